import type { Role } from '../../orders/state';
import { audit } from '../audit';
import { makeToken } from '../auth/token';
import { withWrite, type Transaction } from '../db';
import { AppError } from '../errors';
import { invitationMail } from '../mail/messages/invitation';
import { queueMail } from '../mail/queue-mail';
import type { Person } from '../person';
import { changeStanding, insertPerson, personByEmail } from '../tables/people';

async function invitedId(trx: Transaction, email: string, role: Role): Promise<number> {
  const known = await personByEmail(trx, email);
  if (!known) {
    const at = new Date().toISOString();
    return insertPerson(trx, {
      email,
      name: email,
      role,
      password_hash: null,
      confirmed_at: null,
      created_at: at,
    });
  }
  const stillInvited = known.role !== 'customer' && known.password_hash === null;
  if (!stillInvited) throw new AppError('address-known');
  await changeStanding(trx, known.id, role, null);
  return known.id;
}

/** Invites somebody to the staff; inviting the same address again sends a new link and makes the old one worthless. */
export async function invitePerson(by: Person, email: string, role: Role): Promise<void> {
  if (role === 'customer') throw new AppError('customers-register');
  await withWrite(async (trx) => {
    const id = await invitedId(trx, email, role);
    await queueMail(
      trx,
      email,
      invitationMail({ role, invitedBy: by.name, token: await makeToken(trx, id, 'invitation') }),
    );
    await audit(trx, { by, event: 'invite', subject: `person ${id}`, words: `${email} as ${role}` });
  });
}
