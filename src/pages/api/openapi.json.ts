import { json } from '../../lib/server/http/answer';
import { endpoint } from '../../lib/server/http/endpoint';
import { openApi } from '../../lib/server/http/openapi';

export const GET = endpoint('GET /api/openapi.json', () => json(openApi()));
