import type { Db } from '../db';

export interface WaiverRow {
  order_id: number;
  artwork_version: number;
  finding_id: string;
  reason: string;
  waived_by: number;
  waived_at: string;
}

/** Keeps a waiver; a second one of the same finding replaces the reason. */
export async function keepWaiver(db: Db, waiver: Omit<WaiverRow, 'waived_at'>): Promise<void> {
  await db('waivers')
    .insert({ ...waiver, waived_at: new Date().toISOString() })
    .onConflict(['order_id', 'artwork_version', 'finding_id'])
    .merge();
}

export async function deleteWaiver(
  db: Db,
  orderId: number,
  artworkVersion: number,
  findingId: string,
): Promise<boolean> {
  return (
    (await db('waivers')
      .where({ order_id: orderId, artwork_version: artworkVersion, finding_id: findingId })
      .delete()) === 1
  );
}

export async function waiversOfOrder(db: Db, orderId: number): Promise<(WaiverRow & { waiver: string })[]> {
  return db('waivers as w')
    .join('people as p', 'p.id', 'w.waived_by')
    .where('w.order_id', orderId)
    .orderBy('w.id')
    .select('w.*', { waiver: 'p.name' });
}
