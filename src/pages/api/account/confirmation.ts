import { DONE } from '../../../lib/server/http/answer';
import { endpoint } from '../../../lib/server/http/endpoint';
import { resendConfirmation } from '../../../lib/server/usecases/confirm-address';

export const POST = endpoint('POST /api/account/confirmation', async ({ person }) => {
  await resendConfirmation(person);
  return DONE;
});
