import type { OrderView, PreparationView } from '../../orders/views';
import { audit } from '../audit';
import { database, withWrite, type Transaction } from '../db';
import { AppError } from '../errors';
import { findOrder, findUnchangedOrder } from '../orders/find-order';
import { currentSettings, loadOrder, type LoadedOrder } from '../orders/load-order';
import { requireNextState, viewAfter, VOIDED } from '../orders/move-order';
import { preparationSubject } from '../orders/subjects';
import type { Person } from '../person';
import { askOnce } from '../queue/enqueue';
import { pipeline } from '../queue/pipeline';
import { changeOrder, type OrderRow } from '../tables/orders';
import { insertPreparation, preparationByKey } from '../tables/preparations';

interface Wanted {
  order: LoadedOrder;
  artworkId: number;
  settings: NonNullable<ReturnType<typeof currentSettings>>;
  key: string;
}

async function wantedNow(row: OrderRow): Promise<Wanted> {
  const order = await loadOrder(database(), row);
  const artwork = order.artworks.at(-1);
  if (!artwork) throw new AppError('order-waits', { detail: 'There is no artwork yet.' });
  if (!order.design)
    throw new AppError('order-waits', {
      detail: 'Nothing is chosen yet. Choose machine, spot and treatment first.',
    });
  const settings = currentSettings(order);
  if (!settings)
    throw new AppError('order-waits', {
      detail: 'The size is missing. Say how wide the engraving shall be.',
    });
  const key = await (await pipeline()).keyOf(artwork.sha256, { settings, artworkVersion: artwork.version });
  return { order, artworkId: artwork.id, settings, key };
}

/** Asks for the files of a preparation that has none yet: a first time, or again after a failure. */
async function askForFiles(trx: Transaction, orderId: number, preparationId: number): Promise<void> {
  await askOnce(trx, {
    name: 'prepare-order',
    subject: preparationSubject(preparationId),
    orderId,
    payload: { preparationId },
  });
}

async function start(
  trx: Transaction,
  person: Person,
  row: OrderRow,
  { order, artworkId, settings, key }: Wanted,
): Promise<number> {
  const known = await preparationByKey(trx, row.id, key);
  const next = requireNextState({ row }, 'prepare-again', person);
  if (known && row.state === next) {
    if (known.finished_at === null) await askForFiles(trx, row.id, known.id);
    return known.id;
  }
  const { design } = order;
  if (!design) throw new Error('expected an order with a design');
  const id =
    known?.id ??
    (await insertPreparation(trx, {
      orderId: row.id,
      artworkId,
      key,
      design,
      settings,
      startedBy: person.id,
    }));
  if (!(await changeOrder(trx, row, { ...VOIDED, state: next }))) throw new AppError('conflict');
  const words = row.state === next ? '' : 'The pass no longer holds.';
  await audit(trx, {
    by: person,
    event: row.state === next ? 'prepare' : 'prepare-again',
    subject: order.number,
    from: row.state,
    to: next,
    words,
  });
  if (!known?.finished_at) await askForFiles(trx, row.id, id);
  return id;
}

/**
 * Prepares an order's artwork with the kept choices. The same request gives the same preparation, however often and from
 * however many tabs it is asked for; from a passed order on, pass and approval are void.
 */
export async function prepareOrder(
  person: Person,
  number: string,
  version: number,
): Promise<{ order: OrderView; preparation: PreparationView }> {
  const seen = await findOrder(database(), person, number);
  requireNextState({ row: seen }, 'prepare-again', person);
  const wanted = await wantedNow(seen);
  return withWrite(async (trx) => {
    const row = await findOrder(trx, person, number);
    const known = await preparationByKey(trx, row.id, wanted.key);
    const repeated = known !== undefined && row.state === 'in-preparation';
    // What was read before the write began must still hold, unless this very preparation is there already.
    if (!repeated && row.version !== seen.version) throw new AppError('conflict');
    if (!repeated) await findUnchangedOrder(trx, person, number, version);
    const id = await start(trx, person, row, wanted);
    const order = await viewAfter(trx, row.id, person);
    const preparation = order.preparations.find((view) => view.id === id);
    if (!preparation) throw new Error(`expected preparation ${id} in its order`);
    return { order, preparation };
  });
}
