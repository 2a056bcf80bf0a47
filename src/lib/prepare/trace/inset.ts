import { spotArea, type Spot } from '../../machines/spot';
import type { Point } from './curve';
import { partsOf } from './parts';
import {
  areaOf,
  EMPTY,
  offsetByDisc,
  signedArea,
  simplify,
  subtract,
  sweepByRectangle,
  unite,
  type Region,
} from './region';

/** Arcs are drawn to this share of half the line extent. */
const ARC_TOLERANCE = 0.01;
/** Shares of the line extent by which outlines are drawn in, where an area is too narrow for the one before. */
const SHARES = [1, 0.75, 0.5, 0.25, 0.08];
/** What a drawn-in outline leaves uncovered counts from this share of the spot's area; corners of 60° and wider leave less. */
const LEFTOVER_SHARE = { ellipse: 0.25, rectangle: 0.5 } as const;
/** What is left along edges by the rounding of arcs is narrower than this share of the line extent. */
const SLIVER_SHARE = 0.05;

const scale = (region: Region, x: number, y: number): Region =>
  region.map((path) => path.map((p): Point => [p[0] * x, p[1] * y]));

/** The points at which a spot, made smaller by a share, lies wholly within a region. */
export function erode(region: Region, spot: Spot, share = 1): Region {
  const [w, h] = [(spot.widthMm / 2) * share, (spot.heightMm / 2) * share];
  if (spot.shape === 'rectangle') return subtract(region, sweepByRectangle(region, w, h));
  return scale(offsetByDisc(scale(region, 1 / w, 1 / h), -1, ARC_TOLERANCE), w, h);
}

/** What a spot, made smaller by a share, covers when its centre takes every point of a region. */
export function dilate(region: Region, spot: Spot, share = 1): Region {
  const [w, h] = [(spot.widthMm / 2) * share, (spot.heightMm / 2) * share];
  if (spot.shape === 'rectangle') return unite(region, sweepByRectangle(region, w, h));
  return scale(offsetByDisc(scale(region, 1 / w, 1 / h), 1, ARC_TOLERANCE), w, h);
}

/**
 * Lines along which a spot burns a region so that the burned edge keeps the region's edge: its outlines drawn in by half
 * the line extent. Parts too narrow for that get outlines drawn in by less, so that they burn as one line and are not lost.
 * Erosion by the spot (Minkowski difference); what an opening by the spot leaves goes round again with a smaller share.
 * @param region mm; unchanged
 * @param spot mm
 * @returns closed outlines; empty for an empty region
 */
export function insetOutlines(region: Region, spot: Spot): Region {
  // Parts do not touch each other's outlines, and many small ones take far less time than all at once.
  return partsOf(region).flatMap((part) => insetPart(part.region, spot));
}

function insetPart(region: Region, spot: Spot): Region {
  const fine = Math.min(spot.widthMm, spot.heightMm) / 2;
  const least = LEFTOVER_SHARE[spot.shape] * spotArea(spot);
  let outlines: Region = EMPTY;
  let rest = region;
  for (const share of SHARES) {
    if (rest.length === 0) break;
    const eroded = erode(rest, spot, share);
    outlines = [...outlines, ...simplify(eroded, fine * ARC_TOLERANCE)];
    const covered = dilate(eroded, spot, share);
    // An opening lies within what it opens, so that areas tell whether anything was left.
    if (areaOf(rest) - areaOf(covered) < least) break;
    const left = subtract(rest, covered);
    const whole = dilate(erode(left, spot, SLIVER_SHARE), spot, SLIVER_SHARE);
    rest = whole.filter((path) => Math.abs(signedArea(path)) >= least);
  }
  return outlines;
}
