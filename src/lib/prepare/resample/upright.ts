import { codeValues, FULL_LUMINANCE, linearValues } from '../../imaging/srgb';
import { axisWeights, type AxisWeights } from './axis-weights';

/** Luminance as one-channel pixels, row-major, 0–65535. */
export interface Grey {
  width: number;
  height: number;
  data: Uint16Array;
}

/**
 * In what light pixels are averaged: linear light for tone, because burned patches average as reflectance; code values
 * for linework and solid, because edges are blended in code values.
 */
export type Light = 'linear' | 'coverage';

/** Gives the rows of the resampled picture in turn; the array is filled again by the next call. */
export type RowReader = (count: number) => Uint16Array;

/** One row of a picture in the light that is averaged; `values` says what a sample counts. */
function lightRow({ width, data }: Grey, row: number, values: Float32Array | null, into: Float32Array): void {
  const start = row * width;
  if (values === null) into.set(data.subarray(start, start + width));
  else for (let x = 0; x < width; x++) into[x] = values[data[start + x]];
}

/** One row brought to the asked columns. */
function resampleRow(line: Float32Array, { taps, first, shares }: AxisWeights, into: Float32Array): void {
  if (taps === 4) {
    for (let i = 0, s = 0; i < into.length; i++, s += 4) {
      const at = first[i];
      into[i] =
        line[at] * shares[s] +
        line[at + 1] * shares[s + 1] +
        line[at + 2] * shares[s + 2] +
        line[at + 3] * shares[s + 3];
    }
    return;
  }
  for (let i = 0, s = 0; i < into.length; i++) {
    let sum = 0;
    for (let at = first[i], end = at + taps; at < end; at++, s++) sum += line[at] * shares[s];
    into[i] = sum;
  }
}

function combineFour(
  rows: Float32Array[],
  shares: Float64Array,
  s: number,
  into: Uint16Array,
  start: number,
): void {
  const [a, b, c, d] = rows;
  const [wa, wb, wc, wd] = [shares[s], shares[s + 1], shares[s + 2], shares[s + 3]];
  for (let i = 0, to = start; i < a.length; i++, to++) {
    const value = a[i] * wa + b[i] * wb + c[i] * wc + d[i] * wd;
    into[to] = value <= 0 ? 0 : value >= FULL_LUMINANCE ? FULL_LUMINANCE : (value + 0.5) | 0;
  }
}

function combine(
  rows: Float32Array[],
  shares: Float64Array,
  s: number,
  sum: Float64Array,
  into: Uint16Array,
  start: number,
): void {
  sum.fill(0);
  for (let tap = 0; tap < rows.length; tap++) {
    const share = shares[s + tap];
    const row = rows[tap];
    if (share !== 0) for (let i = 0; i < sum.length; i++) sum[i] += row[i] * share;
  }
  for (let i = 0; i < sum.length; i++) {
    const value = sum[i];
    into[start + i] = value <= 0 ? 0 : value >= FULL_LUMINANCE ? FULL_LUMINANCE : (value + 0.5) | 0;
  }
}

let scaledCodes: Float32Array | null = null;

/** What a sample counts in code values, 0–65535. */
function codeTable(): Float32Array {
  return (scaledCodes ??= codeValues().map((code) => code * FULL_LUMINANCE));
}

/** Code values 0–65535 brought back to linear luminance, in place. */
export function makeLinear(samples: Uint16Array): void {
  const linear = linearValues();
  for (let i = 0; i < samples.length; i++) samples[i] = linear[samples[i]] * FULL_LUMINANCE + 0.5;
}

/** A picture's linear luminance as code values 0–65535. */
export function asCodes({ width, height, data }: Grey): Grey {
  const codes = codeTable();
  const samples = new Uint16Array(data.length);
  for (let i = 0; i < samples.length; i++) samples[i] = codes[data[i]] + 0.5;
  return { width, height, data: samples };
}

/**
 * Brings a picture to other columns and rows over the same extent, band by band.
 * Each axis by its own weights, across first; a row that is done across is kept only as long as it is needed.
 * @param grey the picture; unchanged
 * @param columns columns asked for, 1 or more
 * @param rows rows asked for, 1 or more
 * @param light linear for tone, coverage for linework and solid
 * @returns a reader that gives the next rows, 0–65535 in linear luminance; as many as there are left at the end
 * @throws RangeError when columns or rows are not whole numbers from 1
 * @example a checkerboard of single pixels, halved in linear light, gives 32768 everywhere: code 187.5
 */
export function uprightReader(grey: Grey, columns: number, rows: number, light: Light): RowReader {
  const across = axisWeights(grey.width, columns);
  const down = axisWeights(grey.height, rows);
  const values = light === 'coverage' ? codeTable() : null;
  const identity = grey.width === columns && grey.height === rows;
  const ring = Array.from({ length: down.taps }, () => new Float32Array(identity ? 0 : columns));
  const line = new Float32Array(grey.width);
  const sum = new Float64Array(identity || down.taps === 4 ? 0 : columns);
  let done = 0;
  let next = 0;
  let band = new Uint16Array(0);
  const rowInto = (row: number, start: number): void => {
    for (; next < down.first[row] + down.taps; next++) {
      lightRow(grey, next, values, line);
      resampleRow(line, across, ring[next % down.taps]);
    }
    const sources = ring.map((_, tap) => ring[(down.first[row] + tap) % down.taps]);
    if (down.taps === 4) combineFour(sources, down.shares, row * 4, band, start);
    else combine(sources, down.shares, row * down.taps, sum, band, start);
  };
  return (count) => {
    const taken = Math.min(count, rows - done);
    if (identity) return grey.data.subarray(done * columns, (done += taken) * columns);
    if (band.length < taken * columns) band = new Uint16Array(taken * columns);
    for (let i = 0; i < taken; i++) rowInto(done + i, i * columns);
    done += taken;
    const given = band.subarray(0, taken * columns);
    if (light === 'coverage') makeLinear(given);
    return given;
  };
}

/**
 * The whole picture brought to other columns and rows: `uprightReader` read to the end.
 * @example resampleWhole(grey, 2, 1, 'linear').data.length // 2
 */
export function resampleWhole(grey: Grey, columns: number, rows: number, light: Light): Grey {
  return { width: columns, height: rows, data: uprightReader(grey, columns, rows, light)(rows) };
}
