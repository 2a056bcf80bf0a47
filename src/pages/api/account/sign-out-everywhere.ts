import { DONE } from '../../../lib/server/http/answer';
import { endpoint } from '../../../lib/server/http/endpoint';
import { signOutEverywhere } from '../../../lib/server/usecases/sign-out';

export const POST = endpoint('POST /api/account/sign-out-everywhere', async ({ person }) => {
  await signOutEverywhere(person);
  return DONE;
});
