import type { OrderState } from '@/lib/orders/state';
import type { OrderView, PreparationView } from '@/lib/orders/views';
import type { Report } from '@/lib/prepare/report';
import { LIFE } from '../state-words';

export interface ProofFacts {
  preparation: PreparationView;
  report: Report;
  /** address of the burn forecast */
  forecastUrl: string;
  manifestSha256: string;
}

const SHOWN: readonly OrderState[] = [
  'proof-sent',
  'approved',
  'released',
  'running',
  'finished',
  'handed-over',
];

/** What the customer approves: the passed preparation with its forecast; null until a proof was sent. */
export function proofOf(order: OrderView): ProofFacts | null {
  const { passed, state, preparations } = order;
  if (!passed || !SHOWN.includes(state)) return null;
  const preparation = preparations.find(({ manifestSha256 }) => manifestSha256 === passed.manifestSha256);
  const forecastUrl = preparation?.pictures.burned;
  if (!preparation?.report || !forecastUrl) return null;
  return { preparation, report: preparation.report, forecastUrl, manifestSha256: passed.manifestSha256 };
}

/** The last state of the straight life that an order on hold or cancelled had reached. */
export function reachedState(order: Pick<OrderView, 'state' | 'history'>): OrderState | null {
  if (LIFE.includes(order.state)) return null;
  const byTime = [...order.history].sort((a, b) => b.at.localeCompare(a.at));
  const left = byTime.find(({ from }) => from !== null && LIFE.includes(from));
  return left?.from ?? null;
}
