import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { axisWeights } from '../../../src/lib/prepare/resample/axis-weights';

describe('axis weights', () => {
  test('halving takes two samples, ½ each', () => {
    const { taps, first, shares } = axisWeights(4, 2);
    expect([taps, ...first, ...shares]).toEqual([2, 0, 2, 0.5, 0.5, 0.5, 0.5]);
  });

  test('as many as there are: each sample itself', () => {
    const { taps, first, shares } = axisWeights(3, 3);
    expect([taps, ...first, ...shares]).toEqual([1, 0, 1, 2, 1, 1, 1]);
  });

  test('shares add up to 1 and stay on the axis, whatever the sizes', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 400 }), fc.integer({ min: 1, max: 400 }), (from, to) => {
        const { taps, first, shares } = axisWeights(from, to);
        for (let i = 0; i < to; i++) {
          expect(first[i]).toBeGreaterThanOrEqual(0);
          expect(first[i] + taps).toBeLessThanOrEqual(from);
          const sum = shares.subarray(i * taps, (i + 1) * taps).reduce((a, b) => a + b, 0);
          expect(sum).toBeCloseTo(1, 12);
        }
      }),
    );
  });

  test('reducing counts every sample for the same share in all', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 200 }), fc.integer({ min: 1, max: 200 }), (a, b) => {
        const [from, to] = [Math.max(a, b), Math.min(a, b)];
        const { taps, first, shares } = axisWeights(from, to);
        const counted = new Float64Array(from);
        for (let i = 0; i < to; i++)
          for (let t = 0; t < taps; t++) counted[first[i] + t] += shares[i * taps + t];
        for (const share of counted) expect(share).toBeCloseTo(to / from, 9);
      }),
    );
  });

  test.each([
    [0, 1],
    [1, 0],
    [1.5, 2],
    [2, NaN],
  ])('refuses %d to %d', (from, to) => expect(() => axisWeights(from, to)).toThrow(RangeError));
});
