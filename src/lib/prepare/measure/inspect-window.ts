import { closedLoops, type ClosedLoop } from '../../imaging/closed-loops';
import { contourOf } from '../../imaging/contour';
import { cappedDistance, HIGHEST_CAP_PX } from '../../imaging/distance';
import { divide, type Field } from '../../imaging/field';
import { medialAxis, type AxisPoints } from '../../imaging/medial-axis';
import { extentAlong, type LineExtents } from './line-extents';
import { FLAGGED_SHARE, thinRuns, type ThinRun, type ThinRuns } from './thin-runs';

/** Something found in a window; px from the window's left and top edges. */
export interface FoundPlace {
  left: number;
  top: number;
  right: number;
  bottom: number;
  /** width, or diameter of the disc of the same area, px */
  smallestPx: number;
  limitPx: number;
  worstRatio: number;
  /** points of a stroke that lie near a border of the window's own part, x, y in turn */
  ends: number[];
}

/** What one side of the level gave: strokes and islands of ink, or gaps and holes in it. */
export interface SideFindings {
  thin: FoundPlace[];
  small: FoundPlace[];
  tips: FoundPlace[];
  /** strokes under 1.5 pixels wide */
  unresolved: FoundPlace[];
}

export interface Inspection {
  ink: SideFindings;
  gaps: SideFindings;
}

/** The part of a window that it answers for; the rest is there so that nothing is judged by half. */
export interface OwnPart {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

/** Below this width, px, the samples do not tell a stroke's width. */
export const UNRESOLVED_PX = 1.5;
/** Areas under this share of the spot's are flagged: 2 % of its diameter lie within what can be measured. */
const SMALL_SHARE = FLAGGED_SHARE * FLAGGED_SHARE;
/** An island longer than this many spots is a short stroke. */
const STROKE_SPOTS = 1.6;
/** Widest lines that are looked at, in line extents. */
const LOOK_EXTENTS = 1.12;

/** Margin, px, that a window needs around its own part: a stretch of three extents and its neighbours. */
export const marginPx = (extents: LineExtents): number => Math.ceil(4.5 * extents.largestPx) + 4;

/**
 * What is too thin or too small in one window of coverage.
 * @param field coverage 0–255; unchanged
 * @param level that parts burned from unburned, 0–255
 * @param extents of the spot at the window's scale; unchanged
 * @param own part that the window answers for, px; unchanged
 * @returns places, px; empty lists where all is sound
 */
export function inspectWindow(field: Field, level: number, extents: LineExtents, own: OwnPart): Inspection {
  const division = divide(field, level);
  const nothing = (): SideFindings => ({ thin: [], small: [], tips: [], unresolved: [] });
  if (!division.edgeBlocks.includes(1)) return { ink: nothing(), gaps: nothing() };
  const contour = contourOf(field, division, level);
  const widest = Math.min(LOOK_EXTENTS * extents.largestPx + 0.5, 2 * (HIGHEST_CAP_PX - 2));
  const squared = cappedDistance(division, Math.min(HIGHEST_CAP_PX, Math.ceil(widest / 2 + 2)));
  const loops = closedLoops(contour, Math.ceil(14 * extents.largestPx + 20));
  const side = (inside: 0 | 1): SideFindings => {
    const points = medialAxis(division, squared, contour, inside, widest);
    const found = thinRuns(points, extents, field.width, field.height);
    const own_ = loops.filter(({ areaPx2 }) => (inside === 1 ? areaPx2 > 0 : areaPx2 < 0));
    return judgeSide(points, found, own_, extents, field.width, own);
  };
  return { ink: side(1), gaps: side(0) };
}

const within = (own: OwnPart, x: number, y: number): boolean =>
  x >= own.left && x < own.right && y >= own.top && y < own.bottom;

/** Whether a loop is smaller than the spot: by area, unless it is drawn out into a stroke. */
function isSmall(loop: ClosedLoop, extents: LineExtents): boolean {
  const spotAlong = extentAlong(extents, loop.longestRad > 0 ? loop.longestRad - Math.PI / 2 : Math.PI / 2);
  return Math.abs(loop.areaPx2) < SMALL_SHARE * extents.spotAreaPx2 && loop.longestPx <= STROKE_SPOTS * spotAlong;
}

function placeOfLoop(loop: ClosedLoop, smallestPx: number, limitPx: number): FoundPlace {
  const { left, top, right, bottom } = loop;
  return { left, top, right, bottom, smallestPx, limitPx, worstRatio: smallestPx / limitPx, ends: [] };
}

function judgeSide(
  points: AxisPoints,
  found: ThinRuns,
  loops: readonly ClosedLoop[],
  extents: LineExtents,
  columns: number,
  own: OwnPart,
): SideFindings {
  const out: SideFindings = { thin: [], small: [], tips: [], unresolved: [] };
  const state = new Uint8Array(points.count);
  found.runs.forEach((run) => run.members.forEach((n) => (state[n] = run.counts ? 2 : 1)));
  for (const loop of loops) {
    const inside = pointsIn(points, found.grid, columns, loop);
    const mine = within(own, (loop.left + loop.right) / 2, (loop.top + loop.bottom) / 2);
    if (isSmall(loop, extents)) {
      inside.forEach((n) => (state[n] = 3));
      const diameter = (area: number): number => 2 * Math.sqrt(area / Math.PI);
      if (mine) out.small.push(placeOfLoop(loop, diameter(Math.abs(loop.areaPx2)), diameter(extents.spotAreaPx2)));
    } else if (mine && !inside.some((n) => state[n] === 2)) {
      const width = compactWidth(inside, points, loop, extents);
      if (width) {
        inside.forEach((n) => (state[n] = 3));
        (width < UNRESOLVED_PX ? out.unresolved : out.thin).push(placeOfLoop(loop, width, extents.smallestPx));
      }
    }
  }
  for (const run of found.runs) {
    if (run.members.every((n) => state[n] === 3)) continue;
    const place = placeOfRun(run, points, found, own);
    if (!place) continue;
    if (run.counts) (run.smallestPx < UNRESOLVED_PX ? out.unresolved : out.thin).push(place);
    else if (run.taper > 1 / 3 && run.lengthPx >= extents.smallestPx) out.tips.push(place);
  }
  return out;
}

function pointsIn(points: AxisPoints, grid: Int32Array, columns: number, loop: ClosedLoop): number[] {
  const list: number[] = [];
  const rows = grid.length / columns;
  for (let y = Math.max(0, Math.floor(loop.top)); y <= Math.min(rows - 1, Math.floor(loop.bottom)); y++) {
    for (let x = Math.max(0, Math.floor(loop.left)); x <= Math.min(columns - 1, Math.floor(loop.right)); x++) {
      const n = grid[y * columns + x];
      if (n >= 0) list.push(n);
    }
  }
  return list;
}

/** Greatest width of an island about as small as the spot, px, if even that is too thin; else null. */
function compactWidth(
  inside: readonly number[],
  points: AxisPoints,
  loop: ClosedLoop,
  extents: LineExtents,
): number | null {
  if (inside.length === 0 || Math.abs(loop.areaPx2) > 2.5 * extents.largestPx ** 2) return null;
  const widest = inside.reduce((most, n) => Math.max(most, points.width[n]), 0);
  return widest < FLAGGED_SHARE * extents.smallestPx ? widest : null;
}

/** How near to the border of a window's own part a point may be met again from the other side, px. */
const SEAM_PX = 3;

function placeOfRun(run: ThinRun, points: AxisPoints, found: ThinRuns, own: OwnPart): FoundPlace | null {
  const place: FoundPlace = {
    left: Infinity,
    top: Infinity,
    right: -Infinity,
    bottom: -Infinity,
    smallestPx: Infinity,
    limitPx: run.limitPx,
    worstRatio: run.worstRatio,
    ends: [],
  };
  for (const n of run.members) {
    const [x, y, width] = [points.x[n], points.y[n], found.smoothed.width[n]];
    if (!within(own, x, y)) continue;
    place.left = Math.min(place.left, x);
    place.right = Math.max(place.right, x);
    place.top = Math.min(place.top, y);
    place.bottom = Math.max(place.bottom, y);
    place.smallestPx = Math.min(place.smallestPx, width);
    const toSeam = Math.min(x - own.left, own.right - x, y - own.top, own.bottom - y);
    if (toSeam < SEAM_PX) place.ends.push(x, y);
  }
  return place.smallestPx === Infinity ? null : place;
}
