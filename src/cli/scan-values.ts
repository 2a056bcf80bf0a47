import { firingSchema, sizeAcross, spotShapeSchema, type Firing, type Spot } from '../lib/machines/spot';
import type { Scan } from '../lib/prepare/settings';
import type { TypedCommand } from './arguments';
import { DIRECTION_RANGE, numberValue, pairValue, PITCH_RANGE, SPOT_RANGE, wordValue } from './option-values';
import { UsageError } from './usage-error';

type Values = TypedCommand['values'];

/** The spot that a command names. */
export function readSpot(values: Values): Spot {
  if (values.spot === undefined) {
    throw new UsageError(
      '--spot is needed: width by height of what the beam marks, each from 0.005 to 5 mm, such as 0.07x0.11.',
    );
  }
  const [widthMm, heightMm] = pairValue('spot', values.spot, SPOT_RANGE);
  return {
    widthMm,
    heightMm,
    shape: wordValue('spot-shape', values['spot-shape'] ?? 'ellipse', spotShapeSchema.options),
  };
}

export const readFiring = (values: Values): Firing =>
  wordValue('firing', values.firing ?? 'swept', firingSchema.options);

/** PxQ is along X and along Y: only at quarter turns does each of them lie along or across the lines. */
function pitchPair(text: string, directionDeg: number): Pick<Scan, 'linePitchMm' | 'alongPitchMm'> {
  const [alongX, alongY] = pairValue('pitch-mm', text, PITCH_RANGE);
  if (directionDeg % 90 !== 0) {
    throw new UsageError(
      '--pitch-mm takes PxQ only when scanning at 0 or 90 degrees; use --pitch-mm with --pitch-along-mm.',
    );
  }
  return directionDeg % 180 === 0
    ? { linePitchMm: alongY, alongPitchMm: alongX }
    : { linePitchMm: alongX, alongPitchMm: alongY };
}

/** Direction and pitches that a command asks for; the line pitch is the size across where it asks for none. */
export function readScan(values: Values, spot: Spot): Scan {
  const directionDeg = numberValue('direction-deg', values['direction-deg'] ?? '0', DIRECTION_RANGE);
  const along = values['pitch-along-mm'];
  const pitch = values['pitch-mm'];
  if (pitch !== undefined && /[x×]/i.test(pitch)) {
    if (along !== undefined)
      throw new UsageError('--pitch-mm PxQ already says both pitches: leave --pitch-along-mm out.');
    return { directionDeg, ...pitchPair(pitch, directionDeg) };
  }
  const own = Math.round(sizeAcross(spot, directionDeg) * 1e6) / 1e6;
  const linePitchMm = pitch === undefined ? own : numberValue('pitch-mm', pitch, PITCH_RANGE);
  if (linePitchMm < PITCH_RANGE.min || linePitchMm > PITCH_RANGE.max) {
    throw new UsageError(
      `--pitch-mm is needed, from ${PITCH_RANGE.min} to ${PITCH_RANGE.max} mm: the spot is ${own} mm across the lines, outside that range.`,
    );
  }
  const alongPitchMm = along === undefined ? linePitchMm : numberValue('pitch-along-mm', along, PITCH_RANGE);
  return { directionDeg, linePitchMm, alongPitchMm };
}
