import { picture } from '@/lib/server/http/download';
import { endpoint } from '@/lib/server/http/endpoint';
import { storage } from '@/lib/server/storage/store';
import { fetchPassagePicture } from '@/lib/server/usecases/fetch-file';

export const GET = endpoint(
  'GET /api/orders/:number/preparations/:id/pictures/:name',
  async ({ person, params, request }) => {
    const { key } = await fetchPassagePicture(person, params.number, params.id, params.name);
    return picture(await storage(), key, request);
  },
);
