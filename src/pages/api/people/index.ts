import { endpoint } from '../../../lib/server/http/endpoint';
import { listPeople } from '../../../lib/server/usecases/list-people';

export const GET = endpoint('GET /api/people', async ({ query }) => ({
  people: await listPeople(query.q, query.role),
}));
