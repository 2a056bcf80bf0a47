import type { BurnRaster, LightnessRaster } from '../../imaging/raster';

/**
 * Turns lightness into burn, band after band.
 * Each sample is looked up in the table that `burnTable` gave.
 * @param table 65,536 entries, burn of each sample; unchanged
 * @returns a function from a raster or band to burn 0–1 of the same shape; its data is filled again by the next call
 * @example toner(burnTable(halftone, absolute))(a white pixel, 65535).data // 0
 */
export function toner(table: Float32Array): (lightness: LightnessRaster) => BurnRaster {
  let room = new Float32Array(0);
  return ({ width, height, data: samples, pitchXMm, pitchYMm }) => {
    if (room.length < samples.length) room = new Float32Array(samples.length);
    const data = room.subarray(0, samples.length);
    for (let i = 0; i < data.length; i++) data[i] = table[samples[i]];
    return { kind: 'burn', width, height, data, pitchXMm, pitchYMm };
  };
}
