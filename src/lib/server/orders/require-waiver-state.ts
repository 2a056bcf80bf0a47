import type { OrderState } from '../../orders/state';
import { AppError } from '../errors';

const WAIVING: readonly OrderState[] = ['submitted', 'in-preparation'];

/** What was passed with a finding waived stays so; a waiver is given or taken back before. */
export function requireWaiverState(state: OrderState): void {
  if (!WAIVING.includes(state))
    throw new AppError('not-now', {
      detail: `The order is ${state.replaceAll('-', ' ')}; findings are waived before it is passed.`,
    });
}
