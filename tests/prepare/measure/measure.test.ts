import { describe, expect, test } from 'vitest';
import { judge } from '../../../src/lib/preflight/checks';
import type { Facts } from '../../../src/lib/preflight/facts';
import type { Spot } from '../../../src/lib/machines/spot';
import { measure } from '../../../src/lib/prepare/measure/measure';
import type { MeasureSettings } from '../../../src/lib/prepare/measure/measure-settings';
import { placementFacts, turned } from '../../../src/lib/prepare/measure/placement';
import { suggestTreatment } from '../../../src/lib/prepare/measure/suggest-treatment';
import { bar, disc, hole, type Polygon } from '../../drawn/coverage';
import type { MachineRun } from '../../../src/lib/prepare/settings';
import { drawingOf, pictureOf, pictureOfPolygons } from '../../drawn/drawing';

const spot: Spot = { widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' };
const settings: MeasureSettings = {
  widthMm: 10,
  heightMm: 10,
  quarterTurns: 0,
  spot,
  directionDeg: 0,
  linePitchMm: 0.1,
  treatment: null,
  dividingLstar: 53.4,
  blank: null,
  machine: null,
};
const noTools = { renderSvg: (): Promise<Uint8Array> => Promise.reject(new Error('not drawn')) };

async function measured(
  widthMm: number,
  heightMm: number,
  polygons: readonly Polygon[],
  change: Partial<MeasureSettings> = {},
  ink = 0,
): Promise<Facts> {
  const { artwork, tools } = drawingOf(widthMm, heightMm, polygons, ink);
  return measure(artwork, { ...settings, widthMm, heightMm, ...change }, tools);
}

describe('a drawing', () => {
  test('places and widths are in mm of the placed artwork', async () => {
    const { hairlines, measuredPxPerMm } = await measured(8, 4, [bar(2, 1, 3, 0.06, 0), disc(6, 2.5, 2)]);
    expect(hairlines.count).toBe(1);
    const [place] = hairlines.places;
    expect(place.xMm).toBeCloseTo(2, 1);
    expect(place.yMm).toBeCloseTo(1, 1);
    expect(place.widthMm).toBeCloseTo(2.94, 1);
    expect(place.minMm).toBeCloseTo(0.06, 3);
    expect(place.limitMm).toBeCloseTo(0.1, 4);
    expect(hairlines.worstRatio).toBeCloseTo(0.6, 2);
    expect(measuredPxPerMm).toBeCloseTo(60, 6);
  });

  test.each([
    [1, 3, 2],
    [2, 6, 3],
    [3, 1, 6],
  ] as const)('with %s quarter turns the place turns along', async (quarterTurns, xMm, yMm) => {
    const odd = quarterTurns % 2 === 1;
    const { artwork, tools } = drawingOf(8, 4, [bar(2, 1, 3, 0.06, 0)]);
    const change = { quarterTurns, widthMm: odd ? 4 : 8, heightMm: odd ? 8 : 4 };
    const [place] = (await measure(artwork, { ...settings, ...change }, tools)).hairlines.places;
    expect(place.xMm).toBeCloseTo(xMm, 1);
    expect(place.yMm).toBeCloseTo(yMm, 1);
    expect(odd ? place.heightMm : place.widthMm).toBeCloseTo(2.94, 1);
  });

  test('a stroke’s direction is taken after the turn', async () => {
    const oblong: Spot = { widthMm: 0.05, heightMm: 0.1, shape: 'ellipse' };
    const strokes = [bar(2, 2, 3, 0.07, 0)];
    expect((await measured(4, 4, strokes, { spot: oblong })).hairlines.count).toBe(1);
    expect((await measured(4, 4, strokes, { spot: oblong, quarterTurns: 1 })).hairlines.count).toBe(0);
  });

  test('gaps, specks and pinholes are told apart', async () => {
    const facts = await measured(10, 10, [
      bar(3, 3, 4, 1, 0),
      bar(3, 4.07, 4, 1, 0),
      disc(8, 2, 0.06),
      disc(7, 7, 3),
      hole(disc(7, 7, 0.07)),
    ]);
    expect([facts.hairlines.count, facts.fillIns.count, facts.specks.count, facts.pinholes.count]).toEqual([
      0, 1, 1, 1,
    ]);
    expect(facts.specks.places[0].minMm).toBeCloseTo(0.06, 2);
    expect(facts.fillIns.places[0].minMm).toBeCloseTo(0.07, 2);
  });

  test('dark grey ink is as wide as black ink', async () => {
    const black = await measured(4, 4, [bar(2, 2, 3, 0.09, 12)]);
    const grey = await measured(4, 4, [bar(2, 2, 3, 0.09, 12)], {}, 70);
    expect(grey.hairlines.places[0].minMm).toBeCloseTo(black.hairlines.places[0].minMm, 2);
    expect((await measured(4, 4, [bar(2, 2, 3, 0.105, 12)], {}, 70)).hairlines.count).toBe(0);
  });

  test('fonts and parts left out are passed on', async () => {
    const { artwork, tools } = drawingOf(4, 4, [disc(2, 2, 2)]);
    const facts = await measure(
      { ...artwork, missingFonts: ['Alder'], removed: ['a script'] },
      { ...settings, widthMm: 4, heightMm: 4 },
      tools,
    );
    expect(facts.missingFonts).toEqual(['Alder']);
    expect(facts.removed).toEqual(['a script']);
  });
});

describe('a picture', () => {
  test('lines of under 1.5 pixels are unresolved, not hairlines', async () => {
    const artwork = pictureOfPolygons(200, 200, [bar(100, 60, 150, 1, 0), bar(100, 120, 150, 9, 10)]);
    const facts = await measure(artwork, settings, noTools);
    expect(facts.hairlines.count).toBe(0);
    expect(facts.source.unresolved.count).toBe(1);
    expect(facts.source.pxPerMm).toBe(20);
    expect(facts.measuredPxPerMm).toBe(20);
  });

  test('one with far more pixels than needed resolves thin lines', async () => {
    const artwork = pictureOfPolygons(900, 900, [bar(450, 300, 700, 4, 7), bar(450, 600, 700, 60, 10)]);
    const facts = await measure(artwork, { ...settings, widthMm: 3, heightMm: 3 }, noTools);
    expect(facts.source.unresolved.count).toBe(0);
    expect(facts.hairlines.count).toBe(1);
    expect(facts.hairlines.places[0].minMm).toBeCloseTo((4 * 3) / 900, 3);
  });

  test('of two levels without soft edges: a bar is as wide as its pixels', async () => {
    const data = Uint8Array.from({ length: 600 * 600 }, (_, i) =>
      Math.floor(i / 600) >= 300 && Math.floor(i / 600) < 305 && i % 600 > 50 && i % 600 < 550 ? 255 : 0,
    );
    const facts = await measure(pictureOf(600, 600, data), settings, noTools);
    expect(facts.hairlines.places[0].minMm).toBeCloseTo(5 / 60, 3);
  });

  test('nothing is thin in a photograph', async () => {
    const data = Uint8Array.from(
      { length: 240 * 160 },
      (_, i) => 128 + Math.round(100 * Math.sin(i / 9) * Math.cos(i / 2411)),
    );
    const facts = await measure(pictureOf(240, 160, data), { ...settings, heightMm: 6.667 }, noTools);
    expect(facts.tone.tonalShare).toBeGreaterThan(0.8);
    expect([
      facts.hairlines.count,
      facts.fillIns.count,
      facts.specks.count,
      facts.source.unresolved.count,
    ]).toEqual([0, 0, 0, 0]);
  });

  test.each([
    [1, 1],
    [1, 7],
    [7, 1],
    [3, 5],
  ])('%s × %s px is measured without trouble', async (width, height) => {
    for (const value of [0, 128, 255]) {
      const facts = await measure(
        pictureOf(width, height, new Uint8Array(width * height).fill(value)),
        settings,
        noTools,
      );
      expect(facts.tone.meanCoverage).toBeCloseTo(value / 255, 2);
    }
  });

  test('a second frame is told from the remarks', async () => {
    const artwork = pictureOf(4, 4, new Uint8Array(16));
    const several = { ...artwork, facts: { ...artwork.facts, remarks: ['The first frame of 3 is used.'] } };
    expect((await measure(several, settings, noTools)).severalFrames).toBe(true);
    expect((await measure(artwork, settings, noTools)).severalFrames).toBe(false);
  });
});

test('a blank picture is empty and nothing else', async () => {
  const facts = await measure(pictureOf(40, 40, new Uint8Array(1600)), settings, noTools);
  const found = judge(facts, { spot, treatment: 'solid', photograph: false });
  expect(found.filter(({ severity }) => severity !== 'note').map(({ id }) => id)).toContain('empty');
});

test('sides must be above 0', async () => {
  await expect(
    measure(pictureOf(1, 1, Uint8Array.of(0)), { ...settings, widthMm: 0 }, noTools),
  ).rejects.toThrow(RangeError);
});

describe('placementFacts', () => {
  const field = { width: 10, height: 10, data: new Uint8Array(100).fill(255) };
  const blank = { outline: 'rectangle', widthMm: 50, heightMm: 40, leftMm: 5, topMm: 10 } as const;
  const machine: MachineRun = {
    name: 'Bench',
    bedWidthMm: 300,
    bedHeightMm: 200,
    accelerationMmPerS2: 3000,
    wattsAtFull: 10,
    powerCurve: [],
    scanning: 'two-way',
    maxSpeedMmPerS: 400,
  };

  test('inside a blank, beyond it', () => {
    const at = (change: Partial<typeof settings>): ReturnType<typeof placementFacts> =>
      placementFacts({ ...settings, blank, ...change }, field, 127.5);
    expect(at({ widthMm: 45, heightMm: 30 }).beyondBlank).toEqual({
      leftMm: 0,
      rightMm: 0,
      topMm: 0,
      bottomMm: 0,
    });
    expect(at({ widthMm: 46, heightMm: 31.5 }).beyondBlank).toMatchObject({ rightMm: 1, bottomMm: 1.5 });
    expect(at({ blank: { ...blank, leftMm: -2 } }).beyondBlank?.leftMm).toBe(2);
  });

  test('a round blank: the corners of a burned square reach beyond it', () => {
    const round = { outline: 'round', widthMm: 20, heightMm: 20, leftMm: 2, topMm: 2 } as const;
    const beyond = placementFacts(
      { ...settings, widthMm: 16, heightMm: 16, blank: round },
      { width: 160, height: 160, data: new Uint8Array(25_600).fill(255) },
      127.5,
    ).beyondRoundMm;
    expect(beyond).toBeCloseTo(Math.hypot(8, 8) - 10, 0);
    const bare = { ...field, data: new Uint8Array(100) };
    expect(
      placementFacts({ ...settings, widthMm: 16, heightMm: 16, blank: round }, bare, 127.5).beyondRoundMm,
    ).toBe(0);
  });

  test('the bed must hold width and twice the run-off v²/2a', () => {
    const at = (change: Partial<MeasureSettings>): ReturnType<typeof placementFacts> =>
      placementFacts({ ...settings, widthMm: 280, heightMm: 190, machine, ...change }, field, 127.5);
    expect(at({}).beyondBed).toEqual({ xMm: 0, yMm: 0 });
    const fast = at({ speedMmPerS: 300 });
    expect(fast.runOffMm).toBe(15);
    expect(fast.beyondBed).toEqual({ xMm: 10, yMm: 0 });
    expect(at({ speedMmPerS: 300, directionDeg: 90 }).beyondBed).toEqual({ xMm: 0, yMm: 20 });
  });
});

test.each([
  [0, [0.2, 0.1]],
  [1, [0.9, 0.2]],
  [2, [0.8, 0.9]],
  [3, [0.1, 0.8]],
] as const)('%s quarter turns clockwise', (turns, [x, y]) => {
  const [gotX, gotY] = turned(0.2, 0.1, turns);
  expect(gotX).toBeCloseTo(x, 9);
  expect(gotY).toBeCloseTo(y, 9);
});

describe('suggestTreatment', () => {
  const tone = { tonalShare: 0, tintShare: 0, thinShare: 0 } as Facts['tone'];

  test.each([
    [{ tonalShare: 0.9 }, false, 'halftone', 'photograph'],
    [{ tonalShare: 0.2 }, true, 'halftone', '20 %'],
    [{ tintShare: 0.1 }, true, 'halftone', 'flat grey'],
    [{ thinShare: 0.9 }, true, 'linework', 'fine lines'],
    [{ thinShare: 0.9 }, false, 'solid', 'two levels'],
    [{}, true, 'solid', 'two levels'],
  ] as const)('%o, vector %s: %s', (change, vector, treatment, words) => {
    const suggestion = suggestTreatment({ ...tone, ...change }, vector);
    expect(suggestion.treatment).toBe(treatment);
    expect(suggestion.reason).toContain(words);
  });
});
