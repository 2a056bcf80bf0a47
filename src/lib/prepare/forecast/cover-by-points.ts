import type { MaskRaster } from '../../imaging/raster';
import type { RowSink } from './cover-by-table';
import type { FiredSpot } from './fired-spot';

const POINTS = 4;

/** For each point of a part of a pixel, the pixels around that reach it, as steps in a mask. */
function neighboursOf(
  fired: FiredSpot,
  reach: { x: number; y: number },
  pitchX: number,
  pitchY: number,
  at: { x: number; y: number },
): { column: number; row: number }[] {
  const found: { column: number; row: number; far: number }[] = [];
  for (let row = -reach.y; row <= reach.y; row++) {
    for (let column = -reach.x; column <= reach.x; column++) {
      const [x, y] = [at.x - column * pitchX, at.y - row * pitchY];
      if (fired(x, y)) found.push({ column, row, far: x * x + y * y });
    }
  }
  // The nearest is the likeliest to have fired, so it is asked first.
  return found.sort((a, b) => a.far - b.far);
}

/**
 * Marked shares of a mask where spots reach further than the next pixel, row by row, one a pixel.
 * Each pixel is asked at 16 points whether any fired pixel reaches it.
 * @param mask 1 burned; unchanged
 * @param fired the area that one fired pixel marks
 * @param reach pixels that it reaches along X and Y
 * @param sink takes height rows of width shares, 0–65535; the array is filled again afterwards
 */
export function coverByPoints(
  mask: MaskRaster,
  fired: FiredSpot,
  reach: { x: number; y: number },
  sink: RowSink,
): void {
  const { width, height, data, pitchXMm, pitchYMm } = mask;
  const points = Array.from({ length: POINTS * POINTS }, (_, i) =>
    neighboursOf(fired, reach, pitchXMm, pitchYMm, {
      x: (((i % POINTS) + 0.5) / POINTS - 0.5) * pitchXMm,
      y: ((Math.floor(i / POINTS) + 0.5) / POINTS - 0.5) * pitchYMm,
    }),
  );
  const line = new Uint16Array(width);
  const isReached = (x: number, y: number, neighbours: { column: number; row: number }[]): boolean =>
    neighbours.some(({ column, row }) => {
      const [atX, atY] = [x + column, y + row];
      return atX >= 0 && atX < width && atY >= 0 && atY < height && data[atY * width + atX] === 1;
    });
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      let marked = 0;
      for (const neighbours of points) if (isReached(x, y, neighbours)) marked++;
      line[x] = (65_535 * marked) / points.length;
    }
    sink(line);
  }
}
