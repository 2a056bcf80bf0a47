import { endpoint } from '../../lib/server/http/endpoint';
import { enterWash, findWash } from '../../lib/server/usecases/keep-wash';

export const GET = endpoint('GET /api/wash', async () => ({ wash: await findWash() }));

export const PUT = endpoint('PUT /api/wash', async ({ person, body }) => ({
  wash: await enterWash(person, body),
}));
