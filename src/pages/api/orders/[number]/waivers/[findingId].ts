import { endpoint } from '@/lib/server/http/endpoint';
import { withdrawWaiver } from '@/lib/server/usecases/withdraw-waiver';

export const DELETE = endpoint(
  'DELETE /api/orders/:number/waivers/:findingId',
  async ({ person, params }) => ({
    order: await withdrawWaiver(person, params.number, params.findingId),
  }),
);
