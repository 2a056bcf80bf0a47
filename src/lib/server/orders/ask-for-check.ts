import type { Transaction } from '../db';
import { askAnew } from '../queue/enqueue';
import { latestArtwork } from '../tables/artworks';
import { artworkSubject } from './subjects';

/** Somebody who drags a size changes it many times a second; only the last one is checked. */
const SETTLE_MS = 400;

/** Has an order's newest artwork checked, in place of any check that is under way. */
export async function askForCheck(
  trx: Transaction,
  orderId: number,
  when: 'at-once' | 'settled',
): Promise<void> {
  const artwork = await latestArtwork(trx, orderId);
  if (!artwork) return;
  await askAnew(trx, {
    name: 'check-artwork',
    subject: artworkSubject(artwork.id),
    orderId,
    payload: { artworkId: artwork.id },
    delayMs: when === 'settled' ? SETTLE_MS : 0,
  });
}
