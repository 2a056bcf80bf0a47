import type { Role } from '../../orders/state';
import type { Db } from '../db';

export interface PersonRow {
  id: number;
  email: string;
  name: string;
  role: Role;
  /** null: no password set yet, so nobody can sign in with it */
  password_hash: string | null;
  confirmed_at: string | null;
  disabled_at: string | null;
  token_version: number;
  created_at: string;
}
export type NewPerson = Pick<
  PersonRow,
  'email' | 'name' | 'role' | 'password_hash' | 'confirmed_at' | 'created_at'
>;

export async function personById(db: Db, id: number): Promise<PersonRow | null> {
  return (await db<PersonRow>('people').where({ id }).first()) ?? null;
}

/** Without regard to capitals. */
export async function personByEmail(db: Db, email: string): Promise<PersonRow | null> {
  return (await db<PersonRow>('people').where({ email }).first()) ?? null;
}

export async function insertPerson(db: Db, person: NewPerson): Promise<number> {
  const [id] = await db('people').insert(person);
  return id;
}

/** Those whose name or address holds the words, by name. */
export async function searchPeople(db: Db, words: string, role: Role | undefined): Promise<PersonRow[]> {
  const like = `%${words.replace(/[\\%_]/g, '\\$&')}%`;
  return db<PersonRow>('people')
    .where((where) => {
      if (role) where.where({ role });
    })
    .andWhere((where) => {
      where.whereRaw('name like ? escape ?', [like, '\\']).orWhereRaw('email like ? escape ?', [like, '\\']);
    })
    .orderByRaw('name collate nocase, id')
    .limit(500);
}

export async function renamePerson(db: Db, id: number, name: string): Promise<void> {
  await db('people').where({ id }).update({ name });
}

export async function confirmPerson(db: Db, id: number, at: string): Promise<void> {
  await db('people').where({ id }).whereNull('confirmed_at').update({ confirmed_at: at });
}

/** Sets a password and, with it, ends every session that was opened under the old one. */
export async function setPassword(db: Db, id: number, password_hash: string): Promise<void> {
  await db('people')
    .where({ id })
    .update({ password_hash, token_version: db.raw('token_version + 1') });
}

export async function raiseTokenVersion(db: Db, id: number): Promise<void> {
  await db('people').where({ id }).increment('token_version', 1);
}

/**
 * Changes role and disabled state unless that would leave no admin who can sign in. The condition is part of the update,
 * so that two changes at once cannot each rely on the other's admin. False: nothing was changed.
 */
export async function changeStanding(
  db: Db,
  id: number,
  role: Role,
  disabledAt: string | null,
): Promise<boolean> {
  const changed = await db('people')
    .where({ id })
    .whereRaw(
      `(? = 'admin' and ? is null
        or not (role = 'admin' and disabled_at is null and password_hash is not null)
        or exists (select 1 from people as other
                   where other.id <> people.id and other.role = 'admin'
                     and other.disabled_at is null and other.password_hash is not null))`,
      [role, disabledAt],
    )
    .update({ role, disabled_at: disabledAt });
  return changed === 1;
}

/** Whether anybody can sign in as an admin. */
export async function hasAdmin(db: Db): Promise<boolean> {
  const found = await db('people')
    .where({ role: 'admin', disabled_at: null })
    .whereNotNull('password_hash')
    .first('id');
  return found !== undefined;
}

/** Addresses of those who hold a role and can sign in. */
export async function peopleInRole(db: Db, role: Role): Promise<PersonRow[]> {
  return db<PersonRow>('people')
    .where({ role, disabled_at: null })
    .whereNotNull('password_hash')
    .orderBy('id');
}

/** Stores the same password at a new cost, unless it was changed meanwhile; sessions go on. */
export async function rehashPassword(db: Db, id: number, from: string, to: string): Promise<void> {
  await db('people').where({ id, password_hash: from }).update({ password_hash: to });
}
