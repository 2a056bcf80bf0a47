import { lineExtent, spotArea, type Spot } from '../../machines/spot';

const STEPS = 360;

/** What strokes are held against at one scale, px. */
export interface LineExtents {
  /** line extent by direction of the stroke, in half degrees from −90° */
  byHalfDegree: Float32Array;
  smallestPx: number;
  largestPx: number;
  /** area of the spot, px² */
  spotAreaPx2: number;
}

/**
 * The line extents of a spot at a scale.
 * @param spot in the artwork's own frame; unchanged
 * @param pxPerMm scale, above 0
 * @returns a table by direction, its ends, and the spot's area
 * @throws RangeError when pxPerMm is not above 0
 */
export function lineExtents(spot: Spot, pxPerMm: number): LineExtents {
  if (!(pxPerMm > 0)) throw new RangeError(`expected pxPerMm above 0, got ${pxPerMm}`);
  const byHalfDegree = Float32Array.from(
    { length: STEPS + 1 },
    (_, n) => lineExtent(spot, n / 2 - 90) * pxPerMm,
  );
  return {
    byHalfDegree,
    smallestPx: Math.min(spot.widthMm, spot.heightMm) * pxPerMm,
    largestPx: byHalfDegree.reduce((a, b) => Math.max(a, b), 0),
    spotAreaPx2: spotArea(spot) * pxPerMm * pxPerMm,
  };
}

/** Line extent of a stroke that runs along a direction, radians within −π/2 to π/2, px. */
export function extentAlong(extents: LineExtents, alongRad: number): number {
  return extents.byHalfDegree[Math.round(((alongRad * 180) / Math.PI + 90) * 2)];
}
