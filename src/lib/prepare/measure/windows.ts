import type { OwnPart } from './inspect-window';

/** A square map of cells over a picture. */
export interface CellMap {
  columns: number;
  rows: number;
  /** one byte a cell: 1 where it must be looked at closely */
  marked: Uint8Array;
}

/** Side of the windows that are inspected in one go, px. */
export const WINDOW_PX = 1536;

const allMarked: CellMap = { columns: 1, rows: 1, marked: Uint8Array.of(1) };

/**
 * Parts of a picture to inspect one by one, none overlapping, together holding every marked cell.
 * Each window of the grid is cut down to its marked cells.
 * @param widthPx columns of the whole picture
 * @param heightPx rows
 * @param cells map over the picture, or null: all of it
 * @returns parts in px, row by row
 */
export function partsToInspect(widthPx: number, heightPx: number, cells: CellMap | null): OwnPart[] {
  const map = cells ?? allMarked;
  const [cellWidth, cellHeight] = [widthPx / map.columns, heightPx / map.rows];
  const parts: OwnPart[] = [];
  for (let top = 0; top < heightPx; top += WINDOW_PX) {
    for (let left = 0; left < widthPx; left += WINDOW_PX) {
      const right = Math.min(widthPx, left + WINDOW_PX);
      const bottom = Math.min(heightPx, top + WINDOW_PX);
      const part: OwnPart = { left: right, top: bottom, right: left, bottom: top };
      for (let row = Math.floor(top / cellHeight); row < Math.min(map.rows, bottom / cellHeight); row++) {
        for (
          let column = Math.floor(left / cellWidth);
          column < Math.min(map.columns, right / cellWidth);
          column++
        ) {
          if (!map.marked[row * map.columns + column]) continue;
          part.left = Math.min(part.left, Math.max(left, Math.floor(column * cellWidth)));
          part.right = Math.max(part.right, Math.min(right, Math.ceil((column + 1) * cellWidth)));
          part.top = Math.min(part.top, Math.max(top, Math.floor(row * cellHeight)));
          part.bottom = Math.max(part.bottom, Math.min(bottom, Math.ceil((row + 1) * cellHeight)));
        }
      }
      if (part.right > part.left && part.bottom > part.top) parts.push(part);
    }
  }
  return parts;
}

/** A map of cells of about a side in px over a picture, none marked. */
export function emptyCells(widthPx: number, heightPx: number, sidePx: number): CellMap {
  const columns = Math.max(1, Math.round(widthPx / sidePx));
  const rows = Math.max(1, Math.round(heightPx / sidePx));
  return { columns, rows, marked: new Uint8Array(columns * rows) };
}

/** Marks the cells within `around` px of a place. */
export function markCells(
  cells: CellMap,
  widthPx: number,
  heightPx: number,
  x: number,
  y: number,
  around: number,
): void {
  const column = (at: number): number =>
    Math.min(cells.columns - 1, Math.max(0, Math.floor((at * cells.columns) / widthPx)));
  const row = (at: number): number =>
    Math.min(cells.rows - 1, Math.max(0, Math.floor((at * cells.rows) / heightPx)));
  for (let r = row(y - around); r <= row(y + around); r++) {
    for (let c = column(x - around); c <= column(x + around); c++) cells.marked[r * cells.columns + c] = 1;
  }
}
