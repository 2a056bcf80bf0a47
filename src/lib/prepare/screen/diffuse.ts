import { diffusionRows } from './diffusion-rows';
import { FLOYD_STEINBERG, type Kernel } from './kernels';
import type { Screener } from './screener';

/** Spreads one row's errors and writes its dots; `step` is the direction of travel. */
type SpreadRow = (rows: (below: number) => Float64Array, step: 1 | -1, dots: Uint8Array, at: number) => void;

/** The four taps of 1976 written out: the row below is held in three variables instead of being read and written thrice. */
function spreadFloydSteinberg(width: number, margin: number): SpreadRow {
  return (rows, step, dots, at) => {
    const own = rows(0);
    const below = rows(1);
    const start = step === 1 ? 0 : width - 1;
    let ahead = 0;
    let behindBelow = 0;
    let straightBelow = below[start + margin];
    for (let i = 0, x = start + margin, dot = at + start; i < width; i++, x += step, dot += step) {
      const value = own[x] + ahead;
      const bit = value >= 0.5 ? 1 : 0;
      const error = value - bit;
      dots[dot] = bit;
      ahead = (error * 7) / 16;
      below[x - step] = behindBelow + (error * 3) / 16;
      behindBelow = straightBelow + (error * 5) / 16;
      straightBelow = below[x + step] + error / 16;
    }
    below[start + margin + step * (width - 1)] = behindBelow;
  };
}

function spreadByTaps(kernel: Kernel, width: number, margin: number): SpreadRow {
  const { divisor, taps } = kernel;
  const columns = Int32Array.from(taps, ({ dx }) => dx);
  const weights = Float64Array.from(taps, ({ weight }) => weight);
  return (rows, step, dots, at) => {
    const own = rows(0);
    const targets = taps.map(({ dy }) => rows(dy));
    const start = step === 1 ? 0 : width - 1;
    for (let i = 0, x = start + margin, dot = at + start; i < width; i++, x += step, dot += step) {
      const value = own[x];
      const bit = value >= 0.5 ? 1 : 0;
      const error = value - bit;
      dots[dot] = bit;
      for (let tap = 0; tap < weights.length; tap++) {
        targets[tap][x + columns[tap] * step] += (error * weights[tap]) / divisor;
      }
    }
  };
}

/**
 * Error diffusion over rows that come in bands.
 * Double precision; a value of ½ or more burns; error that leaves the picture is dropped; serpentine travel mirrors the
 * kernel on every second row, beginning from the left.
 * @param kernel where the error goes
 * @param width pixels a row, 1 or more
 * @param travel serpentine unless a comparison asks for left to right throughout
 * @returns a screener; its rows lag behind by as many as the kernel reaches down
 * @throws RangeError when width is not a whole number from 1
 * @example a flat burn of 0.5, 16 × 16, Floyd–Steinberg: mean 0.5
 * @see the papers named in kernels.ts
 */
export function diffuse(
  kernel: Kernel,
  width: number,
  travel: 'serpentine' | 'left-to-right' = 'serpentine',
): Screener {
  if (!Number.isInteger(width) || width < 1) throw new RangeError(`expected a width from 1, got ${width}`);
  const depth = 1 + Math.max(...kernel.taps.map(({ dy }) => dy));
  const margin = Math.max(...kernel.taps.map(({ dx }) => Math.abs(dx)));
  const rows = diffusionRows(width, depth, margin);
  const spread =
    kernel === FLOYD_STEINBERG ? spreadFloydSteinberg(width, margin) : spreadByTaps(kernel, width, margin);
  let row = 0;
  const finish = (dots: Uint8Array, at: number): void => {
    spread(rows.row, travel === 'serpentine' && row % 2 === 1 ? -1 : 1, dots, at);
    rows.drop();
    row++;
  };
  return {
    push(burn, dots, at) {
      let to = at;
      for (let from = 0; from < burn.length; from += width) {
        rows.load(burn, from);
        if (rows.count < depth) continue;
        finish(dots, to);
        to += width;
      }
      return to;
    },
    end(dots, at) {
      let to = at;
      for (; rows.count > 0; to += width) finish(dots, to);
      return to;
    },
  };
}
