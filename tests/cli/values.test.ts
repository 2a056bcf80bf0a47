import { describe, expect, test } from 'vitest';
import { centredBlank, readAsked, sizeFor } from '../../src/cli/asked';
import { readLabel } from '../../src/cli/label';
import { numberValue, pairValue, SPOT_RANGE, wordValue } from '../../src/cli/option-values';
import { readPrepareChoices, settingsOf } from '../../src/cli/prepare-settings';
import { readScan, readSpot } from '../../src/cli/scan-values';
import { readScreen } from '../../src/cli/screen-value';
import { UsageError } from '../../src/cli/usage-error';
import type { Artwork } from '../../src/lib/prepare/artwork';
import { DEFAULT_SCREEN, SCREEN_NAMES } from '../../src/lib/prepare/settings';

const SPOT = { spot: '0.07x0.11' };
const drawing = (aspect: number): Artwork => ({
  kind: 'vector',
  facts: {
    sha256: '',
    bytes: 1,
    format: 'svg',
    kind: 'vector',
    widthPx: 1,
    heightPx: 1,
    ownWidthMm: null,
    ownHeightMm: null,
    remarks: [],
  },
  svg: new Uint8Array(),
  aspect,
  missingFonts: [],
  removed: [],
});

describe('numbers, pairs and words', () => {
  const range = { min: 1, max: 3000, unit: 'mm' };
  test.each(['1', '3000', '12.5', '+7', '1.'])('%s is a number', (text) => {
    expect(numberValue('width-mm', text, range)).toBe(Number(text));
  });
  test.each(['0.99', '3001', 'ten', '', '1e3', '0x10', '12,5', '12mm', 'NaN', 'Infinity', '-5'])(
    '"%s" is refused with option and range',
    (text) => {
      expect(() => numberValue('width-mm', text, range)).toThrow(
        `--width-mm takes a number from 1 to 3000 mm, got "${text}".`,
      );
    },
  );
  test('two numbers joined by x or the multiplication sign', () => {
    expect(pairValue('spot', '0.07x0.11', SPOT_RANGE)).toEqual([0.07, 0.11]);
    expect(pairValue('spot', '0.07×0.11', SPOT_RANGE)).toEqual([0.07, 0.11]);
  });
  test.each(['0.07', '0.07x', '0.07x0.11x1', '0.07,0.11', '0.001x0.1'])('"%s" is no spot', (text) => {
    expect(() => pairValue('spot', text, SPOT_RANGE)).toThrow(/--spot takes .* from 0.005 to 5 mm/);
  });
  test('a word out of a list, and the list in the refusal', () => {
    expect(wordValue('tone', 'scaled', ['absolute', 'scaled'])).toBe('scaled');
    expect(() => wordValue('tone', 'loud', ['absolute', 'scaled'])).toThrow(
      '--tone takes absolute, scaled; got "loud".',
    );
  });
});

describe('spot and scan', () => {
  test('the spot is an ellipse unless said otherwise, and needed', () => {
    expect(readSpot(SPOT)).toEqual({ widthMm: 0.07, heightMm: 0.11, shape: 'ellipse' });
    expect(readSpot({ ...SPOT, 'spot-shape': 'rectangle' }).shape).toBe('rectangle');
    expect(() => readSpot({})).toThrow('--spot is needed');
    expect(() => readSpot({ ...SPOT, 'spot-shape': 'star' })).toThrow('ellipse, rectangle');
  });

  const spot = readSpot(SPOT);
  test.each([
    [{}, 0, 0.11, 0.11],
    [{ 'direction-deg': '90' }, 90, 0.07, 0.07],
    [{ 'direction-deg': '45' }, 45, 0.092195, 0.092195],
    [{ 'pitch-mm': '0.06' }, 0, 0.06, 0.06],
    [{ 'pitch-mm': '0.06', 'pitch-along-mm': '0.05' }, 0, 0.06, 0.05],
    [{ 'pitch-along-mm': '0.05' }, 0, 0.11, 0.05],
    [{ 'pitch-mm': '0.05x0.06' }, 0, 0.06, 0.05],
    [{ 'pitch-mm': '0.05x0.06', 'direction-deg': '90' }, 90, 0.05, 0.06],
    [{ 'pitch-mm': '0.05x0.06', 'direction-deg': '-180' }, -180, 0.06, 0.05],
  ])('%j', (values, directionDeg, linePitchMm, alongPitchMm) => {
    expect(readScan(values, spot)).toEqual({ directionDeg, linePitchMm, alongPitchMm });
  });
  test.each([
    [{ 'pitch-mm': '0.05x0.06', 'direction-deg': '30' }, 'only when scanning at 0 or 90'],
    [{ 'pitch-mm': '0.05x0.06', 'pitch-along-mm': '0.05' }, 'leave --pitch-along-mm out'],
    [{ 'pitch-mm': '0.005' }, '--pitch-mm takes a number from 0.01 to 2 mm'],
    [{ 'pitch-along-mm': '3' }, '--pitch-along-mm takes a number from 0.01 to 2 mm'],
    [{ 'direction-deg': '181' }, '--direction-deg takes a number from -180 to 180 degrees'],
  ])('%j is refused: %s', (values, words) => {
    expect(() => readScan(values, spot)).toThrow(UsageError);
    expect(() => readScan(values, spot)).toThrow(words);
  });
  test('a spot wider than any pitch needs a pitch of its own', () => {
    const wide = readSpot({ spot: '3x3' });
    expect(() => readScan({}, wide)).toThrow('--pitch-mm is needed');
    expect(readScan({ 'pitch-mm': '1' }, wide).linePitchMm).toBe(1);
  });
});

describe('screens', () => {
  test.each(SCREEN_NAMES)('%s', (name) => expect(readScreen(name)).toBe(name));
  test('none asked for', () => expect(readScreen(undefined)).toBe(DEFAULT_SCREEN));
  test.each(['spot-aware', 'clustered-dot'])('%s comes later, and what there is gets named', (name) => {
    expect(() => readScreen(name)).toThrow(
      `--screen ${name} comes later; there are even-grain, published:floyd`,
    );
  });
  test('a screen that nobody knows', () =>
    expect(() => readScreen('dots')).toThrow('--screen takes even-grain'));
});

describe('what both commands are asked', () => {
  test('what stays unsaid', () => {
    expect(readAsked(SPOT)).toMatchObject({
      widthMm: null,
      heightMm: null,
      quarterTurns: 0,
      firing: 'swept',
      treatment: null,
      dividingLstar: 53.4,
      blankSidesMm: null,
    });
  });
  test.each([
    [{ 'width-mm': '0' }, '--width-mm takes a number from 1 to 3000 mm'],
    [{ 'quarter-turns': '4' }, '--quarter-turns takes 0, 1, 2, 3'],
    [{ firing: 'burst' }, '--firing takes pulsed, swept'],
    [{ treatment: 'etch' }, '--treatment takes linework, solid, halftone, continuous'],
    [{ 'dividing-lstar': '0' }, '--dividing-lstar takes a number from 1 to 99, got'],
    [{ 'blank-mm': '4x100' }, '--blank-mm takes a number from 5 to 3000 mm'],
  ])('%j is refused: %s', (values, words) => expect(() => readAsked({ ...SPOT, ...values })).toThrow(words));

  test('a side that the proportions push out of range is refused by name', () => {
    const asked = readAsked({ ...SPOT, 'width-mm': '10' });
    expect(sizeFor(drawing(4), asked)).toEqual({ widthMm: 10, heightMm: 2.5 });
    expect(() => sizeFor(drawing(40), asked)).toThrow(
      '--height-mm must come to 1 to 3000 mm; with these proportions it is 0.25 mm.',
    );
  });
  test('the artwork lies in the middle of its blank', () => {
    expect(centredBlank(null, { widthMm: 1, heightMm: 1 })).toBeNull();
    expect(centredBlank([100, 60], { widthMm: 40, heightMm: 20 })).toEqual({
      outline: 'rectangle',
      widthMm: 100,
      heightMm: 60,
      leftMm: 30,
      topMm: 20,
    });
  });
});

describe('what prepare is asked', () => {
  const choices = (values: Record<string, string>) => {
    const all = { ...SPOT, ...values };
    return readPrepareChoices(all, readAsked(all), 'dir/Käte & Söhne.svg');
  };
  test('what stays unsaid', () => {
    expect(choices({ treatment: 'halftone' })).toEqual({
      treatment: 'halftone',
      screen: DEFAULT_SCREEN,
      tone: { mode: 'absolute', blackPoint: 0, whitePoint: 1, gamma: 1 },
      perpendicular: null,
      corners: 'kept',
      formats: ['png', 'tiff', 'bmp'],
      label: 'Kate-Sohne',
    });
  });
  test('formats keep one order and never repeat', () => {
    expect(choices({ treatment: 'solid', formats: 'bmp,png,bmp' }).formats).toEqual(['png', 'bmp']);
  });
  test('a perpendicular pass has its own pitch', () => {
    const { perpendicular } = choices({ treatment: 'solid', 'perpendicular-pitch-mm': '0.08' });
    expect(perpendicular).toEqual({ linePitchMm: 0.08, alongPitchMm: 0.08 });
  });
  test.each([
    [{}, '--treatment is needed'],
    [{ treatment: 'solid', screen: 'even-grain' }, '--screen belongs to the treatment halftone'],
    [
      { treatment: 'solid', 'black-point': '0.9', 'white-point': '0.5' },
      '--white-point must lie above --black-point',
    ],
    [{ treatment: 'solid', gamma: '0.1' }, '--gamma takes a number from 0.2 to 5'],
    [{ treatment: 'solid', tone: 'dark' }, '--tone takes absolute, scaled'],
    [{ treatment: 'solid', formats: 'png,pdf' }, '--formats takes png, tiff, bmp'],
    [{ treatment: 'solid', corners: 'round' }, '--corners takes kept, eased'],
    [
      { treatment: 'solid', 'perpendicular-pitch-mm': '9' },
      '--perpendicular-pitch-mm takes a number from 0.01 to 2 mm',
    ],
    [{ treatment: 'solid', label: 'a b' }, '--label takes 1 to 60 letters'],
  ])('%j is refused: %s', (values, words) => expect(() => choices(values)).toThrow(words));

  test('all of it becomes settings of the pipeline', () => {
    const values = { ...SPOT, treatment: 'continuous', 'direction-deg': '90', 'blank-mm': '100x60' };
    const asked = readAsked(values);
    const settings = settingsOf(
      asked,
      readPrepareChoices(values, asked, 'a.png'),
      { widthMm: 40, heightMm: 20 },
      true,
    );
    expect(settings).toMatchObject({
      widthMm: 40,
      heightMm: 20,
      treatment: 'continuous',
      mirror: true,
      scan: { directionDeg: 90, linePitchMm: 0.07, alongPitchMm: 0.07 },
      blank: { leftMm: 30, topMm: 20 },
      label: 'a',
    });
  });
});

describe('labels', () => {
  test.each([
    ['a/b/mark.svg', 'mark'],
    ['École d’été.png', 'Ecole-d-ete'],
    ['图.png', 'artwork'],
    [`${'x'.repeat(80)}.png`, 'x'.repeat(60)],
  ])('%s gives %s', (file, label) => expect(readLabel(undefined, file)).toBe(label));
});
