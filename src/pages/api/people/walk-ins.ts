import { endpoint } from '../../../lib/server/http/endpoint';
import { enterWalkIn } from '../../../lib/server/usecases/enter-walk-in';

export const POST = endpoint('POST /api/people/walk-ins', async ({ person, body }) => ({
  person: await enterWalkIn(person, body.name, body.email),
}));
