import { randomUUID } from 'node:crypto';
import { config } from '../config';
import { afterCommit, type Transaction } from '../db';
import { insertMail } from '../tables/mails';
import { deliverSoon } from './deliver';
import type { Mail } from './letter';

/** Puts a mail into the caller's own transaction; it goes out once that is kept, and never when it is rolled back. */
export async function queueMail(trx: Transaction, recipient: string, mail: Mail): Promise<void> {
  const now = new Date().toISOString();
  const message_id = `<${randomUUID()}@${config().publicAddress.hostname}>`;
  await insertMail(trx, { ...mail, message_id, recipient, created_at: now, due_at: now });
  afterCommit(deliverSoon);
}
