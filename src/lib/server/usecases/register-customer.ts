import { audit } from '../audit';
import { hashPassword } from '../auth/password';
import { makeToken } from '../auth/token';
import { withWrite, type Transaction } from '../db';
import { confirmMail } from '../mail/messages/confirm';
import { knownAddressMail } from '../mail/messages/known-address';
import { queueMail } from '../mail/queue-mail';
import { insertPerson, personByEmail } from '../tables/people';

async function enter(trx: Transaction, name: string, email: string, passwordHash: string): Promise<void> {
  const at = new Date().toISOString();
  const id = await insertPerson(trx, {
    name,
    email,
    role: 'customer',
    password_hash: passwordHash,
    confirmed_at: null,
    created_at: at,
  });
  await audit(trx, { by: { id, name }, event: 'register', subject: `person ${id}` });
  await queueMail(trx, email, confirmMail({ name, token: await makeToken(trx, id, 'confirm') }));
}

/**
 * Registers a customer. A known address looks the same from outside, takes as long, changes nothing, and writes to the
 * address's owner instead.
 */
export async function registerCustomer(fields: {
  name: string;
  email: string;
  password: string;
}): Promise<void> {
  const passwordHash = await hashPassword(fields.password);
  await withWrite(async (trx) => {
    const known = await personByEmail(trx, fields.email);
    if (known) await queueMail(trx, known.email, knownAddressMail({ name: known.name }));
    else await enter(trx, fields.name, fields.email, passwordHash);
  });
}
