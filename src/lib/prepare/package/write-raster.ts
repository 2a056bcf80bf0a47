import type { MarkRaster } from '../mark-raster';
import type { Settings } from '../settings';
import { writeBmp } from './bmp';
import { writePng } from './png';
import { writeTiff } from './tiff';

export type RasterFormat = Settings['formats'][number];

export const RASTER_MEDIA_TYPE: Readonly<Record<RasterFormat, string>> = {
  png: 'image/png',
  tiff: 'image/tiff',
  bmp: 'image/bmp',
};

/**
 * The file of one pass in one format.
 * @param marks dots or power levels; unchanged
 * @param format png, tiff or bmp
 * @returns the bytes of the file, the same for the same marks
 * @example writeRaster(marks, 'png') begins with 0x89 P N G
 */
export async function writeRaster(marks: MarkRaster, format: RasterFormat): Promise<Uint8Array> {
  switch (format) {
    case 'png':
      return writePng(marks);
    case 'tiff':
      return writeTiff(marks);
    case 'bmp':
      return writeBmp(marks);
  }
}
