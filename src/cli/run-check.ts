import path from 'node:path';
import { ingest } from '../lib/prepare/ingest/ingest';
import { checkArtwork } from '../lib/prepare/pipeline';
import type { Finding } from '../lib/preflight/finding';
import type { PipelineTools } from '../lib/prepare/tools';
import type { TypedCommand } from './arguments';
import { centredBlank, readAsked, sizeFor } from './asked';
import { checkText } from './check-text';
import { EXIT, type ExitStatus } from './exit-status';
import { readArtwork } from './read-artwork';
import type { Surroundings } from './surroundings';
import { timingsText } from './timings-text';

/** Exit status that findings call for. */
export const statusFor = (findings: readonly Finding[]): ExitStatus =>
  findings.some((finding) => finding.severity === 'blocker') ? EXIT.blockers : EXIT.fine;

/** The command check: what was found, as one JSON object or as text. */
export async function runCheck(
  typed: TypedCommand,
  tools: PipelineTools,
  around: Surroundings,
): Promise<ExitStatus> {
  const asked = readAsked(typed.values);
  const bytes = await readArtwork(typed.artwork);
  const size = sizeFor(await ingest(bytes, tools), asked);
  const { report, timings } = await checkArtwork(
    bytes,
    {
      ...size,
      quarterTurns: asked.quarterTurns,
      spot: asked.spot,
      firing: asked.firing,
      directionDeg: asked.scan.directionDeg,
      linePitchMm: asked.scan.linePitchMm,
      treatment: asked.treatment,
      dividingLstar: asked.dividingLstar,
      blank: centredBlank(asked.blankSidesMm, size),
      machine: null,
    },
    tools,
  );
  const text = checkText(path.basename(typed.artwork), report);
  around.stdout(typed.switches.has('json') ? `${JSON.stringify(report)}\n` : text);
  if (typed.switches.has('timings')) around.stderr(timingsText(timings));
  return statusFor(report.findings);
}
