import { describe, expect, test } from 'vitest';
import {
  aspectOf,
  changesSince,
  EMPTY_FORM,
  formOf,
  lockedSize,
  missingWords,
  patchOf,
  soundWidth,
  type DraftForm,
} from '@/components/new-order/draft-form';
import { orderFieldsSchema } from '@/lib/orders/order';
import { CHECK } from './check-fixture';

const full: DraftForm = {
  ...EMPTY_FORM,
  widthMm: 84,
  heightMm: 60,
  blank: { ...EMPTY_FORM.blank, widthMm: 120, heightMm: 90, thicknessMm: 4, stockId: 2 },
};

describe('lockedSize', () => {
  test.each([
    ['width', 84, 1.4, { widthMm: 84, heightMm: 60 }],
    ['height', 60, 1.4, { widthMm: 84, heightMm: 60 }],
    ['width', 100, 3, { widthMm: 100, heightMm: 33.33 }],
    ['height', 33.33, 1, { widthMm: 33.33, heightMm: 33.33 }],
  ] as const)('%s of %d at %d', (side, value, aspect, size) => {
    expect(lockedSize(side, value, aspect)).toEqual(size);
  });

  test('an emptied side empties both', () => {
    expect(lockedSize('width', null, 1.4)).toEqual({ widthMm: null, heightMm: null });
  });
});

describe('soundWidth', () => {
  test.each([
    [92.31, 92.4],
    [92.4, 92.4],
    [0.3, 0.3],
    [100, 100],
  ])('%d is entered as %d, never under', (given, entered) => {
    expect(soundWidth(given)).toBeCloseTo(entered, 10);
    expect(soundWidth(given)).toBeGreaterThanOrEqual(given - 1e-9);
  });
});

describe('aspectOf', () => {
  test('the size that the file states wins over its pixels', () => {
    const artwork = { ...CHECK.artwork, widthPx: 100, heightPx: 100, ownWidthMm: 140, ownHeightMm: 70 };
    expect(aspectOf({ ...CHECK, artwork })).toBe(2);
  });

  test('without one the pixels count, and without a check nothing is guessed', () => {
    const artwork = { ...CHECK.artwork, widthPx: 300, heightPx: 200, ownWidthMm: null, ownHeightMm: null };
    expect(aspectOf({ ...CHECK, artwork })).toBe(1.5);
    expect(aspectOf(null)).toBeNull();
  });
});

describe('patchOf', () => {
  test('an untouched form is a draft that the server takes', () => {
    const patch = patchOf(EMPTY_FORM);
    expect(patch.blank).toBeNull();
    expect(patch.dueOn).toBeNull();
    expect(orderFieldsSchema.safeParse(patch).success).toBe(true);
  });

  test('a half-filled blank is left out until it fits, and nothing is bent', () => {
    const patch = patchOf({ ...full, blank: { ...full.blank, thicknessMm: null } });
    expect(patch).not.toHaveProperty('blank');
    expect(patch.widthMm).toBe(84);
  });

  test('a figure out of range is left out', () => {
    expect(patchOf({ ...full, widthMm: 5000 })).not.toHaveProperty('widthMm');
    expect(patchOf({ ...full, quantity: null })).not.toHaveProperty('quantity');
  });

  test('goes round: fields to form to patch', () => {
    const fields = orderFieldsSchema.parse(patchOf({ ...full, dueOn: '2026-12-24', title: 'Fern' }));
    expect(patchOf(formOf(fields))).toEqual(fields);
  });
});

describe('changesSince', () => {
  test('only what differs is sent', () => {
    const known = orderFieldsSchema.parse(patchOf(full));
    expect(changesSince(patchOf({ ...full, widthMm: 90 }), known)).toEqual({ widthMm: 90 });
    expect(changesSince(patchOf(full), known)).toEqual({});
  });
});

describe('missingWords', () => {
  test('a complete form misses nothing', () => {
    expect(missingWords(full, true)).toEqual([]);
  });

  test('says everything that is missing, in the order of the page', () => {
    expect(missingWords({ ...EMPTY_FORM, quantity: null }, false)).toEqual([
      'The artwork. Drop it at the top of this page.',
      'The size of the engraving.',
      'The size of the blank.',
      'What the blank is made of.',
      'How many pieces.',
    ]);
  });

  test('a customer’s own piece may be unidentified', () => {
    const blank = { ...full.blank, stockId: null, source: 'customer' as const };
    expect(missingWords({ ...full, blank }, true)).toEqual([]);
  });
});
