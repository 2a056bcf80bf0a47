import type { MaskRaster } from '../../imaging/raster';
import type { CoverTable } from './cover-table';

/** Takes one row of marked shares, 0–65535. */
export type RowSink = (shares: Uint16Array) => void;

const FULL_MARK = 511;

/** Patterns of one row: for each pixel which of the nine pixels around fire; `empty` stands for rows beyond the mask. */
function patternsOf(
  { width, height, data }: MaskRaster,
  row: number,
  empty: Uint8Array,
  into: Uint16Array,
): void {
  const own = data.subarray(row * width, (row + 1) * width);
  const above = row > 0 ? data.subarray((row - 1) * width, row * width) : empty;
  const below = row + 1 < height ? data.subarray((row + 1) * width, (row + 2) * width) : empty;
  let pattern = (above[0] | (own[0] << 1) | (below[0] << 2)) << 6;
  for (let x = 0, next = 1; next < width; x++, next++) {
    pattern = (pattern >> 3) | ((above[next] | (own[next] << 1) | (below[next] << 2)) << 6);
    into[x] = pattern;
  }
  into[width - 1] = pattern >> 3;
}

/** Shares of one row of parts of each pixel, looked up by pattern. */
function lookUp(patterns: Uint16Array, { parts, shares }: CoverTable, part: number, line: Uint16Array): void {
  if (parts === 1) {
    for (let x = 0; x < patterns.length; x++) line[x] = shares[patterns[x]];
    return;
  }
  for (let x = 0, to = 0; x < patterns.length; x++) {
    const from = (patterns[x] * parts + part) * parts;
    for (let i = 0; i < parts; i++) line[to++] = shares[from + i];
  }
}

/**
 * Marked shares of a mask, row by row, each pixel in table.parts × table.parts of them.
 * @param mask 1 burned; unchanged
 * @param table shares by pattern; unchanged
 * @param sink takes height × parts rows of width × parts shares; the array is filled again afterwards
 */
export function coverByTable(mask: MaskRaster, table: CoverTable, sink: RowSink): void {
  const patterns = new Uint16Array(mask.width);
  const empty = new Uint8Array(mask.width);
  const line = new Uint16Array(mask.width * table.parts);
  for (let row = 0; row < mask.height; row++) {
    patternsOf(mask, row, empty, patterns);
    for (let part = 0; part < table.parts; part++) {
      lookUp(patterns, table, part, line);
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
