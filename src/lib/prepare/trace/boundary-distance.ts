import type { Point } from './curve';

export interface BoundaryDistance {
  /** mean distance between the two outlines, taken both ways, px */
  meanPx: number;
  /** greatest distance of any point of one from the other (Hausdorff), px */
  hausdorffPx: number;
}

const SAMPLE_PX = 0.25;

/** Short straight pieces: x0, y0, x1, y1 of each. */
type Pieces = Float64Array;

/** Pixel edges on the two sides of which a mask differs. */
function maskBoundary(mask: Uint8Array, width: number, height: number): Pieces {
  const found: number[] = [];
  const dark = (column: number, row: number): number =>
    column < 0 || row < 0 || column >= width || row >= height ? 0 : mask[row * width + column];
  for (let row = 0; row <= height; row += 1) {
    for (let column = 0; column <= width; column += 1) {
      const here = dark(column, row);
      if (here !== dark(column - 1, row)) found.push(column, row, column, row + 1);
      if (here !== dark(column, row - 1)) found.push(column, row, column + 1, row);
    }
  }
  return Float64Array.from(found);
}

function outlinePieces(outlines: readonly (readonly Point[])[]): Pieces {
  const found: number[] = [];
  for (const outline of outlines) {
    outline.forEach(([x, y], index) => {
      const [nextX, nextY] = outline[(index + 1) % outline.length];
      const steps = Math.max(1, Math.ceil(Math.hypot(nextX - x, nextY - y) / SAMPLE_PX));
      const [dx, dy] = [(nextX - x) / steps, (nextY - y) / steps];
      for (let n = 0; n < steps; n += 1)
        found.push(x + n * dx, y + n * dy, x + (n + 1) * dx, y + (n + 1) * dy);
    });
  }
  return Float64Array.from(found);
}

function squaredDistance(x: number, y: number, pieces: Pieces, at: number): number {
  const [ax, ay, bx, by] = [pieces[at], pieces[at + 1], pieces[at + 2], pieces[at + 3]];
  const [dx, dy] = [bx - ax, by - ay];
  const length = dx * dx + dy * dy;
  const t = length > 0 ? Math.min(1, Math.max(0, ((x - ax) * dx + (y - ay) * dy) / length)) : 0;
  const [awayX, awayY] = [x - ax - t * dx, y - ay - t * dy];
  return awayX * awayX + awayY * awayY;
}

/** Pieces of at most one pixel's length, by the cell of a square grid that their middle lies in. */
class Grid {
  private readonly start: Int32Array;
  private readonly order: Int32Array;

  constructor(
    private readonly pieces: Pieces,
    private readonly columns: number,
    private readonly rows: number,
  ) {
    const count = pieces.length / 4;
    this.start = new Int32Array(columns * rows + 1);
    this.order = new Int32Array(count);
    for (let index = 0; index < count; index += 1) this.start[this.cellOf(index) + 1] += 1;
    for (let cell = 0; cell < columns * rows; cell += 1) this.start[cell + 1] += this.start[cell];
    const next = this.start.slice();
    for (let index = 0; index < count; index += 1) this.order[next[this.cellOf(index)]++] = 4 * index;
  }

  private clampColumn = (x: number): number => Math.min(this.columns - 1, Math.max(0, Math.floor(x) + 2));
  private clampRow = (y: number): number => Math.min(this.rows - 1, Math.max(0, Math.floor(y) + 2));

  private cellOf(index: number): number {
    const { pieces } = this;
    const [x, y] = [pieces[4 * index] + pieces[4 * index + 2], pieces[4 * index + 1] + pieces[4 * index + 3]];
    return this.clampRow(y / 2) * this.columns + this.clampColumn(x / 2);
  }

  /** Distance to the nearest piece, looking outward ring by ring. */
  nearest(x: number, y: number): number {
    const [column, row] = [this.clampColumn(x), this.clampRow(y)];
    const most = Math.max(this.columns, this.rows);
    let best = Infinity;
    for (let ring = 0; ring <= most; ring += 1) {
      // What lies in a farther ring is at least so far away, half a piece's length less.
      const least = ring - 1.5;
      if (least > 0 && best <= least * least) break;
      for (let r = Math.max(0, row - ring); r <= Math.min(this.rows - 1, row + ring); r += 1) {
        const step = Math.abs(r - row) === ring || ring === 0 ? 1 : 2 * ring;
        for (let c = column - ring; c <= column + ring; c += step) {
          if (c < 0 || c >= this.columns) continue;
          const cell = r * this.columns + c;
          for (let at = this.start[cell]; at < this.start[cell + 1]; at += 1) {
            best = Math.min(best, squaredDistance(x, y, this.pieces, this.order[at]));
          }
        }
      }
    }
    return Math.sqrt(best);
  }
}

/**
 * How far outlines lie from the boundary of a mask, both ways.
 * Measured from both ends and the middle of every pixel edge and of every quarter pixel of outline, to the nearest piece of
 * the other, found by a grid.
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
  const [drawn, asked] = [outlinePieces(outlines), maskBoundary(mask, width, height)];
  if (drawn.length === 0 || asked.length === 0) return null;
  const [columns, rows] = [width + 5, height + 5];
  const [drawnGrid, askedGrid] = [new Grid(drawn, columns, rows), new Grid(asked, columns, rows)];
  let [hausdorffPx, total] = [0, 0];
  for (const [pieces, grid] of [[drawn, askedGrid] as const, [asked, drawnGrid] as const]) {
    let [sum, count] = [0, 0];
    for (let at = 0; at < pieces.length; at += 4) {
      for (const t of [0, 0.5, 1]) {
        const x = pieces[at] + t * (pieces[at + 2] - pieces[at]);
        const y = pieces[at + 1] + t * (pieces[at + 3] - pieces[at + 1]);
        const distance = grid.nearest(x, y);
        sum += distance;
        count += 1;
        if (distance > hausdorffPx) hausdorffPx = distance;
      }
    }
    total += sum / count;
  }
  return { meanPx: total / 2, hausdorffPx };
}
