import { promisify } from 'node:util';
import { crc32, deflate } from 'node:zlib';
import { pitchToPxPerMetre } from '../../units';
import type { MarkRaster } from '../mark-raster';
import { packBits } from './pack-bits';

const deflateAsync = promisify(deflate);
const SIGNATURE = Uint8Array.of(0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a);
/** Row filter that takes the byte above away (ISO/IEC 15948, 9.2): tone packs better by it, dots do not. */
const FILTER_UP = 2;

/** One chunk of a PNG: length, type, data and checksum. */
function chunk(type: string, data: Uint8Array): Uint8Array {
  const bytes = new Uint8Array(data.length + 12);
  const view = new DataView(bytes.buffer);
  view.setUint32(0, data.length);
  for (let i = 0; i < 4; i++) bytes[4 + i] = type.charCodeAt(i);
  bytes.set(data, 8);
  view.setUint32(data.length + 8, crc32(bytes.subarray(4, data.length + 8)));
  return bytes;
}

function header(width: number, height: number, bitDepth: number, colourType: number): Uint8Array {
  const data = new Uint8Array(13);
  const view = new DataView(data.buffer);
  view.setUint32(0, width);
  view.setUint32(4, height);
  data[8] = bitDepth;
  data[9] = colourType;
  return chunk('IHDR', data);
}

function physicalSize(pitchXMm: number, pitchYMm: number): Uint8Array {
  const data = new Uint8Array(9);
  const view = new DataView(data.buffer);
  view.setUint32(0, pitchToPxPerMetre(pitchXMm));
  view.setUint32(4, pitchToPxPerMetre(pitchYMm));
  data[8] = 1;
  return chunk('pHYs', data);
}

/** Rows of one byte a pixel, each under the filter that takes the row above away. */
function filteredRows(width: number, height: number, data: Uint8Array): Uint8Array {
  const rows = new Uint8Array(height * (width + 1));
  for (let row = 0, at = 0, to = 0; row < height; row++) {
    rows[to++] = row === 0 ? 0 : FILTER_UP;
    for (let x = 0; x < width; x++, at++) rows[to++] = row === 0 ? data[at] : data[at] - data[at - width];
  }
  return rows;
}

async function assemble(head: Uint8Array[], rows: Uint8Array, level: number): Promise<Uint8Array> {
  const packed = await deflateAsync(rows, { level, memLevel: 9 });
  return new Uint8Array(
    Buffer.concat([SIGNATURE, ...head, chunk('IDAT', packed), chunk('IEND', new Uint8Array(0))]),
  );
}

/**
 * A greyscale PNG of what one pass marks: colour type 0, 1 bit for dots and 8 bit for power levels, sample 0 burned.
 * pHYs carries the pitch, in whole pixels per metre, in X and Y.
 * @param marks dots or levels; unchanged
 * @returns the bytes of the file, the same for the same marks
 * @example a mask at 0.05 mm gives pHYs 20000 × 20000 per metre
 * @see ISO/IEC 15948:2004
 */
export async function writePng(marks: MarkRaster): Promise<Uint8Array> {
  const { width, height, pitchXMm, pitchYMm } = marks;
  const dots = marks.kind === 'mask';
  const rows = dots ? packBits(marks, Math.ceil(width / 8), 1) : filteredRows(width, height, marks.data);
  return assemble([header(width, height, dots ? 1 : 8, 0), physicalSize(pitchXMm, pitchYMm)], rows, 4);
}

/**
 * A PNG of 8-bit grey, or of colours out of a palette, for pictures that people look at.
 * @param width columns
 * @param height rows
 * @param samples one byte a pixel: grey, or an index into the palette; unchanged
 * @param palette red, green, blue of up to 256 colours, or none for grey
 * @returns the bytes of the file
 */
export async function writePicture(
  width: number,
  height: number,
  samples: Uint8Array,
  palette?: Uint8Array,
): Promise<Uint8Array> {
  const head = [header(width, height, 8, palette ? 3 : 0), ...(palette ? [chunk('PLTE', palette)] : [])];
  return assemble(head, filteredRows(width, height, samples), 3);
}
