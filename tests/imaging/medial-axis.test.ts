import { describe, expect, test } from 'vitest';
import { axisGrid, smoothAxis } from '../../src/lib/imaging/axis-smoothing';
import { contourOf } from '../../src/lib/imaging/contour';
import { cappedDistance } from '../../src/lib/imaging/distance';
import { divide } from '../../src/lib/imaging/field';
import { fineLines, withFineLines } from '../../src/lib/imaging/fine-lines';
import { medialAxis, type AxisPoints } from '../../src/lib/imaging/medial-axis';
import { asBytes, bar, coverageOf, disc, hole, star, type Polygon } from '../drawn/coverage';

const SIDE = 80;
const LEVEL = 127.5;

function axis(polygons: readonly Polygon[], side: 0 | 1 = 1, widest = 14, size = SIDE): AxisPoints {
  const field = { width: size, height: size, data: asBytes(coverageOf(size, size, polygons)) };
  const division = divide(field, LEVEL);
  return medialAxis(division, cappedDistance(division, 10), contourOf(field, division, LEVEL), side, widest);
}

const near = (points: AxisPoints, x: number, y: number, within: number): number[] =>
  Array.from({ length: points.count }, (_, n) => n).filter(
    (n) => Math.hypot(points.x[n] - x, points.y[n] - y) < within,
  );

describe('medialAxis', () => {
  test.each([0, 7.5, 22.5, 45, 61, 90, 133])('a bar at %s° has its width all along', (deg) => {
    const points = axis([bar(40.3, 39.8, 60, 6.4, deg)]);
    const middle = near(points, 40, 40, 20);
    expect(middle.length).toBeGreaterThan(25);
    for (const n of middle) expect(Math.abs(points.width[n] - 6.4)).toBeLessThan(0.06);
  });

  test('the angle across stands at right angles to the bar', () => {
    const points = axis([bar(40, 40, 60, 6, 30)]);
    const middle = near(points, 40, 40, 15);
    const mean = middle.reduce((sum, n) => sum + points.across[n], 0) / middle.length;
    expect((mean * 180) / Math.PI).toBeCloseTo(-60, 0);
  });

  test('a gap is measured as the side between', () => {
    const points = axis([bar(40, 25, 70, 12, 0), bar(40, 42, 70, 12, 0)], 0);
    const middle = near(points, 40, 33.5, 15);
    expect(middle.length).toBeGreaterThan(20);
    for (const n of middle) expect(points.width[n]).toBeCloseTo(5, 1);
  });

  test.each([60, 75, 90, 120])('a corner of %s° gives no line', (deg) => {
    const reach = 60;
    const a = (deg * Math.PI) / 360;
    const corner: Polygon = [
      [20, 40],
      [20 + reach * Math.cos(a), 40 - reach * Math.sin(a)],
      [20 + reach * Math.cos(a), 40 + reach * Math.sin(a)],
    ];
    // In the last pixels of the tip its angle cannot be told.
    expect(near(axis([corner], 1, 9), 20, 40, 25).length).toBeLessThanOrEqual(2);
  });

  test('a square wider than the limit gives no point', () => {
    expect(axis([bar(40, 40, 30, 30, 20)], 1, 9).count).toBe(0);
  });

  test('a ring is followed all round', () => {
    const points = axis([disc(40, 40, 60), hole(disc(40, 40, 50))]);
    expect(points.count).toBeGreaterThan(130);
    for (let n = 0; n < points.count; n++) expect(points.width[n]).toBeCloseTo(5, 0);
  });

  test('an empty and a full field give none', () => {
    expect(axis([]).count).toBe(0);
    expect(axis([bar(40, 40, 500, 500, 0)]).count).toBe(0);
  });

  test('refuses a limit of 0', () => {
    expect(() => axis([], 1, 0)).toThrow(RangeError);
  });
});

describe('smoothAxis', () => {
  const smoothed = (points: AxisPoints, size = SIDE): ReturnType<typeof smoothAxis> =>
    smoothAxis(points, axisGrid(points, size * size), size, 6);

  test.each([0, 12, 30, 45, 77, 90])('a bar at %s°: direction, even width, length', (deg) => {
    const points = axis([bar(40, 40, 60, 6, deg)]);
    const { along, slope, length } = smoothed(points);
    for (const n of near(points, 40, 40, 18)) {
      const off = Math.abs(Math.sin(along[n] - (deg * Math.PI) / 180));
      expect(off).toBeLessThan(0.02);
      expect(slope[n]).toBeLessThan(0.02);
    }
    expect(Math.abs(length.reduce((a, b) => a + b, 0) - 54)).toBeLessThan(3);
  });

  test('a taper of 14° gains width at twice the sine of half its angle', () => {
    const h = 70;
    const w = h * Math.tan((7 * Math.PI) / 180);
    const points = axis([
      [
        [5, 40],
        [5 + h, 40 - w],
        [5 + h, 40 + w],
      ],
    ]);
    const { slope, width } = smoothed(points);
    for (const n of near(points, 35, 40, 6)) {
      expect(slope[n]).toBeCloseTo(2 * Math.sin((7 * Math.PI) / 180), 1);
      expect(Math.abs(width[n] - 2 * (points.x[n] - 5) * Math.sin((7 * Math.PI) / 180))).toBeLessThan(0.1);
    }
  });

  test('no points, no answers', () => {
    const none = axis([]);
    expect(smoothed(none).width.length).toBe(0);
    expect(() => smoothAxis(none, axisGrid(none, 4), 2, 0)).toThrow(RangeError);
  });
});

describe('fineLines', () => {
  const field = (polygons: readonly Polygon[]): { width: number; height: number; data: Uint8Array } => ({
    width: SIDE,
    height: SIDE,
    data: asBytes(coverageOf(SIDE, SIDE, polygons)),
  });

  test.each([0.1, 0.3, 0.6, 1, 1.4])('a line %s px wide is seen as that wide at every angle', (width) => {
    for (let deg = 0; deg < 180; deg += 7.5) {
      const points = fineLines(field([bar(40.2, 39.7, 60, width, deg)]), 1, 12);
      const middle = near(points, 40, 40, 20);
      expect(middle.length).toBeGreaterThan(20);
      const mean = middle.reduce((sum, n) => sum + points.width[n], 0) / middle.length;
      expect(Math.abs(mean - width)).toBeLessThan(0.05 + 0.04 * width);
    }
  });

  test('a gap is seen as a line of low samples', () => {
    const points = fineLines(field([bar(40, 29.8, 70, 20, 0), bar(40, 50.2, 70, 20, 0)]), 0, 12);
    const middle = near(points, 40, 40, 15);
    expect(middle.length).toBeGreaterThan(20);
    for (const n of middle) expect(points.width[n]).toBeCloseTo(0.4, 1);
  });

  test('neither a thick bar, nor a dot, nor a star has a fine line', () => {
    expect(fineLines(field([bar(40, 40, 60, 5, 20)]), 1, 12).count).toBe(0);
    expect(fineLines(field([disc(40, 40, 1)]), 1, 12).count).toBe(0);
    expect(fineLines(field([star(40, 40, 5, 30, 12, 9)]), 1, 12).count).toBeLessThan(8);
  });

  test('where both saw one line, the fine points stand', () => {
    const polygons = [bar(40, 40.5, 60, 1.2, 0)];
    const fine = fineLines(field(polygons), 1, 12);
    const both = withFineLines(axis(polygons), fine, SIDE);
    expect(near(both, 40, 40, 20).every((n) => Math.abs(both.width[n] - 1.2) < 0.05)).toBe(true);
    expect([...both.pixel]).toEqual([...both.pixel].sort((a, b) => a - b));
    expect(withFineLines(axis([]), { ...fine, count: 0 }, SIDE).count).toBe(0);
  });
});
