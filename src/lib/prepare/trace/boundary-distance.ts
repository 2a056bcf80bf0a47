import type { Point } from './curve';

export interface BoundaryDistance {
  /** mean distance between the two outlines, taken both ways, px */
  meanPx: number;
  /** greatest distance of any point of one from the other (Hausdorff), px */
  hausdorffPx: number;
}

const SAMPLE_PX = 0.25;

/** Points on both sides of which a mask differs: each pixel edge at three places. */
function maskBoundary(mask: Uint8Array, width: number, height: number): Float64Array {
  const found: number[] = [];
  const dark = (column: number, row: number): number =>
    column < 0 || row < 0 || column >= width || row >= height ? 0 : mask[row * width + column];
  for (let row = 0; row <= height; row += 1) {
    for (let column = 0; column <= width; column += 1) {
      const here = dark(column, row);
      if (here !== dark(column - 1, row)) for (const t of [0, 0.5, 1]) found.push(column, row + t);
      if (here !== dark(column, row - 1)) for (const t of [0, 0.5, 1]) found.push(column + t, row);
    }
  }
  return Float64Array.from(found);
}

function sampleOutlines(outlines: readonly (readonly Point[])[]): Float64Array {
  const found: number[] = [];
  for (const outline of outlines) {
    outline.forEach(([x, y], index) => {
      const [nextX, nextY] = outline[(index + 1) % outline.length];
      const steps = Math.max(1, Math.ceil(Math.hypot(nextX - x, nextY - y) / SAMPLE_PX));
      for (let step = 0; step < steps; step += 1) {
        found.push(x + ((nextX - x) * step) / steps, y + ((nextY - y) * step) / steps);
      }
    });
  }
  return Float64Array.from(found);
}

/** Points by the cell of a square grid that they lie in. */
class Grid {
  private readonly start: Int32Array;
  private readonly order: Int32Array;

  constructor(
    private readonly points: Float64Array,
    private readonly columns: number,
    private readonly rows: number,
  ) {
    const count = points.length / 2;
    this.start = new Int32Array(columns * rows + 1);
    this.order = new Int32Array(count);
    for (let index = 0; index < count; index += 1) this.start[this.cellOf(index) + 1] += 1;
    for (let cell = 0; cell < columns * rows; cell += 1) this.start[cell + 1] += this.start[cell];
    const next = this.start.slice();
    for (let index = 0; index < count; index += 1) this.order[next[this.cellOf(index)]++] = index;
  }

  private clampColumn = (x: number): number => Math.min(this.columns - 1, Math.max(0, Math.floor(x) + 2));
  private clampRow = (y: number): number => Math.min(this.rows - 1, Math.max(0, Math.floor(y) + 2));

  private cellOf(index: number): number {
    return (
      this.clampRow(this.points[2 * index + 1]) * this.columns + this.clampColumn(this.points[2 * index])
    );
  }

  /** Distance to the nearest point, looking outward ring by ring. */
  nearest(x: number, y: number): number {
    const [column, row] = [this.clampColumn(x), this.clampRow(y)];
    let best = Infinity;
    const most = Math.max(this.columns, this.rows);
    for (let ring = 0; ring <= most; ring += 1) {
      // What lies in a farther ring is at least so far away.
      if (best <= (ring - 1) * (ring - 1) && ring > 0) break;
      for (let r = Math.max(0, row - ring); r <= Math.min(this.rows - 1, row + ring); r += 1) {
        const step = Math.abs(r - row) === ring || ring === 0 ? 1 : 2 * ring;
        for (let c = column - ring; c <= column + ring; c += step) {
          if (c < 0 || c >= this.columns) continue;
          const cell = r * this.columns + c;
          for (let at = this.start[cell]; at < this.start[cell + 1]; at += 1) {
            const index = this.order[at];
            const [dx, dy] = [this.points[2 * index] - x, this.points[2 * index + 1] - y];
            best = Math.min(best, dx * dx + dy * dy);
          }
        }
      }
    }
    return Math.sqrt(best);
  }
}

/**
 * How far outlines lie from the boundary of a mask, both ways.
 * Points every quarter pixel along the outlines, three on every pixel edge of the boundary; nearest points by a grid.
 * @param outlines closed, in px of the mask; unchanged
 * @param mask 1 dark, 0 light; unchanged
 * @returns null where either has no boundary
 * @see Hausdorff, Grundzüge der Mengenlehre, 1914, for the greatest distance
 */
export function boundaryDistance(
  outlines: readonly (readonly Point[])[],
  mask: Uint8Array,
  width: number,
  height: number,
): BoundaryDistance | null {
  const [drawn, asked] = [sampleOutlines(outlines), maskBoundary(mask, width, height)];
  if (drawn.length === 0 || asked.length === 0) return null;
  const [columns, rows] = [width + 5, height + 5];
  const [drawnGrid, askedGrid] = [new Grid(drawn, columns, rows), new Grid(asked, columns, rows)];
  let [hausdorffPx, total] = [0, 0];
  for (const [points, grid] of [[drawn, askedGrid] as const, [asked, drawnGrid] as const]) {
    let sum = 0;
    for (let at = 0; at < points.length; at += 2) {
      const distance = grid.nearest(points[at], points[at + 1]);
      sum += distance;
      if (distance > hausdorffPx) hausdorffPx = distance;
    }
    total += sum / (points.length / 2);
  }
  return { meanPx: total / 2, hausdorffPx };
}
