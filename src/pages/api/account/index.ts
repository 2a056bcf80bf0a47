import { DONE } from '../../../lib/server/http/answer';
import { endpoint } from '../../../lib/server/http/endpoint';
import { findPerson } from '../../../lib/server/usecases/find-person';
import { changeAccount } from '../../../lib/server/usecases/change-account';

export const GET = endpoint('GET /api/account', async ({ person }) => ({
  person: person && (await findPerson(person.id)),
}));

export const PATCH = endpoint('PATCH /api/account', async ({ person, body, sessionId }) => {
  await changeAccount(person, body, sessionId);
  return DONE;
});
