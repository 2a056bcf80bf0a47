import type { Db } from '../db';
import type { PersonRow } from './people';

export interface SessionRow {
  id: string;
  person_id: number;
  created_at: string;
  expires_at: string;
}

export async function insertSession(db: Db, session: SessionRow): Promise<void> {
  await db('sessions').insert(session);
}

/** The person of a live session, when the account is enabled and its token version is still the session's. */
export async function personOfSession(db: Db, sessionId: string, personId: number, tokenVersion: number, now: string): Promise<PersonRow | null> {
  const row = await db<PersonRow>('people')
    .join('sessions', 'sessions.person_id', 'people.id')
    .where({ 'sessions.id': sessionId, 'people.id': personId, 'people.token_version': tokenVersion })
    .whereNull('people.disabled_at')
    .where('sessions.expires_at', '>', now)
    .first<PersonRow | undefined>('people.*');
  return row ?? null;
}

export async function deleteSession(db: Db, id: string): Promise<void> {
  await db('sessions').where({ id }).delete();
}

export async function deleteSessionsOf(db: Db, personId: number): Promise<void> {
  await db('sessions').where({ person_id: personId }).delete();
}

export async function deleteExpiredSessions(db: Db, now: string): Promise<void> {
  await db('sessions').where('expires_at', '<', now).delete();
}
