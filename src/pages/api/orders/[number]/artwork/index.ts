import { endpoint } from '@/lib/server/http/endpoint';
import { receiveFile, requireUploadLength, statedLength } from '@/lib/server/http/receive-file';
import { requireRoom } from '@/lib/server/storage/room';
import { storage } from '@/lib/server/storage/store';
import { requireTakesArtwork, submitArtwork } from '@/lib/server/usecases/submit-artwork';

export const POST = endpoint('POST /api/orders/:number/artwork', async ({ person, params, request }) => {
  await requireTakesArtwork(person, params.number);
  requireUploadLength(request);
  const store = await storage();
  await requireRoom(store, statedLength(request));
  const { fileName, incoming } = await receiveFile(request, 'artwork', store);
  return { order: await submitArtwork(person, params.number, fileName, incoming) };
});
