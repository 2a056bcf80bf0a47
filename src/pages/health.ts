import { json } from '../lib/server/http/answer';
import { endpoint } from '../lib/server/http/endpoint';
import { readHealth } from '../lib/server/usecases/read-health';

export const GET = endpoint('GET /health', async () => {
  const health = await readHealth();
  return json(health, health.ok ? 200 : 503);
});
