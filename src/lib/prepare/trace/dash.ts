import { polyline, type Curve, type Point } from './curve';

/** More dashes than this on one line are more than a line is worth; it stays unbroken. */
const MAX_DASHES = 20_000;

/**
 * The drawn pieces of a dashed line.
 * @param points corners of the line
 * @param closed whether it runs back to its start
 * @param dashes drawn and bare lengths in turn, an even number, their sum above 0
 * @param offset how far into the dashes the line begins
 * @returns one open curve a dash
 */
export function dash(
  points: readonly Point[],
  closed: boolean,
  dashes: readonly number[],
  offset: number,
): Curve[] {
  const chain = closed ? [...points, points[0]] : points;
  const period = dashes.reduce((sum, length) => sum + length, 0);
  const whole = chain.reduce(
    (sum, p, i) => (i === 0 ? 0 : sum + Math.hypot(p[0] - chain[i - 1][0], p[1] - chain[i - 1][1])),
    0,
  );
  if ((whole / period) * (dashes.length / 2) > MAX_DASHES) return [polyline(points, closed)];
  let [index, left] = [0, ((offset % period) + period) % period];
  while (left >= dashes[index]) {
    left -= dashes[index];
    index = (index + 1) % dashes.length;
  }
  left = dashes[index] - left;
  const drawn: Point[][] = [];
  let current: Point[] | null = index % 2 === 0 ? [chain[0]] : null;
  for (let n = 1; n < chain.length; n += 1) {
    let from = chain[n - 1];
    const to = chain[n];
    let length = Math.hypot(to[0] - from[0], to[1] - from[1]);
    while (length > left) {
      const t = left / length;
      const cut: Point = [from[0] + t * (to[0] - from[0]), from[1] + t * (to[1] - from[1])];
      if (current) {
        drawn.push([...current, cut]);
        current = null;
      } else current = [cut];
      length -= left;
      from = cut;
      // A dash of no length still changes the turn, so that it cannot hold the walk.
      index = (index + 1) % dashes.length;
      left = Math.max(dashes[index], 1e-9 * period);
    }
    left -= length;
    current?.push(to);
  }
  if (current && current.length > 1) drawn.push(current);
  return drawn.filter((line) => line.length > 1).map((line) => polyline(line, false));
}
