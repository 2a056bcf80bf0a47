import { DONE } from '../../../lib/server/http/answer';
import { endpoint } from '../../../lib/server/http/endpoint';
import { invitePerson } from '../../../lib/server/usecases/invite-person';

export const POST = endpoint('POST /api/people/invitations', async ({ person, body }) => {
  await invitePerson(person, body.email, body.role);
  return DONE;
});
