import { database } from '../db';
import { searchRecord } from '../tables/record';

export const RECORD_PER_PAGE = 50;

/** One page of the record, newest first. */
export async function readRecord(words: string, page: number) {
  const { rows, total } = await searchRecord(database(), words, page, RECORD_PER_PAGE);
  const entries = rows.map(({ id, at, by, event, subject, words }) => ({
    id,
    at,
    by,
    event,
    subject,
    words,
  }));
  return { entries, total, page, perPage: RECORD_PER_PAGE };
}
