import { DONE } from '../../../lib/server/http/answer';
import { endpoint } from '../../../lib/server/http/endpoint';
import { registerCustomer } from '../../../lib/server/usecases/register-customer';

export const POST = endpoint('POST /api/account/register', async ({ body }) => {
  await registerCustomer(body);
  return DONE;
});
