/** Rows being worked on, each with room at both ends for errors that leave the picture and are dropped. */
export interface DiffusionRows {
  readonly margin: number;
  /** takes one row in; it becomes the lowest */
  load(burn: Float32Array | Float64Array, from: number): void;
  /** the row `below` rows under the uppermost */
  row(below: number): Float64Array;
  /** rows loaded and not yet dropped */
  readonly count: number;
  /** drops the uppermost row */
  drop(): void;
}

/**
 * Working rows for a diffusion that reaches `depth` rows, itself among them.
 * A ring of rows in double precision; rows that were never loaded stand for what lies below the picture.
 * @param width pixels a row
 * @param depth rows that one pixel's error reaches, its own among them
 * @param margin pixels kept beyond both ends
 */
export function diffusionRows(width: number, depth: number, margin: number): DiffusionRows {
  const ring = Array.from({ length: depth }, () => new Float64Array(width + 2 * margin));
  let top = 0;
  let count = 0;
  return {
    margin,
    load(burn, from) {
      const row = ring[(top + count) % depth];
      row.fill(0);
      for (let x = 0; x < width; x++) row[x + margin] = burn[from + x];
      count++;
    },
    row: (below) => ring[(top + below) % depth],
    get count() {
      return count;
    },
    drop() {
      top = (top + 1) % depth;
      count--;
    },
  };
}
