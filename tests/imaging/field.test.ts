import { describe, expect, test } from 'vitest';
import { assertField, blocksNearEdges, divide, type Field } from '../../src/lib/imaging/field';

/** A field drawn as rows of `.` and `#`. */
export const drawn = (...rows: string[]): Field => ({
  width: rows[0].length,
  height: rows.length,
  data: Uint8Array.from(rows.join(''), (c) => (c === '#' ? 255 : 0)),
});

describe('assertField', () => {
  test.each([
    [0, 1, 0],
    [1.5, 2, 3],
    [2, 2, 3],
  ])('refuses %s × %s with %s samples', (width, height, samples) => {
    expect(() => assertField({ width, height, data: new Uint8Array(samples) })).toThrow(RangeError);
  });
});

describe('divide', () => {
  test('a sample above the level is inside, one at or under it is not', () => {
    const field = { width: 3, height: 1, data: Uint8Array.of(127, 128, 129) };
    expect([...divide(field, 127.5).inside]).toEqual([0, 1, 1]);
    expect([...divide(field, 128).inside]).toEqual([0, 0, 1]);
  });

  test.each([
    ['all 0', drawn('...', '...'), 0],
    ['all 1', drawn('###', '###'), 0],
    ['one pixel', drawn('...', '.#.'), 1],
  ])('%s', (_name, field, edges) => {
    expect([...divide(field, 127.5).edgeBlocks]).toEqual([edges]);
  });

  test('an edge between two blocks is noted in both', () => {
    const field = {
      width: 48,
      height: 16,
      data: new Uint8Array(48 * 16).map((_, i) => (i % 48 < 16 ? 255 : 0)),
    };
    const division = divide(field, 127.5);
    expect([...division.edgeBlocks]).toEqual([1, 1, 0]);
    expect([...blocksNearEdges(division)]).toEqual([1, 1, 1]);
  });
});
