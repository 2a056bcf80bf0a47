import type { Role } from '../../orders/state';
import type { PersonView } from '../../orders/views';
import { audit } from '../audit';
import { withWrite } from '../db';
import { AppError } from '../errors';
import type { Person } from '../person';
import { personView } from '../person-view';
import { changeStanding, personById, raiseTokenVersion } from '../tables/people';
import { deleteSessionsOf } from '../tables/sessions';

function wordsOf(change: { role?: Role; disabled?: boolean }): string {
  const parts = [
    change.role !== undefined && `now ${change.role}`,
    change.disabled === true && 'disabled',
    change.disabled === false && 'enabled',
  ];
  return parts.filter(Boolean).join(', ');
}

/** Changes somebody's role or disables them; the last admin who can sign in stays one. */
export async function changePerson(
  by: Person,
  id: number,
  change: { role?: Role; disabled?: boolean },
): Promise<PersonView> {
  return withWrite(async (trx) => {
    const before = await personById(trx, id);
    if (!before) throw new AppError('not-found');
    const now = new Date().toISOString();
    const disabledAt =
      change.disabled === undefined
        ? before.disabled_at
        : change.disabled
          ? (before.disabled_at ?? now)
          : null;
    const changed = await changeStanding(trx, id, change.role ?? before.role, disabledAt);
    if (!changed) throw new AppError('last-admin');
    if (change.disabled === true) {
      await raiseTokenVersion(trx, id);
      await deleteSessionsOf(trx, id);
    }
    await audit(trx, {
      by,
      event: 'change-person',
      subject: `person ${id}`,
      words: `${before.name}: ${wordsOf(change)}`,
    });
    const after = await personById(trx, id);
    return personView(after ?? before);
  });
}
