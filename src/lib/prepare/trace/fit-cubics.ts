import { cubicAt, type Piece, type Point } from './curve';

type Cubic = { c1: Point; c2: Point; to: Point };

const minus = (a: Point, b: Point): Point => [a[0] - b[0], a[1] - b[1]];
const plus = (a: Point, b: Point, by = 1): Point => [a[0] + by * b[0], a[1] + by * b[1]];
const dot = (a: Point, b: Point): number => a[0] * b[0] + a[1] * b[1];
const unit = (a: Point): Point => {
  const length = Math.hypot(a[0], a[1]);
  return length > 0 ? [a[0] / length, a[1] / length] : [0, 0];
};

/** Places along a chain by its length, 0 to 1. */
function byLength(points: readonly Point[]): number[] {
  const along = [0];
  for (let n = 1; n < points.length; n += 1) {
    along.push(along[n - 1] + Math.hypot(points[n][0] - points[n - 1][0], points[n][1] - points[n - 1][1]));
  }
  const whole = along[along.length - 1] || 1;
  return along.map((length) => length / whole);
}

/** The cubic with given end directions that lies nearest to points at given places, by least squares. */
function leastSquares(points: readonly Point[], places: readonly number[], out: Point, back: Point): Cubic {
  const [from, to] = [points[0], points[points.length - 1]];
  let [c00, c01, c11, x0, x1] = [0, 0, 0, 0, 0];
  places.forEach((t, n) => {
    const s = 1 - t;
    const [b0, b1, b2, b3] = [s * s * s, 3 * s * s * t, 3 * s * t * t, t * t * t];
    const [a0, a1]: [Point, Point] = [
      [out[0] * b1, out[1] * b1],
      [back[0] * b2, back[1] * b2],
    ];
    c00 += dot(a0, a0);
    c01 += dot(a0, a1);
    c11 += dot(a1, a1);
    const rest = minus(points[n], [
      from[0] * (b0 + b1) + to[0] * (b2 + b3),
      from[1] * (b0 + b1) + to[1] * (b2 + b3),
    ]);
    x0 += dot(a0, rest);
    x1 += dot(a1, rest);
  });
  const det = c00 * c11 - c01 * c01;
  const span = Math.hypot(to[0] - from[0], to[1] - from[1]);
  let [reach, pull] = det === 0 ? [0, 0] : [(x0 * c11 - x1 * c01) / det, (c00 * x1 - c01 * x0) / det];
  // Directions that fight each other give handles that point backwards; a third of the span is the calm choice.
  if (reach < 1e-6 * span || pull < 1e-6 * span) [reach, pull] = [span / 3, span / 3];
  return { c1: plus(from, out, reach), c2: plus(to, back, pull), to };
}

/** A place moved nearer to the foot of a point on a cubic, by one step of Newton's method. */
function improve(from: Point, cubic: Cubic, point: Point, t: number): number {
  const { c1, c2, to } = cubic;
  const s = 1 - t;
  const away = minus(cubicAt(from, cubic, t), point);
  const [d0, d1, d2] = [minus(c1, from), minus(c2, c1), minus(to, c2)];
  const slope: Point = [
    3 * (s * s * d0[0] + 2 * s * t * d1[0] + t * t * d2[0]),
    3 * (s * s * d0[1] + 2 * s * t * d1[1] + t * t * d2[1]),
  ];
  const [e0, e1] = [minus(d1, d0), minus(d2, d1)];
  const bend: Point = [6 * (s * e0[0] + t * e1[0]), 6 * (s * e0[1] + t * e1[1])];
  const below = dot(slope, slope) + dot(away, bend);
  return below === 0 ? t : Math.min(1, Math.max(0, t - dot(away, slope) / below));
}

function worst(
  points: readonly Point[],
  places: readonly number[],
  cubic: Cubic,
): { at: number; error: number } {
  let [at, error] = [Math.floor(points.length / 2), 0];
  for (let n = 1; n < points.length - 1; n += 1) {
    const away = minus(cubicAt(points[0], cubic, places[n]), points[n]);
    const distance = Math.hypot(away[0], away[1]);
    if (distance > error) [at, error] = [n, distance];
  }
  return { at, error };
}

function isStraight(points: readonly Point[], tolerance: number): boolean {
  const [from, to] = [points[0], points[points.length - 1]];
  const [dx, dy] = unit(minus(to, from));
  if (dx === 0 && dy === 0) return false;
  return points.every((p) => Math.abs((p[0] - from[0]) * dy - (p[1] - from[1]) * dx) <= tolerance / 4);
}

const STEPS = 4;

/**
 * Cubic pieces through the corners of a smooth chain.
 * Least squares with the places of the corners improved by Newton's method; a chain that one piece cannot follow is halved
 * where it is worst, with one direction through the halves.
 * @param points at least two; unchanged
 * @param out direction in which the chain leaves its first point; @param back from its last point backwards; unit vectors
 * @param tolerance farthest that a corner may lie from the curve
 * @see Schneider, An algorithm for automatically fitting digitized curves, Graphics Gems, 1990
 */
export function fitCubics(points: readonly Point[], out: Point, back: Point, tolerance: number): Piece[] {
  const last = points[points.length - 1];
  if (points.length === 2 || isStraight(points, tolerance)) return [{ to: last }];
  let places = byLength(points);
  let cubic = leastSquares(points, places, out, back);
  let off = worst(points, places, cubic);
  for (let step = 0; step < STEPS && off.error > tolerance && off.error < 10 * tolerance; step += 1) {
    places = places.map((t, n) => improve(points[0], cubic, points[n], t));
    cubic = leastSquares(points, places, out, back);
    off = worst(points, places, cubic);
  }
  if (off.error <= tolerance) return [cubic];
  const { at } = off;
  const through = unit(minus(points[at + 1], points[at - 1]));
  const first = fitCubics(points.slice(0, at + 1), out, [-through[0], -through[1]], tolerance);
  return [...first, ...fitCubics(points.slice(at), through, back, tolerance)];
}

export const direction = (from: Point, to: Point): Point => unit(minus(to, from));
