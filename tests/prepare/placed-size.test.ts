import { expect, test } from 'vitest';
import type { Artwork, RasterArtwork } from '../../src/lib/prepare/artwork';
import { FALLBACK_WIDTH_MM, placedSize, type AskedSize } from '../../src/lib/prepare/placed-size';

const facts = {
  sha256: '0'.repeat(64),
  bytes: 1,
  format: 'png' as const,
  kind: 'raster' as const,
  widthPx: 300,
  heightPx: 200,
  ownWidthMm: null,
  ownHeightMm: null,
  remarks: [],
};
const picture: RasterArtwork = {
  kind: 'raster',
  facts,
  widthPx: 300,
  heightPx: 200,
  luminance: new Uint16Array(60_000),
};
const scanned: RasterArtwork = { ...picture, facts: { ...facts, ownWidthMm: 40, ownHeightMm: 40 } };
const drawing: Artwork = {
  kind: 'vector',
  facts: { ...facts, format: 'svg', kind: 'vector', ownWidthMm: 80, ownHeightMm: 20 },
  svg: new Uint8Array(),
  aspect: 4,
  missingFonts: [],
  removed: [],
};
const ask = (asked: Partial<AskedSize>): AskedSize => ({
  widthMm: null,
  heightMm: null,
  quarterTurns: 0,
  ...asked,
});

test.each([
  ['width alone', picture, ask({ widthMm: 60 }), 60, 40],
  ['height alone', picture, ask({ heightMm: 40 }), 60, 40],
  ['both, out of proportion', picture, ask({ widthMm: 60, heightMm: 10 }), 60, 10],
  ['a quarter turn', picture, ask({ widthMm: 60, quarterTurns: 1 }), 60, 90],
  ['a half turn', picture, ask({ widthMm: 60, quarterTurns: 2 }), 60, 40],
  ['neither and no size of its own', picture, ask({}), FALLBACK_WIDTH_MM, FALLBACK_WIDTH_MM / 1.5],
  ['pixels that are not square', scanned, ask({ widthMm: 10 }), 10, 10],
  ['neither, but a size of its own', drawing, ask({}), 80, 20],
  ['its own size, turned', drawing, ask({ quarterTurns: 3 }), 20, 80],
])('%s', (_name, artwork, asked, widthMm, heightMm) => {
  const placed = placedSize(artwork, asked);
  expect(placed.widthMm).toBeCloseTo(widthMm, 9);
  expect(placed.heightMm).toBeCloseTo(heightMm, 9);
});

test.each([0, -1, Number.NaN])('a side of %s is refused', (side) => {
  expect(() => placedSize(picture, ask({ widthMm: side }))).toThrow(RangeError);
  expect(() => placedSize(picture, ask({ heightMm: side }))).toThrow(RangeError);
});
