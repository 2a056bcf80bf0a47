/** A window of pixels at a scale, in the artwork's own frame. */
export interface CoverageWindow {
  /** pixels of the whole artwork at this scale */
  artWidthPx: number;
  artHeightPx: number;
  /** first column and row, below 0 outside the artwork */
  left: number;
  top: number;
  width: number;
  height: number;
}

/**
 * What an artwork covers, 0–255 for nothing to all: 1 − the sRGB code value of its luminance, in which edges are drawn
 * in proportion to area. Nothing is covered outside the artwork.
 */
export interface CoverageSource {
  /** columns and rows that the artwork resolves; null where it can be drawn at any size */
  nativePx: { width: number; height: number } | null;
  /** width × height samples, row-major, not shared with later answers */
  read(window: CoverageWindow): Promise<Uint8Array>;
}

/** The whole artwork at a scale, with nothing around it. */
export const wholeWindow = (artWidthPx: number, artHeightPx: number): CoverageWindow => ({
  artWidthPx,
  artHeightPx,
  left: 0,
  top: 0,
  width: artWidthPx,
  height: artHeightPx,
});

/** The part of a window that lies on the artwork, in artwork pixels; null where there is none. */
export function onArtwork(
  window: CoverageWindow,
): { left: number; top: number; right: number; bottom: number } | null {
  const left = Math.max(0, window.left);
  const top = Math.max(0, window.top);
  const right = Math.min(window.artWidthPx, window.left + window.width);
  const bottom = Math.min(window.artHeightPx, window.top + window.height);
  return right > left && bottom > top ? { left, top, right, bottom } : null;
}
