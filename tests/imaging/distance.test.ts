import fc from 'fast-check';
import { describe, expect, test } from 'vitest';
import { cappedDistance, squaredDistance } from '../../src/lib/imaging/distance';
import { divide } from '../../src/lib/imaging/field';

/** The definition, pixel by pixel. */
function nearest(
  mask: Uint8Array,
  width: number,
  height: number,
  other: (i: number) => boolean,
  i: number,
): number {
  let best = Infinity;
  for (let j = 0; j < width * height; j++) {
    if (other(j))
      best = Math.min(
        best,
        ((i % width) - (j % width)) ** 2 + (Math.floor(i / width) - Math.floor(j / width)) ** 2,
      );
  }
  return best;
}

const pictures = fc
  .tuple(fc.integer({ min: 1, max: 14 }), fc.integer({ min: 1, max: 14 }))
  .chain(([width, height]) =>
    fc.record({
      width: fc.constant(width),
      height: fc.constant(height),
      mask: fc
        .array(fc.constantFrom(0, 1), { minLength: width * height, maxLength: width * height })
        .map((list) => Uint8Array.from(list)),
    }),
  );

describe('squaredDistance', () => {
  test('is the nearest zero pixel, whatever the picture', () => {
    fc.assert(
      fc.property(pictures, ({ width, height, mask }) => {
        const got = squaredDistance(mask, width, height);
        for (let i = 0; i < mask.length; i++) {
          expect(got[i]).toBe(nearest(mask, width, height, (j) => mask[j] === 0, i));
        }
      }),
      { numRuns: 60 },
    );
  });

  test.each([
    ['1 × 1 of 0', [0], 1, 1, [0]],
    ['1 × 1 of 1', [1], 1, 1, [Infinity]],
    ['all ones', [1, 1, 1, 1], 2, 2, [Infinity, Infinity, Infinity, Infinity]],
    ['a row', [0, 1, 1], 3, 1, [0, 1, 4]],
    ['a column', [1, 1, 0], 1, 3, [4, 1, 0]],
  ])('%s', (_name, mask, width, height, expected) => {
    expect([...squaredDistance(Uint8Array.from(mask), width, height)]).toEqual(expected);
  });

  test('refuses a mask of another size', () => {
    expect(() => squaredDistance(new Uint8Array(3), 2, 2)).toThrow(RangeError);
  });

  test('leaves the mask as it was', () => {
    const mask = Uint8Array.of(0, 1, 1, 0);
    squaredDistance(mask, 2, 2);
    expect([...mask]).toEqual([0, 1, 1, 0]);
  });
});

describe('cappedDistance', () => {
  test('is the nearest pixel of the other class up to the cap', () => {
    fc.assert(
      fc.property(pictures, fc.integer({ min: 1, max: 15 }), ({ width, height, mask }, cap) => {
        const division = divide({ width, height, data: mask.map((v) => v * 255) }, 127.5);
        const got = cappedDistance(division, cap);
        for (let i = 0; i < mask.length; i++) {
          const exact = nearest(mask, width, height, (j) => mask[j] !== mask[i], i);
          expect(got[i]).toBe(Math.min(cap * cap, exact));
        }
      }),
      { numRuns: 60 },
    );
  });

  test('holds across the blocks in which a picture is looked over', () => {
    const width = 70;
    const height = 50;
    const data = new Uint8Array(width * height);
    for (const [x, y] of [
      [33, 20],
      [15, 15],
      [16, 32],
      [69, 49],
    ])
      data[y * width + x] = 255;
    const got = cappedDistance(divide({ width, height, data }, 127.5), 9);
    const exact = squaredDistance(
      data.map((v) => (v ? 0 : 1)),
      width,
      height,
    );
    for (let i = 0; i < data.length; i++) if (!data[i]) expect(got[i]).toBe(Math.min(81, exact[i]));
  });

  test.each([0, 16, 2.5])('refuses a cap of %s', (cap) => {
    const division = divide({ width: 1, height: 1, data: Uint8Array.of(0) }, 127.5);
    expect(() => cappedDistance(division, cap)).toThrow(RangeError);
  });
});
