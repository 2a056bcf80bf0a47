import { endpoint } from '@/lib/server/http/endpoint';
import { causeEvent } from '@/lib/server/usecases/cause-event';

export const POST = endpoint('POST /api/orders/:number/events', async ({ person, params, body }) => ({
  order: await causeEvent(person, params.number, body),
}));
