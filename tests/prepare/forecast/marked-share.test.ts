import { describe, expect, test } from 'vitest';
import type { Firing, Spot } from '../../../src/lib/machines/spot';
import { blockMeans } from '../../../src/lib/prepare/forecast/block-means';
import { coverByPoints } from '../../../src/lib/prepare/forecast/cover-by-points';
import { firedSpot, reachPx, type Sweep } from '../../../src/lib/prepare/forecast/fired-spot';
import { burnedShare, markedShare } from '../../../src/lib/prepare/forecast/marked-share';
import { pictureSize } from '../../../src/lib/prepare/forecast/picture-size';
import type { LevelRaster } from '../../../src/lib/prepare/mark-raster';
import { scanFrame } from '../../../src/lib/prepare/resample/scan-frame';
import { maskOf } from '../draw-mask';

const round = (mm: number): Spot => ({ widthMm: mm, heightMm: mm, shape: 'ellipse' });
const sweep = (firing: Firing, xMm: number, yMm = 0, fileAngleDeg = 0): Sweep => ({
  firing,
  xMm,
  yMm,
  fileAngleDeg,
});
const scan = (directionDeg: number, pitch: number) => ({
  directionDeg,
  linePitchMm: pitch,
  alongPitchMm: pitch,
});
const mean = (samples: ArrayLike<number>): number =>
  Array.from(samples).reduce((sum, v) => sum + v, 0) / samples.length / 65_535;

describe('one fired pixel', () => {
  test('pulsed it marks the spot, swept a stadium', () => {
    const pulsed = firedSpot(round(0.1), sweep('pulsed', 0.1));
    const swept = firedSpot(round(0.1), sweep('swept', 0.1));
    expect([pulsed(0.049, 0), pulsed(0.051, 0), pulsed(0, 0.049), pulsed(0.04, 0.04)]).toEqual([
      true,
      false,
      true,
      false,
    ]);
    expect([swept(0.099, 0), swept(0.101, 0), swept(0.05, 0.049), swept(0.05, 0.051)]).toEqual([
      true,
      false,
      true,
      false,
    ]);
  });

  test('a rectangle keeps its corners, swept along and across', () => {
    const spot: Spot = { widthMm: 0.06, heightMm: 0.1, shape: 'rectangle' };
    const along = firedSpot(spot, sweep('swept', 0.1));
    expect([along(0.079, 0.049), along(0.081, 0), along(0, 0.051)]).toEqual([true, false, false]);
    const down = firedSpot(spot, sweep('swept', 0, 0.1));
    expect([down(0.029, 0.099), down(0.031, 0), down(0, 0.101)]).toEqual([true, false, false]);
  });

  test('the spot keeps to the machine whatever the scan direction', () => {
    const tall: Spot = { widthMm: 0.02, heightMm: 0.2, shape: 'ellipse' };
    const turned = firedSpot(tall, sweep('pulsed', 0, 0, 90));
    // The file's X runs along the machine's Y.
    expect([turned(0.09, 0), turned(0, 0.09)]).toEqual([true, false]);
  });

  test.each([
    [0.1, 'pulsed', { x: 0, y: 0 }],
    [0.1, 'swept', { x: 1, y: 0 }],
    [0.2, 'pulsed', { x: 1, y: 1 }],
    [0.2, 'swept', { x: 1, y: 1 }],
    [0.31, 'pulsed', { x: 2, y: 2 }],
  ] as const)('a round spot of %d on 0.1 mm, %s, reaches %o', (mm, firing, reach) => {
    const found = reachPx(round(mm), sweep(firing, 0.1), 0.1, 0.1);
    expect(found.y).toBe(reach.y);
    expect(found.x).toBeLessThanOrEqual(Math.max(reach.x, 1));
  });
});

describe('share of a picture that is marked', () => {
  const frame = scanFrame(1.6, 1.2, scan(0, 0.1));
  const size = { columns: 32, rows: 24, widthMm: 1.6, heightMm: 1.2 };
  const all = maskOf(Array<string>(12).fill('#'.repeat(16)), 0.1);
  const none = maskOf(Array<string>(12).fill('.'.repeat(16)), 0.1);

  test('nothing fired marks nothing; everything fired, swept, marks everything', () => {
    expect(mean(markedShare(none, frame, round(0.1), 'swept', size).data)).toBe(0);
    const full = markedShare(all, frame, round(0.15), 'swept', size);
    expect([full.width, full.height]).toEqual([32, 24]);
    expect(mean(full.data)).toBeGreaterThan(0.99);
  });

  test('a dot stands where it was fired', () => {
    const one = maskOf(
      [
        ...Array<string>(5).fill('.'.repeat(16)),
        `${'.'.repeat(11)}#....`,
        ...Array<string>(6).fill('.'.repeat(16)),
      ],
      0.1,
    );
    const { data } = markedShare(one, frame, round(0.1), 'pulsed', size);
    const [brightest] = [...data.keys()].sort((a, b) => data[b] - data[a]);
    expect([Math.floor((brightest % 32) / 2), Math.floor(brightest / 32 / 2)]).toEqual([11, 5]);
    expect(mean(data)).toBeCloseTo((Math.PI / 4) * (1 / 192), 3);
  });

  test('at 90° the beam is swept down the columns', () => {
    const down = scanFrame(1.6, 1.2, scan(90, 0.1));
    const column = maskOf(Array<string>(12).fill(`${'.'.repeat(8)}#${'.'.repeat(7)}`), 0.1);
    const slim: Spot = { widthMm: 0.1, heightMm: 0.02, shape: 'ellipse' };
    const [asRows, asColumns] = [frame, down].map((at) =>
      mean(markedShare(column, at, slim, 'swept', size).data),
    );
    expect(asColumns).toBeCloseTo(1 / 16, 2);
    expect(asRows).toBeLessThan(0.03);
  });

  test('far-reaching spots are asked point by point and mark more', () => {
    const dots = maskOf(
      ['#.......', '........', '........', '........', '....#...', '........', '........', '........'],
      0.1,
    );
    const wide = scanFrame(0.8, 0.8, scan(0, 0.1));
    const picture = { columns: 64, rows: 64, widthMm: 0.8, heightMm: 0.8 };
    const share = mean(markedShare(dots, wide, round(0.4), 'pulsed', picture).data);
    // A whole disc, and a quarter with its share of two sides at the corner.
    expect(share).toBeGreaterThan((1.2 * Math.PI * 0.04) / 0.64);
    expect(share).toBeLessThan((1.7 * Math.PI * 0.04) / 0.64);
  });

  test('by points and by table agree where both apply', () => {
    const mask = maskOf(['#.#..', '.##..', '#...#', '..#..', '#####'], 0.1);
    const small = scanFrame(0.5, 0.5, scan(0, 0.1));
    const byTable = mean(
      markedShare(mask, small, round(0.14), 'pulsed', { columns: 5, rows: 5, widthMm: 0.5, heightMm: 0.5 })
        .data,
    );
    const fired = firedSpot(round(0.14), sweep('pulsed', 0.1));
    const samples: number[] = [];
    coverByPoints(mask, fired, { x: 1, y: 1 }, (shares) => samples.push(...shares));
    expect(Math.abs(mean(samples) - byTable)).toBeLessThan(0.03);
  });

  test('power levels mark in proportion', () => {
    const levels: LevelRaster = {
      kind: 'levels',
      width: 16,
      height: 12,
      data: new Uint8Array(192).fill(127),
      pitchXMm: 0.1,
      pitchYMm: 0.1,
    };
    expect(mean(markedShare(levels, frame, round(0.15), 'swept', size).data)).toBeCloseTo(128 / 255, 2);
  });

  test('a turned frame is shown upright: half burned stays half', () => {
    const turned = scanFrame(10, 10, scan(30, 0.1));
    const half = {
      ...all,
      width: turned.columns,
      height: turned.rows,
      data: new Uint8Array(turned.columns * turned.rows).fill(1),
    };
    const shown = burnedShare(half, turned, { columns: 40, rows: 40, widthMm: 10, heightMm: 10 });
    expect(mean(shown.data)).toBe(1);
  });

  test('what is asked to burn keeps its share', () => {
    const mask = maskOf(['##..', '....', '#.#.', '....'], 0.1);
    const small = scanFrame(0.4, 0.4, scan(0, 0.1));
    for (const columns of [4, 2, 1, 12]) {
      const picture = { columns, rows: columns, widthMm: 0.4, heightMm: 0.4 };
      expect(mean(burnedShare(mask, small, picture).data)).toBeCloseTo(0.25, 3);
    }
  });
});

describe('block means', () => {
  test('of whole and of cut blocks', () => {
    const { sink, means } = blockMeans(3, 3, 2);
    for (const row of [
      [0, 2, 9],
      [4, 6, 5],
      [8, 2, 1],
    ]) {
      sink(Uint16Array.from(row));
    }
    expect([...means.data]).toEqual([3, 7, 5, 1]);
  });
});

describe('picture size', () => {
  test('longest side at most 2400, at most eight pixels to a pitch', () => {
    expect(pictureSize(300, 200, 0.06)).toMatchObject({ columns: 2400, rows: 1600 });
    expect(pictureSize(1, 2, 0.1)).toMatchObject({ columns: 80, rows: 160 });
    expect(pictureSize(3000, 1, 0.1)).toMatchObject({ columns: 2400, rows: 1 });
  });
});
