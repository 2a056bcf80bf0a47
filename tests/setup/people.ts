import type { Role } from '@/lib/orders/state';
import { hashPassword } from '@/lib/server/auth/password';
import { database } from '@/lib/server/db';
import type { Person } from '@/lib/server/person';
import { personOf } from '@/lib/server/person-view';
import { insertPerson, personById } from '@/lib/server/tables/people';

/** Cheap enough for many people in a test; the real cost has its own test. */
const TEST_COST = { ln: 4, r: 8, p: 1 };

export interface PersonFields {
  name?: string;
  email?: string;
  password?: string | null;
  confirmed?: boolean;
}

let made = 0;

/** Enters a person as the database would have them after registering or accepting an invitation. */
export async function addPerson(role: Role, fields: PersonFields = {}): Promise<Person> {
  made += 1;
  const {
    name = `The ${role} ${made}`,
    email = `${role}${made}@shop.example`,
    password = null,
    confirmed = true,
  } = fields;
  const at = new Date().toISOString();
  const id = await insertPerson(database(), {
    name,
    email,
    role,
    password_hash: await hashPassword(password ?? `password of ${made}`, TEST_COST),
    confirmed_at: confirmed ? at : null,
    created_at: at,
  });
  const row = await personById(database(), id);
  if (!row) throw new Error('expected the person just entered');
  return personOf(row);
}
