import type { PersonView } from '../orders/views';
import type { Person } from './person';
import type { PersonRow } from './tables/people';

/** The signed-in person as requests carry them. */
export function personOf(row: PersonRow): Person {
  return {
    id: row.id,
    name: row.name,
    email: row.email,
    role: row.role,
    confirmed: row.confirmed_at !== null,
  };
}

export function personView(row: PersonRow): PersonView {
  return { ...personOf(row), disabled: row.disabled_at !== null };
}
