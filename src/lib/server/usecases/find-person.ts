import type { PersonView } from '../../orders/views';
import { database } from '../db';
import { AppError } from '../errors';
import { personView } from '../person-view';
import { personById } from '../tables/people';

export async function findPerson(id: number): Promise<PersonView> {
  const row = await personById(database(), id);
  if (!row) throw new AppError('not-found');
  return personView(row);
}
