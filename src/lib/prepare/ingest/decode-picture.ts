import { sharp } from '../sharp';
import { LIMITS } from '../tools';
import { brokenPicture } from './broken-picture';
import { decodeBmp } from './bmp';
import type { PictureHeader, Pixels } from './pixels';

async function decodeWithSharp(header: PictureHeader, bytes: Uint8Array): Promise<Pixels> {
  const deep = header.depth === 16;
  const { data, info } = await sharp(bytes, {
    limitInputPixels: LIMITS.maxPixels,
    failOn: 'error',
    sequentialRead: true,
  })
    .autoOrient()
    .toColourspace(deep ? 'rgb16' : 'srgb')
    .raw({ depth: deep ? 'ushort' : 'uchar' })
    .toBuffer({ resolveWithObject: true });
  if (info.channels !== 3 && info.channels !== 4)
    throw new Error(`expected 3 or 4 channels, got ${info.channels}`);
  const samples = info.width * info.height * info.channels;
  return {
    width: info.width,
    height: info.height,
    channels: info.channels,
    data: deep
      ? new Uint16Array(data.buffer, data.byteOffset, samples)
      : new Uint8Array(data.buffer, data.byteOffset, samples),
  };
}

/**
 * Decodes a picture to sRGB code values with its orientation applied and its colour profile or inks converted.
 * sharp reads all kinds but BMP, which jimp reads; a file that breaks off fails instead of ending in grey.
 * @param header what `readHeader` gave for these bytes
 * @param bytes the whole file; unchanged
 * @throws ArtworkError `truncated` or `unreadable`
 */
export async function decodePicture(header: PictureHeader, bytes: Uint8Array): Promise<Pixels> {
  try {
    return header.type === 'bmp' ? await decodeBmp(bytes) : await decodeWithSharp(header, bytes);
  } catch (cause) {
    throw brokenPicture(header.type, cause);
  }
}
