import { describe, expect, it } from 'vitest';
import {
  nextState,
  ORDER_EVENTS,
  ORDER_STATES,
  possibleEvents,
  roleSchema,
  VOIDING_EVENTS,
  type OrderEvent,
  type OrderState,
  type Role,
} from '@/lib/orders/state';

type Next = OrderState | 'former';
const C: readonly Role[] = ['customer'];
const D: readonly Role[] = ['designer', 'admin'];
const O: readonly Role[] = ['operator', 'admin'];
const CD: readonly Role[] = ['customer', 'designer', 'admin'];
const S: readonly Role[] = ['designer', 'operator', 'admin'];
const ALL: readonly Role[] = [...C, ...S];

/** The life of an order, written a second time state by state: what is missing here must not happen. */
const LIFE: Record<OrderState, Partial<Record<OrderEvent, [readonly Role[], Next]>>> = {
  draft: {
    submit: [ALL, 'submitted'],
    'new-artwork': [ALL, 'draft'],
    hold: [S, 'on-hold'],
    cancel: [ALL, 'cancelled'],
  },
  submitted: {
    take: [D, 'in-preparation'],
    'new-artwork': [CD, 'submitted'],
    hold: [S, 'on-hold'],
    cancel: [ALL, 'cancelled'],
  },
  'in-preparation': {
    pass: [D, 'passed'],
    'prepare-again': [D, 'in-preparation'],
    'new-artwork': [CD, 'in-preparation'],
    hold: [S, 'on-hold'],
    cancel: [ALL, 'cancelled'],
  },
  passed: {
    'send-proof': [D, 'proof-sent'],
    'approve-without-proof': [D, 'approved'],
    'prepare-again': [D, 'in-preparation'],
    'new-artwork': [CD, 'in-preparation'],
    hold: [S, 'on-hold'],
    cancel: [ALL, 'cancelled'],
  },
  'proof-sent': {
    approve: [ALL, 'approved'],
    'ask-for-changes': [ALL, 'in-preparation'],
    'prepare-again': [D, 'in-preparation'],
    'new-artwork': [CD, 'in-preparation'],
    hold: [S, 'on-hold'],
    cancel: [ALL, 'cancelled'],
  },
  approved: {
    release: [D, 'released'],
    'prepare-again': [D, 'in-preparation'],
    'new-artwork': [CD, 'in-preparation'],
    hold: [S, 'on-hold'],
    cancel: [S, 'cancelled'],
  },
  released: {
    recall: [D, 'approved'],
    'on-the-machine': [O, 'running'],
    'prepare-again': [D, 'in-preparation'],
    'new-artwork': [CD, 'in-preparation'],
    hold: [S, 'on-hold'],
    cancel: [S, 'cancelled'],
  },
  running: { done: [O, 'finished'], spoiled: [O, 'released'] },
  finished: { 'hand-over': [S, 'handed-over'] },
  'handed-over': {},
  'on-hold': { resume: [S, 'former'], cancel: [S, 'cancelled'] },
  cancelled: {},
};

const CASES = ORDER_STATES.flatMap((state) =>
  ORDER_EVENTS.flatMap((event) => roleSchema.options.map((role) => ({ state, event, role }))),
);

describe('the life of an order', () => {
  it('is tried in every state, for every event and every role', () => {
    expect(CASES).toHaveLength(12 * 18 * 4);
  });

  it.each(ORDER_STATES)('from %s leads where it should and nowhere else', (from) => {
    for (const { state, event, role } of CASES.filter((one) => one.state === from)) {
      const entry = LIFE[state][event];
      expect(nextState(state, event, role), `${state} + ${event} by ${role}`).toBe(
        entry?.[0].includes(role) ? entry[1] : null,
      );
    }
  });

  it.each(roleSchema.options)('offers a %s exactly what would be carried out', (role) => {
    for (const state of ORDER_STATES) {
      expect(possibleEvents(state, role)).toEqual(
        ORDER_EVENTS.filter((event) => nextState(state, event, role) !== null),
      );
    }
  });

  it('never lets a customer or an operator pass, and never lets anybody release what is not approved', () => {
    for (const { state, event, role } of CASES) {
      if (event === 'pass' && (role === 'customer' || role === 'operator'))
        expect(nextState(state, event, role)).toBeNull();
      if (event === 'release' && state !== 'approved') expect(nextState(state, event, role)).toBeNull();
    }
  });

  it('lets an admin do all that a designer and an operator may', () => {
    for (const { state, event, role } of CASES.filter(
      (one) => one.role === 'designer' || one.role === 'operator',
    )) {
      const next = nextState(state, event, role);
      if (next !== null) expect(nextState(state, event, 'admin')).toBe(next);
    }
  });

  it('voids a pass with everything that leads back to preparation', () => {
    for (const { state, event, role } of CASES) {
      const back = nextState(state, event, role) === 'in-preparation' && event !== 'take';
      if (back) expect(VOIDING_EVENTS).toContain(event);
    }
  });

  it.each(ORDER_STATES)(
    'is cancelled by a customer while on hold from %s only where it could be there',
    (from) => {
      const expected = nextState(from, 'cancel', 'customer') === 'cancelled' ? 'cancelled' : null;
      expect(nextState('on-hold', 'cancel', 'customer', from)).toBe(expected);
      expect(possibleEvents('on-hold', 'customer', from)).toEqual(expected ? ['cancel'] : []);
      for (const role of S) expect(nextState('on-hold', 'cancel', role, from)).toBe('cancelled');
    },
  );

  it('lets no operator send artwork once it is submitted, nor prepare, pass or release', () => {
    for (const state of ORDER_STATES.filter((one) => one !== 'draft'))
      for (const event of ['new-artwork', 'prepare-again', 'pass', 'release'] as const)
        expect(nextState(state, event, 'operator'), `${state} + ${event}`).toBeNull();
  });

  it('ends in handed over and cancelled', () => {
    for (const role of roleSchema.options) {
      expect(possibleEvents('handed-over', role)).toEqual([]);
      expect(possibleEvents('cancelled', role)).toEqual([]);
    }
  });
});
