import { BLOCK_PX, blocksNearEdges, type Division } from './field';

/** Stands for "farther than anything in the picture". */
const FAR = 1e20;

function lowerEnvelope(f: Float64Array, n: number, out: Float64Array, v: Int32Array, z: Float64Array): void {
  let k = 0;
  v[0] = 0;
  z[0] = -Infinity;
  z[1] = Infinity;
  for (let q = 1; q < n; q++) {
    let s = (f[q] + q * q - (f[v[k]] + v[k] * v[k])) / (2 * q - 2 * v[k]);
    while (s <= z[k]) {
      k--;
      s = (f[q] + q * q - (f[v[k]] + v[k] * v[k])) / (2 * q - 2 * v[k]);
    }
    k++;
    v[k] = q;
    z[k] = s;
    z[k + 1] = Infinity;
  }
  k = 0;
  for (let q = 0; q < n; q++) {
    while (z[k + 1] < q) k++;
    out[q] = (q - v[k]) * (q - v[k]) + f[v[k]];
  }
}

/**
 * Squared distance from every pixel to the nearest pixel of value 0, px², exact.
 * Two passes of the lower envelope of parabolas; time in proportion to the area.
 * @param mask 0 or not 0, row-major; unchanged
 * @param width columns from 1
 * @param height rows from 1
 * @returns whole numbers; Infinity everywhere when no pixel is 0
 * @throws RangeError when the mask does not hold width × height samples
 * @example squaredDistance(Uint8Array.of(0, 1, 1), 3, 1) // 0, 1, 4
 * @see Felzenszwalb & Huttenlocher, Theory of Computing 8, 2012, 415–428
 */
export function squaredDistance(mask: Uint8Array, width: number, height: number): Float64Array {
  if (width < 1 || height < 1 || mask.length !== width * height) {
    throw new RangeError(`expected ${width} x ${height} samples, got ${mask.length}`);
  }
  const grid = Float64Array.from(mask, (value) => (value ? FAR : 0));
  const longest = Math.max(width, height);
  const [line, out, z] = [
    new Float64Array(longest),
    new Float64Array(longest),
    new Float64Array(longest + 1),
  ];
  const v = new Int32Array(longest);
  for (let x = 0; x < width; x++) {
    for (let y = 0; y < height; y++) line[y] = grid[y * width + x];
    lowerEnvelope(line, height, out, v, z);
    for (let y = 0; y < height; y++) grid[y * width + x] = out[y];
  }
  for (let y = 0; y < height; y++) {
    line.set(grid.subarray(y * width, (y + 1) * width));
    lowerEnvelope(line, width, out, v, z);
    for (let x = 0; x < width; x++) grid[y * width + x] = out[x] >= FAR ? Infinity : out[x];
  }
  return grid;
}

/** Highest cap of `cappedDistance`, px: its square fits one byte. */
export const HIGHEST_CAP_PX = 15;

/**
 * Squared distance from every pixel to the nearest pixel of the other class, px², exact up to a cap.
 * Column by column, then the nearest of each row; pixels far from every edge are left at the cap.
 * @param division unchanged; beyond its sides nothing is known, so they are no edge
 * @param capPx distances from here on are all given as the cap, whole, 1–15
 * @returns one byte a pixel, at most capPx²
 * @throws RangeError when the cap is not a whole number of 1–15
 * @see Meijster, Roerdink & Hesselink 2000
 */
export function cappedDistance(division: Division, capPx: number): Uint8Array {
  if (!Number.isInteger(capPx) || capPx < 1 || capPx > HIGHEST_CAP_PX) {
    throw new RangeError(`expected capPx as a whole number from 1 to ${HIGHEST_CAP_PX}, got ${capPx}`);
  }
  const { width, height, inside, columns, rows } = division;
  const along = new Uint8Array(width * height).fill(capPx);
  for (let i = width; i < inside.length; i++) {
    if (inside[i] !== inside[i - width]) along[i] = 1;
    else if (along[i - width] < capPx) along[i] = along[i - width] + 1;
  }
  for (let i = inside.length - width - 1; i >= 0; i--) {
    if (inside[i] !== inside[i + width]) along[i] = 1;
    else if (along[i + width] + 1 < along[i]) along[i] = along[i + width] + 1;
  }
  const squared = new Uint8Array(width * height).fill(capPx * capPx);
  const near = blocksNearEdges(division);
  for (let y = 0; y < height; y++) {
    const blockRow = Math.min(rows - 1, (y / BLOCK_PX) | 0) * columns;
    for (let block = 0; block < columns; block++) {
      if (!near[blockRow + block]) continue;
      const left = y * width + block * BLOCK_PX;
      nearestInRow(
        inside,
        along,
        squared,
        left,
        Math.min(width - block * BLOCK_PX, BLOCK_PX),
        y * width,
        width,
        capPx,
      );
    }
  }
  return squared;
}

function nearestInRow(
  inside: Uint8Array,
  along: Uint8Array,
  squared: Uint8Array,
  from: number,
  count: number,
  rowStart: number,
  width: number,
  capPx: number,
): void {
  const rowEnd = rowStart + width;
  for (let i = from; i < from + count; i++) {
    const own = inside[i];
    let best = along[i] * along[i];
    for (let d = 1; d < capPx && d * d < best; d++) {
      const l = i - d;
      if (l >= rowStart) {
        const reach = inside[l] === own ? d * d + along[l] * along[l] : d * d;
        if (reach < best) best = reach;
      }
      const r = i + d;
      if (r < rowEnd) {
        const reach = inside[r] === own ? d * d + along[r] * along[r] : d * d;
        if (reach < best) best = reach;
      }
    }
    squared[i] = best;
  }
}
