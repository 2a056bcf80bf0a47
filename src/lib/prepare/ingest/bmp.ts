import { ArtworkError } from '../tools';
import type { PictureHeader, Pixels } from './pixels';

const UNCOMPRESSED = 0;

const cutShort = (): ArtworkError =>
  new ArtworkError(
    'truncated',
    'The BMP file breaks off before its end, probably because it was not copied whole. Export it again as PNG and send that.',
  );

/**
 * What a BMP's header says, with its pixel data checked to be all there.
 * @param bytes the whole file; unchanged
 * @throws ArtworkError `truncated` when the pixel data is not all there; `unsupported-format` for a compressed or very old BMP
 * @see Windows bitmap: BITMAPFILEHEADER and BITMAPINFOHEADER
 */
export function bmpHeader(bytes: Uint8Array): PictureHeader {
  if (bytes.length < 54) throw cutShort();
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const pixelsAt = view.getUint32(10, true);
  const widthPx = view.getInt32(18, true);
  const heightPx = Math.abs(view.getInt32(22, true));
  const bits = view.getUint16(28, true);
  if (
    view.getUint32(14, true) < 40 ||
    view.getUint32(30, true) !== UNCOMPRESSED ||
    ![1, 4, 8, 24, 32].includes(bits)
  ) {
    throw new ArtworkError(
      'unsupported-format',
      'This BMP is of a compressed or old kind, which we do not read. Export it as PNG and send that.',
    );
  }
  const stride = Math.ceil((Math.max(0, widthPx) * bits) / 32) * 4;
  if (pixelsAt + stride * heightPx > bytes.length) throw cutShort();
  return {
    type: 'bmp',
    widthPx,
    heightPx,
    swapsSides: false,
    frames: 1,
    depth: 8,
    exif: undefined,
    remarks: [],
  };
}

/**
 * Decodes an uncompressed BMP.
 * @param bytes the whole file, its header already held against the cap on pixels; unchanged
 */
export async function decodeBmp(bytes: Uint8Array): Promise<Pixels> {
  // jimp is heavy to load and only BMP needs it.
  const { Jimp } = await import('jimp');
  const { bitmap } = await Jimp.fromBuffer(Buffer.from(bytes.buffer, bytes.byteOffset, bytes.byteLength));
  return { width: bitmap.width, height: bitmap.height, channels: 4, data: new Uint8Array(bitmap.data) };
}
