import { database } from '../db';
import { log } from '../log';
import { queueRuns } from '../queue/queue';
import { storage } from '../storage/store';

export interface Health {
  ok: boolean;
  database: boolean;
  storage: boolean;
  queue: boolean;
  freeBytes: number;
}

async function answers(part: string, ask: () => Promise<unknown>): Promise<boolean> {
  try {
    await ask();
    return true;
  } catch (error) {
    log.error({ err: error, part }, 'health: a part does not answer');
    return false;
  }
}

/** Whether each part of the server answers, and how much room is left. */
export async function readHealth(): Promise<Health> {
  let freeBytes = 0;
  const parts = {
    database: await answers('database', () => database().raw('select count(*) from people')),
    storage: await answers('storage', async () => {
      freeBytes = await (await storage()).freeBytes();
    }),
    queue: queueRuns(),
  };
  return { ok: parts.database && parts.storage && parts.queue, ...parts, freeBytes };
}
