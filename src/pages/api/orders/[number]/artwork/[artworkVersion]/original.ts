import { download } from '@/lib/server/http/download';
import { endpoint } from '@/lib/server/http/endpoint';
import { storage } from '@/lib/server/storage/store';
import { fetchOriginal } from '@/lib/server/usecases/fetch-file';

export const GET = endpoint(
  'GET /api/orders/:number/artwork/:artworkVersion/original',
  async ({ person, params }) => {
    const { key, fileName } = await fetchOriginal(person, params.number, params.artworkVersion);
    return download(await storage(), key, fileName);
  },
);
