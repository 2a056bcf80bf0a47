import { describe, expect, test } from 'vitest';
import type { Spot } from '../../../src/lib/machines/spot';
import { inspectWindow, marginPx, type Inspection } from '../../../src/lib/prepare/measure/inspect-window';
import { extentAlong, lineExtents } from '../../../src/lib/prepare/measure/line-extents';
import { asBytes, bar, coverageOf, disc, hole, star, type Polygon } from '../../drawn/coverage';

const SIZE = 200;
const ROUND: Spot = { widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' };
/** Six pixels to the round spot. */
const PX_PER_MM = 60;
const L = 6;

function inspect(
  polygons: readonly Polygon[],
  spot = ROUND,
  own = { left: 0, top: 0, right: SIZE, bottom: SIZE },
): Inspection {
  const data = asBytes(coverageOf(SIZE, SIZE, polygons));
  const window = { own, leaveOut: () => false, faintest: 20 };
  return inspectWindow({ width: SIZE, height: SIZE, data }, 127.5, lineExtents(spot, PX_PER_MM), window);
}

const counts = ({ ink, gaps }: Inspection): number[] => [
  ink.thin.length + ink.unresolved.length,
  gaps.thin.length + gaps.unresolved.length,
  ink.small.length,
  gaps.small.length,
];
const NONE = [0, 0, 0, 0];
/** A tip of an angle, pointing left, `length` long. */
const tip = (deg: number, length = 150): Polygon => {
  const half = length * Math.tan((deg * Math.PI) / 360);
  return [
    [20, 100],
    [20 + length, 100 - half],
    [20 + length, 100 + half],
  ];
};
const square = bar(100, 100, 180, 180, 0);

describe('what is sound is left alone', () => {
  test.each<[string, Polygon[]]>([
    ['nothing', []],
    ['all of it', [bar(100, 100, 900, 900, 0)]],
    ['a square', [bar(100, 100, 80, 80, 17)]],
    ['a square of 1.2 extents', [bar(100, 100, 1.2 * L, 1.2 * L, 31)]],
    ['a bar of 1.05 extents', [bar(100, 100, 100, 1.05 * L, 33)]],
    ['a short bar of 1.05 extents', [bar(100, 100, 2 * L, 1.05 * L, 10)]],
    ['a ring of 1.05 extents', [disc(100, 100, 120), hole(disc(100, 100, 120 - 2.1 * L))]],
    ['a star of five tips', [star(100, 100, 5, 90, 34, 9)]],
    ['a star of eight tips', [star(100, 100, 8, 90, 55, 4)]],
    ['a notch of 60°', [square, hole(tip(60, 100))]],
    [
      'a gap of 1.05 extents',
      [bar(100, 60, 150, 30, 12), bar(100, 60 + (30 + 1.05 * L) / Math.cos(0.2094395), 150, 30, 12)],
    ],
    ['two corners that nearly touch', [bar(60, 60, 60, 60, 0), bar(122, 122, 60, 60, 0)]],
    ['squares that touch at their corners', [bar(60, 60, 60, 60, 0), bar(120, 120, 60, 60, 0)]],
  ])('%s', (_name, polygons) => {
    expect(counts(inspect(polygons))).toEqual(NONE);
  });

  test.each([25, 30, 36, 45, 60, 90, 120])('a tip of %s° never counts', (deg) => {
    expect(counts(inspect([tip(deg)]))).toEqual(NONE);
  });

  test.each([30, 60, 90, 120])('a notch of %s° never counts', (deg) => {
    expect(counts(inspect([square, hole(tip(deg, 100))]))).toEqual(NONE);
  });
});

describe('strokes', () => {
  test.each<[string, Polygon[], number]>([
    ['a bar', [bar(100, 100, 100, 0.95 * L, 33)], 1],
    ['a short bar', [bar(100, 100, 2.2 * L, 0.9 * L, 10)], 1],
    ['a ring', [disc(100, 100, 120), hole(disc(100, 100, 120 - 1.9 * L))], 1],
    ['a bar across the grain of pixels', [bar(100.3, 99.6, 100, 0.2 * L, 7)], 1],
    ['a bar under a pixel', [bar(100.3, 99.6, 100, 0.1 * L, 7)], 1],
    ['a bar that never reaches the level', [bar(100.3, 99.6, 100, 0.03 * L, 7)], 1],
    ['a foot of a letter', [bar(100, 80, 20, 100, 0), bar(100, 132.4, 60, 0.8 * L, 0)], 2],
    ['a tip of 12°', [tip(12)], 1],
    ['a spike of 15°', [tip(15)], 1],
  ])('%s', (_name, polygons, expected) => {
    const found = inspect(polygons);
    expect(counts(found)).toEqual([expected, 0, 0, 0]);
  });

  test('the smallest width and its limit are in px', () => {
    const [only] = inspect([bar(100, 100, 100, 4.2, 33)]).ink.thin;
    expect(only.smallestPx).toBeCloseTo(4.2, 1);
    expect(only.limitPx).toBeCloseTo(6, 2);
    expect(only.worstRatio).toBeCloseTo(0.7, 2);
    expect(only.soundScale).toBeCloseTo(0.98 / 0.7, 1);
    expect(only.fading).toBe(false);
  });

  test('a stroke is held against the extent in its own direction', () => {
    const spot: Spot = { widthMm: 0.1, heightMm: 0.2, shape: 'ellipse' };
    expect(counts(inspect([bar(100, 100, 150, 9, 0)], spot))[0]).toBe(1);
    expect(counts(inspect([bar(100, 100, 150, 9, 90)], spot))[0]).toBe(0);
  });

  test('what tapers to nothing says so', () => {
    expect(inspect([tip(12)]).ink.thin[0].fading).toBe(true);
  });

  test.each([25, 32])('a tip of %s° is a note', (deg) => {
    expect(inspect([tip(deg)]).ink.tips).toHaveLength(1);
  });
});

describe('gaps', () => {
  test.each<[string, Polygon[], number]>([
    ['between two bars', [bar(100, 80, 150, 30, 0), bar(100, 80 + 30 + 0.9 * L, 150, 30, 0)], 1],
    ['between the ends of two bars', [bar(60, 100, 70, 14, 0), bar(60 + 70 + 0.8 * L, 100, 70, 14, 0)], 1],
    ['a slit', [square, hole(bar(100, 100, 100, 0.6 * L, 20))], 1],
    ['a slit under a pixel', [square, hole(bar(100, 100, 100, 0.1 * L, 20))], 1],
    ['between two discs', [disc(65, 100, 66), disc(65 + 66 + 0.5 * L, 100, 66)], 1],
  ])('%s', (_name, polygons, expected) => {
    expect(counts(inspect(polygons))).toEqual([0, expected, 0, 0]);
  });

  test('open ground around a lone bar is no gap', () => {
    expect(inspect([bar(100, 3, 150, 8, 0)]).gaps.thin).toEqual([]);
  });
});

describe('islands and holes', () => {
  test.each([
    [0.5, 1],
    [0.8, 1],
    [0.95, 1],
    [1.03, 0],
    [1.2, 0],
  ])('a disc of %s spots', (share, expected) => {
    expect(counts(inspect([disc(100.3, 99.8, share * L)]))).toEqual([0, 0, expected, 0]);
    expect(counts(inspect([square, hole(disc(100.3, 99.8, share * L))]))).toEqual([0, 0, 0, expected]);
  });

  test('an island shaped like the spot, just under and just over it', () => {
    const spot: Spot = { widthMm: 0.1, heightMm: 0.2, shape: 'rectangle' };
    expect(counts(inspect([bar(100, 100, 5.6, 11.2, 0)], spot))[2]).toBe(1);
    expect(counts(inspect([bar(100, 100, 6.4, 12.8, 0)], spot))[2]).toBe(0);
  });

  test('a short stroke of less than the spot’s area is a stroke, not a speck', () => {
    expect(counts(inspect([bar(100, 100, 2.4 * L, 0.3 * L, 20)]))).toEqual([1, 0, 0, 0]);
  });

  test('the width of a speck is that of the disc of its area', () => {
    const [only] = inspect([disc(100, 100, 4)]).ink.small;
    expect(Math.abs(only.smallestPx - 4)).toBeLessThan(0.25);
    expect(only.limitPx).toBeCloseTo(6, 6);
  });
});

describe('the part that a window answers for', () => {
  test('what lies in the margin alone is left to the neighbour', () => {
    const half = { left: 100, top: 0, right: SIZE, bottom: SIZE };
    expect(counts(inspect([bar(50, 100, 60, 4, 0)], ROUND, half))).toEqual(NONE);
    const [only] = inspect([bar(100, 100, 120, 4, 0)], ROUND, half).ink.thin;
    expect(only.left).toBeGreaterThanOrEqual(100);
    expect(only.ends.length).toBeGreaterThan(0);
  });

  test('left-out places are not judged', () => {
    const data = asBytes(coverageOf(SIZE, SIZE, [bar(100, 100, 100, 4, 33), disc(20, 20, 4)]));
    const own = { left: 0, top: 0, right: SIZE, bottom: SIZE };
    const extents = lineExtents(ROUND, PX_PER_MM);
    const window = { own, leaveOut: () => true, faintest: 20 };
    expect(counts(inspectWindow({ width: SIZE, height: SIZE, data }, 127.5, extents, window))).toEqual(NONE);
  });

  test('the margin holds more than three extents', () => {
    expect(marginPx(lineExtents(ROUND, PX_PER_MM))).toBeGreaterThan(3 * L);
  });
});

describe('lineExtents', () => {
  test('follow the direction of the stroke', () => {
    const extents = lineExtents({ widthMm: 0.07, heightMm: 0.11, shape: 'ellipse' }, 100);
    expect(extentAlong(extents, 0)).toBeCloseTo(11, 4);
    expect(extentAlong(extents, Math.PI / 2)).toBeCloseTo(7, 4);
    expect(extents.smallestPx).toBeCloseTo(7, 6);
    expect(extents.largestPx).toBeCloseTo(11, 4);
    expect(() => lineExtents(ROUND, 0)).toThrow(RangeError);
  });
});
