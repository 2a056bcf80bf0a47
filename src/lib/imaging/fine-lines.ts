import type { Field } from './field';
import type { AxisPoints } from './medial-axis';

/** Lines up to this wide are seen by their coverage: their outline says too little, px. */
export const FINE_LINE_PX = 1.6;
/** What lies beside a line is ground: at most this share of its peak. */
const GROUND_SHARE = 0.3;
const REACH_PX = 2;
/** A line whose weight lies so far ahead or behind, px, ends within the window. */
const END_PX = 0.3;

/**
 * Points along lines that are too thin to have an outline: peaks across which the samples fall back to the ground on both
 * sides within two pixels. Their width is what their coverage amounts to, so that it is right down to a tenth of a pixel.
 * @param field coverage; unchanged
 * @param side 1 for lines of high samples, 0 for lines of low ones
 * @param faintest lowest peak that counts, 0–255
 * @returns points row by row as `medialAxis` gives them; none where nothing is that thin
 * @example a line 0.3 px wide gives points of width 0.3 ± 0.05
 */
export function fineLines(field: Field, side: 0 | 1, faintest: number): AxisPoints {
  const { width, height, data } = field;
  const flip = side === 1 ? 0 : 255;
  const pixel: number[] = [];
  const numbers: number[] = [];
  for (let y = REACH_PX; y < height - REACH_PX; y++) {
    for (let x = REACH_PX; x < width - REACH_PX; x++) {
      const i = y * width + x;
      const v = data[i] ^ flip;
      if (v < faintest) continue;
      const most = GROUND_SHARE * v;
      if (!isPeak(data, i, 1, v, most, flip) && !isPeak(data, i, width, v, most, flip)) continue;
      const at = numbers.length;
      if (!weigh(data, i, width, x, y, flip, numbers)) continue;
      if (numbers[at + 2] > FINE_LINE_PX) numbers.length = at;
      else pixel.push(i);
    }
  }
  const pick = (offset: number): Float32Array => Float32Array.from(pixel, (_, n) => numbers[n * 4 + offset]);
  return {
    count: pixel.length,
    pixel: Int32Array.from(pixel),
    x: pick(0),
    y: pick(1),
    width: pick(2),
    across: pick(3),
  };
}

/** Whether the samples along one step rise to a pixel and fall back to the ground on both sides. */
function isPeak(data: Uint8Array, i: number, step: number, v: number, most: number, flip: number): boolean {
  return (
    (data[i - step] ^ flip) <= v &&
    (data[i + step] ^ flip) < v + 1 &&
    (data[i - 2 * step] ^ flip) <= most &&
    (data[i + 2 * step] ^ flip) <= most
  );
}

/** Adds x, y, width and angle across of the line through a pixel, from the moments of the samples around it. */
function weigh(
  data: Uint8Array,
  i: number,
  width: number,
  x: number,
  y: number,
  flip: number,
  out: number[],
): boolean {
  let [m, mx, my, mxx, mxy, myy] = [0, 0, 0, 0, 0, 0];
  for (let dy = -REACH_PX; dy <= REACH_PX; dy++) {
    for (let dx = -REACH_PX; dx <= REACH_PX; dx++) {
      const v = data[i + dy * width + dx] ^ flip;
      m += v;
      mx += v * dx;
      my += v * dy;
      mxx += v * dx * dx;
      mxy += v * dx * dy;
      myy += v * dy * dy;
    }
  }
  const [xx, yy, xy] = [mxx / m - (mx / m) ** 2, myy / m - (my / m) ** 2, mxy / m - (mx * my) / (m * m)];
  // A line spreads along itself alone: a crossing or a dot is no line.
  const spread = Math.hypot(xx - yy, 2 * xy);
  if (spread < 0.5 * (xx + yy)) return false;
  const along = Math.atan2(2 * xy, xx - yy) / 2;
  // At the end of a line half the window is empty, and what is left tells no width.
  if (Math.abs(mx * Math.cos(along) + my * Math.sin(along)) > END_PX * m) return false;
  // The straight cut through the pixel holds the whole line; aslant it is longer than the line is wide.
  const flat = Math.abs(Math.cos(along)) >= Math.abs(Math.sin(along));
  const step = flat ? width : 1;
  let cut = 0;
  for (let k = -REACH_PX; k <= REACH_PX; k++) cut += data[i + k * step] ^ flip;
  const share = Math.max(Math.abs(Math.cos(along)), Math.abs(Math.sin(along)));
  out.push(x + 0.5, y + 0.5, (cut / 255) * share, along > 0 ? along - Math.PI / 2 : along + Math.PI / 2);
  return true;
}

/**
 * Two lists of points as one: where both saw a line of less than `FINE_LINE_PX`, the fine one stands.
 * @param points of `medialAxis`; unchanged
 * @param fine of `fineLines`; unchanged
 * @param columns width of the picture, px
 * @returns points row by row
 */
export function withFineLines(points: AxisPoints, fine: AxisPoints, columns: number): AxisPoints {
  if (fine.count === 0) return points;
  const taken = new Set<number>(fine.pixel);
  const shadowed = (n: number): boolean => {
    if (points.width[n] > FINE_LINE_PX + 0.4) return false;
    for (let dy = -1; dy <= 1; dy++) {
      for (let dx = -1; dx <= 1; dx++) if (taken.has(points.pixel[n] + dy * columns + dx)) return true;
    }
    return false;
  };
  const kept = Array.from({ length: points.count }, (_, n) => n).filter((n) => !shadowed(n));
  const order = [
    ...kept.map((n) => [points, n] as const),
    ...Array.from({ length: fine.count }, (_, n) => [fine, n] as const),
  ];
  order.sort(([a, n], [b, m]) => a.pixel[n] - b.pixel[m]);
  const pick = (key: 'x' | 'y' | 'width' | 'across'): Float32Array =>
    Float32Array.from(order, ([from, n]) => from[key][n]);
  return {
    count: order.length,
    pixel: Int32Array.from(order, ([from, n]) => from.pixel[n]),
    x: pick('x'),
    y: pick('y'),
    width: pick('width'),
    across: pick('across'),
  };
}
