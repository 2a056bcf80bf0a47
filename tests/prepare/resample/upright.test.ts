import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { resampleWhole, uprightReader, type Grey } from '../../../src/lib/prepare/resample/upright';

const grey = (width: number, height: number, sample: (x: number, y: number) => number): Grey => ({
  width,
  height,
  data: Uint16Array.from({ length: width * height }, (_, i) => sample(i % width, Math.floor(i / width))),
});
const mean = (samples: Uint16Array): number => samples.reduce((sum, y) => sum + y, 0) / samples.length;

describe('upright resampling', () => {
  test('as many pixels as there are gives the picture itself', () => {
    const picture = grey(7, 5, (x, y) => x * 1000 + y);
    expect(resampleWhole(picture, 7, 5, 'linear').data).toEqual(picture.data);
    expect(resampleWhole(picture, 7, 5, 'coverage').data).toEqual(picture.data);
  });

  test('a single pixel covers everything', () => {
    expect(
      new Set(
        resampleWhole(
          grey(1, 1, () => 12_345),
          9,
          4,
          'linear',
        ).data,
      ),
    ).toEqual(new Set([12_345]));
  });

  test.each([
    [300, 2, 7, 7],
    [1, 50_000, 1, 40],
    [50_000, 1, 40, 3],
    [3, 3, 50, 1],
    [2, 9, 5, 4],
  ])('%i × %i to %i × %i keeps a flat field flat', (width, height, columns, rows) => {
    for (const light of ['linear', 'coverage'] as const) {
      for (const level of [0, 1, 777, 40_000, 65_535]) {
        const { data } = resampleWhole(
          grey(width, height, () => level),
          columns,
          rows,
          light,
        );
        expect(data).toHaveLength(columns * rows);
        for (const y of data) expect(Math.abs(y - level)).toBeLessThanOrEqual(light === 'linear' ? 0 : 2);
      }
    }
  });

  test('reducing makes no halo beside an edge', () => {
    const { data } = resampleWhole(
      grey(100, 1, (x) => (x < 47 ? 10_000 : 50_000)),
      31,
      1,
      'linear',
    );
    expect(Math.min(...data)).toBe(10_000);
    expect(Math.max(...data)).toBe(50_000);
  });

  test('enlarging keeps within black and white, and an edge where it was', () => {
    const { data } = resampleWhole(
      grey(10, 1, (x) => (x < 5 ? 0 : 65_535)),
      1000,
      1,
      'coverage',
    );
    const edge = data.findIndex((y) => y > 0.2122 * 65_535);
    expect(Math.abs(edge - 500)).toBeLessThanOrEqual(1);
    expect(Math.min(...data)).toBe(0);
    expect(Math.max(...data)).toBe(65_535);
  });

  test('reducing keeps the mean in linear light', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 40 }),
        fc.integer({ min: 1, max: 40 }),
        fc.integer({ min: 1, max: 3 }),
        fc.nat(),
        (columns, rows, times, seed) => {
          const picture = grey(
            columns * times,
            rows * times,
            (x, y) => ((x * 7919 + y * 104_729 + seed) * 2_654_435_761) % 65_536,
          );
          const { data } = resampleWhole(picture, columns, rows, 'linear');
          expect(Math.abs(mean(data) - mean(picture.data))).toBeLessThan(0.51);
        },
      ),
      { numRuns: 40 },
    );
  });

  test('bands of any height give the same rows as the whole', () => {
    const picture = grey(23, 17, (x, y) => (x * 2851 + y * 7307) % 65_536);
    for (const [columns, rows] of [
      [41, 60],
      [9, 6],
      [30, 5],
      [5, 40],
    ]) {
      const whole = resampleWhole(picture, columns, rows, 'linear').data;
      for (const height of [1, 3, 7]) {
        const read = uprightReader(picture, columns, rows, 'linear');
        const bands: number[] = [];
        for (let band = read(height); band.length > 0; band = read(height)) bands.push(...band);
        expect(bands).toEqual([...whole]);
      }
    }
  });

  test('mirrored pictures give mirrored results', () => {
    const picture = grey(37, 5, (x, y) => (x * 2851 + y * 7307) % 65_536);
    const mirrored = grey(37, 5, (x, y) => picture.data[y * 37 + 36 - x]);
    for (const columns of [90, 20]) {
      const there = resampleWhole(picture, columns, 5, 'linear').data;
      const back = resampleWhole(mirrored, columns, 5, 'linear').data;
      there.forEach((y, i) => {
        const row = Math.floor(i / columns);
        expect(Math.abs(y - back[row * columns + columns - 1 - (i % columns)])).toBeLessThanOrEqual(1);
      });
    }
  });
});
