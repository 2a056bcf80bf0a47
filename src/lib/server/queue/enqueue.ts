import { afterCommit, type Transaction } from '../db';
import { insertTask, openTask, supersedeTask } from '../tables/tasks';
import type { TaskName } from './handler';
import { wakeQueue } from './queue';

interface Asked {
  name: TaskName;
  subject: string;
  orderId: number | null;
  payload: unknown;
  /** how long it may wait for a newer one to take its place, ms */
  delayMs?: number;
}

const write = async (trx: Transaction, asked: Asked): Promise<void> => {
  await insertTask(trx, {
    name: asked.name,
    subject: asked.subject,
    order_id: asked.orderId,
    payload: JSON.stringify(asked.payload),
    due_ms: Date.now() + (asked.delayMs ?? 0),
  });
  // At once as well as when it falls due: a superseded one is to let go of its thread.
  afterCommit(() => {
    wakeQueue();
    if (asked.delayMs) setTimeout(wakeQueue, asked.delayMs + 1).unref();
  });
};

/** Asks for a task unless the same one is open already: asking twice does it once. */
export async function askOnce(trx: Transaction, asked: Asked): Promise<void> {
  if (await openTask(trx, asked.name, asked.subject)) return;
  await write(trx, asked);
}

/** Asks for a task anew: an open one of the same subject is superseded and can no longer complete. */
export async function askAnew(trx: Transaction, asked: Asked): Promise<void> {
  await supersedeTask(trx, asked.name, asked.subject);
  await write(trx, asked);
}
