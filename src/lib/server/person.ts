import type { Role } from '../orders/state';

/** Whoever is signed in, as the database has them at this request. */
export type Person = NonNullable<App.Locals['user']>;

export const isStaff = (person: { role: Role }): boolean => person.role !== 'customer';
