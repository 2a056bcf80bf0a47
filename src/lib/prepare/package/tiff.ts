import { sharp } from '../sharp';
import type { MarkRaster } from '../mark-raster';

/** Dots as grey, 0 burned and 255 untouched. */
function greyOfDots(dots: Uint8Array): Uint8Array {
  const grey = new Uint8Array(dots.length);
  for (let i = 0; i < dots.length; i++) grey[i] = dots[i] - 1;
  return grey;
}

/**
 * A TIFF of what one pass marks: dots in 1 bit with CCITT group 4, power levels in 8 bit with LZW; black is burned.
 * The resolution tags carry the pitch in pixels per centimetre, in X and Y.
 * @param marks dots or levels; unchanged
 * @returns the bytes of the file, the same for the same marks
 * @example a mask at 0.05 mm holds XResolution 200 per cm
 * @see TIFF 6.0; ITU-T T.6
 */
export async function writeTiff(marks: MarkRaster): Promise<Uint8Array> {
  const { width, height, pitchXMm, pitchYMm } = marks;
  const dots = marks.kind === 'mask';
  const resolution = { xres: 1 / pitchXMm, yres: 1 / pitchYMm, resolutionUnit: 'cm' } as const;
  const file = await sharp(dots ? greyOfDots(marks.data) : marks.data, {
    raw: { width, height, channels: 1 },
    limitInputPixels: false,
  })
    .toColourspace('b-w')
    .tiff(
      dots
        ? { ...resolution, bitdepth: 1, compression: 'ccittfax4' }
        : { ...resolution, compression: 'lzw', predictor: 'horizontal' },
    )
    .toBuffer();
  return new Uint8Array(file.buffer, file.byteOffset, file.byteLength);
}
