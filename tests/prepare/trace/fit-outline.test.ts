import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { flatten, type Point } from '../../../src/lib/prepare/trace/curve';
import { fitOutline } from '../../../src/lib/prepare/trace/fit-outline';

const circle = (n: number, r: number): Point[] =>
  Array.from({ length: n }, (_, k): Point => [
    r * Math.cos((2 * Math.PI * k) / n),
    r * Math.sin((2 * Math.PI * k) / n),
  ]);
const toChain = (p: Point, chain: readonly Point[]): number =>
  Math.min(
    ...chain.map((a, n) => {
      const b = chain[(n + 1) % chain.length];
      const [dx, dy] = [b[0] - a[0], b[1] - a[1]];
      const t = Math.min(
        1,
        Math.max(0, ((p[0] - a[0]) * dx + (p[1] - a[1]) * dy) / (dx * dx + dy * dy || 1)),
      );
      return Math.hypot(p[0] - a[0] - t * dx, p[1] - a[1] - t * dy);
    }),
  );

describe('fitOutline', () => {
  test('a square stays four straight pieces with its corners', () => {
    const square: Point[] = [
      [0, 0],
      [5, 0],
      [5, 5],
      [0, 5],
    ];
    expect(fitOutline(square, 0.01)).toEqual({
      start: [0, 0],
      pieces: [{ to: [5, 0] }, { to: [5, 5] }, { to: [0, 5] }, { to: [0, 0] }],
      closed: true,
    });
  });

  test('a circle of many chords becomes few cubics on it', () => {
    const curve = fitOutline(circle(400, 10), 0.005);
    expect(curve.pieces.length).toBeLessThanOrEqual(16);
    for (const [x, y] of flatten(curve, 1e-4)) expect(Math.abs(Math.hypot(x, y) - 10)).toBeLessThan(0.006);
  });

  test('points along a side do not make pieces', () => {
    const square: Point[] = [
      [0, 0],
      [1, 0],
      [2, 0],
      [5, 0],
      [5, 5],
      [0, 5],
    ];
    expect(fitOutline(square, 0.01).pieces.length).toBe(4);
  });

  test('every point of any chain lies within the tolerance of the curve', () => {
    const radius = fc.double({ min: 1, max: 10, noNaN: true });
    fc.assert(
      fc.property(fc.array(radius, { minLength: 3, maxLength: 40 }), (radii) => {
        const chain = radii.map((r, k): Point => [
          r * Math.cos((2 * Math.PI * k) / radii.length),
          r * Math.sin((2 * Math.PI * k) / radii.length),
        ]);
        const drawn = flatten(fitOutline(chain, 0.05), 0.001);
        for (const point of chain) expect(toChain(point, drawn)).toBeLessThan(0.06);
      }),
      { numRuns: 60 },
    );
  });

  test('a triangle is the smallest chain', () => {
    expect(
      fitOutline(
        [
          [0, 0],
          [1, 0],
          [0, 1],
        ],
        0.01,
      ).pieces.length,
    ).toBe(3);
  });
});
