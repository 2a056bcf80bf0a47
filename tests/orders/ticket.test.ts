import { describe, expect, it } from 'vitest';
import type { Placement } from '@/lib/orders/order';
import { blankWords, mmWords, placementWords } from '@/lib/orders/ticket';
import { blank, fields } from './order-fixture';

const placed = (over: Partial<Placement>): string =>
  placementWords(
    fields({ placement: { datum: 'centre', xMm: 0, yMm: 0, quarterTurns: 0, fixture: '', ...over } }),
  );

describe('the ticket’s words', () => {
  it.each<[Partial<Placement>, string]>([
    [{}, '60 × 40 mm. The artwork’s centre lies on the blank’s centre.'],
    [{ xMm: 5 }, '60 × 40 mm. The artwork’s centre lies 5 mm to the right from the blank’s centre.'],
    [
      { datum: 'top-left', xMm: 12.5, yMm: 8.25 },
      '60 × 40 mm. The artwork’s top left corner lies 12.5 mm to the right and 8.25 mm down from the blank’s top left corner.',
    ],
    [
      { datum: 'bottom-right', xMm: -4, yMm: -6 },
      '60 × 40 mm. The artwork’s bottom right corner lies 4 mm to the left and 6 mm up from the blank’s bottom right corner.',
    ],
    [
      { quarterTurns: 1 },
      '40 × 60 mm. The artwork’s centre lies on the blank’s centre. Turned by a quarter turn clockwise.',
    ],
    [
      { quarterTurns: 2 },
      '60 × 40 mm. The artwork’s centre lies on the blank’s centre. Turned by half a turn.',
    ],
    [
      { quarterTurns: 3, fixture: 'the corner stop' },
      '40 × 60 mm. The artwork’s centre lies on the blank’s centre. Turned by a quarter turn anticlockwise. Held by the corner stop.',
    ],
  ])('place %j', (over, words) => {
    expect(placed(over)).toBe(words);
  });

  it('say that the size is missing', () => {
    expect(placementWords(fields({ widthMm: null }))).toBe('The size is missing.');
  });

  it.each([
    [12, '12 mm'],
    [12.5, '12.5 mm'],
    [0.456, '0.46 mm'],
    [-3, '−3 mm'],
    [0, '0 mm'],
  ])('%d mm is “%s”', (mm, words) => {
    expect(mmWords(mm)).toBe(words);
  });

  it('describe the blank', () => {
    expect(blankWords(blank(), 'birch plywood')).toBe(
      'Rectangle 100 × 80 × 4 mm, birch plywood, front, grain at 0°, from the shop',
    );
    expect(
      blankWords(blank({ outline: 'round', grainDeg: null, source: 'customer', side: 'back' }), null),
    ).toBe('Round 100 × 80 × 4 mm, stock not identified, back, the customer’s own, no spare');
    expect(blankWords(blank({ outline: 'own', source: 'customer', spare: true }), 'oak')).toMatch(
      /^Own outline .* with a spare$/,
    );
  });
});
