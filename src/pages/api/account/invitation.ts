import { DONE } from '../../../lib/server/http/answer';
import { endpoint } from '../../../lib/server/http/endpoint';
import { acceptInvitation } from '../../../lib/server/usecases/accept-invitation';

export const POST = endpoint('POST /api/account/invitation', async ({ body }) => {
  await acceptInvitation(body);
  return DONE;
});
