import { closedLoops, type ClosedLoop } from '../../imaging/closed-loops';
import { contourOf } from '../../imaging/contour';
import { cappedDistance, HIGHEST_CAP_PX } from '../../imaging/distance';
import { divide, type Field } from '../../imaging/field';
import { FINE_LINE_PX, fineLines, withFineLines } from '../../imaging/fine-lines';
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
  /** how many times wider the whole artwork must be for the place to be sound; 1 where it counts for nothing */
  soundScale: number;
  /** whether it tapers to nothing and is thin at any scale */
  fading: boolean;
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
  /** pixels above the level in the window's own part */
  burnedPx: number;
}

/** The part of a window that it answers for; the rest is there so that nothing is judged by half. */
export interface OwnPart {
  left: number;
  top: number;
  right: number;
  bottom: number;
}

export interface InspectedWindow {
  own: OwnPart;
  /** whether a place, px, belongs to a part that is not judged */
  leaveOut(x: number, y: number): boolean;
  /** lowest peak of a line without an outline, 0–255 */
  faintest: number;
}

/** Below this width, px, the samples do not tell a stroke's width. */
export const UNRESOLVED_PX = 1.5;
/** Areas under this share of the spot's are flagged: 2 % of its diameter lie within what can be measured. */
const SMALL_SHARE = FLAGGED_SHARE * FLAGGED_SHARE;
/** An island longer than this many spots is a short stroke. */
const STROKE_SPOTS = 1.6;
/** Widest lines that are looked at, in line extents. */
const LOOK_EXTENTS = 1.12;

/** Marks points that lie in an island or hole smaller than the spot, and members of strokes that count. */
const SMALL = 1;
const COUNTS = 2;

/** Margin, px, that a window needs around its own part: a stretch of three extents and its neighbours. */
export const marginPx = (extents: LineExtents): number => Math.ceil(4.5 * extents.largestPx) + 4;

/**
 * What is too thin or too small in one window of coverage.
 * @param field coverage 0–255; unchanged
 * @param level that parts burned from unburned, 0–255
 * @param extents of the spot at the window's scale; unchanged
 * @param window what it answers for and what it leaves out; unchanged
 * @returns places, px; empty lists where all is sound
 */
export function inspectWindow(
  field: Field,
  level: number,
  extents: LineExtents,
  window: InspectedWindow,
): Inspection {
  const division = divide(field, level);
  const contour = contourOf(field, division, level);
  const widest = Math.min(LOOK_EXTENTS * extents.largestPx + 0.5, 2 * (HIGHEST_CAP_PX - 2));
  const squared = cappedDistance(division, Math.min(HIGHEST_CAP_PX, Math.ceil(widest / 2 + 2)));
  const loops = closedLoops(contour, Math.ceil(14 * extents.largestPx + 20));
  const side = (inside: 0 | 1): SideFindings => {
    const outlined = medialAxis(division, squared, contour, inside, widest);
    const points = withFineLines(outlined, fineLines(field, inside, window.faintest), field.width);
    const found = thinRuns(points, extents, field.width, field.height);
    const closed = loops.filter(({ areaPx2 }) => (inside === 1 ? areaPx2 > 0 : areaPx2 < 0));
    return judgeSide(points, found, closed, extents, field.width, window);
  };
  return { ink: side(1), gaps: side(0), burnedPx: countBurned(division.inside, field.width, window.own) };
}

export const nothing = (): SideFindings => ({ thin: [], small: [], tips: [], unresolved: [] });

export const within = (own: OwnPart, x: number, y: number): boolean =>
  x >= own.left && x < own.right && y >= own.top && y < own.bottom;

/** Whether a loop is so long that it is a stroke, however small. */
function isDrawnOut(loop: ClosedLoop, extents: LineExtents): boolean {
  const spotAlong = extentAlong(extents, loop.longestRad > 0 ? loop.longestRad - Math.PI / 2 : Math.PI / 2);
  return loop.longestPx > STROKE_SPOTS * spotAlong;
}

/** Whether a loop encloses less than the spot's area without being a stroke. */
const isSmall = (loop: ClosedLoop, extents: LineExtents): boolean =>
  Math.abs(loop.areaPx2) < SMALL_SHARE * extents.spotAreaPx2 && !isDrawnOut(loop, extents);

const diameterOf = (area: number): number => 2 * Math.sqrt(area / Math.PI);

function placeOfLoop(loop: ClosedLoop, smallestPx: number, limitPx: number): FoundPlace {
  const { left, top, right, bottom } = loop;
  return {
    left,
    top,
    right,
    bottom,
    smallestPx,
    limitPx,
    worstRatio: smallestPx / limitPx,
    soundScale: 1,
    fading: false,
    ends: [],
  };
}

function judgeSide(
  points: AxisPoints,
  found: ThinRuns,
  loops: readonly ClosedLoop[],
  extents: LineExtents,
  columns: number,
  window: InspectedWindow,
): SideFindings {
  const { own } = window;
  const out = nothing();
  const state = new Uint8Array(points.count);
  found.runs.forEach((run) => {
    if (run.counts) run.members.forEach((n) => (state[n] = COUNTS));
  });
  for (const loop of loops) {
    const inside = pointsIn(points, found.grid, columns, loop);
    if (window.leaveOut((loop.left + loop.right) / 2, (loop.top + loop.bottom) / 2)) continue;
    if (isPieceOfStroke(loop, inside, state, points, found, columns)) continue;
    const mine = within(own, (loop.left + loop.right) / 2, (loop.top + loop.bottom) / 2);
    if (isSmall(loop, extents) || isBlunt(inside, points, loop, extents)) {
      inside.forEach((n) => (state[n] = SMALL));
      if (mine)
        out.small.push(
          placeOfLoop(loop, diameterOf(Math.abs(loop.areaPx2)), diameterOf(extents.spotAreaPx2)),
        );
    }
  }
  for (const run of found.runs) {
    if (run.members.every((n) => state[n] === SMALL)) continue;
    const place = placeOfRun(run, points, found, window);
    if (!place) continue;
    if (run.counts) (run.meanPx < UNRESOLVED_PX ? out.unresolved : out.thin).push(place);
    else if (run.taper > 1 / 3 && run.lengthPx >= extents.smallestPx) out.tips.push(place);
  }
  return out;
}

function pointsIn(points: AxisPoints, grid: Int32Array, columns: number, loop: OwnPart): number[] {
  const list: number[] = [];
  const rows = grid.length / columns;
  for (let y = Math.max(0, Math.floor(loop.top)); y <= Math.min(rows - 1, Math.floor(loop.bottom)); y++) {
    for (
      let x = Math.max(0, Math.floor(loop.left));
      x <= Math.min(columns - 1, Math.floor(loop.right));
      x++
    ) {
      const n = grid[y * columns + x];
      if (n >= 0) list.push(n);
    }
  }
  return list;
}

/** Whether a loop is one of the pieces into which pixels break a stroke thinner than they are. */
function isPieceOfStroke(
  loop: ClosedLoop,
  inside: readonly number[],
  state: Uint8Array,
  points: AxisPoints,
  found: ThinRuns,
  columns: number,
): boolean {
  const around = 2.5;
  const wider = {
    left: loop.left - around,
    top: loop.top - around,
    right: loop.right + around,
    bottom: loop.bottom + around,
  };
  const counting = (n: number): boolean => state[n] === COUNTS;
  const unseen = diameterOf(Math.abs(loop.areaPx2)) < FINE_LINE_PX;
  if (!unseen && !inside.some((n) => counting(n) && points.width[n] < FINE_LINE_PX)) return false;
  return (
    pointsIn(points, found.grid, columns, wider).filter(counting).length > inside.filter(counting).length
  );
}

function countBurned(inside: Uint8Array, width: number, own: OwnPart): number {
  let burned = 0;
  for (let y = own.top; y < own.bottom; y++) {
    for (let i = y * width + own.left; i < y * width + own.right; i++) burned += inside[i];
  }
  return burned;
}

/** Whether an island about as small as the spot is too thin everywhere without being a stroke. */
function isBlunt(
  inside: readonly number[],
  points: AxisPoints,
  loop: ClosedLoop,
  extents: LineExtents,
): boolean {
  if (inside.length === 0 || isDrawnOut(loop, extents)) return false;
  return inside.every((n) => points.width[n] < FLAGGED_SHARE * extents.smallestPx);
}

/** How near to the border of a window's own part a point may be met again from the other side, px. */
const SEAM_PX = 3;

function placeOfRun(
  run: ThinRun,
  points: AxisPoints,
  found: ThinRuns,
  { own, leaveOut }: InspectedWindow,
): FoundPlace | null {
  const left = run.members.reduce((count, n) => count + (leaveOut(points.x[n], points.y[n]) ? 1 : 0), 0);
  if (left > run.members.length / 2) return null;
  const place: FoundPlace = {
    left: Infinity,
    top: Infinity,
    right: -Infinity,
    bottom: -Infinity,
    smallestPx: Infinity,
    limitPx: run.limitPx,
    worstRatio: run.worstRatio,
    soundScale: run.soundScale,
    fading: run.fading,
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
