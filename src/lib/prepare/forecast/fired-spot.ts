import type { Firing, Spot } from '../../machines/spot';

/** Whether one fired pixel marks a point, given in mm from the pixel's centre along the file's own X and Y. */
export type FiredSpot = (xMm: number, yMm: number) => boolean;

export interface Sweep {
  firing: Firing;
  /** way of the beam while it stays on across one pixel, mm along the file's X and Y */
  xMm: number;
  yMm: number;
  /** angle of the file's X to the machine's X, degrees */
  fileAngleDeg: number;
}

/** Part of a sweep, −½ to ½, for which |at − t·step| stays within half; empty when from > to. */
function within(at: number, step: number, half: number): [number, number] {
  if (Math.abs(step) < 1e-12) return Math.abs(at) <= half ? [-0.5, 0.5] : [1, -1];
  const [a, b] = [(at - half) / step, (at + half) / step];
  return [Math.max(-0.5, Math.min(a, b)), Math.min(0.5, Math.max(a, b))];
}

function reachesEllipse(x: number, y: number, stepX: number, stepY: number): boolean {
  const length = stepX * stepX + stepY * stepY;
  const t = length > 0 ? Math.max(-0.5, Math.min(0.5, (x * stepX + y * stepY) / length)) : 0;
  return (x - t * stepX) ** 2 + (y - t * stepY) ** 2 <= 1;
}

/**
 * The area that one fired pixel marks: the spot alone where firing is pulsed, the spot drawn across the pixel where it is
 * swept. The spot keeps to the machine's X and Y whatever the scan direction.
 * @param spot mm; unchanged
 * @param sweep firing and the way along the scan line; unchanged
 * @example a swept round spot of 0.1 mm over 0.1 mm marks a stadium of 0.2 × 0.1 mm
 */
export function firedSpot(spot: Spot, sweep: Sweep): FiredSpot {
  const angle = (sweep.fileAngleDeg * Math.PI) / 180;
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  const [halfX, halfY] = [spot.widthMm / 2, spot.heightMm / 2];
  // Everything is measured in half spots along the machine's axes.
  const toX = (x: number, y: number): number => (x * cos - y * sin) / halfX;
  const toY = (x: number, y: number): number => (x * sin + y * cos) / halfY;
  const moves = sweep.firing === 'swept';
  const stepX = moves ? toX(sweep.xMm, sweep.yMm) : 0;
  const stepY = moves ? toY(sweep.xMm, sweep.yMm) : 0;
  if (spot.shape === 'ellipse') return (x, y) => reachesEllipse(toX(x, y), toY(x, y), stepX, stepY);
  return (x, y) => {
    const [fromX, upX] = within(toX(x, y), stepX, 1);
    const [fromY, upY] = within(toY(x, y), stepY, 1);
    return Math.max(fromX, fromY) <= Math.min(upX, upY);
  };
}

/**
 * How many pixels to each side a fired pixel can mark, along the file's X and Y.
 * @param pitchXMm width of a pixel
 * @param pitchYMm height of a pixel
 * @example a spot of two pixels, pulsed, reaches 1
 */
export function reachPx(
  spot: Spot,
  sweep: Sweep,
  pitchXMm: number,
  pitchYMm: number,
): { x: number; y: number } {
  const angle = (sweep.fileAngleDeg * Math.PI) / 180;
  const [cos, sin] = [Math.abs(Math.cos(angle)), Math.abs(Math.sin(angle))];
  const [w, h] = [spot.widthMm / 2, spot.heightMm / 2];
  const box = spot.shape === 'rectangle';
  const halfX = box ? w * cos + h * sin : Math.hypot(w * cos, h * sin);
  const halfY = box ? w * sin + h * cos : Math.hypot(w * sin, h * cos);
  const moves = sweep.firing === 'swept' ? 0.5 : 0;
  const reach = (half: number, step: number, pitch: number): number =>
    Math.max(0, Math.ceil((half + moves * Math.abs(step)) / pitch - 0.5 - 1e-9));
  return { x: reach(halfX, sweep.xMm, pitchXMm), y: reach(halfY, sweep.yMm, pitchYMm) };
}
