import { judge } from '../preflight/checks';
import { colourPicture } from './forecast/colour-picture';
import { passagePictures } from './forecast/passage-pictures';
import { ingest } from './ingest/ingest';
import { overBlack } from './ingest/over-black';
import { mark } from './mark';
import { measure } from './measure/measure';
import { smallestSoundWidth } from './measure/smallest-sound-width';
import { PHOTOGRAPH_SHARE, suggestTreatment } from './measure/suggest-treatment';
import { packageLinework } from './package/package-linework';
import { packageRasters } from './package/package-rasters';
import { placedSize } from './placed-size';
import { turnArtwork } from './resample/turn';
import { untouchedLuminance } from './tone/burn-table';
import { trace } from './trace/trace';
import type { CheckWork, PrepareWork, Stage } from './work';

/** Reads what was sent and settles the size that it is placed at. */
export const ingestStage: Stage<CheckWork> = {
  name: 'ingest',
  async run(work) {
    work.artwork = await ingest(work.bytes, work.tools);
    work.placed = { ...work.asked, ...placedSize(work.artwork, work.asked) };
  },
};

/** Widths, islands, tones and place: numbers only. */
export const measureStage: Stage<CheckWork> = {
  name: 'measure',
  async run(work) {
    work.facts = await measure(work.artwork, work.placed, work.tools);
    work.suggestion = suggestTreatment(work.facts.tone, work.artwork.kind === 'vector');
  },
};

/** What the numbers mean for the job. */
export const preflightStage: Stage<CheckWork> = {
  name: 'preflight',
  async run(work) {
    const photograph = work.facts.tone.tonalShare >= PHOTOGRAPH_SHARE;
    const treatment = work.placed.treatment ?? work.suggestion.treatment;
    work.findings = judge(work.facts, {
      spot: work.placed.spot,
      treatment,
      photograph,
      smallestSoundWidthMm: work.smallestSoundWidthMm,
    });
  },
};

/** The smallest width at which nothing would be too thin. */
export const soundWidthStage: Stage<CheckWork> = {
  name: 'sound-width',
  async run(work) {
    work.smallestSoundWidthMm = await smallestSoundWidth(work.artwork, work.placed, work.tools);
  },
};

const CHECK_PICTURE_PX = 1600;
const NOMINAL_DRAWING_PX = 1600;

/** The artwork in its own colours, as it is placed: never larger than a screen, never finer than it is. */
export const pictureStage: Stage<CheckWork> = {
  name: 'picture',
  async run(work) {
    const { widthMm, heightMm, quarterTurns } = work.placed;
    const { kind, facts } = work.artwork;
    const ownPx = kind === 'raster' ? Math.max(facts.widthPx, facts.heightPx) : NOMINAL_DRAWING_PX;
    const scale = Math.min(CHECK_PICTURE_PX, ownPx) / Math.max(widthMm, heightMm);
    const columns = Math.max(1, Math.round(widthMm * scale));
    const rows = Math.max(1, Math.round(heightMm * scale));
    work.picture = await colourPicture(work.bytes, work.artwork, quarterTurns, columns, rows, work.tools);
  },
};

/** Resample, tone and screen, band by band, for each pass; it times the three apart. */
export const markStage: Stage<PrepareWork> = {
  name: 'mark',
  timesItself: true,
  async run(work) {
    const { settings, artwork, frames, bytes } = work;
    const base = untouchedLuminance(settings) === 0 ? await overBlack(artwork, bytes) : artwork;
    work.turned = turnArtwork(base, settings.quarterTurns);
    work.passes = [];
    for (const [index, frame] of frames.entries()) {
      const onProgress = (share: number): void => work.onProgress((index + share) / frames.length);
      const marks = await mark(work.turned, frame, settings, { ...work, onProgress });
      work.passes.push({ pass: index === 0 ? 1 : 2, frame, marks });
    }
  },
};

/** Lines to be followed, where the treatment asks for them. */
export const traceStage: Stage<PrepareWork> = {
  name: 'trace',
  async run(work) {
    const { artwork, settings, tools } = work;
    work.linework = settings.treatment === 'linework' ? await trace(artwork, settings, tools) : null;
  },
};

/** The files that the operator runs. */
export const packageStage: Stage<PrepareWork> = {
  name: 'package',
  async run(work) {
    const lines = work.linework && (await packageLinework(work, work.linework));
    work.lineworkOptimised = lines?.optimised ?? false;
    work.files = lines?.files ?? (await packageRasters(work));
  },
};

/** The pictures of the passage, last of all the engraved piece. */
export const forecastStage: Stage<PrepareWork> = {
  name: 'forecast',
  async run(work) {
    work.pictures = await passagePictures(work);
  },
};
