import { describe, expect, test } from 'vitest';
import {
  curveLength,
  flatten,
  multiply,
  readPathData,
  readTransform,
  writePathData,
} from '../../../src/lib/prepare/trace/curve';

const roundTrip = (data: string): string => readPathData(data).map(writePathData).join('');

describe('readPathData and writePathData', () => {
  test.each([
    ['M1 2L3 4', 'M1 2L3 4'],
    ['m1 2 2 2', 'M1 2L3 4'],
    ['M1 2H5V6Z', 'M1 2L5 2L5 6Z'],
    ['M0 0C1 1 2 1 3 0', 'M0 0C1 1 2 1 3 0'],
    ['M0 0C1 1 2 1 3 0S5 -1 6 0', 'M0 0C1 1 2 1 3 0C4 -1 5 -1 6 0'],
    ['M0 0Q3 3 6 0', 'M0 0C2 2 4 2 6 0'],
    ['M0 0H1Zm2 0h1z', 'M0 0L1 0ZM2 0L3 0Z'],
    ['M0 0H1ZH5', 'M0 0L1 0ZM0 0L5 0'],
    ['M0 0', ''],
    ['', ''],
    ['nonsense', ''],
    ['M0 0L1 1Lx', 'M0 0L1 1'],
  ])('%s', (data, written) => expect(roundTrip(data)).toBe(written));

  test('an arc becomes cubics on its circle', () => {
    const [curve] = readPathData('M10 0A10 10 0 0 1 -10 0');
    for (const [x, y] of flatten(curve, 0.001)) expect(Math.hypot(x, y)).toBeCloseTo(10, 2);
    expect(curveLength(curve, 1e-4)).toBeCloseTo(Math.PI * 10, 2);
  });

  test('coordinates keep a tenth of a micrometre', () => {
    expect(roundTrip('M0.12345 -0.00001L1e2 1')).toBe('M0.1235 0L100 1');
  });
});

describe('transforms', () => {
  test.each([
    ['translate(3 4)', [1, 0, 0, 1, 3, 4]],
    ['scale(2)', [2, 0, 0, 2, 0, 0]],
    ['matrix(1 2 3 4 5 6)', [1, 2, 3, 4, 5, 6]],
    ['translate(1,0) scale(2,3)', [2, 0, 0, 3, 1, 0]],
    [undefined, [1, 0, 0, 1, 0, 0]],
    ['', [1, 0, 0, 1, 0, 0]],
  ])('%s', (text, matrix) =>
    readTransform(text).forEach((value, n) => expect(value).toBeCloseTo(matrix[n], 9)),
  );

  test('rotation, and the order of a product', () => {
    const turned = readTransform('rotate(90)');
    [0, 1, -1, 0, 0, 0].forEach((value, n) => expect(turned[n]).toBeCloseTo(value, 9));
    const both = multiply(readTransform('translate(1 0)'), turned);
    readTransform('translate(1 0) rotate(90)').forEach((value, n) => expect(both[n]).toBeCloseTo(value, 9));
  });
});

test('chords stay within the tolerance of a cubic', () => {
  const [curve] = readPathData('M0 0C40 80 60 -80 100 0');
  const fine = flatten(curve, 1e-5);
  for (const tolerance of [1, 0.1, 0.01]) {
    const chords = flatten(curve, tolerance);
    const off = Math.max(
      ...fine.map(([x, y]) =>
        Math.min(...chords.slice(1).map(([bx, by], n) => distance([x, y], chords[n], [bx, by]))),
      ),
    );
    expect(off).toBeLessThan(tolerance * 1.001);
  }
});

function distance(p: readonly number[], a: readonly number[], b: readonly number[]): number {
  const [dx, dy] = [b[0] - a[0], b[1] - a[1]];
  const t = Math.min(1, Math.max(0, ((p[0] - a[0]) * dx + (p[1] - a[1]) * dy) / (dx * dx + dy * dy)));
  return Math.hypot(p[0] - a[0] - t * dx, p[1] - a[1] - t * dy);
}
