import type { BurnRaster, LightnessRaster } from '../../imaging/raster';

/**
 * The burn that a lightness raster asks for.
 * Each sample is looked up in the table that `burnTable` gave.
 * @param lightness a raster or a band of one; unchanged
 * @param table 65,536 entries, burn of each sample
 * @returns burn 0–1, of the same shape
 * @example a white pixel, 65535, gives 0 on wood
 */
export function tone(lightness: LightnessRaster, table: Float32Array): BurnRaster {
  const { width, height, pitchXMm, pitchYMm } = lightness;
  const data = new Float32Array(width * height);
  for (let i = 0; i < data.length; i++) data[i] = table[lightness.data[i]];
  return { kind: 'burn', width, height, data, pitchXMm, pitchYMm };
}
