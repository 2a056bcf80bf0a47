import { BLOCK_PX, type Division, type Field } from './field';

/**
 * Contour of a field at a level as straight pieces, in the order of the cells they cross, row by row. A cell spans four
 * pixel centres; pixel (0, 0) has its centre at (0.5, 0.5). Every piece has the inside on the same hand.
 */
export interface Contour {
  count: number;
  /** x0, y0, x1, y1 of each piece, px */
  points: Float32Array;
  /** column of each piece's cell */
  column: Int32Array;
  /** row of each piece's cell */
  row: Int32Array;
  /** cell edge that a piece enters by × 4 + the one it leaves by: 0 top, 1 right, 2 bottom, 3 left */
  edges: Uint8Array;
  /** index of the first piece of each row of cells, and one past the last */
  rowStart: Int32Array;
}

const TOP = 0;
const RIGHT = 1;
const BOTTOM = 2;
const LEFT = 3;
const piece = (from: number, to: number): number => from * 4 + to;

/** Pieces of the sixteen cases, corners as bits: top left 1, top right 2, bottom right 4, bottom left 8. */
const CASES: readonly (readonly number[])[] = [
  [],
  [piece(LEFT, TOP)],
  [piece(TOP, RIGHT)],
  [piece(LEFT, RIGHT)],
  [piece(RIGHT, BOTTOM)],
  [piece(LEFT, TOP), piece(RIGHT, BOTTOM)],
  [piece(TOP, BOTTOM)],
  [piece(LEFT, BOTTOM)],
  [piece(BOTTOM, LEFT)],
  [piece(BOTTOM, TOP)],
  [piece(TOP, RIGHT), piece(BOTTOM, LEFT)],
  [piece(BOTTOM, RIGHT)],
  [piece(RIGHT, LEFT)],
  [piece(RIGHT, TOP)],
  [piece(TOP, LEFT)],
  [],
];
/** The two saddles with their inside corners joined. */
const JOINED_5 = [piece(RIGHT, TOP), piece(LEFT, BOTTOM)];
const JOINED_10 = [piece(TOP, LEFT), piece(BOTTOM, RIGHT)];

class Pieces {
  count = 0;
  points = new Float32Array(4096);
  column = new Int32Array(1024);
  row = new Int32Array(1024);
  edges = new Uint8Array(1024);

  grow(): void {
    const longer = <T extends Float32Array | Int32Array | Uint8Array>(old: T, fresh: T): T => {
      fresh.set(old as never);
      return fresh;
    };
    this.points = longer(this.points, new Float32Array(this.points.length * 2));
    this.column = longer(this.column, new Int32Array(this.column.length * 2));
    this.row = longer(this.row, new Int32Array(this.row.length * 2));
    this.edges = longer(this.edges, new Uint8Array(this.edges.length * 2));
  }
}

/**
 * Where an edge lies between two neighbouring samples `a` and `b`, 0–1 from one centre to the other. Where the samples
 * beyond them level off, the edge is where their sum says, which is exact for a straight edge of any two greys drawn by
 * exact area; elsewhere by straight interpolation to the level.
 */
function crossing(before: number, a: number, b: number, after: number, level: number): number {
  const rising = b > a;
  let high = rising ? after : before;
  let low = rising ? before : after;
  const [top, foot] = rising ? [b, a] : [a, b];
  if (high < top) {
    if (top < SATURATED) return (level - a) / (b - a);
    high = top;
  }
  if (low > foot) {
    if (foot > 255 - SATURATED) return (level - a) / (b - a);
    low = foot;
  }
  const share = (top + foot - 2 * low) / (high - low);
  return Math.min(1.25, Math.max(-0.25, rising ? 1.5 - share : share - 0.5));
}

/** From here on a sample counts as full although its neighbour beyond is less. */
const SATURATED = 250;

/** Where the level is crossed on the way from sample `i` to the next one `step` further; `turn` is the step sideways. */
function placeOn(field: Field, i: number, step: number, turn: number, level: number): number {
  const { data, width } = field;
  const a = data[i];
  const b = data[i + step];
  const beyond =
    i - step >= 0 && i + 2 * step < data.length && i - turn >= 0 && i + step + turn < data.length;
  if (!beyond || !clearOfSides(i, step, width)) return (level - a) / (b - a);
  const sideways = data[i - turn] + data[i + step - turn] - data[i + turn] - data[i + step + turn];
  // Along an edge the samples change slowly and in a straight line: only across it does the sum serve better.
  if (Math.abs(sideways) > 4 * Math.abs(b - a)) return (level - a) / (b - a);
  const before = data[i - step];
  const after = data[i + 2 * step];
  const [highest, behind] = b > a ? [after, i + 3 * step] : [before, i - 2 * step];
  // Two like greys in a row may be a thin line seen by two pixels: that they are a plain grey must show in a third.
  if (highest < SATURATED && !(data[behind] >= highest - 2)) return (level - a) / (b - a);
  return crossing(before, a, b, after, level);
}

const clearOfSides = (i: number, step: number, width: number): boolean => {
  const x = i % width;
  return step === 1 ? x >= 1 && x + 2 < width : x >= 1 && x + 1 < width;
};

/** Writes one end of a piece at `at`: where the level lies on an edge of the cell whose top left sample is `i`. */
function placeEnd(out: Float32Array, at: number, edge: number, field: Field, i: number, level: number): void {
  const { width } = field;
  const x = (i % width) + 0.5;
  const y = ((i / width) | 0) + 0.5;
  if (edge === TOP || edge === BOTTOM) {
    out[at] = x + placeOn(field, edge === TOP ? i : i + width, 1, width, level);
    out[at + 1] = edge === TOP ? y : y + 1;
  } else {
    out[at] = edge === LEFT ? x : x + 1;
    out[at + 1] = y + placeOn(field, edge === LEFT ? i : i + 1, width, 1, level);
  }
}

/**
 * The contour of a field at a level, to a fraction of a pixel.
 * Marching squares; each crossing lies where the samples around it put a straight edge, or by straight interpolation; a
 * saddle is joined where the mean of its corners lies inside.
 * @param field grey samples; unchanged
 * @param division the same field divided at the same level; unchanged
 * @param level 0–255; best not a whole number, so that no sample equals it
 * @returns pieces row by row; none where nothing crosses the level
 * @example contourOf of a black square on white, 10 px wide, gives a closed line of 10 × 10 px with its corners cut
 * @see Lorensen & Cline 1987, in two dimensions
 */
export function contourOf(field: Field, division: Division, level: number): Contour {
  const { width, height } = field;
  const { inside, columns, edgeBlocks } = division;
  const pieces = new Pieces();
  const rowStart = new Int32Array(Math.max(1, height));
  for (let y = 0; y + 1 < height; y++) {
    rowStart[y] = pieces.count;
    const blockRow = ((y / BLOCK_PX) | 0) * columns;
    for (let block = 0; block < columns; block++) {
      if (!edgeBlocks[blockRow + block]) continue;
      const end = Math.min(width - 1, (block + 1) * BLOCK_PX);
      for (let x = block * BLOCK_PX; x < end; x++) {
        const i = y * width + x;
        const kind =
          inside[i] | (inside[i + 1] << 1) | (inside[i + width + 1] << 2) | (inside[i + width] << 3);
        if (kind === 0 || kind === 15) continue;
        addCell(pieces, kind, field, i, level);
      }
    }
  }
  rowStart[height - 1] = pieces.count;
  const { count } = pieces;
  return {
    count,
    points: pieces.points.subarray(0, count * 4),
    column: pieces.column.subarray(0, count),
    row: pieces.row.subarray(0, count),
    edges: pieces.edges.subarray(0, count),
    rowStart,
  };
}

function addCell(pieces: Pieces, kind: number, field: Field, i: number, level: number): void {
  const { data, width } = field;
  let list = CASES[kind];
  if (kind === 5 || kind === 10) {
    const joined = data[i] + data[i + 1] + data[i + width] + data[i + width + 1] > 4 * level;
    if (joined) list = kind === 5 ? JOINED_5 : JOINED_10;
  }
  for (const edges of list) {
    if (pieces.count === pieces.column.length) pieces.grow();
    const n = pieces.count++;
    placeEnd(pieces.points, n * 4, edges >> 2, field, i, level);
    placeEnd(pieces.points, n * 4 + 2, edges & 3, field, i, level);
    pieces.column[n] = i % width;
    pieces.row[n] = (i / width) | 0;
    pieces.edges[n] = edges;
  }
}

/**
 * Index of the first piece of a row whose cell column is at least a column.
 * @param contour unchanged
 * @param row row of cells; outside the field: an empty answer
 * @returns an index into the pieces; the end of the row where there is none
 */
export function firstPieceFrom(contour: Contour, row: number, column: number): number {
  let low = contour.rowStart[row];
  let high = contour.rowStart[row + 1];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (contour.column[middle] < column) low = middle + 1;
    else high = middle;
  }
  return low;
}
