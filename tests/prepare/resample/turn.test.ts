import { describe, expect, test } from 'vitest';
import type { RasterArtwork } from '../../../src/lib/prepare/artwork';
import { turn, turnArtwork } from '../../../src/lib/prepare/resample/turn';

// 1 2 3
// 4 5 6
const GREY = { width: 3, height: 2, data: Uint16Array.of(1, 2, 3, 4, 5, 6) };

describe('quarter turns', () => {
  test.each([
    [0, 3, [1, 2, 3, 4, 5, 6]],
    [1, 2, [4, 1, 5, 2, 6, 3]],
    [2, 3, [6, 5, 4, 3, 2, 1]],
    [3, 2, [3, 6, 2, 5, 1, 4]],
  ] as const)('%i clockwise', (turns, width, samples) => {
    const turned = turn(GREY, turns);
    expect(turned.width).toBe(width);
    expect([...turned.data]).toEqual(samples);
    expect([...GREY.data]).toEqual([1, 2, 3, 4, 5, 6]);
  });

  test('an artwork’s own size turns with it', () => {
    const facts = {
      sha256: '',
      bytes: 1,
      format: 'png',
      kind: 'raster',
      widthPx: 3,
      heightPx: 2,
      ownWidthMm: 30,
      ownHeightMm: 20,
      remarks: [],
    } as const;
    const artwork: RasterArtwork = {
      kind: 'raster',
      facts: { ...facts, remarks: [] },
      widthPx: 3,
      heightPx: 2,
      luminance: GREY.data,
    };
    expect(turnArtwork(artwork, 1)).toMatchObject({
      widthPx: 2,
      heightPx: 3,
      facts: { widthPx: 2, ownWidthMm: 20, ownHeightMm: 30 },
    });
    expect(turnArtwork(artwork, 2)).toMatchObject({ widthPx: 3, facts: { ownWidthMm: 30 } });
    expect(turnArtwork(artwork, 0)).toBe(artwork);
  });
});
