import type { Db } from '../db';

export interface OutcomeRow {
  order_id: number;
  at: string;
  recorded_by: number;
  kind: 'done' | 'spoiled';
  words: string;
  measured_lstar: number | null;
  new_blank: string;
  cost: string;
}

export async function insertOutcome(db: Db, outcome: Omit<OutcomeRow, 'at'>): Promise<void> {
  await db('outcomes').insert({ ...outcome, at: new Date().toISOString() });
}

/** How an order came out, oldest first. */
export async function outcomesOfOrder(
  db: Db,
  orderId: number,
): Promise<(OutcomeRow & { recorder: string })[]> {
  return db('outcomes as o')
    .join('people as p', 'p.id', 'o.recorded_by')
    .where('o.order_id', orderId)
    .orderBy('o.id')
    .select('o.*', { recorder: 'p.name' });
}
