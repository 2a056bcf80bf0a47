import { endpoint } from '@/lib/server/http/endpoint';
import { readPreparation } from '@/lib/server/usecases/read-order';

export const GET = endpoint('GET /api/orders/:number/preparations/:id', async ({ person, params }) => ({
  preparation: await readPreparation(person, params.number, params.id),
}));
