import { describe, expect, test } from 'vitest';
import type { Spot } from '../../../src/lib/machines/spot';
import type { VectorArtwork } from '../../../src/lib/prepare/artwork';
import { measure } from '../../../src/lib/prepare/measure/measure';
import type { MeasureSettings } from '../../../src/lib/prepare/measure/measure-settings';
import { smallestSoundWidth } from '../../../src/lib/prepare/measure/smallest-sound-width';
import { bar, disc, hole, type Polygon } from '../../drawn/coverage';
import { drawingOf, pictureOf, pictureOfPolygons } from '../../drawn/drawing';

const round: Spot = { widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' };
const settingsFor = (
  widthMm: number,
  heightMm: number,
  change: Partial<MeasureSettings> = {},
): MeasureSettings => ({
  widthMm,
  heightMm,
  quarterTurns: 0,
  spot: round,
  directionDeg: 0,
  linePitchMm: 0.1,
  treatment: null,
  dividingLstar: 53.4,
  blank: null,
  machine: null,
  ...change,
});

const noTools = { renderSvg: (): Promise<Uint8Array> => Promise.reject(new Error('not drawn')) };

async function widthOf(
  widthMm: number,
  heightMm: number,
  polygons: readonly Polygon[],
  change: Partial<MeasureSettings> = {},
): Promise<number | null> {
  const { artwork, tools } = drawingOf(widthMm, heightMm, polygons);
  return smallestSoundWidth(artwork, settingsFor(widthMm, heightMm, change), tools);
}

describe('drawings', () => {
  // Width at which the thinnest stroke or gap has 0.98 of the line extent.
  test.each<[string, number, Polygon[], number]>([
    ['a thin bar beside a thick one', 6, [bar(3, 2, 5, 0.2, 20), bar(3, 4.5, 5, 0.8, 20)], (6 * 0.098) / 0.2],
    ['a ring', 6, [disc(3, 3, 5), hole(disc(3, 3, 4.5))], (6 * 0.098) / 0.25],
    ['a gap', 6, [bar(3, 2, 5, 1, 0), bar(3, 3.15, 5, 1, 0)], (6 * 0.098) / 0.15],
    ['a hairline', 4, [bar(2, 1, 3, 0.02, 13), bar(2, 3, 3, 0.5, 0)], (4 * 0.098) / 0.02],
  ])('%s', async (_name, side, polygons, expected) => {
    const width = (await widthOf(side, side, polygons)) ?? 0;
    expect(Math.abs(width / expected - 1)).toBeLessThan(0.03);
  });

  test('sound at that width, not sound 5 % below', async () => {
    const polygons = [bar(3, 2, 5, 0.2, 20), bar(3, 4.5, 5, 0.8, 20)];
    const { artwork, tools } = drawingOf(6, 6, polygons);
    const width = (await smallestSoundWidth(artwork, settingsFor(6, 6), tools)) ?? 0;
    const at = await measure(artwork, settingsFor(width, width), tools);
    expect(at.hairlines.count + at.fillIns.count).toBe(0);
    const below = await measure(artwork, settingsFor(0.95 * width, 0.95 * width), tools);
    expect(below.hairlines.count + below.fillIns.count).toBeGreaterThan(0);
  });

  test('it does not depend on the size that is asked for', async () => {
    const polygons = [bar(3, 2, 5, 0.2, 20)];
    const { artwork, tools } = drawingOf(6, 6, polygons);
    const small = await smallestSoundWidth(artwork, settingsFor(2, 2), tools);
    const large = await smallestSoundWidth(artwork, settingsFor(90, 90), tools);
    expect(small).toBe(large);
  });

  test('an oblong spot: the direction of the stroke decides, also after a quarter turn', async () => {
    const spot: Spot = { widthMm: 0.1, heightMm: 0.2, shape: 'ellipse' };
    const flat = (await widthOf(6, 6, [bar(3, 3, 5, 0.2, 0)], { spot })) ?? 0;
    const turned = (await widthOf(6, 6, [bar(3, 3, 5, 0.2, 0)], { spot, quarterTurns: 1 })) ?? 0;
    expect(flat / turned).toBeCloseTo(2, 1);
  });

  test('a speck of dust does not raise it', async () => {
    const plain = [bar(3, 2, 5, 0.3, 20), bar(3, 4.5, 5, 0.8, 20)];
    const clean = (await widthOf(6, 6, plain)) ?? 0;
    const dusty = (await widthOf(6, 6, [...plain, disc(1, 5.6, 0.03)])) ?? 0;
    expect(Math.abs(dusty / clean - 1)).toBeLessThan(0.03);
  });
});

describe('no such width', () => {
  test.each<[string, Polygon[]]>([
    ['nothing drawn', []],
    ['one square', [bar(3, 3, 5, 5, 10)]],
    [
      'a tip that is thin at any width',
      [
        [
          [0.5, 3],
          [5.5, 2.7],
          [5.5, 3.3],
        ],
      ],
    ],
  ])('%s', async (_name, polygons) => {
    expect(await widthOf(6, 6, polygons)).toBeNull();
  });

  test('a photograph', async () => {
    const data = Uint8Array.from(
      { length: 200 * 150 },
      (_, i) => 128 + Math.round(90 * Math.sin(i / 31) * Math.cos(i / 4777)),
    );
    expect(await smallestSoundWidth(pictureOf(200, 150, data), settingsFor(20, 15), noTools)).toBeNull();
  });
});

test('a picture answers by what its pixels resolve', async () => {
  const artwork = pictureOfPolygons(600, 600, [bar(300, 200, 500, 12, 20), bar(300, 450, 500, 80, 20)]);
  const width = (await smallestSoundWidth(artwork, settingsFor(60, 60), noTools)) ?? 0;
  expect(Math.abs(width / ((600 * 0.098) / 12) - 1)).toBeLessThan(0.03);
});

test('trouble in drawing is passed on', async () => {
  const { artwork } = drawingOf(6, 6, []);
  const broken: VectorArtwork = artwork;
  await expect(smallestSoundWidth(broken, settingsFor(6, 6), noTools)).rejects.toThrow('not drawn');
});
