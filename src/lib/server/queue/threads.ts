import { createHash } from 'node:crypto';
import { MessageChannel, type MessagePort } from 'node:worker_threads';
import { Piscina } from 'piscina';
import { preparationKey, type Checked, type Prepared } from '../../prepare/pipeline';
import { ArtworkError } from '../../prepare/tools';
import type { Answer, Work } from '../tasks/pipeline.worker';
import workerUrl from '../tasks/pipeline.worker.ts?nodeworker';
import type { TaskContext } from './handler';
import type { ArtworkFormat, Pipeline } from './pipeline';
import { workProgress } from './stage-words';

/** One thread each for a check, a preparation and the first look at an upload. */
const MOST_THREADS = 3;
const IDLE_MS = 30_000;

const slot = globalThis as typeof globalThis & { umberlineThreads?: { url: string; pool: Piscina } };

function threads(): Piscina {
  if (slot.umberlineThreads && slot.umberlineThreads.url !== workerUrl) {
    void slot.umberlineThreads.pool.close();
    slot.umberlineThreads = undefined;
  }
  slot.umberlineThreads ??= {
    url: workerUrl,
    pool: new Piscina({ filename: workerUrl, minThreads: 0, maxThreads: MOST_THREADS, idleTimeout: IDLE_MS }),
  };
  return slot.umberlineThreads.pool;
}

/** Smaller bytes are copied to the thread; a copy of large ones would be in memory twice. */
const MOVED_FROM_BYTES = 1024 * 1024;

function moved({ buffer, byteLength }: Uint8Array): ArrayBuffer[] {
  const whole = buffer instanceof ArrayBuffer && buffer.byteLength === byteLength;
  return whole && byteLength >= MOVED_FROM_BYTES ? [buffer] : [];
}

async function inThread<T>(
  work: Work,
  { signal, port }: { signal?: AbortSignal; port?: MessagePort },
): Promise<T> {
  const transferList = [...(port ? [port] : []), ...moved(work.bytes)];
  const answer = (await threads().run(work, { signal, transferList })) as Answer<T>;
  if (!answer.ok) throw new ArtworkError(answer.code, answer.message);
  return answer.value;
}

type Long = Exclude<Work, { kind: 'read' }>;

async function withProgress<T>(
  kind: Long['kind'],
  context: TaskContext,
  workOf: (port: MessagePort) => Long,
): Promise<T> {
  const { port1, port2 } = new MessageChannel();
  port1.on('message', ([stage, share]: [string, number]) => {
    const { words, progress } = workProgress(kind, stage, share);
    context.progress(words, progress);
  });
  try {
    return await inThread<T>(workOf(port2), { signal: context.signal, port: port2 });
  } finally {
    port1.close();
  }
}

const sha256 = (bytes: Uint8Array | string): string => createHash('sha256').update(bytes).digest('hex');

/** Whoever uploads waits for this, so it ends in either case. */
const READ_MS = 15_000;

async function readInTime(bytes: Uint8Array): Promise<{ format: ArtworkFormat }> {
  const signal = AbortSignal.timeout(READ_MS);
  try {
    return await inThread<{ format: ArtworkFormat }>({ kind: 'read', bytes }, { signal });
  } catch (error) {
    if (!signal.aborted) throw error;
    const words =
      'This file takes too long to read. Export it with fewer details or at a smaller size, and send that.';
    throw new ArtworkError('too-slow', words, { cause: error });
  }
}

/** The pipeline in a pool of threads; an aborted signal ends the thread that works for it. */
export function pipelineInThreads(): Pipeline {
  return {
    read: readInTime,
    check: (bytes, settings, context) =>
      withProgress<Checked>('check', context, (port) => ({ kind: 'check', bytes, settings, port })),
    prepare: (bytes, request, context) =>
      withProgress<Prepared>('prepare', context, (port) => ({ kind: 'prepare', bytes, ...request, port })),
    keyOf: async (artworkSha256, request) => preparationKey({ artworkSha256, ...request }, { sha256 }),
  };
}

/** Ends the threads; what runs in them is lost. */
export async function closeThreads(): Promise<void> {
  const open = slot.umberlineThreads;
  slot.umberlineThreads = undefined;
  await open?.pool.destroy();
}
