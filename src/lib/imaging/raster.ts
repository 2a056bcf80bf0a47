/**
 * The three rasters of the pipeline: plain objects, row-major, origin top left, one sample a pixel.
 * `pitchXMm` and `pitchYMm` are the distances between neighbouring pixel centres.
 */
interface RasterShape {
  /** columns, at least 1 */
  width: number;
  /** rows, at least 1 */
  height: number;
  pitchXMm: number;
  pitchYMm: number;
}

/** Relative luminance in linear light (CIE Y of sRGB, D65), 0 to 65535 for 0 to 1. */
export interface LightnessRaster extends RasterShape {
  kind: 'lightness';
  data: Uint16Array;
}

/** Burn 0 to 1: 0 untouched, 1 full mark. */
export interface BurnRaster extends RasterShape {
  kind: 'burn';
  data: Float32Array;
}

/** Two levels: 1 burned, 0 untouched. One byte a pixel. */
export interface MaskRaster extends RasterShape {
  kind: 'mask';
  data: Uint8Array;
}

export type Raster = LightnessRaster | BurnRaster | MaskRaster;
