import { download } from '@/lib/server/http/download';
import { endpoint } from '@/lib/server/http/endpoint';
import { storage } from '@/lib/server/storage/store';
import { fetchPreparedFile } from '@/lib/server/usecases/fetch-file';

export const GET = endpoint(
  'GET /api/orders/:number/preparations/:id/files/:name',
  async ({ person, params }) => {
    const { key, fileName } = await fetchPreparedFile(person, params.number, params.id, params.name);
    return download(await storage(), key, fileName);
  },
);
