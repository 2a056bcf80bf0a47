import { describe, expect, test } from 'vitest';
import { countWords, inReadingOrder, shortfallWords } from '@/components/finding-words';
import { CHECK } from './new-order/check-fixture';

const [hairline] = CHECK.findings;

describe('shortfallWords', () => {
  test.each([
    ['hairline', 'Too thin by 0.04 mm'],
    ['fill-in', 'Gap too narrow by 0.04 mm'],
    ['speck', 'Too small by 0.04 mm'],
    ['pinhole', 'Too small by 0.04 mm'],
  ] as const)('%s', (id, words) => {
    expect(shortfallWords({ ...hairline, id })).toBe(words);
  });

  test('what is not a width says what was measured and what was asked for', () => {
    const measured = { value: 96.04, limit: 231, unit: 'px per inch' };
    expect(shortfallWords({ ...hairline, id: 'resolution', minMm: null, limitMm: null, measured })).toBe(
      '96.04 px per inch, asked for 231 px per inch',
    );
    expect(
      shortfallWords({ ...hairline, minMm: null, limitMm: null, measured: { ...measured, limit: null } }),
    ).toBe('96.04 px per inch');
  });

  test('nothing measured, nothing said', () => {
    expect(shortfallWords({ ...hairline, minMm: null, limitMm: null })).toBe('');
  });
});

test('places are counted in words', () => {
  expect(countWords(1)).toBe('1 place');
  expect(countWords(1204)).toBe('1,204 places');
});

test('gravest first, then from the top of the artwork; the list itself stays as it was', () => {
  const at = (yMm: number) => [{ ...hairline.places[0], yMm }];
  const findings = [
    { ...hairline, id: 'speck' as const, severity: 'note' as const, places: at(1) },
    { ...hairline, id: 'pinhole' as const, places: at(40) },
    { ...hairline, id: 'hairline' as const, places: at(8) },
    { ...hairline, id: 'fill-in' as const, severity: 'blocker' as const, places: at(60) },
  ];
  expect(inReadingOrder(findings).map(({ id }) => id)).toEqual(['fill-in', 'hairline', 'pinhole', 'speck']);
  expect(findings[0].id).toBe('speck');
});
