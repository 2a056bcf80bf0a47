import { describe, expect, test } from 'vitest';
import { onArtwork, wholeWindow } from '../../../src/lib/prepare/measure/coverage-source';
import { levelOf } from '../../../src/lib/prepare/measure/measure';
import { rasterCoverage } from '../../../src/lib/prepare/measure/raster-coverage';
import { vectorCoverage } from '../../../src/lib/prepare/measure/vector-coverage';
import { bar, coverageOf } from '../../drawn/coverage';
import { drawingOf, pictureOf } from '../../drawn/drawing';

describe('onArtwork', () => {
  test.each([
    [
      { left: -2, top: -1, width: 5, height: 4 },
      { left: 0, top: 0, right: 3, bottom: 3 },
    ],
    [
      { left: 8, top: 8, width: 5, height: 5 },
      { left: 8, top: 8, right: 10, bottom: 10 },
    ],
    [{ left: 10, top: 0, width: 2, height: 2 }, null],
  ])('%o', (window, expected) => {
    expect(onArtwork({ artWidthPx: 10, artHeightPx: 10, ...window })).toEqual(expected);
  });
});

describe('rasterCoverage', () => {
  const samples = Uint8Array.from({ length: 12 }, (_, n) => n * 20);

  test('its own pixels come back as they are, 0 outside', async () => {
    const source = rasterCoverage(pictureOf(4, 3, samples));
    expect([...(await source.read(wholeWindow(4, 3)))]).toEqual([...samples]);
    const wider = await source.read({
      artWidthPx: 4,
      artHeightPx: 3,
      left: -1,
      top: -1,
      width: 6,
      height: 5,
    });
    expect([...wider.subarray(0, 6)]).toEqual([0, 0, 0, 0, 0, 0]);
    expect(wider[6 + 1]).toBe(samples[0]);
    expect(wider[6 + 4]).toBe(samples[3]);
    expect(wider[6 + 5]).toBe(0);
  });

  test('coarser pixels are means over area, also at odd ratios', async () => {
    const source = rasterCoverage(pictureOf(4, 2, Uint8Array.of(0, 255, 0, 255, 0, 255, 0, 255)));
    expect([...(await source.read(wholeWindow(2, 1)))]).toEqual([128, 128]);
    const odd = await source.read(wholeWindow(3, 1));
    expect([...odd]).toEqual([64, 128, 191]);
  });

  test('the mean is kept', async () => {
    const data = Uint8Array.from({ length: 35 * 21 }, (_, n) => (n * 37) % 256);
    const mean = (list: Uint8Array): number => list.reduce((a, b) => a + b, 0) / list.length;
    const reduced = await rasterCoverage(pictureOf(35, 21, data)).read(wholeWindow(11, 8));
    expect(Math.abs(mean(reduced) - mean(data))).toBeLessThan(1);
  });

  test('a window that misses the artwork is bare', async () => {
    const window = { artWidthPx: 4, artHeightPx: 3, left: 9, top: 0, width: 2, height: 2 };
    expect([...(await rasterCoverage(pictureOf(4, 3, samples)).read(window))]).toEqual([0, 0, 0, 0]);
  });
});

describe('vectorCoverage', () => {
  test('a window is drawn at its scale, where it lies', async () => {
    const { artwork, tools } = drawingOf(10, 10, [bar(5, 5, 4, 1.5, 0)]);
    const window = { artWidthPx: 40, artHeightPx: 40, left: 8, top: 12, width: 20, height: 16 };
    const got = await vectorCoverage(artwork, tools).read(window);
    const expected = coverageOf(20, 16, [bar(12, 8, 16, 6, 0)]);
    expect([...got]).toEqual([...expected].map((c) => Math.round(c * 255)));
  });

  test.each([
    ['black', [0, 0, 0, 255], 255],
    ['half a pixel of black', [0, 0, 0, 128], 128],
    ['white', [255, 255, 255, 255], 0],
    ['nothing', [0, 0, 0, 0], 0],
    ['grey', [100, 100, 100, 255], 155],
    // Y = 0.2126, sRGB code 127.2
    ['red', [255, 0, 0, 255], 128],
    // Y = 0.0722, sRGB code 76.0
    ['half a pixel of blue', [0, 0, 255, 128], 90],
  ])('%s', async (_name, rgba, expected) => {
    const { artwork } = drawingOf(1, 1, []);
    const source = vectorCoverage(artwork, { renderSvg: async () => Uint8Array.from(rgba) });
    expect(Math.abs((await source.read(wholeWindow(1, 1)))[0] - expected)).toBeLessThanOrEqual(1);
  });
});

test('the default dividing level is half coverage of black on white', () => {
  expect(Math.abs(levelOf(53.4) - 127.5)).toBeLessThan(0.1);
  expect(Number.isInteger(levelOf(100))).toBe(false);
});
