import { sizeAcross } from '../machines/spot';
import { assembleCheckReport, assembleReport } from './assemble-report';
import { canonicalJson, MANIFEST_VERSION, type Manifest, type PrepareRequest } from './manifest';
import { passFrames } from './resample/pass-frames';
import type { Settings } from './settings';
import {
  forecastStage,
  ingestStage,
  markStage,
  measureStage,
  packageStage,
  pictureStage,
  preflightStage,
  soundWidthStage,
  traceStage,
} from './stages';
import { stopwatch } from './stopwatch';
import type { PipelineTools } from './tools';
import { versions } from './versions';
import type { Checked, CheckSettings, CheckWork, Given, Prepared, PrepareWork, Stage } from './work';

export type { Checked, CheckSettings, Prepared } from './work';

const CHECK: readonly Stage<CheckWork>[] = [
  ingestStage,
  measureStage,
  soundWidthStage,
  preflightStage,
  pictureStage,
];

const PREPARE: readonly Stage<PrepareWork>[] = [
  ingestStage,
  measureStage,
  soundWidthStage,
  preflightStage,
  markStage,
  traceStage,
  packageStage,
  forecastStage,
];

/** Told which stage runs and how far it is, 0–1. */
export type OnStage = (stage: string, progress: number) => void;

async function runAll<W extends Given>(
  stages: readonly Stage<W>[],
  work: W,
  onStage: OnStage,
): Promise<void> {
  for (const { name, run, timesItself } of stages) {
    work.onProgress = (share) => onStage(name, share);
    work.onProgress(0);
    await (timesItself ? run(work) : work.stopwatch.time(name, () => run(work)));
    work.onProgress(1);
  }
}

const given = (bytes: Uint8Array, tools: PipelineTools): Given => ({
  bytes,
  tools,
  stopwatch: stopwatch(() => tools.now()),
  onProgress: () => undefined,
});

/**
 * Looks at an artwork and says what will not engrave; writes no files.
 * Runs the stages from ingest to picture.
 * @param bytes what was sent; unchanged
 * @param settings size, spot, direction, blank and machine; unchanged
 * @param tools work that runs in processes of its own
 * @param onStage told of every stage
 * @returns report, picture and milliseconds by stage
 * @throws ArtworkError with a sentence for the sender when the artwork cannot be read
 */
export async function checkArtwork(
  bytes: Uint8Array,
  settings: CheckSettings,
  tools: PipelineTools,
  onStage: OnStage = () => undefined,
): Promise<Checked> {
  const linePitchMm = settings.linePitchMm ?? sizeAcross(settings.spot, settings.directionDeg);
  const work = Object.assign({} as CheckWork, given(bytes, tools), { asked: { ...settings, linePitchMm } });
  await runAll(CHECK, work, onStage);
  return { report: assembleCheckReport(work), picture: work.picture, timings: work.stopwatch.milliseconds };
}

export interface Preparation {
  settings: Settings;
  /** version number of the artwork in its order */
  artworkVersion: number;
}

function requestOf({
  artworkSha256,
  settings,
  artworkVersion,
}: Preparation & { artworkSha256: string }): PrepareRequest {
  return {
    manifestVersion: MANIFEST_VERSION,
    artworkSha256,
    artworkVersion,
    settings,
    responsePoints: [],
    recipeVersion: null,
    mends: [],
    versions: versions(),
  };
}

/**
 * Key of a preparation, known before any work is done: the SHA-256 of the canonical request.
 * @param request artwork's hash and version, and settings; unchanged
 * @param tools only `sha256` is used
 * @returns 64 hexadecimal digits; the same request under the same versions, the same key
 */
export function preparationKey(
  request: Preparation & { artworkSha256: string },
  tools: Pick<PipelineTools, 'sha256'>,
): string {
  return tools.sha256(canonicalJson(requestOf(request)));
}

/**
 * Prepares an artwork for one machine and one stock: files, pictures of the passage, report and manifest.
 * Runs the stages from ingest to forecast; the same bytes and settings under the same versions give the same files.
 * @param bytes what was sent; unchanged
 * @param preparation settings and version of the artwork; unchanged
 * @param tools work that runs in processes of its own
 * @param onStage told of every stage
 * @returns all of it; blockers stop nothing here
 * @throws ArtworkError with a sentence for the sender when the artwork cannot be read or would not fit
 */
export async function prepareArtwork(
  bytes: Uint8Array,
  preparation: Preparation,
  tools: PipelineTools,
  onStage: OnStage = () => undefined,
): Promise<Prepared> {
  const { settings } = preparation;
  const frames = passFrames(settings);
  const request = requestOf({ ...preparation, artworkSha256: tools.sha256(bytes) });
  const key = tools.sha256(canonicalJson(request));
  const { directionDeg, linePitchMm } = settings.scan;
  const asked = { ...settings, directionDeg, linePitchMm, speedMmPerS: settings.recipe?.speedMmPerS ?? null };
  const work = Object.assign({} as PrepareWork, given(bytes, tools), {
    asked,
    settings,
    preparationKey: key,
    frames,
  });
  await runAll(PREPARE, work, onStage);
  const manifest: Manifest = { ...request, files: work.files.map(({ entry }) => entry) };
  const manifestSha256 = tools.sha256(canonicalJson(manifest));
  return {
    report: assembleReport(work, manifestSha256),
    manifest,
    manifestSha256,
    key,
    files: work.files.map(({ name, mediaType, bytes: content }) => ({ name, mediaType, bytes: content })),
    pictures: work.pictures,
    timings: work.stopwatch.milliseconds,
  };
}
