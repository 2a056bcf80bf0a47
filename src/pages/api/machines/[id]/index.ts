import { endpoint } from '../../../../lib/server/http/endpoint';
import { changeMachine } from '../../../../lib/server/usecases/keep-machine';

export const PATCH = endpoint('PATCH /api/machines/:id', async ({ person, params, body }) => ({
  machine: await changeMachine(person, params.id, body),
}));
