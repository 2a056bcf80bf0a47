import type { z } from 'zod';
import type { Transaction } from '../db';

export const TASK_NAMES = ['check-artwork', 'prepare-order'] as const;
export type TaskName = (typeof TASK_NAMES)[number];

export interface TaskContext {
  /** aborted when the task took too long, was superseded or is let go of */
  signal: AbortSignal;
  /** says in words what is being done and how far it is, 0–1; cheap to call often */
  progress(stage: string, progress: number): void;
}

/** Writes the result, in the transaction that ends the task; it is never called for a claim that is no longer good. */
export type Commit = (trx: Transaction) => Promise<void>;

/** What a kind of task does: load, run pure code, store files, and hand back the write. */
export interface TaskHandler {
  name: TaskName;
  timeLimitMs: number;
  /** @param payload as the queue kept it */
  run(payload: unknown, context: TaskContext): Promise<Commit>;
}

/** A handler whose payload is parsed by its own schema before anything is done with it. */
export function taskHandler<S extends z.ZodType>(kind: {
  name: TaskName;
  payload: S;
  timeLimitMs: number;
  run(payload: z.output<S>, context: TaskContext): Promise<Commit>;
}): TaskHandler {
  const { name, timeLimitMs } = kind;
  return {
    name,
    timeLimitMs,
    run: async (payload, context) => kind.run(kind.payload.parse(payload), context),
  };
}

/** Refuses a set of handlers in which a name has none or two: a task that nobody takes would wait for ever. */
export function assertOneHandlerPerName(handlers: readonly { name: TaskName }[]): void {
  for (const name of TASK_NAMES) {
    const count = handlers.filter((handler) => handler.name === name).length;
    if (count !== 1) throw new Error(`expected exactly one handler for the task ${name}, got ${count}`);
  }
}
