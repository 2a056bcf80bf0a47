import { endpoint } from '../../../lib/server/http/endpoint';
import { changePerson } from '../../../lib/server/usecases/change-person';

export const PATCH = endpoint('PATCH /api/people/:id', async ({ person, params, body }) => ({
  person: await changePerson(person, params.id, body),
}));
