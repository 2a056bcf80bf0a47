import { z } from 'zod';

export const spotShapeSchema = z.enum(['ellipse', 'rectangle']);
export type SpotShape = z.infer<typeof spotShapeSchema>;

/** How a spot's size was found; unless said otherwise it is the width of a burned line at the working dose. */
export const spotMeasuredBySchema = z.enum(['burned-line', 'maker', 'beam-1e2', 'beam-4sigma']);
export type SpotMeasuredBy = z.infer<typeof spotMeasuredBySchema>;

export const spotSchema = z.object({
  /** width along X, mm, 0.005 to 5 */
  widthMm: z.number().min(0.005).max(5),
  /** height along Y, mm, 0.005 to 5 */
  heightMm: z.number().min(0.005).max(5),
  shape: spotShapeSchema.default('ellipse'),
});
/** The area that the beam marks at focus. */
export type Spot = z.infer<typeof spotSchema>;

/** Pulsed: one spot per pixel. Swept: the beam stays on across the pixel. */
export const firingSchema = z.enum(['pulsed', 'swept']);
export type Firing = z.infer<typeof firingSchema>;

const radians = (deg: number): number => (deg * Math.PI) / 180;

function assertSpot(spot: Spot, angleDeg: number): void {
  if (!(spot.widthMm > 0) || !(spot.heightMm > 0)) {
    throw new RangeError(`expected a spot with sides above 0 mm, got ${spot.widthMm} x ${spot.heightMm}`);
  }
  if (!Number.isFinite(angleDeg)) throw new RangeError(`expected a finite angle in degrees, got ${angleDeg}`);
}

/**
 * The spot's size across a scan direction, mm: what sets the line pitch, for both shapes.
 * Second moment of the spot taken across the direction: sqrt((w sin)^2 + (h cos)^2).
 * @param spot widths in mm; unchanged
 * @param directionDeg angle of the scan lines to X, degrees, any finite number
 * @throws RangeError when a side is not above 0 or the angle is not finite
 * @example sizeAcross({ widthMm: 0.06, heightMm: 0.08, shape: 'ellipse' }, 45) // 0.0707
 */
export function sizeAcross(spot: Spot, directionDeg: number): number {
  assertSpot(spot, directionDeg);
  const a = radians(directionDeg);
  return Math.hypot(spot.widthMm * Math.sin(a), spot.heightMm * Math.cos(a));
}

/**
 * How wide a line comes out that runs in a direction, mm: the swept extent of the spot across that direction.
 * Size across for an ellipse; w·|sin| + h·|cos| for a rectangle.
 * @param spot widths in mm; unchanged
 * @param strokeDeg direction in which the stroke runs, degrees to X, any finite number
 * @throws RangeError when a side is not above 0 or the angle is not finite
 * @example lineExtent({ widthMm: 0.06, heightMm: 0.08, shape: 'rectangle' }, 45) // 0.0990
 */
export function lineExtent(spot: Spot, strokeDeg: number): number {
  if (spot.shape === 'ellipse') return sizeAcross(spot, strokeDeg);
  assertSpot(spot, strokeDeg);
  const a = radians(strokeDeg);
  return spot.widthMm * Math.abs(Math.sin(a)) + spot.heightMm * Math.abs(Math.cos(a));
}

/**
 * Area of one spot, mm²: π/4·w·h for an ellipse, w·h for a rectangle.
 * @throws RangeError when a side is not above 0
 * @example spotArea({ widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' }) // 0.007854
 */
export function spotArea(spot: Spot): number {
  assertSpot(spot, 0);
  return spot.widthMm * spot.heightMm * (spot.shape === 'ellipse' ? Math.PI / 4 : 1);
}
