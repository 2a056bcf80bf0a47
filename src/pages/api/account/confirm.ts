import { DONE } from '../../../lib/server/http/answer';
import { endpoint } from '../../../lib/server/http/endpoint';
import { confirmAddress } from '../../../lib/server/usecases/confirm-address';

export const POST = endpoint('POST /api/account/confirm', async ({ body }) => {
  await confirmAddress(body.token);
  return DONE;
});
