import type { Spot } from '../../machines/spot';
import { suspectPlaces } from './coarse-pass';
import type { CoverageSource } from './coverage-source';
import {
  inspectWindow,
  marginPx,
  nothing,
  type FoundPlace,
  type Inspection,
  type SideFindings,
} from './inspect-window';
import { lineExtents } from './line-extents';
import { mergeSeams } from './merge-seams';
import { emptyCells, markCells, partsToInspect, WINDOW_PX, type CellMap } from './windows';

/** Scale of the close look: pixels to the smallest line extent, and the most to the largest. */
const CLOSE_PX = 6;
const LARGEST_CLOSE_PX = 22;
/** Scale of the coarse pass: pixels to the smallest line extent. */
const COARSE_PX = 2.2;
/** Lowest peak, 0–255, of a line without an outline: in a drawing one of 0.08 px; in pixels more, for they hold noise. */
const FAINTEST = { drawn: 20, pixels: 72 } as const;
/** Up to this many pixels the whole picture is looked at closely at once. */
const WHOLE_PX = 6_000_000;
/** Side of a cell of the coarse map, in pixels of the coarse picture. */
const CELL_PX = 64;

export interface SearchFrame {
  /** size of the artwork in its own frame, mm */
  widthMm: number;
  heightMm: number;
  /** spot in the artwork's own frame */
  spot: Spot;
  /** that parts burned from unburned, 0–255 */
  level: number;
  /** whether a place, in fractions 0–1 of width and height, is left out */
  leaveOut(fx: number, fy: number): boolean;
  /** cells of the artwork that hold anything to look at; null: all of it */
  drawn: CellMap | null;
}

export interface FoundPlaces extends Inspection {
  /** whether all of the artwork was looked at closely, and not only what the coarse pass marked */
  whole: boolean;
  /** whether it was read at the artwork's own pixels, so that what they do not resolve cannot be known */
  ownPixels: boolean;
  /** scale that was measured at */
  pxPerMm: number;
  artWidthPx: number;
  artHeightPx: number;
}

/** Scale at which an artwork is measured: six pixels to a line extent, or what its own pixels resolve. */
export function closeScale(
  source: CoverageSource,
  frame: Pick<SearchFrame, 'widthMm' | 'heightMm' | 'spot'>,
): number {
  const { widthMm, heightMm } = frame.spot;
  const largest = lineExtents(frame.spot, 1).largestPx;
  const wanted = Math.min(CLOSE_PX / Math.min(widthMm, heightMm), LARGEST_CLOSE_PX / largest);
  if (!source.nativePx) return wanted;
  const native = nativeScale(source.nativePx, frame);
  return native < 1.5 * wanted ? native : wanted;
}

/** Pixels per mm of the artwork's own, by the finer of its sides. */
const nativeScale = (
  native: { width: number; height: number },
  frame: Pick<SearchFrame, 'widthMm' | 'heightMm'>,
): number => Math.max(native.width / frame.widthMm, native.height / frame.heightMm);

function addShifted(to: SideFindings, from: SideFindings, dx: number, dy: number): void {
  for (const key of ['thin', 'small', 'tips', 'unresolved'] as const) {
    for (const place of from[key]) {
      place.left += dx;
      place.right += dx;
      place.top += dy;
      place.bottom += dy;
      place.ends = place.ends.map((v, n) => v + (n % 2 === 0 ? dx : dy));
      to[key].push(place);
    }
  }
}

/** What is too thin on one side: also what was too fine to see where the artwork itself would resolve it. */
export const tooThin = ({ thin, unresolved }: SideFindings, ownPixels: boolean): FoundPlace[] =>
  ownPixels ? thin : [...thin, ...unresolved];

/**
 * Everything in an artwork that is too thin or too small for a spot.
 * A coarse pass over all of it finds where a width lies under 1.5 line extents; there, window by window, the close look.
 * @param source coverage of the artwork
 * @param frame size, spot and level; unchanged
 * @param untilFirst stop at the first window in which anything is too thin
 * @returns places in px at the scale that it names
 * @throws what the source throws
 */
export async function findPlaces(
  source: CoverageSource,
  frame: SearchFrame,
  untilFirst = false,
): Promise<FoundPlaces> {
  const scale = closeScale(source, frame);
  const native = source.nativePx;
  const own = native !== null && scale === nativeScale(native, frame);
  const artWidthPx = own ? native.width : Math.max(1, Math.round(frame.widthMm * scale));
  const artHeightPx = own ? native.height : Math.max(1, Math.round(frame.heightMm * scale));
  const pxPerMm = Math.sqrt((artWidthPx * artHeightPx) / (frame.widthMm * frame.heightMm));
  const extents = lineExtents(frame.spot, pxPerMm);
  const margin = marginPx(extents);
  const faintest = native ? FAINTEST.pixels : FAINTEST.drawn;
  const found: FoundPlaces = {
    ink: nothing(),
    gaps: nothing(),
    burnedPx: 0,
    whole: true,
    ownPixels: own,
    pxPerMm,
    artWidthPx,
    artHeightPx,
  };
  const large = artWidthPx * artHeightPx > WHOLE_PX;
  const cells = (large ? await coarseMap(source, frame, pxPerMm, faintest) : null) ?? frame.drawn;
  found.whole = cells === null;
  for (const part of partsToInspect(artWidthPx, artHeightPx, cells)) {
    const left = part.left - margin;
    const top = part.top - margin;
    const width = part.right - part.left + 2 * margin;
    const height = part.bottom - part.top + 2 * margin;
    const data = await source.read({ artWidthPx, artHeightPx, left, top, width, height });
    const inside = { left: margin, top: margin, right: width - margin, bottom: height - margin };
    const leaveOut = (x: number, y: number): boolean =>
      frame.leaveOut((x + left) / artWidthPx, (y + top) / artHeightPx);
    const inspection = inspectWindow({ width, height, data }, frame.level, extents, {
      own: inside,
      leaveOut,
      faintest,
    });
    addShifted(found.ink, inspection.ink, left, top);
    addShifted(found.gaps, inspection.gaps, left, top);
    found.burnedPx += inspection.burnedPx;
    if (untilFirst && [found.ink, found.gaps].some((side) => tooThin(side, own).length > 0)) break;
  }
  for (const side of [found.ink, found.gaps]) {
    side.thin = mergeSeams(side.thin);
    side.unresolved = mergeSeams(side.unresolved);
  }
  return found;
}

async function coarseMap(
  source: CoverageSource,
  frame: SearchFrame,
  closePxPerMm: number,
  faintest: number,
): Promise<CellMap | null> {
  const wanted = COARSE_PX / Math.min(frame.spot.widthMm, frame.spot.heightMm);
  if (wanted > 0.6 * closePxPerMm) return null;
  const artWidthPx = Math.max(1, Math.round(frame.widthMm * wanted));
  const artHeightPx = Math.max(1, Math.round(frame.heightMm * wanted));
  const extents = lineExtents(frame.spot, wanted);
  const margin = Math.ceil(2 * extents.largestPx) + 4;
  const cells = emptyCells(artWidthPx, artHeightPx, CELL_PX);
  for (const part of partsToInspect(artWidthPx, artHeightPx, null)) {
    const left = part.left - margin;
    const top = part.top - margin;
    const width = Math.min(WINDOW_PX, part.right - part.left) + 2 * margin;
    const height = Math.min(WINDOW_PX, part.bottom - part.top) + 2 * margin;
    const data = await source.read({ artWidthPx, artHeightPx, left, top, width, height });
    const mark = (x: number, y: number): void => {
      const [ax, ay] = [x + left, y + top];
      if (ax < 0 || ay < 0 || ax >= artWidthPx || ay >= artHeightPx) return;
      if (!frame.leaveOut(ax / artWidthPx, ay / artHeightPx))
        markCells(cells, artWidthPx, artHeightPx, ax, ay, 3);
    };
    suspectPlaces({ width, height, data }, frame.level, extents, mark, faintest);
  }
  return cells;
}
