import type { Db } from '../db';

export interface MailRow {
  id: number;
  message_id: string;
  kind: string;
  recipient: string;
  subject: string;
  text: string;
  html: string;
  attempts: number;
  due_at: string;
  sent_at: string | null;
  failed_at: string | null;
  problem: string;
  created_at: string;
}

export async function insertMail(
  db: Db,
  row: Pick<
    MailRow,
    'message_id' | 'kind' | 'recipient' | 'subject' | 'text' | 'html' | 'created_at' | 'due_at'
  >,
): Promise<void> {
  await db('mails').insert(row);
}

const waiting = (db: Db) => db<MailRow>('mails').whereNull('sent_at').whereNull('failed_at');

/** Takes the next mail that is due and puts its next attempt off, so that nobody else takes it meanwhile. */
export async function claimMail(
  db: Db,
  now: string,
  nextAttempt: (attempts: number) => string,
): Promise<MailRow | null> {
  const next = await waiting(db).where('due_at', '<=', now).orderBy('id').first();
  if (!next) return null;
  const attempts = next.attempts + 1;
  await db('mails')
    .where({ id: next.id })
    .update({ attempts, due_at: nextAttempt(attempts) });
  return { ...next, attempts };
}

/** Notes that the mail server took it, and empties it: links in it are secrets that nobody needs to keep. */
export async function markMailSent(db: Db, id: number, at: string): Promise<void> {
  await db('mails').where({ id }).update({ sent_at: at, text: '', html: '', problem: '' });
}

/** Notes why an attempt failed; a time in `failedAt` gives the mail up. */
export async function markMailTrouble(
  db: Db,
  id: number,
  problem: string,
  failedAt: string | null,
): Promise<void> {
  await db('mails').where({ id }).update({ problem, failed_at: failedAt });
}

/** When the next waiting mail is due, or null. */
export async function nextMailDue(db: Db): Promise<string | null> {
  const row = await waiting(db).min<{ due: string | null }[]>({ due: 'due_at' });
  return row[0].due;
}
