import { audit } from '../audit';
import { hashPassword, passwordMatches } from '../auth/password';
import { database, withWrite } from '../db';
import { AppError } from '../errors';
import type { Person } from '../person';
import { personById, renamePerson, setPassword } from '../tables/people';
import { keepOnlySession } from '../tables/sessions';

export interface AccountChange {
  name?: string;
  currentPassword?: string;
  newPassword?: string;
}

async function requirePassword(by: Person, password: string | undefined): Promise<void> {
  const row = await personById(database(), by.id);
  const right =
    row?.password_hash && password !== undefined && (await passwordMatches(password, row.password_hash));
  if (!right)
    throw new AppError('wrong-password', {
      fields: { currentPassword: 'This is not the present password.' },
    });
}

/** Changes the own name or password; a new password needs the present one and ends every session but the one at hand. */
export async function changeAccount(
  by: Person,
  change: AccountChange,
  sessionId: string | null,
): Promise<void> {
  if (change.newPassword !== undefined) await requirePassword(by, change.currentPassword);
  const passwordHash = change.newPassword === undefined ? null : await hashPassword(change.newPassword);
  await withWrite(async (trx) => {
    const subject = `person ${by.id}`;
    if (change.name !== undefined && change.name !== by.name) {
      await renamePerson(trx, by.id, change.name);
      await audit(trx, { by, event: 'rename', subject, words: `${by.name} is now ${change.name}` });
    }
    if (passwordHash !== null) {
      await setPassword(trx, by.id, passwordHash);
      await keepOnlySession(trx, by.id, sessionId ?? '');
      await audit(trx, { by, event: 'change-password', subject });
    }
  });
}
