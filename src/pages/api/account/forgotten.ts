import { DONE } from '../../../lib/server/http/answer';
import { endpoint } from '../../../lib/server/http/endpoint';
import { askForReset } from '../../../lib/server/usecases/reset-password';

export const POST = endpoint('POST /api/account/forgotten', async ({ body }) => {
  await askForReset(body.email);
  return DONE;
});
