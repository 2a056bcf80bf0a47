import type { OrderFields, OrderPatch } from './order';
import type { OrderState, Role } from './state';

/** What a designer may still put right once the artwork has been passed: it decides no byte of the prepared file. */
const ANY_TIME: readonly (keyof OrderFields)[] = ['dueOn', 'notes'];
const DESIGNER_STATES: readonly OrderState[] = ['draft', 'submitted', 'in-preparation'];
const CLOSED: readonly OrderState[] = ['finished', 'handed-over', 'cancelled'];

/**
 * Why a role may not change these fields of an order now, or null where it may.
 * @param formerState state that an order on hold returns to; null where it is not on hold
 */
export function changeRefusal(
  patch: OrderPatch,
  state: OrderState,
  formerState: OrderState | null,
  role: Role,
): string | null {
  const effective = state === 'on-hold' ? (formerState ?? 'draft') : state;
  if (role === 'customer') {
    return state === 'draft'
      ? null
      : 'The order has been submitted. Ask the shop to change it, or cancel it and order again.';
  }
  if (role === 'operator' && state !== 'draft') return 'Once submitted, an order is changed by a designer.';
  if (DESIGNER_STATES.includes(effective)) return null;
  const names = (Object.keys(patch) as (keyof OrderPatch)[]).filter((key) => patch[key] !== undefined);
  if (!CLOSED.includes(effective) && names.every((key) => ANY_TIME.includes(key))) return null;
  return CLOSED.includes(effective)
    ? 'The order is closed and stays as it is.'
    : 'The artwork has been passed with these values. Prepare again first, which voids the pass and the approval.';
}

/** Fields that a check or a preparation depends on. */
const CHECKED: readonly (keyof OrderFields)[] = ['widthMm', 'heightMm', 'blank', 'placement', 'treatment'];

/** Whether a change asks for a new check of the artwork. */
export function asksForCheck(before: OrderFields, after: OrderFields): boolean {
  return CHECKED.some((key) => JSON.stringify(before[key]) !== JSON.stringify(after[key]));
}
