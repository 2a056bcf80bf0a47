import { describe, expect, it } from 'vitest';
import { asksForCheck, changeRefusal } from '@/lib/orders/changes';
import type { OrderPatch } from '@/lib/orders/order';
import { ORDER_STATES, type OrderState } from '@/lib/orders/state';
import { blank, fields } from './order-fixture';

const SIZE: OrderPatch = { widthMm: 50 };
const NOTE: OrderPatch = { notes: 'ring twice', dueOn: '2027-01-08', title: undefined };
const OPEN: readonly OrderState[] = ['draft', 'submitted', 'in-preparation'];
const CLOSED: readonly OrderState[] = ['finished', 'handed-over', 'cancelled'];
const HOLDABLE: readonly OrderState[] = [
  'draft',
  'submitted',
  'in-preparation',
  'passed',
  'proof-sent',
  'approved',
  'released',
];

describe('changing an order', () => {
  it.each(ORDER_STATES.filter((state) => state !== 'on-hold'))('%s', (state) => {
    expect(changeRefusal(SIZE, state, null, 'customer') === null, 'customer').toBe(state === 'draft');
    expect(changeRefusal(NOTE, state, null, 'customer') === null, 'customer, note').toBe(state === 'draft');
    expect(changeRefusal(SIZE, state, null, 'operator') === null, 'operator').toBe(state === 'draft');
    expect(changeRefusal(NOTE, state, null, 'operator') === null, 'operator, note').toBe(state === 'draft');
    for (const role of ['designer', 'admin'] as const) {
      expect(changeRefusal(SIZE, state, null, role) === null, role).toBe(OPEN.includes(state));
      expect(changeRefusal(NOTE, state, null, role) === null, `${role}, note`).toBe(!CLOSED.includes(state));
    }
  });

  it.each(HOLDABLE)(
    'on hold from %s is as it was there for a designer, and closed to customer and operator',
    (former) => {
      expect(changeRefusal(SIZE, 'on-hold', former, 'designer')).toBe(
        changeRefusal(SIZE, former, null, 'designer'),
      );
      expect(changeRefusal(SIZE, 'on-hold', former, 'customer')).not.toBeNull();
      expect(changeRefusal(NOTE, 'on-hold', former, 'operator')).not.toBeNull();
    },
  );

  it.each<[OrderPatch, boolean]>([
    [{}, false],
    [
      {
        title: 'x',
        quantity: 3,
        dueOn: '2027-02-01',
        notes: 'y',
        shadeLstar: 40,
        route: 'paint-fill',
        use: 'outdoors',
        withoutProof: true,
      },
      false,
    ],
    [{ widthMm: 61 }, true],
    [{ heightMm: null }, true],
    [{ blank: blank({ widthMm: 101 }) }, true],
    [{ blank: blank() }, false],
    [{ treatment: 'halftone' }, true],
    [{ placement: { ...fields().placement, quarterTurns: 1 } }, true],
    [{ widthMm: 60, heightMm: 40 }, false],
  ])('%j asks for a new check: %s', (patch, asks) => {
    expect(asksForCheck(fields(), fields(patch))).toBe(asks);
  });
});
