import type { PersonView } from '../../orders/views';
import { audit } from '../audit';
import { withWrite } from '../db';
import { AppError } from '../errors';
import type { Person } from '../person';
import { personView } from '../person-view';
import { insertPerson, personByEmail, personById } from '../tables/people';

/**
 * Enters a customer who stands at the counter; the one who is known by the address already is given back unchanged. They
 * may set a password later through the forgotten-password mail.
 */
export async function enterWalkIn(by: Person, name: string, email: string): Promise<PersonView> {
  return withWrite(async (trx) => {
    const known = await personByEmail(trx, email);
    if (known && known.role !== 'customer')
      throw new AppError('address-known', { detail: 'It belongs to somebody of the shop.' });
    if (known) return personView(known);
    const at = new Date().toISOString();
    const id = await insertPerson(trx, {
      name,
      email,
      role: 'customer',
      password_hash: null,
      confirmed_at: null,
      created_at: at,
    });
    await audit(trx, { by, event: 'enter-walk-in', subject: `person ${id}`, words: `${name}, ${email}` });
    const row = await personById(trx, id);
    if (!row) throw new AppError('not-found');
    return personView(row);
  });
}
