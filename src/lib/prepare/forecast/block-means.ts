import type { Grey } from '../resample/upright';
import type { RowSink } from './cover-by-table';

/**
 * Means of blocks of whole pixels, taken as rows come, so that the full picture is never held.
 * @param width pixels a row that will come
 * @param height rows that will come
 * @param block pixels of a block along X and along Y, 1 or more; the last ones may be smaller
 * @returns a sink for the rows, and the means once all have come
 * @example blockMeans(4, 2, 2) of rows 0 2 4 4 and 0 2 4 4 gives 1 4
 */
export function blockMeans(width: number, height: number, block: number): { sink: RowSink; means: Grey } {
  const columns = Math.ceil(width / block);
  const means: Grey = {
    width: columns,
    height: Math.ceil(height / block),
    data: new Uint16Array(columns * Math.ceil(height / block)),
  };
  const sums = new Float64Array(columns);
  let row = 0;
  const sink: RowSink = (shares) => {
    row++;
    if (block === 1) {
      means.data.set(shares, (row - 1) * columns);
      return;
    }
    for (let x = 0, i = 0; i < columns; i++) {
      for (const end = Math.min(width, x + block); x < end; x++) sums[i] += shares[x];
    }
    if (row % block !== 0 && row !== height) return;
    const rows = row % block || block;
    const start = (Math.ceil(row / block) - 1) * columns;
    for (let i = 0; i < columns; i++) {
      means.data[start + i] = sums[i] / (rows * Math.min(block, width - i * block)) + 0.5;
    }
    sums.fill(0);
  };
  return { sink, means };
}
