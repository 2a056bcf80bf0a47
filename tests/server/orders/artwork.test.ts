import { dataDir } from '../../setup/database';
import { readdir } from 'node:fs/promises';
import path from 'node:path';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { shownFileName } from '@/lib/server/http/receive-file';
import { memoryStorage } from '@/lib/server/storage/memory';
import { useStorage } from '@/lib/server/storage/store';
import { GET as original } from '@/pages/api/orders/[number]/artwork/[artworkVersion]/original';
import { GET as artworkPicture } from '@/pages/api/orders/[number]/artwork/[artworkVersion]/picture';
import { POST as check } from '@/pages/api/orders/[number]/artwork/[artworkVersion]/check';
import { POST } from '@/pages/api/orders/[number]/artwork/index';
import { call, jsonOf } from '../../setup/call';
import {
  at,
  bench,
  blankOf,
  change,
  fileForm,
  open,
  openShop,
  read,
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
afterEach(async () => {
  useStorage(shop.storage);
  bench.wait = async () => undefined;
  // A check under way stores its picture through the same folder, so it may take a moment.
  await expect
    .poll(() => readdir(path.join(dataDir, 'storage/arriving')), { message: 'temporary files' })
    .toEqual([]);
});

const MIB = 1024 * 1024;
const send = (raw: BodyInit, headers: Record<string, string> = {}): Promise<Response> =>
  call(POST, { person: shop.customer, params: { number }, method: 'POST', raw, headers });
const stored = async (): Promise<number> =>
  (await readdir(path.join(dataDir, 'storage/stored'), { recursive: true })).length;
interface Problem {
  code: string;
  title: string;
  detail: string;
  action: string;
}

describe('an upload', () => {
  it('becomes a version, is checked within moments and shows its picture', async () => {
    const sent = await upload(shop.customer, number, 'first picture', 'logo.png');
    expect(sent.artworks).toMatchObject([
      { version: 1, fileName: 'logo.png', mediaType: 'image/png', bytes: 13, uploadedBy: 'Ina' },
    ]);
    const order = await settled(shop.customer, number);
    expect(order.artworks[0]).toMatchObject({
      task: { state: 'done' },
      check: { widthMm: 100 },
      pictureUrl: `/api/orders/${number}/artwork/1/picture`,
    });
  });

  it('is one version when the same file is sent twice, also at once', async () => {
    const { number: fresh } = await open(shop.customer);
    await Promise.all([
      upload(shop.customer, fresh, 'twice'),
      upload(shop.customer, fresh, 'twice'),
      upload(shop.customer, fresh, 'twice'),
    ]);
    expect((await read(shop.customer, fresh)).artworks).toHaveLength(1);
    await upload(shop.customer, fresh, 'another');
    await upload(shop.customer, fresh, 'twice');
    expect((await read(shop.customer, fresh)).artworks.map(({ version }) => version)).toEqual([1, 2, 3]);
  });

  it('is refused by its stated length before a byte is read', async () => {
    let pulled = 0;
    const body = new ReadableStream(
      { pull: (controller) => void (pulled++, controller.enqueue(new Uint8Array(1024))) },
      { highWaterMark: 0 },
    );
    const response = await send(body, {
      'content-type': 'multipart/form-data; boundary=x',
      'content-length': String(65 * MIB),
    });
    expect(await jsonOf<Problem>(response, 413)).toMatchObject({
      code: 'artwork-too-large',
      detail: 'The file has more than 64 MiB.',
    });
    expect(pulled).toBe(0);
  });

  it('is cut off at the limit when it states no length', async () => {
    const head = new TextEncoder().encode(
      '--x\r\nContent-Disposition: form-data; name="artwork"; filename="a.png"\r\nContent-Type: image/png\r\n\r\n',
    );
    let sent = 0;
    const body = new ReadableStream({
      pull(controller) {
        controller.enqueue(sent === 0 ? head : new Uint8Array(MIB));
        sent += 1;
        if (sent > 70) controller.close();
      },
    });
    await jsonOf(await send(body, { 'content-type': 'multipart/form-data; boundary=x' }), 413);
  });

  it.each([
    ['JSON', '{}', { 'content-type': 'application/json' }, 415],
    [
      'no file',
      (() => {
        const form = new FormData();
        form.set('words', 'hello');
        return form;
      })(),
      {},
      422,
    ],
    [
      'another field',
      (() => {
        const form = new FormData();
        form.set('picture', new File(['x'], 'x.png'));
        return form;
      })(),
      {},
      422,
    ],
    ['an empty file', fileForm(''), {}, 422],
    ['what is no picture', fileForm('bad bytes'), {}, 422],
    ['a broken form', 'this is no form', { 'content-type': 'multipart/form-data; boundary=x' }, 400],
    ['a form without a boundary', 'this is no form', { 'content-type': 'multipart/form-data' }, 400],
  ] as const)(
    'of %s is refused with what happened, why and what to do, and nothing stays',
    async (_, raw, headers, status) => {
      const [before, versions] = [await stored(), (await read(shop.customer, number)).artworks.length];
      const problem = await jsonOf<Problem>(await send(raw as BodyInit, headers), status);
      for (const words of [problem.title, problem.detail, problem.action]) expect(words).not.toBe('');
      expect(await stored()).toBe(before);
      expect((await read(shop.customer, number)).artworks).toHaveLength(versions);
    },
  );

  it('of two files takes neither', async () => {
    const form = fileForm('one');
    form.append('artwork', new File(['two'], 'two.png'));
    expect((await send(form)).status).toBe(422);
  });

  it('leaves nothing when the sender breaks off', async () => {
    const body = new ReadableStream({
      start(controller) {
        controller.enqueue(
          new TextEncoder().encode(
            '--x\r\nContent-Disposition: form-data; name="artwork"; filename="a.png"\r\n\r\nhalf of',
          ),
        );
        setTimeout(() => controller.error(new Error('gone')), 20);
      },
    });
    const before = await stored();
    expect(
      (await send(body, { 'content-type': 'multipart/form-data; boundary=x' })).status,
    ).toBeGreaterThanOrEqual(400);
    expect(await stored()).toBe(before);
  });

  it('is refused first when the disk is nearly full, before anything else fails', async () => {
    useStorage(memoryStorage(100 * MIB));
    expect(await jsonOf<Problem>(await send(fileForm('picture')), 507)).toMatchObject({
      title: 'The shop’s disk is nearly full.',
    });
  });

  it('that meets a full disk half-way says so, and nothing stays', async () => {
    useStorage({
      ...memoryStorage(),
      receive: async () => {
        throw Object.assign(new Error('write'), { code: 'ENOSPC' });
      },
    });
    expect(await jsonOf<Problem>(await send(fileForm('picture'.repeat(50_000))), 507)).toMatchObject({
      code: 'no-room',
    });
  });

  it('to a stranger’s order is not found, and is not read', async () => {
    for (const who of [shop.stranger, shop.unconfirmed]) {
      expect(
        (await call(POST, { person: who, params: { number }, method: 'POST', raw: fileForm('x') })).status,
      ).toBe(404);
    }
  });

  it.each([
    ['../../etc/passwd', 'passwd'],
    ['C:\\shop\\logo.svg', 'logo.svg'],
    ['a\u0000b\nc\u202e.png', 'abc.png'],
    ['', 'artwork'],
    [null, 'artwork'],
    ['x'.repeat(300), 'x'.repeat(120)],
    ['Bäckerei “Ähre”.svg', 'Bäckerei “Ähre”.svg'],
  ])('named %j is shown as %j', (given, shown) => {
    expect(shownFileName(given)).toBe(shown);
  });
});

describe('a stored file', () => {
  it('comes back as it was sent, as a download that nothing runs', async () => {
    const { number: own } = await open(shop.customer);
    await upload(shop.customer, own, '<svg onload="alert(1)"/>', 'Ähre "x".svg');
    const response = await call(original, {
      person: shop.customer,
      params: { number: own, artworkVersion: '1' },
    });
    expect(await response.text()).toBe('<svg onload="alert(1)"/>');
    expect(Object.fromEntries(response.headers)).toMatchObject({
      'content-type': 'application/octet-stream',
      'x-content-type-options': 'nosniff',
      'content-security-policy': "sandbox; default-src 'none'",
      'content-disposition': `attachment; filename="_hre _x_.svg"; filename*=UTF-8''%C3%84hre%20%22x%22.svg`,
    });
  });

  it('is sent again only when a browser does not have it', async () => {
    await settled(shop.customer, number);
    const ask = (headers = {}): Promise<Response> =>
      call(artworkPicture, { person: shop.customer, params: { number, artworkVersion: '1' }, headers });
    const first = await ask();
    expect(first.headers.get('content-type')).toBe('image/png');
    expect(await first.text()).toBe('a picture');
    expect((await ask({ 'if-none-match': first.headers.get('etag') })).status).toBe(304);
  });

  it.each(['0', '99', '-1', '1e0', '01', 'x', '%31', ''])(
    'of version %j does not exist',
    async (artworkVersion) => {
      expect(
        (await call(original, { person: shop.customer, params: { number, artworkVersion } })).status,
      ).toBe(404);
    },
  );

  it('of another customer’s order does not exist', async () => {
    for (const route of [original, artworkPicture]) {
      expect(
        (await call(route, { person: shop.stranger, params: { number, artworkVersion: '1' } })).status,
      ).toBe(404);
      expect(
        (await call(route, { person: shop.operator, params: { number, artworkVersion: '1' } })).status,
      ).toBe(200);
      expect((await call(route, { person: null, params: { number, artworkVersion: '1' } })).status).toBe(401);
    }
  });
});

describe('a check', () => {
  it('runs again when size, blank or treatment change, and not for a due date', async () => {
    const { number: own } = await open(shop.customer);
    await upload(shop.customer, own, 'checked');
    await settled(shop.customer, own);
    const before = bench.checks.length;
    await change(shop.customer, own, { dueOn: '2027-03-01', title: 'New title' });
    await settled(shop.customer, own);
    expect(bench.checks).toHaveLength(before);
    await change(shop.customer, own, { widthMm: 50, heightMm: 30 });
    expect((await settled(shop.customer, own)).artworks[0].check?.widthMm).toBe(50);
    await change(shop.customer, own, { blank: blankOf(shop.birch) });
    await settled(shop.customer, own);
    expect(bench.checks.at(-1)).toMatchObject({
      widthMm: 50,
      heightMm: 30,
      blank: { widthMm: 100, leftMm: 25, topMm: 25 },
      spot: { widthMm: 0.07 },
    });
  });

  it('of an older size never overwrites that of a newer one', async () => {
    const { number: own } = await open(shop.customer);
    await upload(shop.customer, own, 'raced');
    await settled(shop.customer, own);
    const before = bench.checks.length;
    for (const widthMm of [20, 21, 22, 23, 24]) await change(shop.customer, own, { widthMm, heightMm: 10 });
    expect((await settled(shop.customer, own)).artworks[0].check?.widthMm).toBe(24);
    expect(bench.checks.length - before).toBeLessThanOrEqual(2);
  });

  it('that failed says why, and can be started again', async () => {
    const { number: own } = await open(shop.customer);
    bench.wait = async () => {
      throw Object.assign(new Error('write'), { code: 'ENOSPC' });
    };
    await upload(shop.customer, own, 'fails at first');
    const failed = await settled(shop.customer, own);
    expect(failed.artworks[0].task).toMatchObject({
      state: 'failed',
      problem: expect.stringMatching(/disk is full/),
    });
    bench.wait = async () => undefined;
    await at(check, shop.customer, own, { body: {}, params: { artworkVersion: '1' } });
    expect((await settled(shop.customer, own)).artworks[0].task.state).toBe('done');
  });
});
