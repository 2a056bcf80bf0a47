import type { AxisPoints } from './medial-axis';

/** What the neighbours along a middle line say of each of its points. */
export interface SmoothedAxis {
  /** width by the straight line through the widths of the neighbours, px */
  width: Float32Array;
  /** direction in which the line runs, radians, −π/2 to π/2, y downwards */
  along: Float32Array;
  /** how much the width changes for each pixel of length, 0 or more */
  slope: Float32Array;
  /** length of line that the point stands for, px; doubles share it */
  length: Float32Array;
}

/** Where each point of an axis lies in the grid of pixels: −1 where there is none. */
export function axisGrid(points: AxisPoints, pixels: number): Int32Array {
  const grid = new Int32Array(pixels).fill(-1);
  for (let n = 0; n < points.count; n++) grid[points.pixel[n]] = n;
  return grid;
}

/** Sums over the neighbours of one point, used again for each. */
class Sums {
  n = 0;
  x = 0;
  y = 0;
  xx = 0;
  xy = 0;
  yy = 0;
  w = 0;
  xw = 0;
  yw = 0;
  narrowest = Infinity;
  widest = 0;

  clear(): void {
    this.narrowest = Infinity;
    this.widest = 0;
    this.n = this.x = this.y = this.xx = this.xy = this.yy = this.w = this.xw = this.yw = 0;
  }

  add(dx: number, dy: number, width: number): void {
    this.n++;
    this.x += dx;
    this.y += dy;
    this.xx += dx * dx;
    this.xy += dx * dy;
    this.yy += dy * dy;
    this.w += width;
    this.xw += dx * width;
    this.yw += dy * width;
    if (width < this.narrowest) this.narrowest = width;
    if (width > this.widest) this.widest = width;
  }
}

/** Farthest that a neighbour may lie beside the line through a point, px, and how much more for each pixel along it. */
const BESIDE_PX = 1.5;
const BESIDE_SHARE = 0.35;

/**
 * Direction, smoothed width, taper and length of line for every point of a middle line, from its neighbours within a reach.
 * Direction: the main axis of the neighbours' places; taper: the straight line through their widths.
 * @param points unchanged
 * @param grid `axisGrid` of them; unchanged
 * @param columns width of the picture, px
 * @param reachPx neighbours up to this many columns and rows away, from 1
 * @returns one value a point in each list
 * @throws RangeError when reachPx is under 1
 * @example along a bar at 30° with ends far off: along π/6 ± 0.01, slope 0 ± 0.01
 */
export function smoothAxis(
  points: AxisPoints,
  grid: Int32Array,
  columns: number,
  reachPx: number,
): SmoothedAxis {
  if (!(reachPx >= 1)) throw new RangeError(`expected reachPx from 1, got ${reachPx}`);
  const { count } = points;
  const out: SmoothedAxis = {
    width: new Float32Array(count),
    along: new Float32Array(count),
    slope: new Float32Array(count),
    length: new Float32Array(count),
  };
  const sums = new Sums();
  const reach = Math.round(reachPx);
  for (let n = 0; n < count; n++) {
    sumAround(points, grid, columns, reach, n, sums);
    const along = directionOf(sums, points.across[n]);
    const [c, s] = [Math.cos(along), Math.sin(along)];
    out.along[n] = along;
    const slope = slopeOf(sums, c, s);
    const fitted = (sums.w - slope * (sums.x * c + sums.y * s)) / sums.n;
    out.width[n] = Math.min(sums.widest, Math.max(sums.narrowest, fitted));
    out.slope[n] = Math.abs(slope);
    const steep = Math.abs(s) > Math.abs(c);
    const doubles = steep ? countDoubles(grid, points, n, 1) : countDoubles(grid, points, n, columns);
    out.length[n] = 1 / (doubles * Math.max(Math.abs(c), Math.abs(s)));
  }
  return out;
}

function sumAround(
  points: AxisPoints,
  grid: Int32Array,
  columns: number,
  reach: number,
  n: number,
  sums: Sums,
): void {
  sums.clear();
  const px = points.pixel[n] % columns;
  const py = (points.pixel[n] / columns) | 0;
  const rows = grid.length / columns;
  const [ax, ay] = [Math.cos(points.across[n]), Math.sin(points.across[n])];
  const right = Math.min(columns - 1, px + reach);
  const bottom = Math.min(rows - 1, py + reach);
  for (let y = Math.max(0, py - reach); y <= bottom; y++) {
    for (let i = y * columns + Math.max(0, px - reach); i <= y * columns + right; i++) {
      const m = grid[i];
      if (m < 0) continue;
      const dx = points.x[m] - points.x[n];
      const dy = points.y[m] - points.y[n];
      const beside = Math.abs(dx * ax + dy * ay);
      const ahead = Math.abs(dy * ax - dx * ay);
      if (beside <= BESIDE_PX + BESIDE_SHARE * ahead) sums.add(dx, dy, points.width[m]);
    }
  }
}

/** Main axis of the neighbours; where they hardly spread, at right angles to the line across. */
function directionOf(sums: Sums, across: number): number {
  const { n } = sums;
  const xx = sums.xx / n - (sums.x / n) ** 2;
  const yy = sums.yy / n - (sums.y / n) ** 2;
  const xy = sums.xy / n - (sums.x * sums.y) / (n * n);
  const spread = Math.hypot(xx - yy, 2 * xy);
  if (spread < 1) return across > 0 ? across - Math.PI / 2 : across + Math.PI / 2;
  return Math.atan2(2 * xy, xx - yy) / 2;
}

function slopeOf(sums: Sums, c: number, s: number): number {
  const { n } = sums;
  const t = (sums.x * c + sums.y * s) / n;
  const spread = (sums.xx * c * c + 2 * sums.xy * c * s + sums.yy * s * s) / n - t * t;
  if (spread < 0.5) return 0;
  const covariance = (sums.xw * c + sums.yw * s) / n - t * (sums.w / n);
  return covariance / spread;
}

/** How many points of a line lie side by side at one place of its length, itself included. */
function countDoubles(grid: Int32Array, points: AxisPoints, n: number, step: number): number {
  let doubles = 1;
  for (let k = -2; k <= 2; k++) {
    const i = points.pixel[n] + k * step;
    if (k === 0 || i < 0 || i >= grid.length) continue;
    const m = grid[i];
    if (m >= 0 && Math.hypot(points.x[m] - points.x[n], points.y[m] - points.y[n]) < 1) doubles++;
  }
  return doubles;
}
