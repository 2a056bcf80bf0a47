import { describe, expect, test } from 'vitest';
import { MAX_PASS_PX, passFrames } from '../../../src/lib/prepare/resample/pass-frames';

const pitch = (mm: number) => ({ linePitchMm: mm, alongPitchMm: mm });
const asked = {
  widthMm: 300,
  heightMm: 200,
  scan: { directionDeg: 0, ...pitch(0.06) },
  perpendicular: pitch(0.1),
  treatment: 'halftone',
} as const;

describe('frames of all passes', () => {
  test('the main one and the perpendicular one', () => {
    const frames = passFrames(asked);
    expect(frames.map(({ columns, rows, directionDeg }) => [columns, rows, directionDeg])).toEqual([
      [5000, 3333, 0],
      [3000, 2000, 90],
    ]);
  });
  test('one where none is asked across, or lines are followed', () => {
    expect(passFrames({ ...asked, perpendicular: null })).toHaveLength(1);
    expect(passFrames({ ...asked, treatment: 'linework' })).toHaveLength(1);
  });
  test('what would not fit is refused with what to do, whichever pass it is', () => {
    const large = { ...asked, widthMm: 3000, heightMm: 3000 };
    expect(3000 * 3000 * 100).toBeGreaterThan(MAX_PASS_PX);
    expect(() => passFrames({ ...large, perpendicular: null })).toThrow(/wider pitch/);
    expect(() => passFrames({ ...large, scan: { directionDeg: 0, ...pitch(0.5) } })).toThrow(/30000 × 30000/);
  });
});
