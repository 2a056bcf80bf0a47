import type { Db } from '../db';
import type { PersonRow } from './people';

export interface SessionRow {
  id: string;
  person_id: number;
  /** the person's token version when it was opened; it lives as long as the two are the same */
  token_version: number;
  created_at: string;
  expires_at: string;
}

export async function insertSession(db: Db, session: SessionRow): Promise<void> {
  await db('sessions').insert(session);
}

/** The person of a live session, when the account is enabled and its token version is still the session's. */
export async function personOfSession(
  db: Db,
  sessionId: string,
  personId: number,
  now: string,
): Promise<PersonRow | null> {
  const row = await db<PersonRow>('people')
    .join('sessions', 'sessions.person_id', 'people.id')
    .where({ 'sessions.id': sessionId, 'people.id': personId })
    .whereRaw('people.token_version = sessions.token_version')
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

/** Ends every session of a person but one, which goes on under the person's present token version. */
export async function keepOnlySession(db: Db, personId: number, id: string): Promise<void> {
  await db('sessions').where({ person_id: personId }).whereNot({ id }).delete();
  await db('sessions')
    .where({ person_id: personId, id })
    .update({ token_version: db('people').select('token_version').where({ id: personId }) });
}

export async function deleteExpiredSessions(db: Db, now: string): Promise<void> {
  await db('sessions').where('expires_at', '<', now).delete();
}
