import { firstPieceFrom, type Contour } from './contour';
import { BLOCK_PX, blocksNearEdges, type Division } from './field';

/**
 * Points on the middle line of what is thin, one or two a pixel of length, row by row. Coordinates as in `Contour`.
 */
export interface AxisPoints {
  count: number;
  /** pixel that each point was found from: row × width + column */
  pixel: Int32Array;
  x: Float32Array;
  y: Float32Array;
  /** distance between the two sides, px */
  width: Float32Array;
  /** angle of the line from one side to the other, radians, −π/2 to π/2 */
  across: Float32Array;
}

/** Farthest that a point may lie from the centre of its pixel, px. */
const REACH_PX = 0.75;
/** Cosine beyond which two nearest points lie on two sides and not around one corner: 140°. */
const TWO_SIDES = Math.cos((140 * Math.PI) / 180);
/** Difference of the distances to the two sides below which a point counts as being in the middle, px. */
const IN_THE_MIDDLE_PX = 0.35;
const ROOTS = Float32Array.from({ length: 256 }, (_, n) => Math.sqrt(n));

/** Room for the pieces around one pixel: two a cell in a square of 36 cells. */
const MAX_NEAR = 2 * 36 * 36;

/** Finds where the nearest sides lie: one instance a picture, so that nothing is made anew for each pixel. */
class Sides {
  private readonly near = new Int32Array(MAX_NEAR);
  private readonly qx = new Float64Array(MAX_NEAR);
  private readonly qy = new Float64Array(MAX_NEAR);
  private readonly qd = new Float64Array(MAX_NEAR);
  private count = 0;
  /** distances to the nearest side and to the one facing it; Infinity where there is none */
  d1 = Infinity;
  d2 = Infinity;
  ux = 0;
  uy = 0;
  acrossRad = 0;

  constructor(
    private readonly contour: Contour,
    private readonly height: number,
  ) {}

  gather(x: number, y: number, reach: number): void {
    const { contour } = this;
    this.count = 0;
    const last = Math.min(this.height - 2, y + reach);
    for (let row = Math.max(0, y - reach - 1); row <= last; row++) {
      const end = contour.rowStart[row + 1];
      for (
        let n = firstPieceFrom(contour, row, x - reach - 1);
        n < end && contour.column[n] <= x + reach;
        n++
      ) {
        if (this.count < MAX_NEAR) this.near[this.count++] = n;
      }
    }
  }

  /** Looks from a point: sets d1, d2, the direction away from the nearest side, and the angle across. */
  look(cx: number, cy: number): boolean {
    const { points } = this.contour;
    let first = -1;
    for (let k = 0; k < this.count; k++) {
      const at = this.near[k] * 4;
      const ax = points[at];
      const ay = points[at + 1];
      const dx = points[at + 2] - ax;
      const dy = points[at + 3] - ay;
      const length2 = dx * dx + dy * dy;
      let t = length2 > 0 ? ((cx - ax) * dx + (cy - ay) * dy) / length2 : 0;
      if (t < 0) t = 0;
      else if (t > 1) t = 1;
      const x = ax + t * dx - cx;
      const y = ay + t * dy - cy;
      this.qx[k] = x;
      this.qy[k] = y;
      this.qd[k] = x * x + y * y;
      if (first < 0 || this.qd[k] < this.qd[first]) first = k;
    }
    if (first < 0) return false;
    this.d1 = Math.sqrt(this.qd[first]);
    if (this.d1 < 1e-4) return false;
    this.ux = -this.qx[first] / this.d1;
    this.uy = -this.qy[first] / this.d1;
    return this.findFacing(first);
  }

  private findFacing(first: number): boolean {
    let second = -1;
    for (let k = 0; k < this.count; k++) {
      if (second >= 0 && this.qd[k] >= this.qd[second]) continue;
      const facing = this.qx[k] * this.ux + this.qy[k] * this.uy;
      if (facing > 0 && facing > -TWO_SIDES * Math.sqrt(this.qd[k])) second = k;
    }
    if (second < 0) return false;
    this.d2 = Math.sqrt(this.qd[second]);
    let angle = Math.atan2(this.qy[second] - this.qy[first], this.qx[second] - this.qx[first]);
    if (angle > Math.PI / 2) angle -= Math.PI;
    else if (angle <= -Math.PI / 2) angle += Math.PI;
    this.acrossRad = angle;
    return true;
  }
}

/** Whether the distance has a ridge at a pixel across one axis, and hardly changes along the other. */
function onRidge(squared: Uint8Array, inside: Uint8Array, i: number, width: number): boolean {
  const own = inside[i];
  const d = squared[i];
  const l = inside[i - 1] === own ? squared[i - 1] : 0;
  const r = inside[i + 1] === own ? squared[i + 1] : 0;
  const u = inside[i - width] === own ? squared[i - width] : 0;
  const b = inside[i + width] === own ? squared[i + width] : 0;
  if (d >= l && d >= r && (d > l || d > r) && Math.abs(ROOTS[u] - ROOTS[b]) < 1.2) return true;
  return d >= u && d >= b && (d > u || d > b) && Math.abs(ROOTS[l] - ROOTS[r]) < 1.2;
}

/**
 * The middle line of everything thinner than a limit, with its width at every point.
 * From each pixel on the ridge of the distance map, the point within 0.75 px that is farthest from the contour; the width
 * is twice that distance. Points whose two nearest sides meet in a corner of more than 40° are left out.
 * @param division two classes; unchanged
 * @param squared `cappedDistance` of it; unchanged
 * @param contour `contourOf` the same field; unchanged
 * @param side 1 for what is inside the level, 0 for what lies between
 * @param maxWidthPx widths from here on are left out, px, above 0 and under twice the cap of the distances less 2
 * @returns the points, row by row; none where nothing is thin
 * @throws RangeError when maxWidthPx is not above 0
 * @example a bar 6 px wide gives points with width 6 ± 0.05 along its middle
 * @see science of thin features: distance to the sub-pixel contour, error −0.02 ± 0.04 px from 1.5 px up
 */
export function medialAxis(
  division: Division,
  squared: Uint8Array,
  contour: Contour,
  side: 0 | 1,
  maxWidthPx: number,
): AxisPoints {
  if (!(maxWidthPx > 0)) throw new RangeError(`expected maxWidthPx above 0, got ${maxWidthPx}`);
  const { width, height, inside, columns } = division;
  const found = new Found();
  const sides = new Sides(contour, height);
  const near = blocksNearEdges(division);
  // The nearest pixel of the other class lies up to 1.5 px farther than the contour does.
  const highest = (maxWidthPx / 2 + 1.5) ** 2;
  for (let y = 1; y + 1 < height; y++) {
    const blockRow = ((y / BLOCK_PX) | 0) * columns;
    for (let block = 0; block < columns; block++) {
      if (!near[blockRow + block]) continue;
      const end = Math.min(width - 1, (block + 1) * BLOCK_PX);
      for (let x = Math.max(1, block * BLOCK_PX); x < end; x++) {
        const i = y * width + x;
        if (inside[i] !== side || squared[i] > highest || !onRidge(squared, inside, i, width)) continue;
        settle(sides, x, y, ROOTS[squared[i]], i, maxWidthPx, found);
      }
    }
  }
  return found.points();
}

/** Moves from a pixel's centre to the middle between the two sides and keeps the point if there is one. */
function settle(
  sides: Sides,
  x: number,
  y: number,
  distance: number,
  pixel: number,
  maxWidthPx: number,
  found: Found,
): void {
  sides.gather(x, y, Math.ceil(distance + 2 * REACH_PX + 0.5));
  let cx = x + 0.5;
  let cy = y + 0.5;
  for (let step = 0; step < 3; step++) {
    if (!sides.look(cx, cy)) return;
    if (step === 2) break;
    const shift = (sides.d2 - sides.d1) / 2;
    cx += sides.ux * shift;
    cy += sides.uy * shift;
    const away = Math.hypot(cx - x - 0.5, cy - y - 0.5);
    if (away > REACH_PX) {
      cx = x + 0.5 + ((cx - x - 0.5) * REACH_PX) / away;
      cy = y + 0.5 + ((cy - y - 0.5) * REACH_PX) / away;
    }
    if (Math.abs(shift) < 0.02) step = 1;
  }
  if (Math.abs(sides.d2 - sides.d1) > IN_THE_MIDDLE_PX || sides.d1 + sides.d2 >= maxWidthPx) return;
  found.add(pixel, cx, cy, sides.d1 + sides.d2, sides.acrossRad);
}

/** Arrays that grow by doubling. */
class Found {
  private count = 0;
  private pixel = new Int32Array(1024);
  private numbers = new Float32Array(4096);

  add(pixel: number, x: number, y: number, width: number, across: number): void {
    if (this.count === this.pixel.length) {
      const longer = new Int32Array(this.count * 2);
      longer.set(this.pixel);
      this.pixel = longer;
      const more = new Float32Array(this.count * 8);
      more.set(this.numbers);
      this.numbers = more;
    }
    this.pixel[this.count] = pixel;
    this.numbers.set([x, y, width, across], this.count * 4);
    this.count++;
  }

  points(): AxisPoints {
    const { count, numbers } = this;
    const pick = (offset: number): Float32Array =>
      Float32Array.from({ length: count }, (_, n) => numbers[n * 4 + offset]);
    return {
      count,
      pixel: this.pixel.slice(0, count),
      x: pick(0),
      y: pick(1),
      width: pick(2),
      across: pick(3),
    };
  }
}
