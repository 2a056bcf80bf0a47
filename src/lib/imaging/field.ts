/** A window of a grey picture, 8 bit, row-major. What lies outside it is unknown. */
export interface Field {
  width: number;
  height: number;
  /** width × height samples, 0–255 */
  data: Uint8Array;
}

/**
 * Throws unless a field has sides of at least 1 and as many samples as pixels.
 * @throws RangeError otherwise
 */
export function assertField(field: Field): void {
  const { width, height, data } = field;
  if (!Number.isInteger(width) || !Number.isInteger(height) || width < 1 || height < 1) {
    throw new RangeError(`expected whole sides from 1, got ${width} x ${height}`);
  }
  if (data.length !== width * height)
    throw new RangeError(`expected ${width * height} samples, got ${data.length}`);
}

/** Side of the square blocks in which a two-level picture is looked over, px. */
export const BLOCK_PX = 16;

/** A field divided at a level, with the blocks that hold an edge. */
export interface Division {
  width: number;
  height: number;
  /** 1 above the level, else 0 */
  inside: Uint8Array;
  columns: number;
  rows: number;
  /** one byte a block of `BLOCK_PX`: 1 where it, or the row or column of pixels next to it, holds both classes */
  edgeBlocks: Uint8Array;
}

/**
 * Divides a field at a level and notes which blocks hold an edge, so that later passes can leave out the rest.
 * @param field unchanged
 * @param level samples above it are inside, 0–255
 * @returns the classes and the map of blocks
 * @throws RangeError as `assertField`
 * @example divide({ width: 2, height: 1, data: Uint8Array.of(0, 255) }, 127.5).inside // 0, 1
 */
export function divide(field: Field, level: number): Division {
  assertField(field);
  const { width, height, data } = field;
  const inside = new Uint8Array(width * height);
  for (let i = 0; i < inside.length; i++) inside[i] = data[i] > level ? 1 : 0;
  const columns = Math.ceil(width / BLOCK_PX);
  const rows = Math.ceil(height / BLOCK_PX);
  const edgeBlocks = new Uint8Array(columns * rows);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const left = Math.max(0, column * BLOCK_PX - 1);
      const right = Math.min(width, column * BLOCK_PX + BLOCK_PX + 1);
      const bottom = Math.min(height, row * BLOCK_PX + BLOCK_PX + 1);
      const first = inside[Math.max(0, row * BLOCK_PX - 1) * width + left];
      scan: for (let y = Math.max(0, row * BLOCK_PX - 1); y < bottom; y++) {
        for (let i = y * width + left; i < y * width + right; i++) {
          if (inside[i] !== first) {
            edgeBlocks[row * columns + column] = 1;
            break scan;
          }
        }
      }
    }
  }
  return { width, height, inside, columns, rows, edgeBlocks };
}

/**
 * The blocks that hold an edge and their eight neighbours.
 * @param division unchanged
 * @returns one byte a block
 */
export function blocksNearEdges({ edgeBlocks, columns, rows }: Division): Uint8Array {
  const near = new Uint8Array(edgeBlocks.length);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      if (!edgeBlocks[row * columns + column]) continue;
      for (let y = Math.max(0, row - 1); y <= Math.min(rows - 1, row + 1); y++) {
        for (let x = Math.max(0, column - 1); x <= Math.min(columns - 1, column + 1); x++)
          near[y * columns + x] = 1;
      }
    }
  }
  return near;
}
