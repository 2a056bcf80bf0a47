import { database } from '../db';
import type { Person } from '../person';
import { personOf } from '../person-view';
import { personOfSession } from '../tables/sessions';
import type { Opened } from './sign-in';

/** Whoever a session cookie speaks for, as the database has them now; null once it was ended in any way. */
export async function findSessionPerson({ sessionId, personId }: Opened): Promise<Person | null> {
  const row = await personOfSession(database(), sessionId, personId, new Date().toISOString());
  return row ? personOf(row) : null;
}
