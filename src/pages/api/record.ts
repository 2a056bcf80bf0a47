import { endpoint } from '../../lib/server/http/endpoint';
import { readRecord } from '../../lib/server/usecases/read-record';

export const GET = endpoint('GET /api/record', ({ query }) => readRecord(query.q, query.page));
