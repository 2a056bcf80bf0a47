import { picture } from '@/lib/server/http/download';
import { endpoint } from '@/lib/server/http/endpoint';
import { storage } from '@/lib/server/storage/store';
import { fetchArtworkPicture } from '@/lib/server/usecases/fetch-file';

export const GET = endpoint(
  'GET /api/orders/:number/artwork/:artworkVersion/picture',
  async ({ person, params, request }) => {
    const { key } = await fetchArtworkPicture(person, params.number, params.artworkVersion);
    return picture(await storage(), key, request);
  },
);
