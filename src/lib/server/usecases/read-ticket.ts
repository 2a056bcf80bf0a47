import type { z } from 'zod';
import { instructionSentence } from '../../orders/sentence';
import { placementWords } from '../../orders/ticket';
import { ROUTES } from '../routes';
import { database } from '../db';
import { AppError } from '../errors';
import { findOrder } from '../orders/find-order';
import { loadOrder } from '../orders/load-order';
import { orderView } from '../orders/order-view';
import type { Person } from '../person';
import { machineById } from '../tables/machines';

type Ticket = z.input<Extract<(typeof ROUTES)[number], { path: '/api/orders/:number/ticket' }>['response']>;

/** What the job ticket says: of what was passed, else of what was prepared last. */
export async function readTicket(person: Person, number: string): Promise<Ticket> {
  const row = await findOrder(database(), person, number);
  const loaded = await loadOrder(database(), row);
  const order = orderView(loaded, person.role);
  const finished = order.preparations.filter(({ manifestSha256 }) => manifestSha256 !== null);
  const preparation = finished.find(({ id }) => id === row.passed_preparation_id) ?? finished[0];
  if (!preparation)
    throw new AppError('order-waits', { detail: 'Nothing is prepared yet, so there is no ticket.' });
  const machine = await machineById(database(), preparation.design.machineId);
  const spot = preparation.report?.settings.spot;
  if (!machine || !spot) throw new AppError('not-found');
  const sentence = instructionSentence(preparation.design, {
    machineName: machine.name,
    spot,
    stockName: order.stock?.name ?? null,
    speedUnit: machine.speedUnit,
  });
  const { fields } = order;
  return {
    order,
    preparation,
    sentence,
    placementWords: placementWords(fields),
    blank: fields.blank,
    fields,
  };
}
