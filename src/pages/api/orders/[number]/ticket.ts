import { endpoint } from '@/lib/server/http/endpoint';
import { readTicket } from '@/lib/server/usecases/read-ticket';

export const GET = endpoint('GET /api/orders/:number/ticket', ({ person, params }) =>
  readTicket(person, params.number),
);
