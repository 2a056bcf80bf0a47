import { randomUUID } from 'node:crypto';
import { hashPassword, needsNewHash, passwordMatches, pretendToCheck } from '../auth/password';
import { database, withWrite } from '../db';
import { countAttempt, forgive } from '../limits';
import { personByEmail, rehashPassword, type PersonRow } from '../tables/people';
import { deleteExpiredSessions, insertSession } from '../tables/sessions';

/** A session ends by itself after this, whatever the cookie says. */
export const SESSION_SECONDS = 7 * 24 * 3600;

/** What a cookie says: who, and which session. */
export interface Opened {
  personId: number;
  sessionId: string;
}

async function personWith(email: string, password: string): Promise<PersonRow | null> {
  const person = await personByEmail(database(), email);
  if (!person?.password_hash) {
    await pretendToCheck(password);
    return null;
  }
  const matches = await passwordMatches(password, person.password_hash);
  return matches && person.disabled_at === null ? person : null;
}

async function openSession(person: PersonRow, newHash: string | null): Promise<Opened> {
  const now = Date.now();
  const sessionId = randomUUID();
  await withWrite(async (trx) => {
    await deleteExpiredSessions(trx, new Date(now).toISOString());
    await insertSession(trx, {
      id: sessionId,
      person_id: person.id,
      token_version: person.token_version,
      created_at: new Date(now).toISOString(),
      expires_at: new Date(now + SESSION_SECONDS * 1000).toISOString(),
    });
    if (newHash && person.password_hash) await rehashPassword(trx, person.id, person.password_hash, newHash);
  });
  return { personId: person.id, sessionId };
}

/**
 * Opens a session, or gives null for an unknown address, a wrong password and a disabled account alike. Throws `too-many`
 * when the address or the account has failed too often.
 */
export async function signIn(email: string, password: string, address: string): Promise<Opened | null> {
  await countAttempt('sign-in', address, email);
  const person = await personWith(email, password);
  if (!person?.password_hash) return null;
  await forgive('sign-in', address, email);
  return openSession(person, needsNewHash(person.password_hash) ? await hashPassword(password) : null);
}
