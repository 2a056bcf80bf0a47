import { describe, expect, test } from 'vitest';
import fc from 'fast-check';
import { bayerRanks } from '../../../src/lib/prepare/screen/bayer';
import { diffuse } from '../../../src/lib/prepare/screen/diffuse';
import { evenGrainRanks } from '../../../src/lib/prepare/screen/even-grain';
import { FLOYD_STEINBERG, JARVIS_JUDICE_NINKE, STUCKI } from '../../../src/lib/prepare/screen/kernels';
import { screen } from '../../../src/lib/prepare/screen/screen';
import { screenWhole, type Screener } from '../../../src/lib/prepare/screen/screener';
import { twoLevels } from '../../../src/lib/prepare/screen/two-levels';
import { SCREEN_NAMES, type ScreenName } from '../../../src/lib/prepare/settings';

const halftone = (name: ScreenName, width: number): Screener =>
  screen({ treatment: 'halftone', screen: name, dividingLstar: 53.4 }, width);
const mean = (dots: ArrayLike<number>): number =>
  Array.from(dots).reduce((sum, dot) => sum + dot, 0) / dots.length;
const SIZES = [
  [1, 1],
  [1, 9],
  [9, 1],
  [2, 2],
  [7, 5],
  [16, 16],
  [33, 21],
];

describe.each(SCREEN_NAMES)('%s', (name) => {
  test.each(SIZES)('%i × %i: all untouched stays untouched, all burned stays burned', (width, height) => {
    expect(mean(screenWhole(halftone(name, width), new Float32Array(width * height)))).toBe(0);
    expect(mean(screenWhole(halftone(name, width), new Float32Array(width * height).fill(1)))).toBe(1);
  });

  test('keeps the mean burn of any picture of some size', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 64, max: 100 }),
        fc.integer({ min: 64, max: 100 }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (width, height, from, to) => {
          const burn = Float32Array.from(
            { length: width * height },
            (_, i) => from + ((to - from) * (i % width)) / width,
          );
          expect(Math.abs(mean(screenWhole(halftone(name, width), burn)) - mean(burn))).toBeLessThan(0.02);
        },
      ),
      { numRuns: 20 },
    );
  });

  test('bands of any height give the same dots as the whole', () => {
    const [width, height] = [23, 31];
    const burn = Float32Array.from({ length: width * height }, (_, i) => ((i * 7919) % 1000) / 1000);
    const whole = screenWhole(halftone(name, width), burn);
    for (const rows of [1, 2, 5, 30]) {
      const screener = halftone(name, width);
      const dots = new Uint8Array(burn.length);
      let at = 0;
      for (let row = 0; row < height; row += rows) {
        at = screener.push(burn.subarray(row * width, Math.min(height, row + rows) * width), dots, at);
      }
      expect(screener.end(dots, at)).toBe(dots.length);
      expect(dots).toEqual(whole);
    }
  });

  test('gives the same dots every time', () => {
    const burn = new Float32Array(900).fill(0.3);
    expect(screenWhole(halftone(name, 30), burn)).toEqual(screenWhole(halftone(name, 30), burn));
  });
});

describe('error diffusion', () => {
  test.each([FLOYD_STEINBERG, JARVIS_JUDICE_NINKE, STUCKI])(
    'hands on all of the error',
    ({ divisor, taps }) => {
      expect(taps.reduce((sum, { weight }) => sum + weight, 0)).toBe(divisor);
    },
  );

  test('Floyd–Steinberg written out equals the kernel taken tap by tap', () => {
    const [width, height] = [37, 29];
    const burn = Float64Array.from({ length: width * height }, (_, i) => ((i * 104_729) % 997) / 997);
    const copy = { ...FLOYD_STEINBERG };
    for (const travel of ['serpentine', 'left-to-right'] as const) {
      expect(screenWhole(diffuse(FLOYD_STEINBERG, width, travel), burn)).toEqual(
        screenWhole(diffuse(copy, width, travel), burn),
      );
    }
  });

  test('refuses a width of none', () => expect(() => diffuse(FLOYD_STEINBERG, 0)).toThrow(RangeError));
});

describe('squares of ranks', () => {
  test.each([2, 4, 8, 16, 32, 64])('Bayer %i holds each rank once', (size) => {
    expect(new Set(bayerRanks(size).ranks).size).toBe(size * size);
  });
  test.each([0, 1, 3, 256])('Bayer refuses %i', (size) => expect(() => bayerRanks(size)).toThrow(RangeError));

  test.each([8, 33, 64, 128])('even grain %i holds each rank once', (size) => {
    const { ranks } = evenGrainRanks(size);
    expect(new Set(ranks).size).toBe(size * size);
    expect(Math.max(...ranks)).toBe(size * size - 1);
  });

  test('even grain sets its first dots far apart, across the edges too', () => {
    const size = 64;
    const { ranks } = evenGrainRanks(size);
    const places = [...ranks.keys()].filter((place) => ranks[place] < 41);
    const apart = (a: number, b: number): number => Math.min(Math.abs(a - b), size - Math.abs(a - b));
    for (const a of places) {
      for (const b of places) {
        if (a === b) continue;
        // 41 dots on 64 × 64, evenly set, stand some 10 apart.
        expect(
          Math.hypot(apart(a % size, b % size), apart(Math.floor(a / size), Math.floor(b / size))),
        ).toBeGreaterThan(5);
      }
    }
  });

  test('even grain is made once', () => expect(evenGrainRanks(64)).toBe(evenGrainRanks(64)));
  test.each([7, 129, 8.5])('even grain refuses %d', (size) =>
    expect(() => evenGrainRanks(size)).toThrow(RangeError),
  );
});

describe('two levels and none', () => {
  test('the default dividing level burns what black covers by more than half', () => {
    expect([...screenWhole(twoLevels(53.4), Float32Array.of(0, 0.49, 0.51, 1))]).toEqual([0, 0, 1, 1]);
  });

  test('a higher level burns lighter parts', () => {
    expect([...screenWhole(twoLevels(80), Float32Array.of(0.1, 0.3, 0.9))]).toEqual([0, 1, 1]);
  });

  test('linework and solid part in two; continuous tone keeps levels', () => {
    const burn = Float32Array.of(0, 0.4, 1);
    const through = (treatment: 'linework' | 'solid' | 'continuous') => [
      ...screenWhole(screen({ treatment, screen: 'even-grain', dividingLstar: 53.4 }, 3), burn),
    ];
    expect(through('linework')).toEqual([0, 0, 1]);
    expect(through('solid')).toEqual([0, 0, 1]);
    expect(through('continuous')).toEqual([255, 153, 0]);
  });
});
