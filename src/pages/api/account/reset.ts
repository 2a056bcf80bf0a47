import { DONE } from '../../../lib/server/http/answer';
import { endpoint } from '../../../lib/server/http/endpoint';
import { resetPassword } from '../../../lib/server/usecases/reset-password';

export const POST = endpoint('POST /api/account/reset', async ({ body }) => {
  await resetPassword(body.token, body.password);
  return DONE;
});
