import { describe, expect, test } from 'vitest';
import { closedLoops, type ClosedLoop } from '../../src/lib/imaging/closed-loops';
import { contourOf } from '../../src/lib/imaging/contour';
import { divide } from '../../src/lib/imaging/field';
import { asBytes, bar, coverageOf, disc, hole, type Polygon } from '../drawn/coverage';

function loops(polygons: readonly Polygon[], maxPieces = 200, size = 60): ClosedLoop[] {
  const field = { width: size, height: size, data: asBytes(coverageOf(size, size, polygons)) };
  return closedLoops(contourOf(field, divide(field, 127.5), 127.5), maxPieces);
}

describe('closedLoops', () => {
  test.each([4, 6, 9, 14])('a disc of %s px: area, extent and place', (diameter) => {
    const [only, ...others] = loops([disc(30.3, 28.6, diameter)]);
    expect(others).toEqual([]);
    expect(Math.abs(only.areaPx2 / ((Math.PI / 4) * diameter ** 2) - 1)).toBeLessThan(0.05);
    expect(only.longestPx).toBeCloseTo(diameter, 0);
    expect((only.left + only.right) / 2).toBeCloseTo(30.3, 1);
    expect((only.top + only.bottom) / 2).toBeCloseTo(28.6, 1);
  });

  test('a hole has an area under 0', () => {
    const found = loops([disc(30, 30, 40), hole(disc(30, 30, 8))], 60);
    expect(found).toHaveLength(1);
    expect(found[0].areaPx2).toBeLessThan(-40);
  });

  test('the longest extent of a bar lies along it', () => {
    const [only] = loops([bar(30, 30, 20, 4, 45)]);
    expect(only.longestRad).toBeCloseTo(Math.PI / 4, 6);
    // A rectangle's corners reach a little farther than its ends, less what the pixels cut off them.
    expect(Math.abs(only.longestPx - 20)).toBeLessThan(1);
  });

  test('lines longer than asked for are left out', () => {
    expect(loops([disc(30, 30, 40)], 50)).toEqual([]);
    expect(loops([disc(30, 30, 40)], 500)).toHaveLength(1);
  });

  test('a line that runs off the field is not closed', () => {
    expect(loops([bar(0, 30, 40, 6, 0)])).toEqual([]);
  });

  test('nothing gives nothing, and a limit under 1 is refused', () => {
    expect(loops([])).toEqual([]);
    expect(() => loops([], 0)).toThrow(RangeError);
  });
});
