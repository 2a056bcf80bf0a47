import { waiverRefusal } from '../../orders/rules';
import type { OrderView } from '../../orders/views';
import { audit } from '../audit';
import { withWrite } from '../db';
import { AppError } from '../errors';
import { findUnchangedOrder } from '../orders/find-order';
import { loadOrder } from '../orders/load-order';
import { requireNothingWaits, viewAfter } from '../orders/move-order';
import { reportOf } from '../orders/rule-facts';
import { requireWaiverState } from '../orders/require-waiver-state';
import type { Person } from '../person';
import { checkOf } from '../tables/artworks';
import { changeOrder } from '../tables/orders';
import { keepWaiver } from '../tables/waivers';

/** Lets a finding of the newest artwork stand, for a reason; new artwork asks anew. */
export async function waiveFinding(
  person: Person,
  number: string,
  version: number,
  findingId: string,
  reason: string,
): Promise<OrderView> {
  return withWrite(async (trx) => {
    const row = await findUnchangedOrder(trx, person, number, version);
    requireWaiverState(row.state);
    const order = await loadOrder(trx, row);
    const artwork = order.artworks.at(-1);
    if (!artwork) throw new AppError('order-waits', { detail: 'There is no artwork yet.' });
    const prepared = order.preparations.filter(
      (preparation) => preparation.artwork_version === artwork.version,
    );
    const findings = [
      ...(checkOf(artwork)?.findings ?? []),
      ...prepared.flatMap((preparation) => reportOf(preparation)?.findings ?? []),
    ];
    requireNothingWaits(waiverRefusal(findingId, findings));
    await keepWaiver(trx, {
      order_id: row.id,
      artwork_version: artwork.version,
      finding_id: findingId,
      reason,
      waived_by: person.id,
    });
    if (!(await changeOrder(trx, row, {}))) throw new AppError('conflict');
    await audit(trx, {
      by: person,
      event: 'waive',
      subject: number,
      words: `${findingId} of artwork version ${artwork.version}: ${reason}`,
    });
    return viewAfter(trx, row.id, person);
  });
}
