import type { Ranks } from './threshold-matrix';

/**
 * Bayer's square of ranks, built by his recursion and never copied.
 * From M of side n: the side 2n holds 4M, 4M + 2 above 4M + 3, 4M + 1.
 * @param size side, a power of two from 2 to 128
 * @throws RangeError when size is none of them
 * @example bayerRanks(2).ranks // 0 2 3 1
 * @see Bayer, An optimum method for two-level rendition of continuous-tone pictures, IEEE ICC 1973, 26-11 to 26-15
 */
export function bayerRanks(size: number): Ranks {
  if (![2, 4, 8, 16, 32, 64, 128].includes(size))
    throw new RangeError(`expected a power of two from 2 to 128, got ${size}`);
  let ranks = Uint16Array.of(0);
  for (let half = 1; half < size; half *= 2) {
    const side = 2 * half;
    const grown = new Uint16Array(side * side);
    for (let y = 0; y < side; y++) {
      for (let x = 0; x < side; x++) {
        const quarter = (y < half ? [0, 2] : [3, 1])[x < half ? 0 : 1];
        grown[y * side + x] = 4 * ranks[(y % half) * half + (x % half)] + quarter;
      }
    }
    ranks = grown;
  }
  return { size, ranks };
}
