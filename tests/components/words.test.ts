import { describe, expect, test } from 'vitest';
import { EMPTY_FORM, patchOf } from '@/components/new-order/draft-form';
import {
  blankWords,
  dateWords,
  fieldPairs,
  placementWords,
  shadeWords,
  shortDateWords,
  shortTimeWords,
  sizeWords,
  timeWords,
} from '@/components/words';
import { orderFieldsSchema } from '@/lib/orders/order';

const blank = { ...EMPTY_FORM.blank, widthMm: 120, heightMm: 90, thicknessMm: 4, stockId: 2 };

test('dates and times read the same on server and client', () => {
  expect(dateWords('2026-12-01')).toBe('1 December 2026');
  expect(shortDateWords('2026-12-01')).toBe('1 Dec 2026');
  expect(shortTimeWords('2026-12-01T15:20:33.000Z')).toBe('1 Dec, 15:20');
  expect(timeWords('2026-12-01T15:20:33.000Z')).toBe('1 Dec 2026, 15:20 UTC');
});

test('sizes have no needless decimals', () => {
  expect(sizeWords(84, 59.999)).toBe('84 × 60 mm');
  expect(sizeWords(84.25, 60.1)).toBe('84.25 × 60.1 mm');
});

test.each([
  [null, 'as it comes'],
  [48, 'Chestnut, L* 48'],
  [45, 'Chestnut, L* 45'],
  [10, 'Soot, L* 10'],
  [90, 'Straw, L* 90'],
])('shade %s', (lstar, words) => {
  expect(shadeWords(lstar)).toBe(words);
});

describe('blankWords', () => {
  test('of the shop', () => {
    expect(blankWords(blank, 'Birch plywood 4 mm')).toBe(
      'Birch plywood 4 mm, rectangle, 120 × 90 × 4 mm, front, from the shop',
    );
  });

  test('the customer’s own, not identified', () => {
    expect(blankWords({ ...blank, source: 'customer', stockId: null }, null)).toContain('not identified yet');
  });
});

test('placement says only what is not plain', () => {
  expect(placementWords(EMPTY_FORM.placement)).toBe('from the centre');
  expect(
    placementWords({ datum: 'top-left', xMm: 10, yMm: 5.5, quarterTurns: 1, fixture: 'the round jig' }),
  ).toBe(
    'from the top left corner, 10 mm to the right and 5.5 mm down, turned a quarter clockwise; held by the round jig',
  );
});

test('what an order says of itself, without what is not said yet', () => {
  const fields = orderFieldsSchema.parse(patchOf({ ...EMPTY_FORM, widthMm: 84, heightMm: 60, blank }));
  const pairs = Object.fromEntries(fieldPairs(fields, 'Cork sheet 3 mm'));
  expect(pairs).toMatchObject({ Size: '84 × 60 mm', Quantity: '1', Shade: 'as it comes', Use: 'decoration' });
  expect(Object.keys(pairs)).not.toContain('Notes');
  expect(Object.keys(pairs)).not.toContain('Needed by');
});
