import type { Artwork } from '../artwork';
import { turnVector } from '../svg/turn-vector';
import type { Grey } from './upright';

/**
 * A picture turned clockwise by quarter turns.
 * @param grey the picture; unchanged
 * @param turns quarter turns clockwise
 * @returns the picture itself for no turn, else a new one
 * @example turn({ width: 2, height: 1, data: Uint16Array.of(1, 2) }, 1) // 1 × 2: 1 over 2
 */
export function turn(grey: Grey, turns: 0 | 1 | 2 | 3): Grey {
  if (turns === 0) return grey;
  const { width, height, data } = grey;
  if (turns === 2) return { width, height, data: data.slice().reverse() };
  const turned = new Uint16Array(data.length);
  for (let row = 0; row < height; row++) {
    const column = turns === 1 ? height - 1 - row : row;
    for (let x = 0; x < width; x++)
      turned[(turns === 1 ? x : width - 1 - x) * height + column] = data[row * width + x];
  }
  return { width: height, height: width, data: turned };
}

/**
 * An artwork turned clockwise by quarter turns, as it is placed.
 * @param artwork what ingest gave; unchanged
 * @param turns quarter turns clockwise
 * @returns the artwork itself for no turn, else a new one with its sides and its own size exchanged for odd turns
 * @example turnArtwork(a picture of 300 × 200 px, 1).facts.widthPx // 200
 */
export function turnArtwork(artwork: Artwork, turns: 0 | 1 | 2 | 3): Artwork {
  if (turns === 0) return artwork;
  if (artwork.kind === 'vector') return turnVector(artwork, turns);
  const { width, height, data } = turn(
    { width: artwork.widthPx, height: artwork.heightPx, data: artwork.luminance },
    turns,
  );
  const { ownWidthMm, ownHeightMm } = artwork.facts;
  const own =
    turns === 2 ? { ownWidthMm, ownHeightMm } : { ownWidthMm: ownHeightMm, ownHeightMm: ownWidthMm };
  return {
    ...artwork,
    facts: { ...artwork.facts, widthPx: width, heightPx: height, ...own },
    widthPx: width,
    heightPx: height,
    luminance: data,
  };
}
