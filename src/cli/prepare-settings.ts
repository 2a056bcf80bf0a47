import { pitchSchema, settingsSchema, toneSchema, type Settings, type Tone } from '../lib/prepare/settings';
import type { PlacedSize } from '../lib/prepare/placed-size';
import type { TypedCommand } from './arguments';
import { centredBlank, type Asked } from './asked';
import { readLabel } from './label';
import { numberValue, PITCH_RANGE, wordValue } from './option-values';
import { readScreen } from './screen-value';
import { UsageError } from './usage-error';

type Values = TypedCommand['values'];
const FORMATS = ['png', 'tiff', 'bmp'] as const;

function readTone(values: Values): Tone {
  const blackPoint = numberValue('black-point', values['black-point'] ?? '0', {
    min: 0,
    max: 0.95,
    unit: '',
  });
  const whitePoint = numberValue('white-point', values['white-point'] ?? '1', {
    min: 0.05,
    max: 1,
    unit: '',
  });
  if (whitePoint <= blackPoint) {
    throw new UsageError(`--white-point must lie above --black-point, got ${whitePoint} and ${blackPoint}.`);
  }
  return toneSchema.parse({
    mode: wordValue('tone', values.tone ?? 'absolute', toneSchema.shape.mode.unwrap().options),
    blackPoint,
    whitePoint,
    gamma: numberValue('gamma', values.gamma ?? '1', { min: 0.2, max: 5, unit: '' }),
  });
}

function readFormats(text: string | undefined): Settings['formats'] {
  if (text === undefined) return [...FORMATS];
  const asked = text.split(',').map((word) => wordValue('formats', word.trim(), FORMATS));
  return FORMATS.filter((format) => asked.includes(format));
}

function readPerpendicular(text: string | undefined): Settings['perpendicular'] {
  if (text === undefined) return null;
  const linePitchMm = pitchSchema.parse(numberValue('perpendicular-pitch-mm', text, PITCH_RANGE));
  return { linePitchMm, alongPitchMm: linePitchMm };
}

/** What prepare is asked beyond what both commands share; read before the artwork is touched. */
export function readPrepareChoices(values: Values, asked: Asked, artworkPath: string) {
  if (asked.treatment === null) {
    throw new UsageError('--treatment is needed: linework, solid, halftone or continuous.');
  }
  if (values.screen !== undefined && asked.treatment !== 'halftone') {
    throw new UsageError(`--screen belongs to the treatment halftone, not to ${asked.treatment}.`);
  }
  return {
    treatment: asked.treatment,
    screen: readScreen(values.screen),
    tone: readTone(values),
    perpendicular: readPerpendicular(values['perpendicular-pitch-mm']),
    corners: wordValue('corners', values.corners ?? 'kept', ['kept', 'eased'] as const),
    formats: readFormats(values.formats),
    label: readLabel(values.label, artworkPath),
  };
}
export type PrepareChoices = ReturnType<typeof readPrepareChoices>;

/** Settings of the pipeline, once the size is known. */
export function settingsOf(
  asked: Asked,
  choices: PrepareChoices,
  size: PlacedSize,
  mirror: boolean,
): Settings {
  const { quarterTurns, spot, firing, scan, dividingLstar, blankSidesMm } = asked;
  const blank = centredBlank(blankSidesMm, size);
  return settingsSchema.parse({
    ...size,
    quarterTurns,
    spot,
    firing,
    scan,
    dividingLstar,
    blank,
    mirror,
    ...choices,
  });
}
