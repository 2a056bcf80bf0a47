import { readFileSync } from 'node:fs';
import path from 'node:path';
import { expect } from 'vitest';
import { contourOf } from '../../src/lib/imaging/contour';
import { cappedDistance, squaredDistance } from '../../src/lib/imaging/distance';
import { divide } from '../../src/lib/imaging/field';
import { medialAxis } from '../../src/lib/imaging/medial-axis';
import { lineExtent, type Spot } from '../../src/lib/machines/spot';
import { inspectWindow, type Inspection } from '../../src/lib/prepare/measure/inspect-window';
import { lineExtents } from '../../src/lib/prepare/measure/line-extents';
import { asBytes, bar, coverageOf, wheel, type Polygon } from '../drawn/coverage';
import { referenceCheck } from './check';
import { readTable } from './read-table';

const LEVEL = 127.5;
const ANGLES = Array.from({ length: 24 }, (_, n) => n * 7.5);
const OFFSETS = [
  [0, 0],
  [0.25, 0.5],
  [0.5, 0.25],
  [0.75, 0.75],
] as const;

const fieldOf = (
  size: number,
  polygons: readonly Polygon[],
): { width: number; height: number; data: Uint8Array } => ({
  width: size,
  height: size,
  data: asBytes(coverageOf(size, size, polygons)),
});

/** What a spot of so many px finds in a square picture, all of it judged. */
function inspect(size: number, polygons: readonly Polygon[], spot: Spot, pxPerMm: number): Inspection {
  const own = { left: 0, top: 0, right: size, bottom: size };
  const window = { own, leaveOut: () => false, faintest: 20 };
  return inspectWindow(fieldOf(size, polygons), LEVEL, lineExtents(spot, pxPerMm), window);
}

/** Errors of the widths measured along the middle of a bar, px, over 24 angles and 4 offsets. */
function barErrors(width: number): number[] {
  return ANGLES.flatMap((deg) =>
    OFFSETS.flatMap(([dx, dy]) => {
      const field = fieldOf(64, [bar(32 + dx, 32 + dy, 50, width, deg)]);
      const division = divide(field, LEVEL);
      const contour = contourOf(field, division, LEVEL);
      const points = medialAxis(division, cappedDistance(division, 8), contour, 1, 12);
      return [...points.width].flatMap((w, n) =>
        Math.hypot(points.x[n] - 32, points.y[n] - 32) < 15 ? [w - width] : [],
      );
    }),
  );
}

referenceCheck(
  {
    what: 'distance transform of a 12 × 12 picture',
    basis: 'computed',
    source:
      'scipy 1.10.1 distance_transform_edt; Felzenszwalb & Huttenlocher, Theory of Computing 8, 2012, give the same integers',
  },
  () => {
    const text = readFileSync(path.join(import.meta.dirname, 'data', 'edt_golden.json'), 'utf8');
    const golden = JSON.parse(text) as {
      pattern: number[][];
      squared_distance_to_nearest_zero_pixel: number[][];
    };
    const mask = Uint8Array.from(golden.pattern.flat());
    const expected = golden.squared_distance_to_nearest_zero_pixel.flat();
    expect([...squaredDistance(mask, 12, 12)]).toEqual(expected);
    const division = divide({ width: 12, height: 12, data: mask.map((v) => v * 255) }, LEVEL);
    const capped = cappedDistance(division, 15);
    expected.forEach((value, i) => mask[i] && expect(capped[i]).toBe(value));
  },
);

referenceCheck(
  {
    what: 'widths of bars at 24 angles and 4 sub-pixel offsets stay within the errors of the contour method',
    basis: 'computed',
    source:
      'bar_width_estimators.csv, column contour_subpixel: scikit-image 0.19.3 and scipy 1.10.1 on 16 × 16 box-filtered bars',
    within:
      'from 2 px up the table’s own lowest and highest error, or 0.05 px; its mean error and 0.025 px more',
  },
  () => {
    const rows = readTable('bar_width_estimators.csv').filter(
      ({ estimator, true_width_px }) => estimator === 'contour_subpixel' && Number(true_width_px) >= 2,
    );
    expect(rows.length).toBeGreaterThan(3);
    for (const row of rows) {
      const errors = barErrors(Number(row.true_width_px));
      const mean = errors.reduce((a, b) => a + b, 0) / errors.length;
      expect(Math.abs(mean)).toBeLessThanOrEqual(Math.abs(Number(row.mean_error_px)) + 0.025);
      expect(errors.reduce((a, b) => Math.min(a, b))).toBeGreaterThanOrEqual(Number(row.min_error_px));
      expect(errors.reduce((a, b) => Math.max(a, b))).toBeLessThanOrEqual(
        Math.max(0.05, Number(row.max_error_px)),
      );
    }
  },
);

referenceCheck(
  {
    what: 'verdict on bars of 0.6 to 1.5 spots at 24 angles and 4 offsets, spots of 4, 6 and 8 px',
    basis: 'computed',
    source: 'thin_classification.csv, detector contour distance: scikit-image 0.19.3 and scipy 1.10.1',
    within: 'as sharp or sharper: all at 0.95 and under, none at 1.05 and over',
  },
  () => {
    for (const row of readTable('thin_classification.csv')) {
      const ratio = Number(row.true_width_over_spot);
      if (row.detector !== 'contour distance' || ratio === 1) continue;
      const spotPx = Number(row.spot_px);
      const spot: Spot = { widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' };
      let flagged = 0;
      for (const deg of ANGLES) {
        for (const [dx, dy] of OFFSETS) {
          const polygons = [bar(40 + dx, 40 + dy, 60, ratio * spotPx, deg)];
          flagged += inspect(80, polygons, spot, spotPx / 0.1).ink.thin.length > 0 ? 1 : 0;
        }
      }
      expect({ spotPx, ratio, flagged }).toEqual({ spotPx, ratio, flagged: ratio < 1 ? 96 : 0 });
    }
  },
  180_000,
);

referenceCheck(
  {
    what: 'bars at 0.95 and 1.05 of the line extent in their own direction: all found, none found, nothing else',
    basis: 'computed',
    source:
      'bars drawn by exact area in the test at 24 angles and 4 offsets; ellipses and rectangles of 1:1, 7:11 and 2:1',
    within: '96 of 96 and 0 of 96',
  },
  () => {
    for (const [widthMm, heightMm] of [
      [0.1, 0.1],
      [0.07, 0.11],
      [0.1, 0.05],
    ]) {
      for (const shape of ['ellipse', 'rectangle'] as const) {
        const spot: Spot = { widthMm, heightMm, shape };
        const pxPerMm = 6 / Math.min(widthMm, heightMm);
        const counts = [0.95, 1.05].map((ratio) => {
          let found = 0;
          for (const deg of ANGLES) {
            for (const [dx, dy] of OFFSETS) {
              const width = ratio * lineExtent(spot, deg) * pxPerMm;
              const { ink, gaps } = inspect(110, [bar(55 + dx, 55 + dy, 80, width, deg)], spot, pxPerMm);
              found += ink.thin.length > 0 ? 1 : 0;
              for (const list of [ink.small, ink.unresolved, gaps.thin, gaps.small, gaps.unresolved]) {
                expect(list).toEqual([]);
              }
            }
          }
          return found;
        });
        expect({ spot, counts }).toEqual({ spot, counts: [96, 0] });
      }
    }
  },
  180_000,
);

referenceCheck(
  {
    what: 'radius at which the sectors of a Siemens star are as wide as the spot',
    basis: 'computed',
    source: 'siemens_wedge.csv: r* = s / (2 sin(π/2n)), the inscribed disc; stars of 12 to 36 sectors',
    within: '0.98 r* ± 4 % or 1.2 px',
  },
  () => {
    const rows = readTable('siemens_wedge.csv').filter(
      ({ spot, black_sectors_n }) =>
        Number(spot) === 6 && Number(black_sectors_n) >= 12 && Number(black_sectors_n) <= 36,
    );
    expect(rows).toHaveLength(5);
    for (const row of rows) {
      const radius = 0.98 * Number(row.radius_axis_width_equals_spot);
      const size = Math.ceil(2 * radius + 60);
      const n = Number(row.black_sectors_n);
      const star = wheel(size / 2, size / 2, n, size / 2 - 6, 3);
      const { ink, gaps } = inspect(size, star, { widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' }, 60);
      for (const [half, { thin }] of [
        [0.5, ink],
        [1.5, gaps],
      ] as const) {
        // How far the middle lines of the sectors reach along X or Y at that radius.
        const axes = Array.from(
          { length: n },
          (_, k) => ((2 * k + half) * Math.PI) / n + (3 * Math.PI) / 180,
        );
        const along = Math.max(...axes.flatMap((a) => [Math.abs(Math.cos(a)), Math.abs(Math.sin(a))]));
        const reach = Math.max(
          ...thin.flatMap(({ left, top, right, bottom }) => [
            size / 2 - left,
            size / 2 - top,
            right - size / 2,
            bottom - size / 2,
          ]),
        );
        expect(Math.abs(reach - radius * along)).toBeLessThan(Math.max(1.2, 0.04 * radius));
      }
    }
  },
);
