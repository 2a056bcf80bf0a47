import type { Artwork } from './artwork';

/** Width that an artwork is placed at which states no size of its own and is asked for none, mm. */
export const FALLBACK_WIDTH_MM = 100;

export interface AskedSize {
  /** after the quarter turns, mm; null: not said */
  widthMm: number | null;
  heightMm: number | null;
  quarterTurns: 0 | 1 | 2 | 3;
}

export interface PlacedSize {
  widthMm: number;
  heightMm: number;
}

/** Width ÷ height of an artwork as it was drawn: its physical size where the file states one, else its pixels. */
function ownAspect(artwork: Artwork): number {
  if (artwork.kind === 'vector') return artwork.aspect;
  const { ownWidthMm, ownHeightMm } = artwork.facts;
  return ownWidthMm !== null && ownHeightMm !== null
    ? ownWidthMm / ownHeightMm
    : artwork.widthPx / artwork.heightPx;
}

/**
 * The size at which an artwork is placed, mm, after its quarter turns.
 * What is asked for wins; one missing side follows from the proportions; with neither, the file's own size, else 100 mm wide.
 * @param artwork what ingest gave; unchanged
 * @param asked sides in mm above 0, or null
 * @returns both sides in mm
 * @throws RangeError when an asked side is not above 0
 * @example placedSize(a picture of 300 × 200 px, { widthMm: 60, heightMm: null, quarterTurns: 1 }) // 60 × 90
 */
export function placedSize(artwork: Artwork, asked: AskedSize): PlacedSize {
  for (const side of [asked.widthMm, asked.heightMm]) {
    if (side !== null && !(side > 0)) throw new RangeError(`expected a side above 0 mm, got ${side}`);
  }
  const turned = asked.quarterTurns % 2 === 1;
  const aspect = turned ? 1 / ownAspect(artwork) : ownAspect(artwork);
  const { widthMm, heightMm } = asked;
  if (widthMm !== null) return { widthMm, heightMm: heightMm ?? widthMm / aspect };
  if (heightMm !== null) return { widthMm: heightMm * aspect, heightMm };
  const own = turned ? artwork.facts.ownHeightMm : artwork.facts.ownWidthMm;
  const width = own ?? FALLBACK_WIDTH_MM;
  return { widthMm: width, heightMm: width / aspect };
}
