import type { OrderState } from '../orders/state';
import type { Transaction } from './db';
import { insertRecord } from './tables/record';

export interface AuditEntry {
  /** the person who did it, or null for the shop's own machinery */
  by: { id: number; name: string } | null;
  /** one verb of the trade, such as `approve` or `invite` */
  event: string;
  /** what it was done to: an order's number, `person 4`, `machine 2` … */
  subject: string;
  from?: OrderState | null;
  to?: OrderState | null;
  words?: string;
}

/** Writes who did what, in the caller's own transaction: either both are kept or neither. */
export async function audit(trx: Transaction, entry: AuditEntry): Promise<void> {
  await insertRecord(trx, {
    at: new Date().toISOString(),
    person_id: entry.by?.id ?? null,
    by: entry.by?.name ?? 'Umberline',
    event: entry.event,
    subject: entry.subject,
    from_state: entry.from ?? null,
    to_state: entry.to ?? null,
    words: entry.words ?? '',
  });
}
