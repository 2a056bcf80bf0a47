import { parse, converter } from 'culori';
import { describe, expect, test } from 'vitest';
import { lstarOf, withLightness } from '@/components/lightness-colour';

const toLab = converter('lab65');

describe('colours at another lightness', () => {
  test.each(['#5a3b22', '#e3cba3', '#3f4347'])('L* of %s agrees with culori', (colour) => {
    expect(lstarOf(colour)).toBeCloseTo(toLab(parse(colour))?.l ?? NaN, 1);
  });

  test.each([66, 58, 48, 38, 28])('a brown at L* %d comes out at that lightness', (lstar) => {
    expect(lstarOf(withLightness('#5a3b22', lstar))).toBeCloseTo(lstar, 0);
  });

  test('black stays black, white stays within range', () => {
    expect(withLightness('#5a3b22', 0)).toBe('#000000');
    expect(withLightness('#ffffff', 100)).toBe('#ffffff');
  });
});
