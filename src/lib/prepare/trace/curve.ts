import SvgPath from 'svgpath';

export type Point = readonly [x: number, y: number];
/** a b c d e f as in SVG: x' = a·x + c·y + e, y' = b·x + d·y + f */
export type Matrix = readonly [a: number, b: number, c: number, d: number, e: number, f: number];

/** A straight piece, or a cubic one with its two control points. */
export type Piece = { to: Point } | { c1: Point; c2: Point; to: Point };

/** One line: where it starts, its pieces, and whether it closes. */
export interface Curve {
  start: Point;
  pieces: Piece[];
  closed: boolean;
}

export const IDENTITY: Matrix = [1, 0, 0, 1, 0, 0];

/** The matrix that applies `second` to what it is given and `first` to the outcome: first × second. */
export function multiply(first: Matrix, second: Matrix): Matrix {
  const [a, b, c, d, e, f] = first;
  const [g, h, i, j, k, l] = second;
  return [a * g + c * h, b * g + d * h, a * i + c * j, b * i + d * j, a * k + c * l + e, b * k + d * l + f];
}

export const apply = ([a, b, c, d, e, f]: Matrix, [x, y]: Point): Point => [
  a * x + c * y + e,
  b * x + d * y + f,
];

/** A matrix from the `transform` attribute; what cannot be read changes nothing. */
export function readTransform(text: string | undefined): Matrix {
  if (!text) return IDENTITY;
  const path = new SvgPath('M0 0L1 0L0 1').transform(text).abs();
  const corners: Point[] = [];
  path.iterate((segment) => {
    corners.push([Number(segment[1]), Number(segment[2])]);
  });
  const [origin, right, down] = corners;
  if (!down) return IDENTITY;
  return [
    right[0] - origin[0],
    right[1] - origin[1],
    down[0] - origin[0],
    down[1] - origin[1],
    origin[0],
    origin[1],
  ];
}

const third = (from: Point, control: Point): Point => [
  from[0] + (2 / 3) * (control[0] - from[0]),
  from[1] + (2 / 3) * (control[1] - from[1]),
];

/**
 * Lines of SVG path data: arcs and quadratic pieces become cubic, relative coordinates absolute.
 * @param data path data; what follows a mistake is left out, as SVG 2 section 9.5.4 asks
 * @param matrix applied to every point
 * @returns one curve for each subpath that has a piece or closes; a lone move gives none
 */
export function readPathData(data: string, matrix: Matrix = IDENTITY): Curve[] {
  const curves: Curve[] = [];
  let curve: Curve | null = null;
  let [at, begin]: [Point, Point] = [
    [0, 0],
    [0, 0],
  ];
  const open = (): Curve => {
    if (!curve) {
      curve = { start: at, pieces: [], closed: false };
      begin = at;
      curves.push(curve);
    }
    return curve;
  };
  const path = new SvgPath(data).abs().unshort().unarc().abs();
  path.iterate((segment, _index, x, y) => {
    const values = segment.slice(1).map(Number);
    at = [x, y];
    switch (segment[0]) {
      case 'M':
        curve = null;
        at = [values[0], values[1]];
        open();
        break;
      case 'L':
        open().pieces.push({ to: [values[0], values[1]] });
        break;
      case 'H':
        open().pieces.push({ to: [values[0], y] });
        break;
      case 'V':
        open().pieces.push({ to: [x, values[0]] });
        break;
      case 'C':
        open().pieces.push({
          c1: [values[0], values[1]],
          c2: [values[2], values[3]],
          to: [values[4], values[5]],
        });
        break;
      case 'Q': {
        const [control, to]: [Point, Point] = [
          [values[0], values[1]],
          [values[2], values[3]],
        ];
        open().pieces.push({ c1: third(at, control), c2: third(to, control), to });
        break;
      }
      default:
        open().closed = true;
        at = begin;
        curve = null;
    }
  });
  return curves.filter((item) => item.pieces.length > 0).map((item) => transformCurve(item, matrix));
}

/** The curve with a matrix applied to its points. */
export function transformCurve(curve: Curve, matrix: Matrix): Curve {
  if (matrix === IDENTITY) return curve;
  const pieces = curve.pieces.map((piece): Piece =>
    'c1' in piece
      ? { c1: apply(matrix, piece.c1), c2: apply(matrix, piece.c2), to: apply(matrix, piece.to) }
      : { to: apply(matrix, piece.to) },
  );
  return { start: apply(matrix, curve.start), pieces, closed: curve.closed };
}

const MAX_STEPS = 200;

/** Steps in which a cubic stays within a tolerance of its chords: a bound by its second differences. */
function stepsOf(from: Point, piece: { c1: Point; c2: Point; to: Point }, tolerance: number): number {
  const bend = (a: Point, b: Point, c: Point): number =>
    Math.hypot(a[0] - 2 * b[0] + c[0], a[1] - 2 * b[1] + c[1]);
  const most = Math.max(bend(from, piece.c1, piece.c2), bend(piece.c1, piece.c2, piece.to));
  return Math.min(MAX_STEPS, Math.max(1, Math.ceil(Math.sqrt((0.75 * most) / tolerance))));
}

/** Point of a cubic at t from 0 to 1. */
export function cubicAt(from: Point, { c1, c2, to }: { c1: Point; c2: Point; to: Point }, t: number): Point {
  const s = 1 - t;
  const [a, b, c, d] = [s * s * s, 3 * s * s * t, 3 * s * t * t, t * t * t];
  return [a * from[0] + b * c1[0] + c * c2[0] + d * to[0], a * from[1] + b * c1[1] + c * c2[1] + d * to[1]];
}

/**
 * Corners of a chain of chords along a curve.
 * @param tolerance farthest that a chord may lie from the curve, in the curve's unit, above 0
 * @returns at least two points; the first is not repeated at the end of a closed curve
 */
export function flatten(curve: Curve, tolerance: number): Point[] {
  const points: Point[] = [curve.start];
  let from = curve.start;
  for (const piece of curve.pieces) {
    if ('c1' in piece) {
      const steps = stepsOf(from, piece, tolerance);
      for (let step = 1; step < steps; step += 1) points.push(cubicAt(from, piece, step / steps));
    }
    points.push(piece.to);
    from = piece.to;
  }
  if (curve.closed && points.length > 2) {
    const last = points[points.length - 1];
    if (last[0] === curve.start[0] && last[1] === curve.start[1]) points.pop();
  }
  return points;
}

/** The straight-sided curve through points. */
export function polyline(points: readonly Point[], closed: boolean): Curve {
  return { start: points[0], pieces: points.slice(1).map((to) => ({ to })), closed };
}

/** A coordinate in mm to a tenth of a micrometre, without a needless zero. */
const write = (value: number): string => {
  const rounded = Math.round(value * 1e4) / 1e4;
  return String(rounded === 0 ? 0 : rounded);
};
const pair = (point: Point): string => `${write(point[0])} ${write(point[1])}`;

/** Path data of one curve, absolute, to a tenth of a micrometre where the unit is mm. */
export function writePathData({ start, pieces, closed }: Curve): string {
  const parts = pieces.map((piece) =>
    'c1' in piece ? `C${pair(piece.c1)} ${pair(piece.c2)} ${pair(piece.to)}` : `L${pair(piece.to)}`,
  );
  return `M${pair(start)}${parts.join('')}${closed ? 'Z' : ''}`;
}

/** Length of a curve, measured along chords within a tolerance. */
export function curveLength(curve: Curve, tolerance: number): number {
  const points = flatten(curve, tolerance);
  let length = 0;
  for (let index = 1; index < points.length; index += 1) {
    length += Math.hypot(points[index][0] - points[index - 1][0], points[index][1] - points[index - 1][1]);
  }
  if (!curve.closed) return length;
  const [first, last] = [points[0], points[points.length - 1]];
  return length + Math.hypot(first[0] - last[0], first[1] - last[1]);
}
