/** Points x, y in pixels, origin top left; the first point is not repeated. */
export type Polygon = readonly (readonly [number, number])[];

/**
 * Exact share of every pixel that lies inside some polygons, 0–1: the area of each edge's trapezoid is summed pixel by
 * pixel. Polygons may nest against each other's direction (holes) but must not overlap in the same direction.
 */
export function coverageOf(width: number, height: number, polygons: readonly Polygon[]): Float64Array {
  const sums = new Float64Array((width + 2) * height);
  for (const polygon of polygons) {
    for (let n = 0; n < polygon.length; n++) {
      const [x0, y0] = polygon[n];
      const [x1, y1] = polygon[(n + 1) % polygon.length];
      addEdge(sums, width, height, x0, y0, x1, y1);
    }
  }
  const coverage = new Float64Array(width * height);
  for (let y = 0; y < height; y++) {
    let running = 0;
    for (let x = 0; x < width; x++) {
      running += sums[y * (width + 2) + x];
      coverage[y * width + x] = Math.min(1, Math.abs(running));
    }
  }
  return coverage;
}

function addEdge(
  sums: Float64Array,
  width: number,
  height: number,
  x0: number,
  y0: number,
  x1: number,
  y1: number,
): void {
  if (y0 === y1) return;
  const sign = y0 < y1 ? 1 : -1;
  const [ax, ay, bx, by] = y0 < y1 ? [x0, y0, x1, y1] : [x1, y1, x0, y0];
  const slope = (bx - ax) / (by - ay);
  for (let row = Math.max(0, Math.floor(ay)); row < Math.min(height, Math.ceil(by)); row++) {
    const top = Math.max(ay, row);
    const bottom = Math.min(by, row + 1);
    if (bottom <= top) continue;
    addRow(
      sums,
      row * (width + 2),
      width,
      ax + (top - ay) * slope,
      ax + (bottom - ay) * slope,
      sign * (bottom - top),
    );
  }
}

/** One edge within one row of pixels: split at the columns it crosses. */
function addRow(
  sums: Float64Array,
  start: number,
  width: number,
  xa: number,
  xb: number,
  signedHeight: number,
): void {
  const low = Math.min(xa, xb);
  const high = Math.max(xa, xb);
  const steps = high > low ? [low, ...whole(low, high), high] : [low, low];
  for (let n = 0; n + 1 < steps.length; n++) {
    const share = high > low ? (steps[n + 1] - steps[n]) / (high - low) : 1;
    const middle = (steps[n] + steps[n + 1]) / 2;
    const column = Math.min(Math.max(Math.floor(middle), 0), width);
    const inside = Math.min(Math.max(column + 1 - middle, 0), 1);
    sums[start + column] += signedHeight * share * inside;
    sums[start + column + 1] += signedHeight * share * (1 - inside);
  }
}

function whole(low: number, high: number): number[] {
  const list: number[] = [];
  for (let x = Math.floor(low) + 1; x < high; x++) list.push(x);
  return list;
}

/** Coverage as 8-bit samples, 255 for a full pixel. */
export const asBytes = (coverage: Float64Array): Uint8Array =>
  Uint8Array.from(coverage, (c) => Math.round(c * 255));

/** A bar of a length and a width around a centre, its length at an angle to X in degrees. */
export function bar(cx: number, cy: number, length: number, width: number, angleDeg: number): Polygon {
  const a = (angleDeg * Math.PI) / 180;
  const [ux, uy] = [Math.cos(a), Math.sin(a)];
  return [
    [-0.5, -0.5],
    [0.5, -0.5],
    [0.5, 0.5],
    [-0.5, 0.5],
  ].map(([s, t]) => [cx + s * length * ux - t * width * uy, cy + s * length * uy + t * width * ux] as const);
}

/** A disc as a polygon of the same area; `sides` corners. */
export function disc(cx: number, cy: number, diameter: number, sides = 720): Polygon {
  const r = (diameter / 2) * Math.sqrt((2 * Math.PI) / sides / Math.sin((2 * Math.PI) / sides));
  return Array.from({ length: sides }, (_, n) => {
    const t = (2 * Math.PI * n) / sides;
    return [cx + r * Math.cos(t), cy + r * Math.sin(t)] as const;
  });
}

/** The same outline walked the other way: a hole in what surrounds it. */
export const hole = (polygon: Polygon): Polygon => [...polygon].reverse();

/** Corners of a star with tips at `outer` and notches at `inner` from the centre. */
export function star(
  cx: number,
  cy: number,
  tips: number,
  outer: number,
  inner: number,
  turnDeg = 0,
): Polygon {
  return Array.from({ length: tips * 2 }, (_, n) => {
    const t = (Math.PI * n) / tips + (turnDeg * Math.PI) / 180;
    const r = n % 2 === 0 ? outer : inner;
    return [cx + r * Math.cos(t), cy + r * Math.sin(t)] as const;
  });
}

/** Black sectors of a wheel of `black` sectors and as many gaps. */
export function wheel(cx: number, cy: number, black: number, radius: number, turnDeg = 0): Polygon[] {
  const step = Math.PI / black;
  return Array.from({ length: black }, (_, n) => {
    const from = 2 * n * step + (turnDeg * Math.PI) / 180;
    const arc = Array.from({ length: 33 }, (_, k) => {
      const t = from + (step * k) / 32;
      return [cx + radius * Math.cos(t), cy + radius * Math.sin(t)] as const;
    });
    return [[cx, cy] as const, ...arc];
  });
}
