import path from 'node:path';
import { ingest } from '../lib/prepare/ingest/ingest';
import { canonicalJson } from '../lib/prepare/manifest';
import { prepareArtwork, type Prepared } from '../lib/prepare/pipeline';
import { passFrames } from '../lib/prepare/resample/pass-frames';
import type { Settings } from '../lib/prepare/settings';
import { ArtworkError, type PipelineTools } from '../lib/prepare/tools';
import type { TypedCommand } from './arguments';
import { readAsked, sizeFor } from './asked';
import { checkText } from './check-text';
import type { ExitStatus } from './exit-status';
import { readPrepareChoices, settingsOf } from './prepare-settings';
import { readArtwork } from './read-artwork';
import type { Surroundings } from './surroundings';
import { statusFor } from './run-check';
import { timingsText } from './timings-text';
import { UsageError } from './usage-error';
import { isTakenByFile, writeFolder, type FileToWrite } from './write-folder';

async function readOut(text: string | undefined): Promise<string> {
  if (!text) throw new UsageError('--out is needed: the folder that the files are written into.');
  if (await isTakenByFile(text)) throw new UsageError(`--out takes a folder, and ${text} is a file.`);
  return text;
}

/** Refuses passes that would not fit before any work: the artwork is sound, the pitch is not. */
function requireFittingPitch(settings: Settings): void {
  try {
    passFrames(settings);
  } catch (error) {
    if (error instanceof ArtworkError)
      throw new UsageError(`--pitch-mm does not fit. ${error.message}`, { cause: error });
    throw error;
  }
}

/** The manifest stands last: where it is, all the other files are. */
function filesOf(prepared: Prepared, withPictures: boolean): FileToWrite[] {
  const pictures = Object.entries(prepared.pictures).map(([name, bytes]) => ({
    name: `pictures/${name}.png`,
    bytes,
  }));
  return [
    ...prepared.files,
    ...(withPictures ? pictures : []),
    { name: 'report.json', bytes: `${JSON.stringify(prepared.report, null, 2)}\n` },
    { name: 'manifest.json', bytes: canonicalJson(prepared.manifest) },
  ];
}

function writtenText(out: string, files: readonly FileToWrite[]): string {
  return `Written to ${out}:\n${files.map(({ name }) => `  ${name}\n`).join('')}`;
}

/** The command prepare: writes the prepared files with report and manifest, also when there are blockers. */
export async function runPrepare(
  typed: TypedCommand,
  tools: PipelineTools,
  around: Surroundings,
): Promise<ExitStatus> {
  const asked = readAsked(typed.values);
  const choices = readPrepareChoices(typed.values, asked, typed.artwork);
  const out = await readOut(typed.values.out);
  const bytes = await readArtwork(typed.artwork);
  const artwork = await ingest(bytes, tools);
  if (asked.widthMm === null && asked.heightMm === null && artwork.facts.ownWidthMm === null) {
    throw new UsageError('--width-mm is needed, from 1 to 3000 mm: this artwork states no size of its own.');
  }
  const settings = settingsOf(asked, choices, sizeFor(artwork, asked), typed.switches.has('mirror'));
  requireFittingPitch(settings);
  const prepared = await prepareArtwork(bytes, { settings, artworkVersion: 1 }, tools);
  const files = filesOf(prepared, typed.switches.has('pictures'));
  await writeFolder(out, files);
  const text = `${checkText(path.basename(typed.artwork), prepared.report)}\n${writtenText(out, files)}`;
  around.stdout(typed.switches.has('json') ? `${JSON.stringify(prepared.report)}\n` : text);
  if (typed.switches.has('timings')) around.stderr(timingsText(prepared.timings));
  return statusFor(prepared.report.findings);
}
