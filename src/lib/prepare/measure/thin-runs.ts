import { axisGrid, smoothAxis, type SmoothedAxis } from '../../imaging/axis-smoothing';
import type { AxisPoints } from '../../imaging/medial-axis';
import { extentAlong, type LineExtents } from './line-extents';

/** Widths under this share of the line extent are flagged: 2 % lie within what can be measured. */
export const FLAGGED_SHARE = 0.98;
/** Steepest taper of a stroke that stays thin for three extents of length: width gained for each unit of length. */
const GENTLE_TAPER = 1 / 3;
/** Length, in line extents, that a steeper taper must stay thin for. */
const TAPER_EXTENTS = 3;

/** A stretch of middle line along which a stroke or a gap is too thin. */
export interface ThinRun {
  /** members by their index into the points */
  members: number[];
  smallestPx: number;
  /** line extent where it is smallest, px */
  limitPx: number;
  /** lowest width ÷ line extent */
  worstRatio: number;
  lengthPx: number;
  /** whether it is a stroke, and not the tip of a corner */
  counts: boolean;
  /** width gained for each unit of length, over the whole stretch */
  taper: number;
}

export interface ThinRuns {
  runs: ThinRun[];
  smoothed: SmoothedAxis;
  grid: Int32Array;
}

/**
 * The stretches of a middle line that are thinner than the line extent in their own direction.
 * Neighbouring thin points are joined; a stretch counts where it runs for one extent with a taper under 1 in 3, or stays
 * thin for three extents, so that corners and short tips never count.
 * @param points middle line; unchanged
 * @param extents at the same scale; unchanged
 * @param columns width of the picture, px
 * @param rows height of the picture, px
 * @param share of the line extent that is the limit, above 0
 * @returns all stretches, also those that do not count
 */
export function thinRuns(
  points: AxisPoints,
  extents: LineExtents,
  columns: number,
  rows: number,
  share = FLAGGED_SHARE,
): ThinRuns {
  const grid = axisGrid(points, columns * rows);
  const smoothed = smoothAxis(points, grid, columns, Math.min(8, Math.max(2, Math.round(extents.smallestPx))));
  const thin = new Uint8Array(points.count);
  for (let n = 0; n < points.count; n++) {
    if (smoothed.width[n] < share * extentAlong(extents, smoothed.along[n])) thin[n] = 1;
  }
  const groups = joinNeighbours(points, thin, grid, columns);
  return { runs: groups.map((members) => describe(members, smoothed, extents, share)), smoothed, grid };
}

/** Groups of thin points that lie within two pixels of each other, each in the order of the points. */
function joinNeighbours(points: AxisPoints, thin: Uint8Array, grid: Int32Array, columns: number): number[][] {
  const parent = Int32Array.from({ length: points.count }, (_, n) => n);
  const root = (n: number): number => {
    while (parent[n] !== n) n = parent[n] = parent[parent[n]];
    return n;
  };
  for (let n = 0; n < points.count; n++) {
    if (!thin[n]) continue;
    const x = points.pixel[n] % columns;
    // Earlier points alone: later ones look back at this one.
    for (let dy = -2; dy <= 0; dy++) {
      for (let dx = -2; dx <= (dy < 0 ? 2 : -1); dx++) {
        const i = points.pixel[n] + dy * columns + dx;
        if (i < 0 || x + dx < 0 || x + dx >= columns) continue;
        const m = grid[i];
        if (m >= 0 && thin[m]) parent[root(n)] = root(m);
      }
    }
  }
  const groups = new Map<number, number[]>();
  for (let n = 0; n < points.count; n++) {
    if (!thin[n]) continue;
    const group = groups.get(root(n));
    if (group) group.push(n);
    else groups.set(root(n), [n]);
  }
  return [...groups.values()];
}

function describe(members: number[], smoothed: SmoothedAxis, extents: LineExtents, share: number): ThinRun {
  let [length, gentle, widthSum, slopeSum, limitSum] = [0, 0, 0, 0, 0];
  let [worst, smallest, limit] = [Infinity, Infinity, 0];
  for (const n of members) {
    const own = extentAlong(extents, smoothed.along[n]);
    const step = smoothed.length[n];
    length += step;
    widthSum += step * smoothed.width[n];
    slopeSum += step * smoothed.slope[n];
    limitSum += step * own;
    if (smoothed.slope[n] <= GENTLE_TAPER) gentle += step;
    worst = Math.min(worst, smoothed.width[n] / own);
    if (smoothed.width[n] < smallest) [smallest, limit] = [smoothed.width[n], own];
  }
  const taper = slopeSum / length;
  const [meanWidth, meanLimit] = [widthSum / length, limitSum / length];
  // The middle line of a stroke ends half its width before the stroke does; that of a tip ends where pixels fail.
  const reached = taper > GENTLE_TAPER ? length + smallest / taper : length + meanWidth;
  const plain = taper <= GENTLE_TAPER && gentle + Math.min(meanWidth, gentle) >= meanLimit;
  const counts = plain || reached >= TAPER_EXTENTS * share * meanLimit;
  return { members, smallestPx: smallest, limitPx: limit, worstRatio: worst, lengthPx: length, counts, taper };
}
