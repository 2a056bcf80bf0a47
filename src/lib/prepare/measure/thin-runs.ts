import { axisGrid, smoothAxis, type SmoothedAxis } from '../../imaging/axis-smoothing';
import type { AxisPoints } from '../../imaging/medial-axis';
import { extentAlong, type LineExtents } from './line-extents';

/** Widths under this share of the line extent are flagged: 2 % lie within what can be measured. */
export const FLAGGED_SHARE = 0.98;
/** Steepest taper of a stroke that stays thin for three extents of length: width gained for each unit of length. */
const GENTLE_TAPER = 1 / 3;
/** An even stretch shorter than so many pixels is not a stroke but the stairs of a corner: at 6 px an extent, half of one. */
const STAIRS_PX = 3;
/** Length, in line extents, that a steeper taper must stay thin for. */
const TAPER_EXTENTS = 3;

/** A stretch that ends thinner than so many pixels, and is so many times wider half-way, tapers to nothing. */
const FADED_PX = 2.5;
const FADING_SHARE = 1.8;
/** Strokes taper less than this by what cannot be measured better. */
const EVEN_TAPER = 0.03;

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
  meanPx: number;
  /** whether it is a stroke, and not the tip of a corner */
  counts: boolean;
  /** width gained for each unit of length, over the whole stretch */
  taper: number;
  /** how many times larger it must be drawn until it no longer counts; 1 where it does not */
  soundScale: number;
  /** whether it tapers away to nothing, so that it stays thin for as many extents at any scale */
  fading: boolean;
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
  const smoothed = smoothAxis(
    points,
    grid,
    columns,
    Math.min(8, Math.max(2, Math.round(extents.smallestPx))),
  );
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

/** Sums over a stretch, taken member by member. */
class Stretch {
  length = 0;
  gentle = 0;
  width = 0;
  slope = 0;
  limit = 0;
  tapering = 0;
  private narrowest = Infinity;
  private widest = 0;

  add(step: number, width: number, slope: number, limit: number): void {
    this.length += step;
    this.width += step * width;
    this.slope += step * slope;
    this.limit += step * limit;
    if (slope > EVEN_TAPER) this.tapering += step;
    if (slope > GENTLE_TAPER) return;
    this.gentle += step;
    this.narrowest = Math.min(this.narrowest, width);
    this.widest = Math.max(this.widest, width);
  }

  get taper(): number {
    return this.slope / this.length;
  }

  get meanPx(): number {
    return this.width / this.length;
  }

  /** Whether it is a stroke once everything is drawn `scale` times as large. */
  counts(scale: number, smallest: number, share: number): boolean {
    const { length, gentle, taper, meanPx } = this;
    const limit = this.limit / length;
    // The middle line of a stroke ends half its width before the stroke does; that of a tip ends where pixels fail.
    const reached = taper > GENTLE_TAPER ? length + smallest / taper : length + meanPx;
    const even = this.widest - this.narrowest <= GENTLE_TAPER * gentle;
    const plain = even && scale * gentle >= STAIRS_PX && scale * (gentle + Math.min(meanPx, gentle)) >= limit;
    return plain || scale * reached >= TAPER_EXTENTS * share * limit;
  }
}

function describe(members: number[], smoothed: SmoothedAxis, extents: LineExtents, share: number): ThinRun {
  const whole = new Stretch();
  const ratio = new Map<number, number>();
  let [smallest, limit] = [Infinity, 0];
  for (const n of members) {
    const own = extentAlong(extents, smoothed.along[n]);
    const width = smoothed.width[n];
    whole.add(smoothed.length[n], width, smoothed.slope[n], own);
    ratio.set(n, width / own);
    if (width < smallest) [smallest, limit] = [width, own];
  }
  const byRatio = [...members].sort((a, b) => (ratio.get(a) ?? 0) - (ratio.get(b) ?? 0));
  const counts = whole.counts(1, smallest, share);
  const soundScale = counts ? scaleToSound(byRatio, ratio, smoothed, extents, smallest, share) : 1;
  const { length, taper, meanPx } = whole;
  const worstRatio = ratio.get(byRatio[0]) ?? Infinity;
  const middle = ratio.get(byRatio[byRatio.length >> 1]) ?? 0;
  const fades = smallest < FADED_PX && middle > FADING_SHARE * worstRatio && whole.tapering > 0.8 * length;
  const fading = fades && soundScale * worstRatio > 0.8 * share;
  return {
    members,
    smallestPx: smallest,
    limitPx: limit,
    worstRatio,
    lengthPx: length,
    meanPx,
    counts,
    taper,
    soundScale,
    fading,
  };
}

/** How many times larger a stretch must be drawn until what stays thin of it no longer counts. */
function scaleToSound(
  byRatio: readonly number[],
  ratio: ReadonlyMap<number, number>,
  smoothed: SmoothedAxis,
  extents: LineExtents,
  smallest: number,
  share: number,
): number {
  const thin = new Stretch();
  let scale = 1;
  for (const n of byRatio) {
    thin.add(
      smoothed.length[n],
      smoothed.width[n],
      smoothed.slope[n],
      extentAlong(extents, smoothed.along[n]),
    );
    // At this scale everything up to this member is just thin.
    const at = share / (ratio.get(n) ?? share);
    if (thin.counts(at, smallest, share)) scale = Math.max(scale, at);
  }
  return scale;
}
