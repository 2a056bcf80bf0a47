import type { OrderView } from '../../orders/views';
import { withWrite } from '../db';
import { AppError } from '../errors';
import { askForCheck } from '../orders/ask-for-check';
import { findOrder } from '../orders/find-order';
import { viewAfter } from '../orders/move-order';
import type { Person } from '../person';
import { latestArtwork } from '../tables/artworks';

/** Has the newest artwork of an order checked again, after a failure. */
export async function checkAgain(person: Person, number: string, artworkVersion: number): Promise<OrderView> {
  return withWrite(async (trx) => {
    const row = await findOrder(trx, person, number);
    const newest = await latestArtwork(trx, row.id);
    if (!newest || artworkVersion > newest.version) throw new AppError('not-found');
    if (artworkVersion < newest.version)
      throw new AppError('not-now', { detail: 'There is newer artwork; only that is checked.' });
    await askForCheck(trx, row.id, 'at-once');
    return viewAfter(trx, row.id, person);
  });
}
