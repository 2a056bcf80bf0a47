import { config } from '../config';
import { database } from '../db';
import { AppError } from '../errors';
import { readOutbox } from '../tables/outbox';

export interface OutboxMail {
  id: number;
  at: string;
  to: string;
  subject: string;
  text: string;
  html: string;
}

/** Mails that the in-process server kept, newest first; where mails really go out there is no such page. */
export async function listOutbox(): Promise<OutboxMail[]> {
  if (!config().isDemo) throw new AppError('not-found');
  const rows = await readOutbox(database());
  return rows.map(({ id, received_at, recipient, subject, text, html }) => ({
    id,
    at: received_at,
    to: recipient,
    subject,
    text,
    html,
  }));
}
