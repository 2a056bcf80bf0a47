import type { Db } from '../db';

export interface OutboxRow {
  id: number;
  message_id: string;
  received_at: string;
  sender: string;
  recipient: string;
  subject: string;
  text: string;
  html: string;
}

/** Keeps one mail and the newest of the others; one that arrives twice under the same message id is kept once. */
export async function keepInOutbox(db: Db, row: Omit<OutboxRow, 'id'>, keep: number): Promise<void> {
  await db('outbox').insert(row).onConflict('message_id').ignore();
  await db('outbox').whereNotIn('id', db('outbox').select('id').orderBy('id', 'desc').limit(keep)).delete();
}

/** Newest first. */
export async function readOutbox(db: Db): Promise<OutboxRow[]> {
  return db<OutboxRow>('outbox').orderBy('id', 'desc');
}
