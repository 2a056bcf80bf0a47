import { describe, expect, test } from 'vitest';
import type { Spot } from '../../../src/lib/machines/spot';
import { closeScale, findPlaces, type FoundPlaces } from '../../../src/lib/prepare/measure/find-places';
import type { FoundPlace } from '../../../src/lib/prepare/measure/inspect-window';
import { coverageOfArtwork } from '../../../src/lib/prepare/measure/measure';
import { mergeSeams } from '../../../src/lib/prepare/measure/merge-seams';
import { emptyCells, markCells, partsToInspect, WINDOW_PX } from '../../../src/lib/prepare/measure/windows';
import { bar, disc, type Polygon } from '../../drawn/coverage';
import { drawingOf, pictureOfPolygons } from '../../drawn/drawing';

const spot: Spot = { widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' };

async function find(
  widthMm: number,
  heightMm: number,
  polygons: readonly Polygon[],
): Promise<FoundPlaces & { drawnPx: number }> {
  const { artwork, tools, drawnPx } = drawingOf(widthMm, heightMm, polygons);
  const frame = { widthMm, heightMm, spot, level: 127.5, leaveOut: () => false, drawn: null };
  const found = await findPlaces(coverageOfArtwork(artwork, tools), frame);
  return { ...found, drawnPx: drawnPx() };
}

describe('closeScale', () => {
  const scale = (widthPx: number, widthMm: number, own: Spot = spot): number => {
    const artwork = pictureOfPolygons(widthPx, widthPx, []);
    return closeScale(
      coverageOfArtwork(artwork, { renderSvg: () => Promise.reject(new Error('not drawn')) }),
      { widthMm, heightMm: widthMm, spot: own },
    );
  };

  test('a drawing has six pixels to the smaller side of the spot', () => {
    const { artwork, tools } = drawingOf(10, 10, []);
    const source = coverageOfArtwork(artwork, tools);
    expect(closeScale(source, { widthMm: 10, heightMm: 10, spot })).toBeCloseTo(60, 6);
    expect(closeScale(source, { widthMm: 10, heightMm: 10, spot: { ...spot, widthMm: 0.05 } })).toBeCloseTo(
      120,
      6,
    );
  });

  test.each([
    [20, 10, 2],
    [600, 10, 60],
    [800, 10, 80],
    [2000, 10, 60],
  ])('%s px over %s mm are read at %s px/mm: never finer than they are', (widthPx, widthMm, expected) => {
    expect(scale(widthPx, widthMm)).toBeCloseTo(expected, 6);
  });
});

describe('findPlaces', () => {
  test('a large drawing is looked at closely only where it is thin', async () => {
    const found = await find(60, 60, [bar(30, 20, 50, 8, 0), bar(12.34, 40, 10, 0.08, 90), disc(45, 45, 10)]);
    expect(found.ink.thin).toHaveLength(1);
    const [only] = found.ink.thin;
    expect(only.smallestPx / found.pxPerMm).toBeCloseTo(0.08, 2);
    expect((only.left + only.right) / 2 / found.pxPerMm).toBeCloseTo(12.34, 1);
    expect((only.bottom - only.top) / found.pxPerMm).toBeCloseTo(9.9, 0);
    expect(found.whole).toBe(false);
    expect(found.drawnPx).toBeLessThan(0.4 * found.artWidthPx * found.artHeightPx);
  });

  test('a stroke across several windows is one place', async () => {
    const found = await find(55, 40, [bar(27.5, 20, 50, 0.09, 0), bar(27.5, 30, 50, 0.09, 3)]);
    expect(found.artWidthPx).toBeGreaterThan(2 * WINDOW_PX);
    expect(found.ink.thin).toHaveLength(2);
    for (const { left, right } of found.ink.thin) expect((right - left) / found.pxPerMm).toBeGreaterThan(49);
  });

  test('lines and specks too fine for the coarse pass are met all the same', async () => {
    const found = await find(60, 60, [bar(30, 20, 40, 0.02, 11), bar(30, 50, 40, 6, 0), disc(20, 33, 0.07)]);
    expect(found.ink.thin.length + found.ink.unresolved.length).toBe(1);
    expect(found.ink.small).toHaveLength(1);
  });

  test('nothing drawn, nothing found', async () => {
    const found = await find(5, 5, []);
    expect(found.ink.thin).toEqual([]);
    expect(found.burnedPx).toBe(0);
  });
});

describe('partsToInspect', () => {
  test('without a map the windows tile the picture', () => {
    const parts = partsToInspect(WINDOW_PX * 2 + 5, 100, null);
    expect(parts.map(({ left, right }) => [left, right])).toEqual([
      [0, WINDOW_PX],
      [WINDOW_PX, 2 * WINDOW_PX],
      [2 * WINDOW_PX, 2 * WINDOW_PX + 5],
    ]);
  });

  test('with one, they shrink to its marks and none overlap', () => {
    const [width, height] = [4000, 3000];
    const cells = emptyCells(400, 300, 10);
    markCells(cells, 400, 300, 15, 15, 0);
    markCells(cells, 400, 300, 390, 290, 0);
    expect(partsToInspect(width, height, cells)).toEqual([
      { left: 100, top: 100, right: 200, bottom: 200 },
      { left: 3900, top: 2900, right: 4000, bottom: 3000 },
    ]);
  });

  test('nothing marked, nothing to do', () => {
    expect(partsToInspect(100, 100, emptyCells(100, 100, 10))).toEqual([]);
  });

  test('a mark near a border of cells marks both', () => {
    const cells = emptyCells(100, 100, 10);
    markCells(cells, 100, 100, 50, 55, 2);
    expect([...cells.marked].filter((v) => v === 1)).toHaveLength(2);
  });
});

describe('mergeSeams', () => {
  const place = (left: number, right: number, ends: number[], smallestPx = 3): FoundPlace => ({
    left,
    right,
    top: 0,
    bottom: 1,
    smallestPx,
    limitPx: 6,
    worstRatio: smallestPx / 6,
    soundScale: 2,
    fading: false,
    ends,
  });

  test('places whose ends meet are one, with the smallest width of both', () => {
    const merged = mergeSeams([
      place(0, 99, [98, 1]),
      place(101, 200, [101, 1, 199, 1], 2),
      place(201, 250, [201, 1]),
    ]);
    expect(merged).toHaveLength(1);
    expect(merged[0]).toMatchObject({ left: 0, right: 250, smallestPx: 2, worstRatio: 2 / 6, ends: [] });
  });

  test('places whose ends lie apart stay two', () => {
    expect(mergeSeams([place(0, 99, [98, 1]), place(101, 200, [102, 5])])).toHaveLength(2);
    expect(mergeSeams([])).toEqual([]);
  });
});
