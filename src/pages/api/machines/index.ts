import { endpoint } from '../../../lib/server/http/endpoint';
import { addMachine } from '../../../lib/server/usecases/keep-machine';
import { listMachines } from '../../../lib/server/usecases/list-machines';

export const GET = endpoint('GET /api/machines', async () => ({ machines: await listMachines() }));

export const POST = endpoint('POST /api/machines', async ({ person, body }) => ({
  machine: await addMachine(person, body),
}));
