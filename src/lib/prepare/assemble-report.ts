import { dose, opticalPower } from '../machines/dose';
import { runOff, scanTime } from '../machines/scan-time';
import { sizeAcross } from '../machines/spot';
import { meanBurn } from './mark-raster';
import type { ArtworkFacts, CheckReport, PassReport, Report } from './report';
import { REPORT_VERSION } from './report';
import type { ScanFrame } from './resample/scan-frame';
import type { Settings } from './settings';
import type { CheckWork, MarkedPass, PrepareWork } from './work';

function artworkFacts({ artwork, suggestion, facts }: CheckWork): ArtworkFacts {
  return {
    ...artwork.facts,
    suggestedTreatment: suggestion.treatment,
    suggestionReason: suggestion.reason,
    tonalShare: facts.tone.tonalShare,
  };
}

/**
 * The quick answer to an upload, from what the stages left.
 * @param work with all stages of a check done; unchanged
 */
export function assembleCheckReport(work: CheckWork): CheckReport {
  const { placed, findings, smallestSoundWidthMm, facts } = work;
  return {
    reportVersion: REPORT_VERSION,
    artwork: artworkFacts(work),
    widthMm: placed.widthMm,
    heightMm: placed.heightMm,
    directionDeg: placed.directionDeg,
    sizeAcrossMm: sizeAcross(placed.spot, placed.directionDeg),
    findings,
    smallestSoundWidthMm,
    measuredPxPerMm: facts.measuredPxPerMm,
  };
}

/** Scan lines of a pass, the pixels along one, and its length. */
function linesOf({ columns, rows, widthMm, heightMm, linesAre }: ScanFrame) {
  return linesAre === 'rows'
    ? { lines: rows, pixelsAlong: columns, lineMm: widthMm }
    : { lines: columns, pixelsAlong: rows, lineMm: heightMm };
}

function pitchesOf({ linesAre, pitchXMm, pitchYMm }: ScanFrame) {
  return linesAre === 'rows'
    ? { linePitchMm: pitchYMm, alongPitchMm: pitchXMm }
    : { linePitchMm: pitchXMm, alongPitchMm: pitchYMm };
}

type RunFigures = Pick<PassReport, 'doseJPerMm2' | 'assumesLinearPower' | 'scanSeconds' | 'runOffMm'>;
const NOT_KNOWN: RunFigures = {
  doseJPerMm2: null,
  assumesLinearPower: false,
  scanSeconds: null,
  runOffMm: null,
};

/** Time of lines that are followed at one speed, s; moves from line to line are not counted. They have no dose of an area. */
function followedFigures({ linework, settings }: PrepareWork): RunFigures {
  if (!linework || !settings.recipe) return NOT_KNOWN;
  return { ...NOT_KNOWN, scanSeconds: linework.report.lengthMm / settings.recipe.speedMmPerS };
}

/** Dose, time and run-off where recipe and machine are known. */
function runFigures({ pass, frame }: MarkedPass, { recipe, machine }: Settings): RunFigures {
  const run = pass === 1 ? recipe : recipe?.perpendicular;
  if (!run || !machine) return NOT_KNOWN;
  const { linePitchMm } = pitchesOf(frame);
  const power = opticalPower(machine, run.powerPercent);
  const { lines, lineMm } = linesOf(frame);
  const { accelerationMmPerS2, scanning } = machine;
  const motion = { speedMmPerS: run.speedMmPerS, accelerationMmPerS2 };
  return {
    doseJPerMm2: dose(power.watts, run.speedMmPerS, linePitchMm),
    assumesLinearPower: power.assumesLinear,
    scanSeconds: scanTime({ lines, lineMm, linePitchMm, ...motion, scanning }),
    runOffMm: runOff(run.speedMmPerS, accelerationMmPerS2),
  };
}

function passReport(marked: MarkedPass, work: PrepareWork): PassReport {
  const { settings, linework } = work;
  const { pass, frame, marks } = marked;
  const { lines, pixelsAlong } = linesOf(frame);
  const pitches = pitchesOf(frame);
  const sizeAcrossMm = sizeAcross(settings.spot, frame.directionDeg);
  const { angleDeg, origin, outline } = frame;
  return {
    pass,
    directionDeg: frame.directionDeg,
    ...pitches,
    sizeAcrossMm,
    pitchRatio: pitches.linePitchMm / sizeAcrossMm,
    lines,
    pixelsAlong,
    scanFrame: angleDeg === 0 ? null : { angleDeg, originXMm: origin.xMm, originYMm: origin.yMm, outline },
    ...(linework ? followedFigures(work) : runFigures(marked, settings)),
    meanBurn: meanBurn(marks),
  };
}

/** Sum of figures that are all known, else null. */
function total(figures: readonly (number | null)[]): number | null {
  return figures.reduce<number | null>(
    (sum, figure) => (sum === null || figure === null ? null : sum + figure),
    0,
  );
}

/**
 * What a preparation says of itself, from what the stages left.
 * @param work with all stages done; unchanged
 * @param manifestSha256 hash of the manifest that belongs to it
 */
export function assembleReport(work: PrepareWork, manifestSha256: string): Report {
  const { settings, preparationKey, linework } = work;
  const passes = work.passes.map((marked) => passReport(marked, work));
  return {
    ...assembleCheckReport(work),
    settings,
    passes,
    trace: linework && { ...linework.report, optimised: work.lineworkOptimised },
    totalDoseJPerMm2: total(passes.map(({ doseJPerMm2 }) => doseJPerMm2)),
    totalSeconds: total(passes.map(({ scanSeconds }) => scanSeconds)),
    files: work.files.map(({ entry }) => entry),
    preparationKey,
    manifestSha256,
  };
}
