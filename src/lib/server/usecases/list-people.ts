import type { Role } from '../../orders/state';
import type { PersonView } from '../../orders/views';
import { database } from '../db';
import { personView } from '../person-view';
import { searchPeople } from '../tables/people';

/** People by name, those whose name or address holds the words. */
export async function listPeople(words: string, role: Role | undefined): Promise<PersonView[]> {
  return (await searchPeople(database(), words, role)).map(personView);
}
