import type { MaskRaster } from '../../imaging/raster';
import type { CoverTable } from './cover-table';

/** Takes one row of marked shares, 0–65535. */
export type RowSink = (shares: Uint16Array) => void;

const FULL_MARK = 511;

/** Patterns of one row: for each pixel which of the nine pixels around it fire. */
function patternsOf(mask: MaskRaster, row: number, into: Uint16Array): void {
  const { width, height, data } = mask;
  const own = row * width;
  const above = row > 0 ? own - width : -1;
  const below = row + 1 < height ? own + width : -1;
  const columnAt = (x: number): number =>
    (above >= 0 ? data[above + x] : 0) | (data[own + x] << 1) | (below >= 0 ? data[below + x] << 2 : 0);
  let pattern = columnAt(0) << 6;
  for (let x = 0; x < width; x++) {
    pattern = (pattern >> 3) | (x + 1 < width ? columnAt(x + 1) << 6 : 0);
    into[x] = pattern;
  }
}

/**
 * Marked shares of a mask, row by row, each pixel in table.parts × table.parts of them.
 * @param mask 1 burned; unchanged
 * @param table shares by pattern; unchanged
 * @param sink takes height × parts rows of width × parts shares; the array is filled again afterwards
 */
export function coverByTable(mask: MaskRaster, { parts, shares }: CoverTable, sink: RowSink): void {
  const patterns = new Uint16Array(mask.width);
  const line = new Uint16Array(mask.width * parts);
  for (let row = 0; row < mask.height; row++) {
    patternsOf(mask, row, patterns);
    for (let part = 0; part < parts; part++) {
      for (let x = 0, to = 0; x < patterns.length; x++) {
        const from = (patterns[x] * parts + part) * parts;
        for (let i = 0; i < parts; i++) line[to++] = shares[from + i];
      }
      sink(line);
    }
  }
}

/**
 * Marked shares of power levels, row by row: burn times what a field of fired pixels covers of each part.
 * @param levels 255·(1 − burn), row-major; unchanged
 * @param width pixels a row
 */
export function coverByLevels(
  levels: Uint8Array,
  width: number,
  { parts, shares }: CoverTable,
  sink: RowSink,
): void {
  const line = new Uint16Array(width * parts);
  for (let start = 0; start < levels.length; start += width) {
    for (let part = 0; part < parts; part++) {
      const from = (FULL_MARK * parts + part) * parts;
      for (let x = 0, to = 0; x < width; x++) {
        const burn = (255 - levels[start + x]) / 255;
        for (let i = 0; i < parts; i++) line[to++] = shares[from + i] * burn;
      }
      sink(line);
    }
  }
}
