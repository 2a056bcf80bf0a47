import '../../setup/database';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { progressEventSchema, type ProgressEvent } from '@/lib/orders/views';
import { eventStream, MOST_STREAMS_PER_PERSON, openStreams } from '@/lib/server/http/event-stream';
import { GET } from '@/pages/api/orders/[number]/progress';
import { call } from '../../setup/call';
import {
  bench,
  change,
  open,
  openShop,
  settled,
  startShopQueue,
  stopShopQueue,
  upload,
  type Shop,
} from './shop';

let shop: Shop;
let number: string;
beforeAll(async () => {
  shop = await openShop();
  startShopQueue();
  ({ number } = await open(shop.customer));
});
afterAll(stopShopQueue);
afterEach(() => {
  bench.wait = async () => undefined;
});

interface Reader {
  next(): Promise<string>;
  event(): Promise<ProgressEvent & { id: string }>;
  close(): Promise<void>;
}
function reader(response: Response): Reader {
  const stream = response.body!.pipeThrough(new TextDecoderStream()).getReader();
  let rest = '';
  const next = async (): Promise<string> => {
    for (;;) {
      const end = rest.indexOf('\n\n');
      if (end >= 0) {
        const block = rest.slice(0, end);
        rest = rest.slice(end + 2);
        return block;
      }
      const { value, done } = await stream.read();
      if (done) return 'the end';
      rest += value;
    }
  };
  return {
    next,
    async event() {
      for (;;) {
        const block = await next();
        const data = /^data: (.*)$/m.exec(block)?.[1];
        if (data)
          return { ...progressEventSchema.parse(JSON.parse(data)), id: /^id: (.*)$/m.exec(block)?.[1] ?? '' };
        if (block === 'the end') throw new Error('the stream ended');
      }
    },
    close: () => stream.cancel(),
  };
}
const watch = async (headers = {}): Promise<Reader> =>
  reader(await call(GET, { person: shop.customer, params: { number }, headers }));

describe('progress', () => {
  it('tells how it stands at once, and then whenever it stands differently', async () => {
    const stream = await watch();
    expect(await stream.event()).toMatchObject({ version: 1, tasks: [] });
    bench.wait = () => new Promise((done) => setTimeout(done, 900));
    await upload(shop.customer, number);
    const seen: string[] = [];
    for (;;) {
      const { version, tasks } = await stream.event();
      expect(version).toBe(2);
      seen.push(`${tasks[0].kind} ${tasks[0].state} ${tasks[0].stage}`);
      if (tasks[0].state === 'done') break;
    }
    expect(seen).toContain('check running Measuring');
    expect(seen.length).toBeLessThan(8);
    await stream.close();
  });

  it('goes on after a break with what was not seen, by Last-Event-ID', async () => {
    await settled(shop.customer, number);
    const first = await watch();
    const { id, version } = await first.event();
    await first.close();
    const second = await watch({ 'last-event-id': id });
    const next = second.event();
    await change(shop.customer, number, { notes: 'while away' });
    expect((await next).version).toBe(version + 1);
    await second.close();
  });

  it('is not for another customer', async () => {
    expect((await call(GET, { person: shop.stranger, params: { number } })).status).toBe(404);
    expect(openStreams(shop.stranger.id)).toBe(0);
  });

  it('is held by a person a limited number of times, and every place is given back', async () => {
    const streams = await Promise.all(Array.from({ length: MOST_STREAMS_PER_PERSON }, () => watch()));
    const refused = await call(GET, { person: shop.customer, params: { number } });
    expect(refused.status).toBe(429);
    await streams[0].close();
    const another = await watch();
    expect((await another.event()).tasks).toHaveLength(1);
    for (const stream of [another, ...streams.slice(1)]) await stream.close();
    await expect.poll(() => openStreams(shop.customer.id)).toBe(0);
  });
});

describe('an event stream', () => {
  const stream = (over: Partial<Parameters<typeof eventStream>[0]> = {}, signal?: AbortSignal): Response =>
    eventStream({
      personId: 77,
      request: new Request('http://localhost/', { signal }),
      look: async () => ({ still: true }),
      times: { lookMs: 5, heartbeatMs: 40, slowMs: 60 },
      ...over,
    });

  it('is text/event-stream that nothing on the way keeps back', () => {
    const response = stream();
    expect(Object.fromEntries(response.headers)).toMatchObject({
      'content-type': 'text/event-stream',
      'cache-control': 'no-cache, no-transform',
      'x-accel-buffering': 'no',
    });
    void response.body?.cancel();
  });

  it('says nothing twice, and is still heard of', async () => {
    const read = reader(stream());
    expect(await read.next()).toBe('retry: 2000');
    expect(await read.next()).toMatch(/^id: .*\nevent: progress\ndata: \{"still":true\}$/);
    expect(await read.next()).toBe(': still here');
    expect(await read.next()).toBe(': still here');
    await read.close();
    await expect.poll(() => openStreams(77)).toBe(0);
  });

  it('makes many changes one event', async () => {
    let count = 0;
    const counting = setInterval(() => (count += 1), 1);
    const read = reader(
      stream({ look: async () => ({ count }), times: { lookMs: 60, heartbeatMs: 1000, slowMs: 1000 } }),
    );
    await read.next();
    const began = performance.now();
    for (let events = 0; events < 4; events += 1) await read.next();
    clearInterval(counting);
    expect(performance.now() - began).toBeGreaterThan(150);
    await read.close();
  });

  it('gives its place back when the request is aborted', async () => {
    const abort = new AbortController();
    const read = reader(stream({}, abort.signal));
    await read.next();
    abort.abort();
    await expect.poll(() => openStreams(77)).toBe(0);
  });

  it('ends when what it watches may not be seen any more, and when looking fails', async () => {
    const gone = reader(stream({ look: async () => undefined }));
    await gone.next();
    expect(await gone.next()).toBe('the end');
    const broken = reader(stream({ look: () => Promise.reject(new Error('no database')) }));
    await broken.next();
    expect(await broken.next()).toBe('the end');
    await expect.poll(() => openStreams(77)).toBe(0);
  });

  it('drops a reader that takes nothing, and never piles up for it', async () => {
    let count = 0;
    stream({ look: async () => ({ count: (count += 1) }) });
    await expect.poll(() => openStreams(77), { timeout: 3000 }).toBe(0);
    expect(count).toBeLessThan(200);
  });
});
