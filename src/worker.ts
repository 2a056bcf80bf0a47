import { startQueue, stopQueue } from './lib/server/queue/queue';
import { checkArtworkTask } from './lib/server/tasks/check-artwork';
import { prepareOrderTask } from './lib/server/tasks/prepare-order';

/** Under this name the start script finds how to stop the queue, which lives in the built server's own modules. */
const STOP = Symbol.for('umberline.stop');

/** Starts the background work of this process; a second call does nothing. */
export function startWorker(): void {
  startQueue([checkArtworkTask, prepareOrderTask]);
  (globalThis as typeof globalThis & { [STOP]?: () => Promise<void> })[STOP] = stopWorker;
}

/** Stops it: running tasks are let go of, so that the next start takes them up at once. */
export async function stopWorker(): Promise<void> {
  await stopQueue();
  const { closeThreads } = await import('./lib/server/queue/threads');
  await closeThreads();
}
