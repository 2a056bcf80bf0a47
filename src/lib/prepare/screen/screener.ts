/** Turns rows of burn into rows of dots, keeping what it must remember from row to row. */
export interface Screener {
  /**
   * Takes the next rows and writes those that are finished, 1 burned, 0 untouched: none or some may lag behind.
   * @param burn rows of burn 0–1 from the top, row-major, whole rows; unchanged
   * @param dots the whole mask, written from `at` on
   * @param at where the next row begins
   * @returns where the row after the last finished one begins
   */
  push(burn: Float32Array | Float64Array, dots: Uint8Array, at: number): number;
  /** Writes the rows that were still held back, once all have been pushed. */
  end(dots: Uint8Array, at: number): number;
}

/**
 * All rows at once.
 * @param screener one that has taken nothing yet
 * @param burn the whole picture, 0–1; unchanged
 * @example screenWhole(twoLevels(53.4), Float32Array.of(0, 1)) // 0, 1
 */
export function screenWhole(screener: Screener, burn: Float32Array | Float64Array): Uint8Array {
  const dots = new Uint8Array(burn.length);
  screener.end(dots, screener.push(burn, dots, 0));
  return dots;
}
