import type { OrderRow } from '@/lib/orders/views';

export interface MachineDay {
  machineName: string;
  rows: OrderRow[];
  /** scanning time of all pieces that is known, s */
  seconds: number;
  /** whether an order's time is not known, so that the sum is a least */
  isLeast: boolean;
}

const NO_DATE = '9999-12-31';

/** Scanning time of an order with all its pieces, s; null where it is not known. */
export const orderSeconds = (row: OrderRow): number | null =>
  row.scanSeconds === null ? null : row.scanSeconds * row.quantity;

function byUrgency(a: OrderRow, b: OrderRow): number {
  const running = Number(b.state === 'running') - Number(a.state === 'running');
  return (
    running || (a.dueOn ?? NO_DATE).localeCompare(b.dueOn ?? NO_DATE) || a.number.localeCompare(b.number)
  );
}

/** Released and running orders by machine: what runs comes first, then by due date; machines by their earliest order. */
export function dayPlan(rows: readonly OrderRow[]): MachineDay[] {
  const names = [...new Set(rows.map((row) => row.machineName))];
  const days = names.map((machineName) => {
    const own = rows.filter((row) => row.machineName === machineName).sort(byUrgency);
    const times = own.map(orderSeconds);
    return {
      machineName,
      rows: own,
      seconds: times.reduce<number>((sum, seconds) => sum + (seconds ?? 0), 0),
      isLeast: times.includes(null),
    };
  });
  return days.sort((a, b) => byUrgency(a.rows[0], b.rows[0]));
}
