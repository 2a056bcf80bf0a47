import { endpoint } from '@/lib/server/http/endpoint';
import { checkAgain } from '@/lib/server/usecases/check-again';

export const POST = endpoint(
  'POST /api/orders/:number/artwork/:artworkVersion/check',
  async ({ person, params }) => ({
    order: await checkAgain(person, params.number, params.artworkVersion),
  }),
);
