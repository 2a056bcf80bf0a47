import type { Screener } from './screener';

/** A square of ranks 0 to size² − 1, each once, row-major. */
export interface Ranks {
  size: number;
  ranks: Uint16Array;
}

/**
 * Compares burn with a square of thresholds that is repeated over the picture.
 * A pixel burns where its burn is above (rank + ½) ÷ size².
 * @param matrix ranks, each once; unchanged
 * @param width pixels a row, 1 or more
 * @returns a screener whose rows never lag
 * @example with the 2 × 2 ranks 0 2 3 1, a flat burn of 0.5 burns two pixels of four
 */
export function compareWith({ size, ranks }: Ranks, width: number): Screener {
  const thresholds = Float32Array.from(ranks, (rank) => (rank + 0.5) / (size * size));
  let row = 0;
  return {
    push(burn, dots, at) {
      for (let from = 0; from < burn.length; row++) {
        const line = (row % size) * size;
        for (let x = 0; x < width; x++, from++)
          dots[at + from] = burn[from] > thresholds[line + (x % size)] ? 1 : 0;
      }
      return at + burn.length;
    },
    end: (_dots, at) => at,
  };
}
