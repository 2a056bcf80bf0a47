import type { Field } from '../../imaging/field';

/** A line or dot so thin that its pixels do not reach the level. */
export interface FaintPoint {
  x: number;
  y: number;
  /** width of the line that leaves as much coverage, px */
  widthPx: number;
  /** direction in which it runs, radians, −π/2 to π/2 */
  alongRad: number;
}

/** Faintest peak that counts, 0–255: a line of 0.08 px. */
const FAINTEST = 20;

/** What lies below the peak on both sides is ground: at most this share of the peak. */
const GROUND_SHARE = 0.35;

/**
 * Points along lines that are too thin to reach the level: peaks across which the samples fall back to the ground on both
 * sides within two pixels.
 * @param field coverage; unchanged
 * @param level that parts burned from unburned, 0–255
 * @param side 1 for lines of ink, 0 for gaps in it
 * @returns points row by row; none where nothing is faint
 */
export function faintRidges(field: Field, level: number, side: 0 | 1): FaintPoint[] {
  const { width, height, data } = field;
  const out: FaintPoint[] = [];
  const top = side === 1 ? level : 255 - level;
  const value = (i: number): number => (side === 1 ? data[i] : 255 - data[i]);
  for (let y = 2; y < height - 2; y++) {
    for (let x = 2; x < width - 2; x++) {
      const i = y * width + x;
      const v = side === 1 ? data[i] : 255 - data[i];
      if (v < FAINTEST || v > top) continue;
      const across = value(i - 1) <= v && value(i + 1) < v && ground(value(i - 2), value(i + 2), v);
      const down = value(i - width) <= v && value(i + width) < v && ground(value(i - 2 * width), value(i + 2 * width), v);
      if (!across && !down) continue;
      const point = weigh(value, i, width, x, y, across && !down ? 1 : !across && down ? width : 0, top);
      if (point) out.push(point);
    }
  }
  return out;
}

const ground = (a: number, b: number, peak: number): boolean => a < GROUND_SHARE * peak && b < GROUND_SHARE * peak;

/** Coverage around a peak, by its moments: direction and the width of a full line that leaves as much. */
function weigh(
  value: (i: number) => number,
  i: number,
  width: number,
  x: number,
  y: number,
  _step: number,
  top: number,
): FaintPoint | null {
  let [m, mx, my, mxx, mxy, myy] = [0, 0, 0, 0, 0, 0];
  for (let dy = -2; dy <= 2; dy++) {
    for (let dx = -2; dx <= 2; dx++) {
      const v = value(i + dy * width + dx);
      if (v > top) return null;
      m += v;
      mx += v * dx;
      my += v * dy;
      mxx += v * dx * dx;
      mxy += v * dx * dy;
      myy += v * dy * dy;
    }
  }
  const [xx, yy, xy] = [mxx / m - (mx / m) ** 2, myy / m - (my / m) ** 2, mxy / m - (mx * my) / (m * m)];
  const alongRad = Math.atan2(2 * xy, xx - yy) / 2;
  // A line through the square of five pixels is that long in it.
  const length = 5 / Math.max(Math.abs(Math.cos(alongRad)), Math.abs(Math.sin(alongRad)));
  return { x: x + 0.5 + mx / m, y: y + 0.5 + my / m, widthPx: m / 255 / length, alongRad };
}
