import type { FiredSpot } from './fired-spot';

/** How much of each part of a pixel is marked, for each of the 512 ways in which it and its eight neighbours may fire. */
export interface CoverTable {
  /** parts of a pixel along X and along Y */
  parts: number;
  /** 512 × parts × parts shares, 0–65535, row by row */
  shares: Uint16Array;
}

/** Sample points of a pixel along X and along Y, at least: with fewer a round spot's area is off by more than half a percent. */
const SAMPLES = 128;

/**
 * How many samples of one part of a pixel are reached by exactly these of the nine pixels around: bit
 * 3·(column + 1) + row + 1.
 */
function reachOfPart(
  fired: FiredSpot,
  pitchX: number,
  pitchY: number,
  parts: number,
  partX: number,
  partY: number,
): { counts: Float64Array; samples: number } {
  const side = Math.ceil(SAMPLES / parts);
  const counts = new Float64Array(512);
  for (let i = 0; i < side * side; i++) {
    const x = ((partX + ((i % side) + 0.5) / side) / parts - 0.5) * pitchX;
    const y = ((partY + (Math.floor(i / side) + 0.5) / side) / parts - 0.5) * pitchY;
    let reached = 0;
    for (let column = -1; column <= 1; column++) {
      for (let row = -1; row <= 1; row++) {
        if (fired(x - column * pitchX, y - row * pitchY)) reached |= 1 << (3 * (column + 1) + row + 1);
      }
    }
    counts[reached]++;
  }
  return { counts, samples: side * side };
}

/**
 * The marked share of each part of a pixel for every way in which it and its eight neighbours may fire.
 * Each part is sampled on a grid of at least 128 points a side of a pixel; a point counts once, however many spots reach it.
 * @param fired the area that one fired pixel marks, reaching no further than the next pixel
 * @param pitchXMm width of a pixel, mm
 * @param pitchYMm height of a pixel, mm
 * @param parts parts of a pixel along X and along Y, 1 to 8
 * @returns shares by pattern; pattern bit 3·(column + 1) + row + 1
 * @example a round pulsed spot of one pitch: pattern 16, the pixel alone, covers 0.785 of it
 */
export function coverTable(fired: FiredSpot, pitchXMm: number, pitchYMm: number, parts: number): CoverTable {
  const shares = new Uint16Array(512 * parts * parts);
  for (let part = 0; part < parts * parts; part++) {
    const { counts, samples } = reachOfPart(
      fired,
      pitchXMm,
      pitchYMm,
      parts,
      part % parts,
      Math.floor(part / parts),
    );
    for (let pattern = 0; pattern < 512; pattern++) {
      let marked = 0;
      for (let reached = 1; reached < 512; reached++)
        if ((reached & pattern) !== 0) marked += counts[reached];
      shares[pattern * parts * parts + part] = Math.round((65_535 * marked) / samples);
    }
  }
  return { parts, shares };
}
