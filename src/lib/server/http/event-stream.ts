import { createHash } from 'node:crypto';
import { AppError } from '../errors';
import { log } from '../log';

const HEADERS = {
  'content-type': 'text/event-stream',
  'cache-control': 'no-cache, no-transform',
  'x-accel-buffering': 'no',
  'x-content-type-options': 'nosniff',
};
const LOOK_MS = 400;
const HEARTBEAT_MS = 20_000;
/** A reader that takes nothing for this long is cut off; its browser comes back by itself. */
const SLOW_MS = 30_000;
export const MOST_STREAMS_PER_PERSON = 8;

const open = new Map<number, number>();

/** Takes a place for one more stream of a person. */
function takePlace(personId: number): () => void {
  const count = open.get(personId) ?? 0;
  if (count >= MOST_STREAMS_PER_PERSON) throw new AppError('too-many-streams');
  open.set(personId, count + 1);
  let held = true;
  return () => {
    if (!held) return;
    held = false;
    const left = (open.get(personId) ?? 1) - 1;
    if (left > 0) open.set(personId, left);
    else open.delete(personId);
  };
}

export const openStreams = (personId: number): number => open.get(personId) ?? 0;

interface Options {
  personId: number;
  request: Request;
  /** looked at again and again; undefined ends the stream */
  look(): Promise<unknown>;
  times?: { lookMs?: number; heartbeatMs?: number; slowMs?: number };
}

/**
 * Server-sent events that say how something stands, whenever it stands differently: many changes between two looks are
 * one event. An event's id is the hash of what it says, so that whoever reconnects is told only what they have not seen.
 */
export function eventStream({ personId, request, look, times = {} }: Options): Response {
  const { lookMs = LOOK_MS, heartbeatMs = HEARTBEAT_MS, slowMs = SLOW_MS } = times;
  const giveBack = takePlace(personId);
  const encoder = new TextEncoder();
  let seen = request.headers.get('last-event-id') ?? '';
  let timer: NodeJS.Timeout | undefined;
  let stopped = false;

  const stop = (controller?: ReadableStreamDefaultController<Uint8Array>): void => {
    if (stopped) return;
    stopped = true;
    clearTimeout(timer);
    giveBack();
    try {
      controller?.close();
    } catch {
      // The reader has closed it already.
    }
  };

  const body = new ReadableStream<Uint8Array>(
    {
      start(controller) {
        let spokenAt = Date.now();
        let readAt = Date.now();
        const say = (text: string): void => {
          spokenAt = Date.now();
          controller.enqueue(encoder.encode(text));
        };
        const turn = async (): Promise<void> => {
          const now = await look();
          if (stopped) return;
          if (now === undefined) return stop(controller);
          if ((controller.desiredSize ?? 0) > 0) readAt = Date.now();
          else if (Date.now() - readAt > slowMs) return stop(controller);
          const data = JSON.stringify(now);
          const id = createHash('sha256').update(data).digest('base64url').slice(0, 16);
          if ((controller.desiredSize ?? 0) > 0 && id !== seen) {
            seen = id;
            say(`id: ${id}\nevent: progress\ndata: ${data}\n\n`);
          } else if (Date.now() - spokenAt >= heartbeatMs) say(': still here\n\n');
          timer = setTimeout(go, lookMs);
        };
        const go = (): void =>
          void turn().catch((error: unknown) => {
            log.warn({ err: error }, 'an event stream ended');
            stop(controller);
          });
        request.signal.addEventListener('abort', () => stop(controller), { once: true });
        say('retry: 2000\n\n');
        go();
      },
      cancel: () => stop(),
    },
    { highWaterMark: 8 },
  );
  return new Response(body, { headers: HEADERS });
}
