import { describe, expect, test } from 'vitest';
import { dropIslands } from '../../../src/lib/prepare/trace/drop-islands';

const mask = (rows: string[]): Uint8Array => Uint8Array.from(rows.join(''), (mark) => (mark === '#' ? 1 : 0));
const rowsOf = (data: Uint8Array, width: number): string[] =>
  Array.from({ length: data.length / width }, (_, row) =>
    Array.from(data.subarray(row * width, (row + 1) * width), (value) => (value === 1 ? '#' : '.')).join(''),
  );

describe('dropIslands', () => {
  const picture = ['#.....###', '......#.#', '..##..###', '..##.....', '....#....'];

  test('islands and holes up to the limit go, larger ones stay', () => {
    const data = mask(picture);
    expect(dropIslands(data, 9, 5, 1)).toEqual({ islands: 1, holes: 1 });
    expect(rowsOf(data, 9)).toEqual(['......###', '......###', '..##..###', '..##.....', '....#....']);
  });

  test('dark parts hold together over corners, light ones do not', () => {
    const data = mask(['#..', '.#.', '..#']);
    expect(dropIslands(data, 3, 3, 2).islands).toBe(0);
    const holes = mask(['#####', '#.###', '##.##', '#####']);
    expect(dropIslands(holes, 5, 4, 1)).toEqual({ islands: 0, holes: 2 });
  });

  test.each([0, 0.5, -1])('a limit of %d drops nothing', (limit) => {
    const data = mask(picture);
    expect(dropIslands(data, 9, 5, limit)).toEqual({ islands: 0, holes: 0 });
    expect(rowsOf(data, 9)).toEqual(picture);
  });

  test('all dark and all light stay as they are, also 1 × 1', () => {
    for (const mark of ['#', '.']) {
      const data = mask([mark]);
      expect(dropIslands(data, 1, 1, 100)).toEqual({ islands: 0, holes: 0 });
      expect(rowsOf(data, 1)).toEqual([mark]);
    }
  });
});
