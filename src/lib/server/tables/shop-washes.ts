import type { Wash } from '../../stock/wash';
import type { Db } from '../db';

interface WashRow {
  id: 1;
  product: string;
  ratio: string;
  drying_minutes: number;
  sheet_url: string;
  changed_at: string;
}

/** The shop's darkening wash, or null while none is entered. */
export async function readWash(db: Db): Promise<Wash | null> {
  const row = await db<WashRow>('shop_washes').where({ id: 1 }).first();
  return row
    ? { product: row.product, ratio: row.ratio, dryingMinutes: row.drying_minutes, sheetUrl: row.sheet_url }
    : null;
}

/** There is one wash, so entering one takes the place of the former. */
export async function writeWash(db: Db, wash: Wash, at: string): Promise<void> {
  const row: WashRow = {
    id: 1,
    product: wash.product,
    ratio: wash.ratio,
    drying_minutes: wash.dryingMinutes,
    sheet_url: wash.sheetUrl,
    changed_at: at,
  };
  await db('shop_washes').insert(row).onConflict('id').merge();
}
