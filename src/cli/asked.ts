import { treatmentSchema, type Settings, type Treatment } from '../lib/prepare/settings';
import { placedSize, type PlacedSize } from '../lib/prepare/placed-size';
import type { Artwork } from '../lib/prepare/artwork';
import type { TypedCommand } from './arguments';
import { BLANK_RANGE, numberValue, pairValue, SIZE_RANGE, wordValue } from './option-values';
import { readFiring, readScan, readSpot } from './scan-values';
import { UsageError } from './usage-error';

type Values = TypedCommand['values'];
type QuarterTurns = Settings['quarterTurns'];

const TURNS: readonly QuarterTurns[] = [0, 1, 2, 3];

function readTurns(text: string): QuarterTurns {
  const word = wordValue('quarter-turns', text, ['0', '1', '2', '3']);
  return TURNS[Number(word)];
}

/** What both commands are asked. */
export interface Asked extends Pick<Settings, 'spot' | 'firing' | 'scan' | 'quarterTurns' | 'dividingLstar'> {
  widthMm: number | null;
  heightMm: number | null;
  treatment: Treatment | null;
  blankSidesMm: [number, number] | null;
}

const optionalNumber = (values: Values, name: 'width-mm' | 'height-mm'): number | null => {
  const text = values[name];
  return text === undefined ? null : numberValue(name, text, SIZE_RANGE);
};

/** Reads what both commands share. */
export function readAsked(values: Values): Asked {
  const spot = readSpot(values);
  const blank = values['blank-mm'];
  return {
    widthMm: optionalNumber(values, 'width-mm'),
    heightMm: optionalNumber(values, 'height-mm'),
    quarterTurns: readTurns(values['quarter-turns'] ?? '0'),
    spot,
    firing: readFiring(values),
    scan: readScan(values, spot),
    treatment:
      values.treatment === undefined
        ? null
        : wordValue('treatment', values.treatment, treatmentSchema.options),
    dividingLstar: numberValue('dividing-lstar', values['dividing-lstar'] ?? '53.4', {
      min: 1,
      max: 99,
      unit: '',
    }),
    blankSidesMm: blank === undefined ? null : pairValue('blank-mm', blank, BLANK_RANGE),
  };
}

/** Placed size of an artwork, refused where it lies outside what a machine can hold. */
export function sizeFor(artwork: Artwork, asked: Asked): PlacedSize {
  const size = placedSize(artwork, asked);
  for (const [side, mm] of [
    ['width', size.widthMm],
    ['height', size.heightMm],
  ] as const) {
    if (mm < SIZE_RANGE.min || mm > SIZE_RANGE.max) {
      const found = Number(mm.toFixed(3));
      throw new UsageError(
        `--${side}-mm must come to ${SIZE_RANGE.min} to ${SIZE_RANGE.max} mm; with these proportions it is ${found} mm.`,
      );
    }
  }
  return size;
}

/** The blank with the artwork in its middle. */
export function centredBlank(sidesMm: Asked['blankSidesMm'], size: PlacedSize): Settings['blank'] {
  if (sidesMm === null) return null;
  const [widthMm, heightMm] = sidesMm;
  const leftMm = (widthMm - size.widthMm) / 2;
  const topMm = (heightMm - size.heightMm) / 2;
  return { outline: 'rectangle', widthMm, heightMm, leftMm, topMm };
}
