import { describe, expect, test } from 'vitest';
import type { Field } from '../../../src/lib/imaging/field';
import { isTonalAt, surveyTones } from '../../../src/lib/prepare/measure/tone-survey';

const field = (width: number, height: number, at: (x: number, y: number) => number): Field => ({
  width,
  height,
  data: Uint8Array.from({ length: width * height }, (_, i) => at(i % width, Math.floor(i / width))),
});

/** A number from −1 to 1 that looks like grain and is the same every time. */
const grain = (x: number, y: number): number => (((x * 7919 + y * 104_729 + x * y * 31) % 201) - 100) / 100;

describe('drawn parts', () => {
  test.each([
    ['bare', () => 0],
    ['black bars', (x: number) => (x % 40 < 20 ? 255 : 0)],
    ['one grey', () => 120],
    [
      'four greys with grain of an export',
      (x: number, y: number) => 60 + 40 * Math.floor(x / 64) + Math.round(2 * grain(x, y)),
    ],
  ])('%s: nothing is tonal', (_name, at) => {
    expect(surveyTones(field(256, 128, at)).tonalShare).toBe(0);
  });

  test('flat greys are counted as tints', () => {
    expect(surveyTones(field(256, 128, (x) => (x < 128 ? 120 : 0))).tintShare).toBeCloseTo(0.5, 2);
  });
});

test('ink that is not quite black and paper that is not quite white are no tints', () => {
  expect(surveyTones(field(256, 128, (x) => (x < 128 ? 215 : 40))).tintShare).toBe(0);
});

describe('tonal parts', () => {
  test.each([
    ['a ramp from bare to full', (x: number) => Math.round(x / 2)],
    ['a slow ramp whose blocks look flat', (x: number) => 60 + Math.round(x / 6)],
    ['a ramp of little contrast', (x: number) => 100 + Math.round(x / 10)],
    ['grain', (x: number, y: number) => 128 + Math.round(60 * grain(x, y))],
  ])('%s', (_name, at) => {
    expect(surveyTones(field(512, 128, at)).tonalShare).toBeGreaterThan(0.7);
  });

  test('a photograph beside a drawing: each is told from the other', () => {
    const survey = surveyTones(
      field(512, 256, (x, y) =>
        x < 256 ? 90 + Math.round(x / 4) + Math.round(9 * grain(x, y)) : y % 64 < 32 ? 255 : 0,
      ),
    );
    expect(isTonalAt(survey, 0.25, 0.5)).toBe(true);
    expect(isTonalAt(survey, 0.75, 0.5)).toBe(false);
    expect(survey.tonalShare).toBeCloseTo(0.5, 1);
  });
});

test.each([
  [1, 1],
  [1, 9],
  [7, 1],
  [9, 9],
])('%s × %s px are surveyed too', (width, height) => {
  const survey = surveyTones(field(width, height, () => 255));
  expect([survey.columns, survey.rows]).toEqual([Math.ceil(width / 8), Math.ceil(height / 8)]);
  expect(survey.histogram[255]).toBe(width * height);
});
