import { pitchToPxPerMetre } from '../../units';
import type { MarkRaster } from '../mark-raster';
import { packBits } from './pack-bits';

const HEADERS = 54;

/** Rows from the top down to rows from the bottom up, as BMP keeps them. */
function bottomUp(rows: Uint8Array, strideBytes: number): Uint8Array {
  const turned = new Uint8Array(rows.length);
  for (let from = 0; from < rows.length; from += strideBytes) {
    turned.set(rows.subarray(from, from + strideBytes), rows.length - from - strideBytes);
  }
  return turned;
}

function paddedRows({ width, height, data }: MarkRaster, strideBytes: number): Uint8Array {
  const rows = new Uint8Array(height * strideBytes);
  for (let row = 0; row < height; row++)
    rows.set(data.subarray(row * width, (row + 1) * width), row * strideBytes);
  return rows;
}

/**
 * An uncompressed BMP of what one pass marks: 1 bit for dots, 8 bit for power levels, with a palette of greys, sample 0
 * black and burned. The header carries the pitch in whole pixels per metre.
 * @param marks dots or levels; unchanged
 * @returns the bytes of the file, the same for the same marks
 * @example a mask at 0.05 mm holds 20000 at offsets 38 and 42
 * @see Windows bitmap: BITMAPFILEHEADER, BITMAPINFOHEADER
 */
export function writeBmp(marks: MarkRaster): Uint8Array {
  const { width, height, pitchXMm, pitchYMm } = marks;
  const bits = marks.kind === 'mask' ? 1 : 8;
  const colours = 2 ** bits;
  const stride = Math.ceil((width * bits) / 32) * 4;
  const start = HEADERS + 4 * colours;
  const file = new Uint8Array(start + stride * height);
  const view = new DataView(file.buffer);
  file.set([0x42, 0x4d]);
  view.setUint32(2, file.length, true);
  view.setUint32(10, start, true);
  view.setUint32(14, 40, true);
  view.setInt32(18, width, true);
  view.setInt32(22, height, true);
  view.setUint16(26, 1, true);
  view.setUint16(28, bits, true);
  view.setUint32(34, stride * height, true);
  view.setInt32(38, pitchToPxPerMetre(pitchXMm), true);
  view.setInt32(42, pitchToPxPerMetre(pitchYMm), true);
  view.setUint32(46, colours, true);
  for (let i = 0; i < colours; i++)
    file.fill((255 * i) / (colours - 1), HEADERS + 4 * i, HEADERS + 4 * i + 3);
  const rows = marks.kind === 'mask' ? packBits(marks, stride, 0) : paddedRows(marks, stride);
  file.set(bottomUp(rows, stride), start);
  return file;
}
