import { luminanceOfLstar } from '../../imaging/cie-lightness';
import type { Field } from '../../imaging/field';
import { linearToSrgb } from '../../imaging/srgb';
import { spotArea, type Spot } from '../../machines/spot';
import type { AreaFacts, Facts, WidthFacts, WidthPlace } from '../../preflight/facts';
import type { Place } from '../../preflight/finding';
import type { Artwork } from '../artwork';
import type { PipelineTools } from '../tools';
import { wholeWindow, type CoverageSource } from './coverage-source';
import { findPlaces, tooThin, type FoundPlaces } from './find-places';
import type { FoundPlace } from './inspect-window';
import type { MeasureSettings } from './measure-settings';
import { placementFacts, turned } from './placement';
import { rasterCoverage } from './raster-coverage';
import { toneFacts } from './tone-facts';
import { drawnCells, isTonalAt, surveyTones } from './tone-survey';
import { vectorCoverage } from './vector-coverage';

/** Pixels of the reduced picture that tones are read from. */
const OVERVIEW_RASTER_PX = 4_000_000;
const OVERVIEW_VECTOR_PX = 1_500_000;
/** Places that a list holds at most. */
const MAX_PLACES = 200;
const LEVELS = 255;

/** Coverage that parts burned from unburned, 0–255, never a whole number. */
export function levelOf(dividingLstar: number): number {
  const level = LEVELS * (1 - linearToSrgb(luminanceOfLstar(dividingLstar)));
  return Number.isInteger(level) ? level + 0.001 : level;
}

/** Coverage of an artwork, whatever it is made of. */
export function coverageOfArtwork(artwork: Artwork, tools: Pick<PipelineTools, 'renderSvg'>): CoverageSource {
  return artwork.kind === 'raster' ? rasterCoverage(artwork) : vectorCoverage(artwork, tools);
}

/** The spot as it lies in the artwork's own frame before its quarter turns. */
export function ownSpot(spot: Spot, quarterTurns: number): Spot {
  return quarterTurns % 2 === 0 ? spot : { ...spot, widthMm: spot.heightMm, heightMm: spot.widthMm };
}

/** The artwork as a whole, reduced to a number of pixels. */
export async function overview(source: CoverageSource, widthMm: number, heightMm: number): Promise<Field> {
  const native = source.nativePx;
  const most = native ? OVERVIEW_RASTER_PX : OVERVIEW_VECTOR_PX;
  const aspect = native ? native.width / native.height : widthMm / heightMm;
  const full = native ? native.width * native.height : most;
  const share = Math.min(1, Math.sqrt(most / full));
  const width = native
    ? Math.max(1, Math.round(native.width * share))
    : Math.max(1, Math.round(Math.sqrt(most * aspect)));
  const height = native
    ? Math.max(1, Math.round(native.height * share))
    : Math.max(1, Math.round(width / aspect));
  return { width, height, data: await source.read(wholeWindow(width, height)) };
}

/** Turns places in px of the artwork's own frame into mm of the placed one. */
function placer(found: FoundPlaces, settings: MeasureSettings): (place: FoundPlace) => WidthPlace {
  const { quarterTurns, widthMm, heightMm } = settings;
  return (place) => {
    const [ax, ay] = turned(place.left / found.artWidthPx, place.top / found.artHeightPx, quarterTurns);
    const [bx, by] = turned(place.right / found.artWidthPx, place.bottom / found.artHeightPx, quarterTurns);
    return {
      xMm: ((ax + bx) / 2) * widthMm,
      yMm: ((ay + by) / 2) * heightMm,
      widthMm: Math.abs(bx - ax) * widthMm,
      heightMm: Math.abs(by - ay) * heightMm,
      minMm: place.smallestPx / found.pxPerMm,
      limitMm: place.limitPx / found.pxPerMm,
    };
  };
}

const withoutLimit = ({ xMm, yMm, widthMm, heightMm, minMm }: WidthPlace): Place => ({
  xMm,
  yMm,
  widthMm,
  heightMm,
  minMm,
});
const bySize = (a: FoundPlace, b: FoundPlace): number => a.smallestPx - b.smallestPx;

function widthFacts(places: readonly FoundPlace[], place: (found: FoundPlace) => WidthPlace): WidthFacts {
  const worst = places.reduce((least, { worstRatio }) => Math.min(least, worstRatio), Infinity);
  return {
    count: places.length,
    places: [...places].sort(bySize).slice(0, MAX_PLACES).map(place),
    worstRatio: places.length > 0 ? worst : null,
  };
}

function areaFacts(
  places: readonly FoundPlace[],
  spot: Spot,
  place: (found: FoundPlace) => WidthPlace,
): AreaFacts {
  return {
    count: places.length,
    places: [...places].sort(bySize).slice(0, MAX_PLACES).map(place).map(withoutLimit),
    limitMm: 2 * Math.sqrt(spotArea(spot) / Math.PI),
  };
}

/**
 * Measures an artwork at its placed size: widths, islands, tones and place. It judges nothing.
 * Widths are distances to the sub-pixel contour at the dividing level, at six pixels to a line extent or what the
 * artwork's own pixels resolve; tonal parts are left out.
 * @param artwork what ingest gave; unchanged
 * @param settings placed size, spot, blank and machine; unchanged
 * @param tools draws vector artwork
 * @returns numbers, with places in mm from the placed artwork's top left corner
 * @throws ArtworkError when a drawing cannot be rendered; RangeError when a size is not above 0
 */
export async function measure(
  artwork: Artwork,
  settings: MeasureSettings,
  tools: Pick<PipelineTools, 'renderSvg'>,
): Promise<Facts> {
  const { widthMm, heightMm, quarterTurns } = settings;
  if (!(widthMm > 0) || !(heightMm > 0))
    throw new RangeError(`expected sides above 0 mm, got ${widthMm} x ${heightMm}`);
  const source = coverageOfArtwork(artwork, tools);
  const [ownWidthMm, ownHeightMm] = quarterTurns % 2 === 0 ? [widthMm, heightMm] : [heightMm, widthMm];
  const spot = ownSpot(settings.spot, quarterTurns);
  const level = levelOf(settings.dividingLstar);
  const field = await overview(source, ownWidthMm, ownHeightMm);
  const survey = surveyTones(field);
  const extentPx = (Math.min(spot.widthMm, spot.heightMm) * field.width) / ownWidthMm;
  const frame = {
    widthMm: ownWidthMm,
    heightMm: ownHeightMm,
    spot,
    level,
    leaveOut: (fx: number, fy: number): boolean => isTonalAt(survey, fx, fy),
    drawn: drawnCells(survey),
  };
  const found = await findPlaces(source, frame);
  const place = placer(found, settings);
  const unresolved = found.ownPixels ? [...found.ink.unresolved, ...found.gaps.unresolved] : [];
  return {
    placement: placementFacts(settings, field, level),
    linePitchMm: settings.linePitchMm,
    hairlines: widthFacts(tooThin(found.ink, found.ownPixels), place),
    fillIns: widthFacts(tooThin(found.gaps, found.ownPixels), place),
    specks: areaFacts(found.ink.small, spot, place),
    pinholes: areaFacts(found.gaps.small, spot, place),
    sharpTips: {
      count: found.ink.tips.length,
      places: found.ink.tips.slice(0, MAX_PLACES).map(place).map(withoutLimit),
    },
    source: {
      pxPerMm: source.nativePx && source.nativePx.width / ownWidthMm,
      unresolved: {
        count: unresolved.length,
        places: [...unresolved].sort(bySize).slice(0, MAX_PLACES).map(place).map(withoutLimit),
      },
    },
    tone: toneFacts(field, survey, level, extentPx),
    measuredPxPerMm: found.pxPerMm,
    missingFonts: artwork.kind === 'vector' ? artwork.missingFonts : [],
    removed: artwork.kind === 'vector' ? artwork.removed : [],
    severalFrames: artwork.facts.remarks.some((remark) => /first (frame|page|picture)/i.test(remark)),
  };
}
