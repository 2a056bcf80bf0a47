import { endpoint } from '../../lib/server/http/endpoint';
import { listOutbox } from '../../lib/server/usecases/read-outbox';

export const GET = endpoint('GET /api/outbox', async () => ({ mails: await listOutbox() }));
