import type { OrderView } from '../../orders/views';
import { audit } from '../audit';
import { database, withWrite } from '../db';
import { AppError } from '../errors';
import { askForCheck } from '../orders/ask-for-check';
import { findOrder } from '../orders/find-order';
import { requireNextState, viewAfter, VOIDED } from '../orders/move-order';
import type { Person } from '../person';
import { pipeline, type ArtworkFormat } from '../queue/pipeline';
import type { Incoming } from '../storage/storage';
import { insertArtwork, latestArtwork } from '../tables/artworks';
import { changeOrder } from '../tables/orders';

const MEDIA_TYPES: Record<ArtworkFormat, string> = {
  png: 'image/png',
  jpeg: 'image/jpeg',
  webp: 'image/webp',
  tiff: 'image/tiff',
  gif: 'image/gif',
  avif: 'image/avif',
  bmp: 'image/bmp',
  svg: 'image/svg+xml',
};

/** Refuses an upload before a byte of it is read: another's order, or one that is past taking artwork. */
export async function requireTakesArtwork(person: Person, number: string): Promise<void> {
  const row = await findOrder(database(), person, number);
  requireNextState({ row }, 'new-artwork', person);
}

async function keepVersion(
  person: Person,
  number: string,
  fileName: string,
  mediaType: string,
  incoming: Incoming,
): Promise<OrderView> {
  return withWrite(async (trx) => {
    const row = await findOrder(trx, person, number);
    const next = requireNextState({ row }, 'new-artwork', person);
    const newest = await latestArtwork(trx, row.id);
    // The same file sent twice, as by a double click, is one version.
    if (newest?.sha256 === incoming.key) return viewAfter(trx, row.id, person);
    const version = (newest?.version ?? 0) + 1;
    const { key: sha256, bytes } = incoming;
    await insertArtwork(trx, {
      order_id: row.id,
      version,
      file_name: fileName,
      media_type: mediaType,
      bytes,
      sha256,
      uploaded_by: person.id,
    });
    if (!(await changeOrder(trx, row, { ...VOIDED, state: next }))) throw new AppError('conflict');
    await audit(trx, {
      by: person,
      event: 'new-artwork',
      subject: number,
      from: row.state,
      to: next,
      words: `version ${version}, ${fileName}`,
    });
    await askForCheck(trx, row.id, 'at-once');
    return viewAfter(trx, row.id, person);
  });
}

/**
 * Takes what has arrived as the order's newest artwork and has it checked; what cannot be read is refused at once and
 * nothing of it stays. A pass and an approval are void with it.
 */
export async function submitArtwork(
  person: Person,
  number: string,
  fileName: string,
  incoming: Incoming,
): Promise<OrderView> {
  try {
    const { format } = await (await pipeline()).read(await incoming.read());
    await incoming.keep();
    return await keepVersion(person, number, fileName, MEDIA_TYPES[format], incoming);
  } finally {
    await incoming.discard();
  }
}
