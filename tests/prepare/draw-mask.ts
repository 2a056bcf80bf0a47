import type { MaskRaster } from '../../src/lib/imaging/raster';

/** A mask drawn as rows of `#` burned and `.` untouched. */
export function maskOf(rows: string[], pitchMm = 0.1): MaskRaster {
  const data = Uint8Array.from([...rows.join('')].map((cell) => (cell === '#' ? 1 : 0)));
  return {
    kind: 'mask',
    width: rows[0].length,
    height: rows.length,
    data,
    pitchXMm: pitchMm,
    pitchYMm: pitchMm,
  };
}
