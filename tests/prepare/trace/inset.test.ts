import { describe, expect, test } from 'vitest';
import { lineExtent, type Spot } from '../../../src/lib/machines/spot';
import type { Point } from '../../../src/lib/prepare/trace/curve';
import { dilate, erode, insetOutlines } from '../../../src/lib/prepare/trace/inset';
import { areaOf, boundsOf, regionOf, subtract, type Region } from '../../../src/lib/prepare/trace/region';

const box = (left: number, top: number, right: number, bottom: number): Point[] => [
  [left, top],
  [right, top],
  [right, bottom],
  [left, bottom],
];
const disc = (x: number, y: number, r: number, n = 720): Point[] =>
  Array.from({ length: n }, (_, k): Point => [
    x + r * Math.cos((2 * Math.PI * k) / n),
    y + r * Math.sin((2 * Math.PI * k) / n),
  ]);
const SPOTS: Spot[] = [
  { widthMm: 0.07, heightMm: 0.11, shape: 'ellipse' },
  { widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' },
  { widthMm: 0.07, heightMm: 0.11, shape: 'rectangle' },
];

describe.each(SPOTS)('with a spot %o', (spot) => {
  const { widthMm: w, heightMm: h } = spot;

  test('an upright box is drawn in by half the spot on each side', () => {
    const [outline, ...more] = insetOutlines([box(0, 0, 5, 3)], spot);
    expect(more).toEqual([]);
    const bounds = boundsOf([outline]);
    [w / 2, h / 2, 5 - w / 2, 3 - h / 2].forEach((value, n) => expect(bounds[n]).toBeCloseTo(value, 3));
    expect(areaOf([outline])).toBeCloseTo((5 - w) * (3 - h), 3);
  });

  test('a hole is drawn out into the dark', () => {
    const outlines = insetOutlines(regionOf([box(0, 0, 5, 5), box(2, 2, 3, 3)], 'evenodd'), spot);
    const hole = outlines.find((path) => boundsOf([path])[0] > 1)!;
    const bounds = boundsOf([hole]);
    [2 - w / 2, 2 - h / 2, 3 + w / 2, 3 + h / 2].forEach((value, n) =>
      expect(bounds[n]).toBeCloseTo(value, 3),
    );
  });

  test('every edge is drawn in by half the line extent of its direction, at 24 angles', () => {
    for (let deg = 0; deg < 180; deg += 7.5) {
      const a = (deg * Math.PI) / 180;
      const [along, across]: [Point, Point] = [
        [Math.cos(a), Math.sin(a)],
        [-Math.sin(a), Math.cos(a)],
      ];
      const corner = (s: number, t: number): Point => [
        s * along[0] + t * across[0],
        s * along[1] + t * across[1],
      ];
      const bar: Region = [[corner(0, 0), corner(6, 0), corner(6, 2), corner(0, 2)]];
      const inner = insetOutlines(bar, spot).flat();
      const depth = inner.map(([x, y]) => x * across[0] + y * across[1]);
      expect(Math.min(...depth)).toBeCloseTo(lineExtent(spot, deg) / 2, 3);
      expect(2 - Math.max(...depth)).toBeCloseTo(lineExtent(spot, deg) / 2, 3);
    }
  });

  test('the burned area is the drawn one: nothing outside, only corners left', () => {
    const star: Region = [
      Array.from({ length: 10 }, (_, k): Point => {
        const r = k % 2 === 0 ? 4 : 2;
        return [5 + r * Math.cos((k * Math.PI) / 5), 5 + r * Math.sin((k * Math.PI) / 5)];
      }),
    ];
    for (const region of [[disc(5, 5, 3)], star, [box(1, 1, 2, 9)]]) {
      const again = dilate(erode(region, spot), spot);
      expect(areaOf(subtract(again, region))).toBeLessThan(2e-3);
      expect(areaOf(subtract(region, again))).toBeLessThan(0.03);
    }
  });

  test('a bar narrower than the line is still followed', () => {
    for (const share of [0.9, 0.6, 0.3, 0.12]) {
      const outlines = insetOutlines([box(0, 0, 5, share * h)], spot);
      expect(outlines.length).toBeGreaterThan(0);
      const [left, top, right, bottom] = boundsOf(outlines);
      expect(right - left).toBeGreaterThan(4.8);
      // Burned, it is no more than a quarter of a line wider than one line.
      expect(bottom - top).toBeLessThan(0.27 * h);
      expect(top).toBeGreaterThanOrEqual(0);
    }
  });

  test('a narrow neck between two discs is not lost', () => {
    const region = regionOf([disc(2, 2, 1), disc(6, 2, 1), box(2, 2 - 0.03, 6, 2 + 0.03)], 'nonzero');
    const [left, , right] = boundsOf(
      insetOutlines(region, spot).filter((path) => boundsOf([path])[0] > 2.5 && boundsOf([path])[2] < 5.5),
    );
    expect(right - left).toBeGreaterThan(1.6);
  });

  test('nothing gives nothing', () => {
    expect(insetOutlines([], spot)).toEqual([]);
  });
});
