import { lab65 } from 'culori';
import { describe, expect, test } from 'vitest';
import { lstarOf, withLightness } from '@/components/lightness-colour';

describe('colours at another lightness', () => {
  test.each(['#5a3b22', '#e3cba3', '#3f4347'])('L* of %s agrees with culori', (colour) => {
    const [r, g, b] = [1, 3, 5].map((at) => parseInt(colour.slice(at, at + 2), 16) / 255);
    expect(lstarOf(colour)).toBeCloseTo(lab65({ mode: 'rgb', r, g, b }).l, 1);
  });

  test.each([66, 58, 48, 38, 28])('a brown at L* %d comes out at that lightness', (lstar) => {
    expect(lstarOf(withLightness('#5a3b22', lstar))).toBeCloseTo(lstar, 0);
  });

  test('black stays black, white stays within range', () => {
    expect(withLightness('#5a3b22', 0)).toBe('#000000');
    expect(withLightness('#ffffff', 100)).toBe('#ffffff');
  });
});
