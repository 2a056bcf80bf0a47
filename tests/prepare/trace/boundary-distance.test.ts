import { describe, expect, test } from 'vitest';
import { boundaryDistance } from '../../../src/lib/prepare/trace/boundary-distance';
import type { Point } from '../../../src/lib/prepare/trace/curve';

const square = (left: number, top: number, size: number): Point[] => [
  [left, top],
  [left + size, top],
  [left + size, top + size],
  [left, top + size],
];
function mask(width: number, height: number, dark: (x: number, y: number) => boolean): Uint8Array {
  return Uint8Array.from({ length: width * height }, (_, n) =>
    dark(n % width, Math.floor(n / width)) ? 1 : 0,
  );
}
const block = mask(40, 40, (x, y) => x >= 10 && x < 30 && y >= 10 && y < 30);

describe('boundaryDistance', () => {
  test('the boundary itself is at no distance', () => {
    expect(boundaryDistance([square(10, 10, 20)], block, 40, 40)).toEqual({ meanPx: 0, hausdorffPx: 0 });
  });

  test('an outline one pixel aside', () => {
    const { meanPx, hausdorffPx } = boundaryDistance([square(11, 10, 20)], block, 40, 40)!;
    expect(hausdorffPx).toBeCloseTo(1, 6);
    expect(meanPx).toBeGreaterThan(0.45);
    expect(meanPx).toBeLessThan(0.6);
  });

  test('one far corner rules the greatest distance, not the mean', () => {
    const spike: Point[] = [
      ...square(10, 10, 20).slice(0, 1),
      [20, 10],
      [20, 3],
      [20.1, 10],
      ...square(10, 10, 20).slice(1),
    ];
    const { meanPx, hausdorffPx } = boundaryDistance([spike], block, 40, 40)!;
    expect(hausdorffPx).toBeCloseTo(7, 1);
    expect(meanPx).toBeLessThan(0.6);
  });

  test('a part that is missing counts from the mask’s side', () => {
    const two = mask(60, 20, (x, y) => y >= 5 && y < 15 && ((x >= 5 && x < 15) || (x >= 45 && x < 55)));
    expect(boundaryDistance([square(5, 5, 10)], two, 60, 20)!.hausdorffPx).toBeCloseTo(40, 0);
  });

  test('nothing has no distance', () => {
    expect(boundaryDistance([], block, 40, 40)).toBe(null);
    expect(boundaryDistance([square(1, 1, 2)], new Uint8Array(100), 10, 10)).toBe(null);
  });

  test('dark up to the edge has its boundary there', () => {
    expect(boundaryDistance([square(0, 0, 1)], Uint8Array.of(1), 1, 1)).toEqual({
      meanPx: 0,
      hausdorffPx: 0,
    });
  });
});
