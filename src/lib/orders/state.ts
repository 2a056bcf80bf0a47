import { z } from 'zod';

export const roleSchema = z.enum(['customer', 'designer', 'operator', 'admin']);
export type Role = z.infer<typeof roleSchema>;

export const ORDER_STATES = [
  'draft',
  'submitted',
  'in-preparation',
  'passed',
  'proof-sent',
  'approved',
  'released',
  'running',
  'finished',
  'handed-over',
  'on-hold',
  'cancelled',
] as const;
export const orderStateSchema = z.enum(ORDER_STATES);
export type OrderState = z.infer<typeof orderStateSchema>;

export const ORDER_EVENTS = [
  'submit',
  'take',
  'pass',
  'send-proof',
  'approve',
  'approve-without-proof',
  'ask-for-changes',
  'prepare-again',
  'new-artwork',
  'release',
  'recall',
  'on-the-machine',
  'done',
  'spoiled',
  'hand-over',
  'hold',
  'resume',
  'cancel',
] as const;
export const orderEventSchema = z.enum(ORDER_EVENTS);
export type OrderEvent = z.infer<typeof orderEventSchema>;

interface Transition {
  event: OrderEvent;
  from: readonly OrderState[];
  /** 'former': the state that the order was held from */
  to: OrderState | 'former';
  roles: readonly Role[];
  /** for an order on hold: only where it was held from one of these */
  heldFrom?: readonly OrderState[];
}

const STAFF: readonly Role[] = ['designer', 'operator', 'admin'];
const DESIGN: readonly Role[] = ['designer', 'admin'];
const RUN: readonly Role[] = ['operator', 'admin'];
const UNTIL_APPROVAL: readonly OrderState[] = [
  'draft',
  'submitted',
  'in-preparation',
  'passed',
  'proof-sent',
];
const BEFORE_RUNNING: readonly OrderState[] = [...UNTIL_APPROVAL, 'approved', 'released'];

/** The whole life of an order. What is not here cannot happen. */
export const TRANSITIONS: readonly Transition[] = [
  { event: 'submit', from: ['draft'], to: 'submitted', roles: ['customer', ...STAFF] },
  { event: 'take', from: ['submitted'], to: 'in-preparation', roles: DESIGN },
  { event: 'pass', from: ['in-preparation'], to: 'passed', roles: DESIGN },
  { event: 'send-proof', from: ['passed'], to: 'proof-sent', roles: DESIGN },
  { event: 'approve', from: ['proof-sent'], to: 'approved', roles: ['customer', ...STAFF] },
  { event: 'approve-without-proof', from: ['passed'], to: 'approved', roles: DESIGN },
  { event: 'ask-for-changes', from: ['proof-sent'], to: 'in-preparation', roles: ['customer', ...STAFF] },
  {
    event: 'prepare-again',
    from: ['in-preparation', 'passed', 'proof-sent', 'approved', 'released'],
    to: 'in-preparation',
    roles: DESIGN,
  },
  { event: 'new-artwork', from: ['draft'], to: 'draft', roles: ['customer', ...STAFF] },
  { event: 'new-artwork', from: ['submitted'], to: 'submitted', roles: ['customer', ...DESIGN] },
  {
    event: 'new-artwork',
    from: ['in-preparation', 'passed', 'proof-sent', 'approved', 'released'],
    to: 'in-preparation',
    roles: ['customer', ...DESIGN],
  },
  { event: 'release', from: ['approved'], to: 'released', roles: DESIGN },
  { event: 'recall', from: ['released'], to: 'approved', roles: DESIGN },
  { event: 'on-the-machine', from: ['released'], to: 'running', roles: RUN },
  { event: 'done', from: ['running'], to: 'finished', roles: RUN },
  { event: 'spoiled', from: ['running'], to: 'released', roles: RUN },
  { event: 'hand-over', from: ['finished'], to: 'handed-over', roles: STAFF },
  { event: 'hold', from: BEFORE_RUNNING, to: 'on-hold', roles: STAFF },
  { event: 'resume', from: ['on-hold'], to: 'former', roles: STAFF },
  { event: 'cancel', from: UNTIL_APPROVAL, to: 'cancelled', roles: ['customer', ...STAFF] },
  { event: 'cancel', from: ['approved', 'released', 'on-hold'], to: 'cancelled', roles: STAFF },
  { event: 'cancel', from: ['on-hold'], heldFrom: UNTIL_APPROVAL, to: 'cancelled', roles: ['customer'] },
];

/** Events that void a designer's pass and the customer's approval. */
export const VOIDING_EVENTS: readonly OrderEvent[] = ['ask-for-changes', 'prepare-again', 'new-artwork'];

/**
 * Where an event leads from a state for a role: the next state, `'former'`, or null where it cannot happen.
 * @param formerState state that an order on hold returns to; null where it is not on hold
 */
export function nextState(
  state: OrderState,
  event: OrderEvent,
  role: Role,
  formerState: OrderState | null = null,
): OrderState | 'former' | null {
  const found = TRANSITIONS.find(
    ({ heldFrom, ...t }) =>
      t.event === event &&
      t.from.includes(state) &&
      t.roles.includes(role) &&
      (!heldFrom || (formerState !== null && heldFrom.includes(formerState))),
  );
  return found ? found.to : null;
}

/**
 * Events that a role may cause in a state, in the table's order.
 * @param formerState state that an order on hold returns to; null where it is not on hold
 */
export function possibleEvents(
  state: OrderState,
  role: Role,
  formerState: OrderState | null = null,
): OrderEvent[] {
  return ORDER_EVENTS.filter((event) => nextState(state, event, role, formerState) !== null);
}
