import type { MaskRaster } from '../imaging/raster';

/** Power levels for continuous tone, 8 bit: 255·(1 − burn), so 0 is a full mark and 255 untouched. */
export interface LevelRaster {
  kind: 'levels';
  /** columns, at least 1 */
  width: number;
  /** rows, at least 1 */
  height: number;
  pitchXMm: number;
  pitchYMm: number;
  data: Uint8Array;
}

/** What one pass marks: dots, or power levels. */
export type MarkRaster = MaskRaster | LevelRaster;

/**
 * Share of the pixels that burn, or mean burn of power levels.
 * @param marks what one pass marks; unchanged
 * @returns a ratio 0–1
 * @example meanBurn(a mask with one pixel of four burned) // 0.25
 */
export function meanBurn({ kind, data }: MarkRaster): number {
  let sum = 0;
  for (let i = 0; i < data.length; i++) sum += data[i];
  return kind === 'mask' ? sum / data.length : 1 - sum / data.length / 255;
}
