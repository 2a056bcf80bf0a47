import {
  Clipper,
  ClipperD,
  ClipType,
  EndType,
  FillRule,
  JoinType,
  type PathD,
  type PathsD,
} from 'clipper2-ts';
import type { Point } from './curve';

/** An area of the plane, mm: outlines whose inside is counted by the non-zero rule, holes turning the other way. */
export type Region = readonly (readonly Point[])[];

/** Decimals of a mm that areas are worked out to: a tenth of a micrometre. */
const PRECISION = 4;

const toPath = (points: readonly Point[]): PathD => points.map(([x, y]) => ({ x, y }));
const toPaths = (region: Region): PathsD => region.map(toPath);
const fromPaths = (paths: PathsD): Region =>
  paths.filter((path) => path.length > 2).map((path) => path.map(({ x, y }): Point => [x, y]));

export const EMPTY: Region = [];

/** The area within outlines by a fill rule, each part once. */
export function regionOf(outlines: Region, rule: 'nonzero' | 'evenodd'): Region {
  if (outlines.length === 0) return EMPTY;
  const fillRule = rule === 'evenodd' ? FillRule.EvenOdd : FillRule.NonZero;
  return fromPaths(Clipper.unionD(toPaths(outlines), [], fillRule, PRECISION));
}

/** Area of either region. */
export function unite(a: Region, b: Region): Region {
  if (a.length === 0) return b;
  if (b.length === 0) return a;
  return fromPaths(Clipper.unionD(toPaths(a), toPaths(b), FillRule.NonZero, PRECISION));
}

/** Area of `a` outside `b`. */
export function subtract(a: Region, b: Region): Region {
  if (a.length === 0 || b.length === 0) return a;
  return fromPaths(Clipper.differenceD(toPaths(a), toPaths(b), FillRule.NonZero, PRECISION));
}

/** Area of both regions; empty where one of them is. */
export function intersect(a: Region, b: Region): Region {
  if (a.length === 0 || b.length === 0) return EMPTY;
  return fromPaths(Clipper.intersectD(toPaths(a), toPaths(b), FillRule.NonZero, PRECISION));
}

/** Area of a region, mm²; holes do not count. */
export function areaOf(region: Region): number {
  return Math.abs(region.reduce((sum, path) => sum + signedArea(path), 0));
}

/** Area within one outline with the sign of its turn. */
export function signedArea(path: readonly Point[]): number {
  let sum = 0;
  for (let index = 0, before = path.length - 1; index < path.length; before = index, index += 1) {
    sum += path[before][0] * path[index][1] - path[index][0] * path[before][1];
  }
  return sum / 2;
}

/** Smallest upright rectangle around points: left, top, right, bottom. */
export function boundsOf(paths: Region): [number, number, number, number] {
  const bounds: [number, number, number, number] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const path of paths) {
    for (const [x, y] of path) {
      if (x < bounds[0]) bounds[0] = x;
      if (y < bounds[1]) bounds[1] = y;
      if (x > bounds[2]) bounds[2] = x;
      if (y > bounds[3]) bounds[3] = y;
    }
  }
  return bounds;
}

/** The parts of an open line inside or outside a region. */
export function cutLine(line: readonly Point[], region: Region, keep: 'inside' | 'outside'): Point[][] {
  if (region.length === 0) return keep === 'inside' ? [] : [[...line]];
  const clipper = new ClipperD(PRECISION);
  clipper.addOpenSubjectPaths([toPath(line)]);
  clipper.addClipPaths(toPaths(region));
  const [closed, open]: [PathsD, PathsD] = [[], []];
  clipper.execute(
    keep === 'inside' ? ClipType.Intersection : ClipType.Difference,
    FillRule.NonZero,
    closed,
    open,
  );
  return open.filter((path) => path.length > 1).map((path) => path.map(({ x, y }): Point => [x, y]));
}

export interface Pen {
  width: number;
  cap: 'butt' | 'round' | 'square';
  join: 'miter' | 'round' | 'bevel';
  miterLimit: number;
}

const END = { butt: EndType.Butt, round: EndType.Round, square: EndType.Square };
const JOIN = { miter: JoinType.Miter, round: JoinType.Round, bevel: JoinType.Bevel };

/** The area that a pen covers along lines. */
export function penArea(
  lines: readonly { points: readonly Point[]; closed: boolean }[],
  pen: Pen,
  tolerance: number,
): Region {
  let area: Region = EMPTY;
  for (const closed of [false, true]) {
    const paths = lines.filter((line) => line.closed === closed).map((line) => toPath(line.points));
    if (paths.length === 0) continue;
    const end = closed ? EndType.Joined : END[pen.cap];
    const half = pen.width / 2;
    const grown = Clipper.inflatePathsD(
      paths,
      half,
      JOIN[pen.join],
      end,
      pen.miterLimit,
      PRECISION,
      tolerance,
    );
    area = unite(area, fromPaths(grown));
  }
  return area;
}

/** A region moved inward (below 0) or outward by a distance in every direction: erosion or dilation by a disc. */
export function offsetByDisc(region: Region, distance: number, tolerance: number): Region {
  if (region.length === 0) return EMPTY;
  const paths = Clipper.inflatePathsD(
    toPaths(region),
    distance,
    JoinType.Round,
    EndType.Polygon,
    2,
    PRECISION,
    tolerance,
  );
  return fromPaths(paths);
}

/**
 * The band that an upright rectangle sweeps when its centre follows every outline of a region.
 * Outlines are cut where they turn back in x or y; along each run the band lies between the paths of two opposite corners.
 */
export function sweepByRectangle(region: Region, halfWidth: number, halfHeight: number): Region {
  const bands = region.flatMap((path) =>
    monotoneRuns(path).map(({ run, right, down }) => bandAlong(run, right * halfWidth, down * halfHeight)),
  );
  if (bands.length === 0) return EMPTY;
  return fromPaths(Clipper.unionD(bands.map(toPath), [], FillRule.NonZero, PRECISION));
}

interface Run {
  run: Point[];
  /** 1 where x never falls along the run, else −1 */
  right: 1 | -1;
  down: 1 | -1;
}

/** A closed outline cut into runs along which neither x nor y turns back. */
function monotoneRuns(path: readonly Point[]): Run[] {
  const runs: Run[] = [];
  let run: Point[] = [path[0]];
  let [right, down]: (-1 | 0 | 1)[] = [0, 0];
  const sign = (value: number): -1 | 0 | 1 => (value > 0 ? 1 : value < 0 ? -1 : 0);
  const close = (): void => {
    if (run.length > 1) runs.push({ run, right: right || 1, down: down || 1 });
  };
  for (let n = 1; n <= path.length; n += 1) {
    const [from, to] = [path[n - 1], path[n % path.length]];
    const [dx, dy] = [sign(to[0] - from[0]), sign(to[1] - from[1])];
    if (dx * right < 0 || dy * down < 0) {
      close();
      run = [from];
      [right, down] = [0, 0];
    }
    right ||= dx;
    down ||= dy;
    run.push(to);
  }
  close();
  return runs;
}

function bandAlong(run: readonly Point[], w: number, h: number): Point[] {
  const [first, last] = [run[0], run[run.length - 1]];
  const band: Point[] = [
    [first[0] - w, first[1] - h],
    ...run.map(([x, y]): Point => [x + w, y - h]),
    [last[0] + w, last[1] + h],
    ...run.map(([x, y]): Point => [x - w, y + h]).reverse(),
  ];
  // Bands that turn different ways would cancel where they overlap.
  return signedArea(band) < 0 ? band.reverse() : band;
}

/** Outlines with the points left out that lie within a tolerance of the rest. */
export function simplify(region: Region, tolerance: number): Region {
  return fromPaths(Clipper.simplifyPathsD(toPaths(region), tolerance, true));
}
