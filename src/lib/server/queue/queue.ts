import { assertOneHandlerPerName, type TaskHandler } from './handler';
import { Lane, type LaneTimes } from './lane';

/** A lease outlives two missed heartbeats; nothing of ours keeps the main thread busy for longer. */
const TIMES: LaneTimes = { leaseMs: 20_000, pollMs: 1_000, retryMs: 1_000, progressMs: 250 };

// On globalThis, so that a reload of modules in development does not start a second queue.
const slot = globalThis as typeof globalThis & { umberlineQueue?: Lane[] };

/** Starts taking tasks, one lane per handler, so that a check never waits behind a preparation. */
export function startQueue(handlers: readonly TaskHandler[], times: Partial<LaneTimes> = {}): void {
  assertOneHandlerPerName(handlers);
  if (slot.umberlineQueue) return;
  const lanes = handlers.map((handler) => new Lane(handler, { ...TIMES, ...times }));
  slot.umberlineQueue = lanes;
  for (const lane of lanes) lane.start();
}

/** Says that there is work; nothing happens where no queue runs. */
export function wakeQueue(): void {
  for (const lane of slot.umberlineQueue ?? []) lane.wake();
}

export const queueRuns = (): boolean => slot.umberlineQueue !== undefined;

/** Stops taking tasks and lets go of the running ones. */
export async function stopQueue(): Promise<void> {
  const lanes = slot.umberlineQueue ?? [];
  slot.umberlineQueue = undefined;
  await Promise.all(lanes.map((lane) => lane.stop()));
}
