import { audit } from '../audit';
import { withWrite } from '../db';
import type { Person } from '../person';
import { raiseTokenVersion } from '../tables/people';
import { deleteSession, deleteSessionsOf } from '../tables/sessions';

/** Ends one session: a copy of its cookie is worthless from now on. */
export async function signOut(sessionId: string): Promise<void> {
  await withWrite((trx) => deleteSession(trx, sessionId));
}

/** Ends every session of a person, on every device. */
export async function signOutEverywhere(by: Person): Promise<void> {
  await withWrite(async (trx) => {
    await raiseTokenVersion(trx, by.id);
    await deleteSessionsOf(trx, by.id);
    await audit(trx, { by, event: 'sign-out-everywhere', subject: `person ${by.id}` });
  });
}
