import type { OrderState } from '../../orders/state';
import type { Db } from '../db';

export interface RecordRow {
  id: number;
  at: string;
  person_id: number | null;
  by: string;
  event: string;
  subject: string;
  from_state: OrderState | null;
  to_state: OrderState | null;
  words: string;
}

export async function insertRecord(db: Db, row: Omit<RecordRow, 'id'>): Promise<void> {
  await db('record').insert(row);
}

/** Everything about one subject, oldest first. */
export async function recordOf(db: Db, subject: string): Promise<RecordRow[]> {
  return db<RecordRow>('record').where({ subject }).orderBy('id');
}

/** One page of the record, newest first, with the number of rows that match in all. */
export async function searchRecord(
  db: Db,
  words: string,
  page: number,
  perPage: number,
): Promise<{ rows: RecordRow[]; total: number }> {
  const matching = db<RecordRow>('record').where((where) => {
    if (words === '') return;
    const like = `%${words.replace(/[\\%_]/g, '\\$&')}%`;
    for (const column of ['by', 'event', 'subject', 'words'])
      where.orWhereRaw('?? like ? escape ?', [column, like, '\\']);
  });
  const counted = await matching.clone().count<{ count: number }[]>({ count: '*' });
  const rows = await matching
    .clone()
    .orderBy('id', 'desc')
    .limit(perPage)
    .offset((page - 1) * perPage);
  return { rows, total: counted[0].count };
}
