import type { Curve, Piece, Point } from './curve';
import { direction, fitCubics } from './fit-cubics';

/** A chain that turns by more than this at one point has a corner there. */
const CORNER_COS = Math.cos((30 * Math.PI) / 180);
/** A smooth closed chain is cut in so many pieces to begin with: one cubic cannot go round. */
const SMOOTH_PIECES = 4;

function turnsAt(points: readonly Point[], n: number): boolean {
  const size = points.length;
  const [before, at, after] = [points[(n + size - 1) % size], points[n], points[(n + 1) % size]];
  const [a, b] = [direction(before, at), direction(at, after)];
  return a[0] * b[0] + a[1] * b[1] < CORNER_COS;
}

/**
 * A closed chain of points as a curve of straight and cubic pieces, its corners kept.
 * @param outline at least three points; unchanged
 * @param tolerance farthest that a point may lie from the curve, in the points' unit
 * @returns a closed curve
 */
export function fitOutline(outline: readonly Point[], tolerance: number): Curve {
  const size = outline.length;
  const corners = outline.map((_, n) => n).filter((n) => turnsAt(outline, n));
  const isCorner = new Set(corners);
  const cuts =
    corners.length > 0
      ? corners
      : Array.from({ length: Math.min(SMOOTH_PIECES, size) }, (_, k) =>
          Math.floor((k * size) / SMOOTH_PIECES),
        );
  const tangent = (n: number): Point => direction(outline[(n + size - 1) % size], outline[(n + 1) % size]);
  const pieces: Piece[] = cuts.flatMap((cut, index) => {
    const next = cuts[(index + 1) % cuts.length];
    const length = ((next - cut + size - 1) % size) + 1;
    const run = Array.from({ length: length + 1 }, (_, k) => outline[(cut + k) % size]);
    const out = isCorner.has(cut) ? direction(run[0], run[1]) : tangent(cut);
    const into = isCorner.has(next) ? direction(run[length - 1], run[length]) : tangent(next);
    return fitCubics(run, out, [-into[0], -into[1]], tolerance);
  });
  return { start: outline[cuts[0]], pieces, closed: true };
}
