import { MM_PER_INCH, ppiToPitch } from '../../units';
import type { ReadableType } from './file-type';
import { tiffResolution, type Resolution } from './tiff-directory';

const EXIF_HEAD = 'Exif\0\0';
const text = (bytes: Uint8Array, from: number, length: number): string =>
  String.fromCharCode(...bytes.subarray(from, from + length));

const viewOf = (bytes: Uint8Array): DataView =>
  new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);

/** PNG's pHYs chunk, unit 1 = metre (ISO/IEC 15948, 11.3.5.3). */
function pngResolution(bytes: Uint8Array): Resolution | null {
  const view = viewOf(bytes);
  for (let at = 8; at + 12 <= bytes.length;) {
    const length = view.getUint32(at);
    const type = text(bytes, at + 4, 4);
    if (type === 'IDAT' || type === 'IEND') return null;
    if (type === 'pHYs' && at + 17 <= bytes.length) {
      if (bytes[at + 16] !== 1) return null;
      return { xPxPerMm: view.getUint32(at + 8) / 1000, yPxPerMm: view.getUint32(at + 12) / 1000 };
    }
    at += 12 + length;
  }
  return null;
}

/** JFIF's density (ITU-T T.871, 10.1) where it has a unit. */
function jfifResolution(segment: Uint8Array): Resolution | null {
  if (text(segment, 0, 5) !== 'JFIF\0' || segment.length < 12) return null;
  const mmPerUnit = segment[7] === 1 ? ppiToPitch(1) : segment[7] === 2 ? 10 : null;
  if (mmPerUnit === null) return null;
  const view = viewOf(segment);
  return { xPxPerMm: view.getUint16(8) / mmPerUnit, yPxPerMm: view.getUint16(10) / mmPerUnit };
}

function jpegResolution(bytes: Uint8Array): Resolution | null {
  const view = viewOf(bytes);
  let found: Resolution | null = null;
  for (let at = 2; at + 4 <= bytes.length && bytes[at] === 0xff; at += 2 + view.getUint16(at + 2)) {
    const marker = bytes[at + 1];
    if (marker === 0xda) break;
    const segment = bytes.subarray(at + 4, at + 2 + view.getUint16(at + 2));
    if (marker === 0xe0) found = jfifResolution(segment) ?? found;
    // EXIF wins: writers that know a size put it there and leave JFIF at its placeholder.
    if (marker === 0xe1 && text(segment, 0, 6) === EXIF_HEAD)
      found = tiffResolution(segment.subarray(6)) ?? found;
  }
  return found;
}

/** BMP's pixels per metre at offsets 38 and 42, where the header is long enough to hold them. */
function bmpResolution(bytes: Uint8Array): Resolution | null {
  if (bytes.length < 54 || viewOf(bytes).getUint32(14, true) < 40) return null;
  return {
    xPxPerMm: viewOf(bytes).getInt32(38, true) / 1000,
    yPxPerMm: viewOf(bytes).getInt32(42, true) / 1000,
  };
}

function statedResolution(
  type: ReadableType,
  bytes: Uint8Array,
  exif: Uint8Array | undefined,
): Resolution | null {
  if (type === 'png') return pngResolution(bytes);
  if (type === 'jpeg') return jpegResolution(bytes);
  if (type === 'tiff') return tiffResolution(bytes);
  if (type === 'bmp') return bmpResolution(bytes);
  if (!exif) return null;
  return tiffResolution(text(exif, 0, 6) === EXIF_HEAD ? exif.subarray(6) : exif);
}

/** Values that programs write when nobody chose a size: 1, 72 and 96 to the inch, and 1 to the millimetre. */
const PLACEHOLDER_PPI = [1, 72, 96, MM_PER_INCH];

/**
 * The resolution that a picture's file states, where somebody chose it.
 * Reads PNG pHYs, JFIF and EXIF, TIFF tags and BMP's header; the values that programs write when nobody chose a size
 * count as none.
 * @param type what the bytes are
 * @param bytes the whole file; unchanged
 * @param exif EXIF block of the kinds that keep it in a container (WebP, AVIF), or undefined
 * @returns pixels per millimetre of the stored pixels, or null where none is stated
 * @example a PNG with pHYs 20000 × 20000 per metre gives { xPxPerMm: 20, yPxPerMm: 20 }
 */
export function embeddedResolution(
  type: ReadableType,
  bytes: Uint8Array,
  exif?: Uint8Array,
): Resolution | null {
  const stated = statedResolution(type, bytes, exif);
  if (!stated || !(stated.xPxPerMm > 0) || !(stated.yPxPerMm > 0)) return null;
  const ppi = stated.xPxPerMm * MM_PER_INCH;
  const placeholder = PLACEHOLDER_PPI.some((value) => Math.abs(ppi - value) < 0.05);
  return placeholder && stated.xPxPerMm === stated.yPxPerMm ? null : stated;
}
