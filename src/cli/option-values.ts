import { UsageError } from './usage-error';

/** Range of a number that an option takes, both ends included. */
export interface NumberRange {
  min: number;
  max: number;
  /** as people read it; empty for a bare number */
  unit: string;
}

export const SIZE_RANGE: NumberRange = { min: 1, max: 3000, unit: 'mm' };
export const SPOT_RANGE: NumberRange = { min: 0.005, max: 5, unit: 'mm' };
export const PITCH_RANGE: NumberRange = { min: 0.01, max: 2, unit: 'mm' };
export const BLANK_RANGE: NumberRange = { min: 5, max: 3000, unit: 'mm' };
export const DIRECTION_RANGE: NumberRange = { min: -180, max: 180, unit: 'degrees' };

const DECIMAL = /^[+-]?(\d+\.?\d*|\.\d+)$/;

const rangeInWords = ({ min, max, unit }: NumberRange): string =>
  `from ${min} to ${max}${unit && ` ${unit}`}`;

/** A number of an option within its range. */
export function numberValue(option: string, text: string, range: NumberRange): number {
  const value = DECIMAL.test(text) ? Number(text) : Number.NaN;
  if (value >= range.min && value <= range.max) return value;
  throw new UsageError(`--${option} takes a number ${rangeInWords(range)}, got "${text}".`);
}

/** Two numbers written WxH, such as 0.07x0.11. */
export function pairValue(option: string, text: string, range: NumberRange): [number, number] {
  const parts = text.split(/[x×]/i);
  if (parts.length !== 2) {
    throw new UsageError(
      `--${option} takes two numbers joined by x, each ${rangeInWords(range)}, got "${text}".`,
    );
  }
  return [numberValue(option, parts[0], range), numberValue(option, parts[1], range)];
}

/** One word out of a list. */
export function wordValue<Word extends string>(option: string, text: string, words: readonly Word[]): Word {
  const found = words.find((word) => word === text);
  if (found !== undefined) return found;
  throw new UsageError(`--${option} takes ${words.join(', ')}; got "${text}".`);
}
