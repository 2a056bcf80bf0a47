import { describe, expect, test } from 'vitest';
import { contourOf, firstPieceFrom, type Contour } from '../../src/lib/imaging/contour';
import { divide, type Field } from '../../src/lib/imaging/field';
import { asBytes, bar, coverageOf, disc } from '../drawn/coverage';

const LEVEL = 127.5;
const contour = (field: Field): Contour => contourOf(field, divide(field, LEVEL), LEVEL);

const rows = (...lines: string[]): Field => ({
  width: lines[0].length,
  height: lines.length,
  data: Uint8Array.from(lines.join(''), (c) => (c === '#' ? 255 : 0)),
});

/** Area to one side of closed lines: above 0 around islands. */
function area({ count, points }: Contour): number {
  let twice = 0;
  for (let n = 0; n < count; n++) {
    twice += points[n * 4] * points[n * 4 + 3] - points[n * 4 + 2] * points[n * 4 + 1];
  }
  return -twice / 2;
}

describe('contourOf', () => {
  test.each([
    ['1 × 1', rows('#')],
    ['1 × n', rows('#.#')],
    ['all 0', rows('....', '....', '....')],
    ['all 1', rows('####', '####', '####')],
  ])('%s has none', (_name, field) => {
    expect(contour(field).count).toBe(0);
  });

  test('goes round an island one way and round a hole the other', () => {
    expect(area(contour(rows('.....', '.....', '..#..', '.....', '.....')))).toBeGreaterThan(0);
    expect(area(contour(rows('#####', '#####', '##.##', '#####', '#####')))).toBeLessThan(0);
  });

  test('two pixels that touch at a corner are joined only where their mean reaches the level', () => {
    const touching = contour(rows('....', '.#..', '..#.', '....'));
    expect(touching.count).toBe(8);
    const joined = { ...rows('....', '.#..', '..#.', '....') };
    joined.data[1 * 4 + 2] = 120;
    joined.data[2 * 4 + 1] = 120;
    expect(contour(joined).count).toBeGreaterThan(0);
  });

  test('a straight edge at any angle and offset lies where it was drawn', () => {
    for (let deg = 0; deg < 180; deg += 7.5) {
      for (const offset of [0, 0.25, 0.5, 0.81]) {
        const field = {
          width: 40,
          height: 40,
          data: asBytes(coverageOf(40, 40, [bar(20 + offset, 20, 200, 12, deg)])),
        };
        const { count, points } = contour(field);
        const a = (deg * Math.PI) / 180;
        for (let n = 0; n < count; n++) {
          const [x, y] = [points[n * 4], points[n * 4 + 1]];
          if (Math.hypot(x - 20, y - 20) > 14) continue;
          const beside = Math.abs(-(x - 20 - offset) * Math.sin(a) + (y - 20) * Math.cos(a));
          expect(Math.abs(beside - 6)).toBeLessThan(0.03);
        }
      }
    }
  });

  test('grey ink on white has the same edge as black ink', () => {
    const black = asBytes(coverageOf(40, 40, [bar(20.3, 20, 200, 12, 0)]));
    const field = { width: 40, height: 40, data: black.map((v) => Math.round(v * 0.7)) };
    const { count, points } = contour(field);
    for (let n = 0; n < count; n++) {
      // The outermost columns have no neighbours to tell the grey by.
      if (Math.abs(points[n * 4] - 20) < 17)
        expect(Math.abs(Math.abs(points[n * 4 + 1] - 20) - 6)).toBeLessThan(0.03);
    }
  });

  test('the area of a disc is right to one per cent', () => {
    const field = { width: 30, height: 30, data: asBytes(coverageOf(30, 30, [disc(14.7, 15.2, 17)])) };
    expect(area(contour(field)) / (Math.PI * 8.5 ** 2)).toBeCloseTo(1, 2);
  });
});

describe('firstPieceFrom', () => {
  test('finds the first piece of a row from a column on', () => {
    const found = contour(rows('..........', '.##....##.', '..........'));
    const first = firstPieceFrom(found, 0, 5);
    expect(found.column[first]).toBe(6);
    expect(firstPieceFrom(found, 0, 100)).toBe(found.rowStart[1]);
  });
});
