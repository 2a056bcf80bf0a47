import { waitsFor, type RuleFacts } from '../../orders/rules';
import { nextState, VOIDING_EVENTS, type OrderEvent, type OrderState } from '../../orders/state';
import type { OrderView } from '../../orders/views';
import { audit } from '../audit';
import { withWrite, type Transaction } from '../db';
import { AppError } from '../errors';
import type { Person } from '../person';
import { changeOrder, orderById, type OrderChange } from '../tables/orders';
import { findUnchangedOrder } from './find-order';
import { loadOrder, type LoadedOrder } from './load-order';
import { orderView } from './order-view';
import { ruleFacts } from './rule-facts';

/** What an event writes beside the new state. */
export interface Move {
  change?: OrderChange;
  /** what the person said, for the record */
  words?: string;
  /** further writes and mails of the same transaction */
  also?(trx: Transaction, order: LoadedOrder): Promise<void>;
}

export interface Asked {
  event: OrderEvent;
  version: number;
  preparationId?: number;
}

/** A voided pass takes the approval with it. */
export const VOIDED: OrderChange = {
  passed_at: null,
  passed_by: null,
  passed_preparation_id: null,
  passed_manifest_sha256: null,
  approved_at: null,
  approved_by: null,
  approved_how: null,
  approved_manifest_sha256: null,
};

/** Where the event leads from here for this person; throws when the life of an order does not have it. */
export function requireNextState(
  order: Pick<LoadedOrder, 'row'>,
  event: OrderEvent,
  person: Person,
): OrderState {
  const { state, former_state } = order.row;
  const next = nextState(state, event, person.role, former_state);
  if (next === null) throw new AppError('not-now', { detail: `The order is ${state.replaceAll('-', ' ')}.` });
  if (next !== 'former') return next;
  if (former_state === null) throw new Error('expected an order on hold to have a former state');
  return former_state;
}

/** Stops an event with words that say what to do first. */
export function requireNothingWaits(refusal: string | null): void {
  if (refusal !== null) throw new AppError('order-waits', { detail: refusal });
}

/** Reads an order anew inside the transaction that changed it. */
export async function viewAfter(trx: Transaction, id: number, person: Person): Promise<OrderView> {
  const row = await orderById(trx, id);
  if (!row) throw new AppError('not-found');
  return orderView(await loadOrder(trx, row), person.role);
}

/**
 * Moves an order along its life: state table, rules, one guarded update, and the record in the same transaction.
 * @param decide adds what this event writes, or throws what a person must be told
 */
export async function moveOrder(
  person: Person,
  number: string,
  { event, version, preparationId }: Asked,
  decide: (order: LoadedOrder, facts: RuleFacts) => Move,
): Promise<OrderView> {
  return withWrite(async (trx) => {
    const row = await findUnchangedOrder(trx, person, number, version);
    const order = await loadOrder(trx, row);
    const next = requireNextState(order, event, person);
    const facts = ruleFacts(order, person.role, preparationId);
    if (event === 'submit' && !facts.customerConfirmed) throw new AppError('address-not-confirmed');
    requireNothingWaits(waitsFor(event, facts));
    const { change = {}, words, also } = decide(order, facts);
    const state = change.state ?? next;
    const left: OrderChange = row.state === 'on-hold' ? { former_state: null, held_because: '' } : {};
    const voided = VOIDING_EVENTS.includes(event) ? VOIDED : {};
    if (!(await changeOrder(trx, row, { ...left, ...voided, ...change, state })))
      throw new AppError('conflict');
    await audit(trx, { by: person, event, subject: number, from: row.state, to: next, words });
    await also?.(trx, order);
    return viewAfter(trx, row.id, person);
  });
}
