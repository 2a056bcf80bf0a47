/** Turns rows of burn into rows of dots, keeping what it must remember from row to row. */
export interface Screener {
  /**
   * Takes the next rows.
   * @param burn rows of burn 0–1 from the top, row-major, whole rows; unchanged
   * @returns the rows that are finished, 1 burned, 0 untouched: none or some may lag behind
   */
  push(burn: Float32Array | Float64Array): Uint8Array;
  /** The rows that were still held back, once all have been pushed. */
  end(): Uint8Array;
}
