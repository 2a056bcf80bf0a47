import type { Artwork } from '../artwork';
import type { PipelineTools } from '../tools';
import type { CoverageSource } from './coverage-source';
import { closeScale, findPlaces, tooThin, type FoundPlaces, type SearchFrame } from './find-places';
import type { MeasureSettings } from './measure-settings';
import { coverageOfArtwork, levelOf, overview, ownSpot } from './measure';
import { PHOTOGRAPH_SHARE } from './suggest-treatment';
import { drawnCells, isTonalAt, surveyTones } from './tone-survey';

/** Longest side that the search begins with, in line extents. */
const FIRST_EXTENTS = 6;
/** Widths under this many pixels tell only roughly how much larger the artwork must be. */
const ROUGH_PX = 2.5;
const ROUGH_SHARE = 0.85;
const ROUGH_GROWTH = 6;
const MOST_GROWTH = 30;
/** Share of the burned area that may lie in islands smaller than the spot before the picture counts as not yet resolved. */
const DUST_SHARE = 0.02;
/** Share of the burned area that must be seen as burned: thinner strokes than a pixel are not. */
const SEEN_SHARE = 0.8;
/** How far below the answer the artwork must not be sound. */
const TIGHT = 0.98;
/** Longest side that is searched, mm, and most pixels that are looked at for one width. */
const LONGEST_MM = 5000;
const MOST_PX = 400_000_000;

interface Verdict {
  sound: boolean;
  /** whether what is small at this width is no more than dust */
  resolved: boolean;
  /** factor to the width that is expected to be sound */
  growth: number;
  /** whether all that is thin tapers to nothing, which no width mends */
  fading: boolean;
}

function verdictOf(found: FoundPlaces, burnedShare: number): Verdict {
  const thin = [found.ink, found.gaps].flatMap((side) => tooThin(side, found.ownPixels));
  const smallPx2 = [...found.ink.small, ...found.gaps.small].reduce(
    (sum, { smallestPx }) => sum + (Math.PI / 4) * smallestPx * smallestPx,
    0,
  );
  const burnedPx = burnedShare * found.artWidthPx * found.artHeightPx;
  let growth = 1;
  for (const { soundScale, smallestPx } of thin) {
    growth = Math.max(
      growth,
      smallestPx < ROUGH_PX ? Math.min(ROUGH_SHARE * soundScale, ROUGH_GROWTH) : soundScale,
    );
  }
  return {
    sound: thin.length === 0,
    resolved: smallPx2 <= DUST_SHARE * burnedPx && (!found.whole || found.burnedPx >= SEEN_SHARE * burnedPx),
    fading: thin.length > 0 && thin.every(({ fading }) => fading),
    growth: Math.min(MOST_GROWTH, Math.max(1.01, growth)),
  };
}

/**
 * The smallest physical width at which an artwork has neither hairline nor fill-in, at the current direction.
 * Beginning small, the artwork is drawn ever larger until its thinnest stroke or gap has the line extent, each time at six
 * pixels to the extent; then the answer is closed in from below. Specks and pinholes count for nothing.
 * @param artwork what ingest gave; unchanged
 * @param settings proportions, spot and dividing level; the size itself does not matter; unchanged
 * @param tools draws vector artwork
 * @returns mm, sound at that width and not sound 3 % below; null for photographs, where nothing is thin at any
 *   width, and where a tip tapers so gently that it is thin at any
 * @throws ArtworkError when a drawing cannot be rendered
 */
export async function smallestSoundWidth(
  artwork: Artwork,
  settings: MeasureSettings,
  tools: Pick<PipelineTools, 'renderSvg'>,
): Promise<number | null> {
  const odd = settings.quarterTurns % 2 === 1;
  const [widthMm, heightMm] = odd
    ? [settings.heightMm, settings.widthMm]
    : [settings.widthMm, settings.heightMm];
  const source = coverageOfArtwork(artwork, tools);
  const spot = ownSpot(settings.spot, settings.quarterTurns);
  const field = await overview(source, widthMm, heightMm);
  const survey = surveyTones(field);
  if (survey.tonalShare >= PHOTOGRAPH_SHARE) return null;
  const level = levelOf(settings.dividingLstar);
  const burned = field.data.reduce((count, v) => count + (v > level ? 1 : 0), 0) / field.data.length;
  if (burned === 0) return null;
  const frame: SearchFrame = {
    widthMm,
    heightMm,
    spot,
    level,
    leaveOut: (fx, fy) => isTonalAt(survey, fx, fy),
    drawn: drawnCells(survey),
  };
  const scale = await closeIn(source, frame, burned);
  return scale === null ? null : Math.ceil(scale * settings.widthMm * 1000) / 1000;
}

/** Scale of the frame's size at which the artwork is just sound. */
async function closeIn(
  source: CoverageSource,
  frame: SearchFrame,
  burnedShare: number,
): Promise<number | null> {
  const longest = Math.max(frame.widthMm, frame.heightMm);
  const at = (scale: number): SearchFrame => ({
    ...frame,
    widthMm: scale * frame.widthMm,
    heightMm: scale * frame.heightMm,
  });
  const look = async (scale: number, untilFirst = false): Promise<Verdict> =>
    verdictOf(await findPlaces(source, at(scale), untilFirst), burnedShare);
  const tooLarge = (scale: number): boolean => {
    const pxPerMm = closeScale(source, at(scale));
    return frame.widthMm * frame.heightMm * (scale * pxPerMm) ** 2 > MOST_PX || scale * longest > LONGEST_MM;
  };
  let scale = (FIRST_EXTENTS * Math.max(frame.spot.widthMm, frame.spot.heightMm)) / longest;
  let below: number | null = null;
  let faded = 0;
  for (;;) {
    const verdict = await look(scale);
    if (verdict.sound && verdict.resolved) break;
    if (!verdict.sound) below = scale;
    faded = verdict.fading ? faded + 1 : 0;
    if (faded === 2) return null;
    const next = scale * (verdict.sound ? 1.5 : verdict.growth);
    if (tooLarge(next)) return below === null ? null : next;
    scale = next;
  }
  return below === null ? null : tighten(look, below, scale);
}

/** Narrows the bracket between a width that is not sound and one that is: in growing steps down, then by halves. */
async function tighten(
  look: (scale: number, untilFirst: boolean) => Promise<Verdict>,
  below: number,
  sound: number,
): Promise<number> {
  let [low, high, step] = [below, sound, TIGHT];
  let met = false;
  while (low < high * 0.97) {
    const stepped = high * step;
    const next = met || stepped <= low ? Math.sqrt(low * high) : stepped;
    if ((await look(next, true)).sound) {
      high = next;
      step *= step;
    } else {
      low = next;
      met = true;
    }
  }
  return high;
}
