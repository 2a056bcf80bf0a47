import type { OrderView } from '../../orders/views';
import { audit } from '../audit';
import { withWrite } from '../db';
import { AppError } from '../errors';
import { findOrder } from '../orders/find-order';
import { viewAfter } from '../orders/move-order';
import { requireWaiverState } from '../orders/require-waiver-state';
import type { Person } from '../person';
import { latestArtwork } from '../tables/artworks';
import { changeOrder } from '../tables/orders';
import { deleteWaiver } from '../tables/waivers';

/** Takes a waiver of the newest artwork back: the finding counts again. */
export async function withdrawWaiver(person: Person, number: string, findingId: string): Promise<OrderView> {
  return withWrite(async (trx) => {
    const row = await findOrder(trx, person, number);
    requireWaiverState(row.state);
    const artwork = await latestArtwork(trx, row.id);
    if (!artwork || !(await deleteWaiver(trx, row.id, artwork.version, findingId)))
      throw new AppError('not-found');
    if (!(await changeOrder(trx, row, {}))) throw new AppError('conflict');
    await audit(trx, {
      by: person,
      event: 'unwaive',
      subject: number,
      words: `${findingId} of artwork version ${artwork.version}`,
    });
    return viewAfter(trx, row.id, person);
  });
}
