import { endpoint } from '@/lib/server/http/endpoint';
import { waiveFinding } from '@/lib/server/usecases/waive-finding';

export const POST = endpoint('POST /api/orders/:number/waivers', async ({ person, params, body }) => ({
  order: await waiveFinding(person, params.number, body.version, body.findingId, body.reason),
}));
