import { endpoint } from '@/lib/server/http/endpoint';
import { eventStream } from '@/lib/server/http/event-stream';
import { watchOrder } from '@/lib/server/usecases/watch-order';

export const GET = endpoint('GET /api/orders/:number/progress', async ({ person, params, request }) => {
  const look = await watchOrder(person, params.number);
  return eventStream({ personId: person.id, request, look });
});
