import { endpoint } from '@/lib/server/http/endpoint';
import { keepDesign } from '@/lib/server/usecases/keep-design';

export const PUT = endpoint('PUT /api/orders/:number/design', async ({ person, params, body }) => ({
  order: await keepDesign(person, params.number, body.version, body.design),
}));
