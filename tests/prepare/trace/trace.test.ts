import { describe, expect, test } from 'vitest';
import type { RasterArtwork } from '../../../src/lib/prepare/artwork';
import { readSvg } from '../../../src/lib/prepare/svg/read-svg';
import { curveLength, flatten, readPathData } from '../../../src/lib/prepare/trace/curve';
import type { TraceSettings } from '../../../src/lib/prepare/trace/linework';
import { boundsOf } from '../../../src/lib/prepare/trace/region';
import { trace } from '../../../src/lib/prepare/trace/trace';
import { nodeTools } from '../../../src/rendering/node-tools';

const tools = nodeTools();
const settings: TraceSettings = {
  widthMm: 40,
  heightMm: 20,
  quarterTurns: 0,
  spot: { widthMm: 0.07, heightMm: 0.11, shape: 'ellipse' },
  dividingLstar: 53.4,
  corners: 'kept',
};
const NEVER = {
  renderSvg: () => Promise.reject(new Error('a render was asked for')),
  traceGrey: () => Promise.reject(new Error('a trace was asked for')),
};

/** Lines of a drawing of 40 × 20 mm whose units are mm. */
async function lines(
  inner: string,
  more: Partial<TraceSettings> = {},
  root = 'viewBox="0 0 40 20"',
  with_: typeof tools | typeof NEVER = NEVER,
) {
  const text = `<svg xmlns="http://www.w3.org/2000/svg" xmlns:xlink="http://www.w3.org/1999/xlink" ${root}>${inner}</svg>`;
  return trace(await readSvg(new TextEncoder().encode(text)), { ...settings, ...more }, with_);
}
const boxes = (paths: readonly string[]): number[][] =>
  paths
    .map((data) =>
      boundsOf(readPathData(data).map((curve) => flatten(curve, 1e-4))).map(
        (value) => Math.round(value * 1000) / 1000,
      ),
    )
    .sort((a, b) => a[0] - b[0] || a[1] - b[1]);

describe('strokes', () => {
  test('stay centrelines with their curves, whatever their width', async () => {
    const { paths, report } = await lines(
      '<path d="M5 10C10 0 20 20 30 10" fill="none" stroke="#000" stroke-width="0.2"/><line x1="1" y1="1" x2="9" y2="1" stroke="black" stroke-width="2"/>',
    );
    expect(paths).toEqual(['M5 10C10 0 20 20 30 10', 'M1 1L9 1']);
    expect(report).toMatchObject({
      method: 'followed',
      paths: 2,
      nodes: 4,
      islandsDropped: 0,
      meanBoundaryMm: null,
    });
    expect(report.lengthMm).toBeCloseTo(curveLength(readPathData(paths[0])[0], 1e-5) + 8, 2);
  });

  test('after transforms, style sheets, symbols and repetition', async () => {
    const inner = `<style>.line{fill:none;stroke:#222}</style>
      <g transform="translate(10 0) scale(2)"><path class="line" d="M0 0L1 1"/></g>
      <defs><path id="p" class="line" d="M0 0C1 0 2 1 2 2"/><symbol id="s" viewBox="0 0 10 10"><path class="line" d="M0 0L10 10"/></symbol></defs>
      <use href="#p" x="20" y="5"/><use href="#p" transform="rotate(90)" x="1" y="-35"/><use xlink:href="#s" x="1" y="2" width="5" height="5"/>`;
    expect((await lines(inner)).paths).toEqual([
      'M10 0L12 2',
      'M20 5C21 5 22 6 22 7',
      'M35 1C35 2 34 3 33 3',
      'M1 2L6 7',
    ]);
  });

  test('at the placed size and with quarter turns', async () => {
    const inner = '<path d="M0 0L40 20" stroke="#000"/>';
    expect((await lines(inner, { widthMm: 80, heightMm: 40 })).paths).toEqual(['M0 0L80 40']);
    expect((await lines(inner, { widthMm: 20, heightMm: 40, quarterTurns: 1 })).paths).toEqual([
      'M20 0L0 40',
    ]);
    expect((await lines(inner, { quarterTurns: 2 })).paths).toEqual(['M40 20L0 0']);
    expect((await lines(inner, { widthMm: 20, heightMm: 40, quarterTurns: 3 })).paths).toEqual([
      'M0 40L20 0',
    ]);
    expect((await lines(inner, {}, 'width="40mm" height="20mm" viewBox="-10 -5 60 30"')).paths).toEqual([
      'M6.6667 3.3333L33.3333 16.6667',
    ]);
  });

  test('closed shapes stay closed', async () => {
    const { paths } = await lines(
      '<rect x="1" y="1" width="5" height="4" fill="none" stroke="#000"/><polygon points="10,1 12,1 11,3" fill="none" stroke="#000"/><polyline points="20,1 22,1 21,3" fill="none" stroke="#000"/>',
    );
    expect(paths).toEqual(['M1 1L6 1L6 5L1 5Z', 'M10 1L12 1L11 3Z', 'M20 1L22 1L21 3']);
  });

  test('dashes are drawn as dashes', async () => {
    const { paths } = await lines(
      '<path d="M0 5H10" stroke="#000" stroke-dasharray="2 1" stroke-dashoffset="1"/>',
    );
    expect(paths).toEqual(['M0 5L1 5', 'M2 5L4 5', 'M5 5L7 5', 'M8 5L10 5']);
    expect((await lines('<path d="M0 5H10" stroke="#000" stroke-dasharray="0 0"/>')).paths).toEqual([
      'M0 5L10 5',
    ]);
  });

  test('invisible, light and veiled strokes are not drawn', async () => {
    const inner = `<path d="M0 1H9" stroke="none"/><path d="M0 2H9" stroke="#fff"/><path d="M0 3H9" stroke="#000" stroke-opacity="0.2"/>
      <path d="M0 4H9" stroke="#000" stroke-width="0"/><path d="M0 5H9" stroke="#000" display="none"/><path d="M0 6H9" stroke="#000" visibility="hidden"/>
      <g opacity="0.1"><path d="M0 7H9" stroke="#000"/></g><path d="M0 8H9"/>`;
    expect((await lines(inner)).paths).toEqual([]);
  });

  test('what is off the page or clipped is not drawn', async () => {
    expect((await lines('<path d="M-5 5H50" stroke="#000"/>')).paths).toEqual(['M0 5L40 5']);
    const clipped =
      '<clipPath id="c"><rect x="10" width="10" height="20"/></clipPath><g clip-path="url(#c)"><path d="M0 5H40" stroke="#000"/><path d="M12 1C13 2 14 3 15 1" fill="none" stroke="#000"/></g>';
    expect((await lines(clipped)).paths).toEqual(['M10 5L20 5', 'M12 1C13 2 14 3 15 1']);
  });

  test('a line hidden by what is painted later is left out, a half hidden one stays', async () => {
    const hidden =
      '<path d="M0 5H40" stroke="#000" stroke-width="0.2"/><rect x="10" width="10" height="20" fill="#fff"/>';
    const { paths } = await lines(hidden);
    expect(boxes(paths)).toEqual([
      [0, 5, 10.1, 5],
      [19.9, 5, 40, 5],
    ]);
    const edge =
      '<path d="M0 5H40" stroke="#000" stroke-width="0.2"/><rect y="5" width="40" height="5" fill="#fff"/>';
    expect((await lines(edge)).paths).toEqual(['M0 5L40 5']);
  });
});

describe('fills', () => {
  test('become outlines drawn in by half the line extent', async () => {
    const { paths } = await lines('<rect x="5" y="4" width="10" height="8"/>');
    expect(boxes(paths)).toEqual([[5.035, 4.055, 14.965, 11.945]]);
    expect(paths[0]).toMatch(/Z$/);
  });

  test('a disc becomes an ellipse of few nodes', async () => {
    const { paths, report } = await lines('<circle cx="20" cy="10" r="8"/>');
    for (const [x, y] of flatten(readPathData(paths[0])[0], 1e-4)) {
      expect(Math.hypot(x - 20, y - 10)).toBeLessThan(8 - 0.034);
      expect(Math.hypot(x - 20, y - 10)).toBeGreaterThan(8 - 0.057);
    }
    expect(report.nodes).toBeLessThan(25);
  });

  test('dark fills that overlap are one area; light ones take away', async () => {
    expect(
      boxes(
        (await lines('<rect x="1" y="1" width="5" height="5"/><rect x="4" y="1" width="5" height="5"/>'))
          .paths,
      ),
    ).toEqual([[1.035, 1.055, 8.965, 5.945]]);
    const hole =
      '<rect width="40" height="20" fill="white"/><rect x="1" y="1" width="10" height="10"/><rect x="3" y="3" width="4" height="4" fill="#eee"/>';
    expect(boxes((await lines(hole)).paths)).toEqual([
      [1.035, 1.055, 10.965, 10.945],
      [2.965, 2.945, 7.035, 7.055],
    ]);
    const over = '<rect x="1" y="1" width="10" height="10"/><rect width="40" height="20" fill="white"/>';
    expect((await lines(over)).paths).toEqual([]);
  });

  test('even-odd and non-zero filling differ', async () => {
    const d = 'M1 1H11V11H1ZM3 3H7V7H3Z';
    expect((await lines(`<path d="${d}"/>`)).paths.length).toBe(1);
    expect((await lines(`<path d="${d}" fill-rule="evenodd"/>`)).paths.length).toBe(2);
  });

  test('a light stroke over a fill takes its width away, in the shape’s own stretch', async () => {
    const { paths } = await lines(
      '<rect x="1" y="1" width="20" height="10"/><path d="M11 0V12" stroke="#fff" stroke-width="2"/>',
    );
    expect(boxes(paths)).toEqual([
      [1.035, 1.055, 9.965, 10.945],
      [12.035, 1.055, 20.965, 10.945],
    ]);
    const stretched = await lines(
      '<rect x="1" y="1" width="20" height="10"/><g transform="scale(2 1)"><path d="M5.5 0V12" stroke="#fff" stroke-width="2"/></g>',
    );
    expect(boxes(stretched.paths)).toEqual([
      [1.035, 1.055, 8.965, 10.945],
      [13.035, 1.055, 20.965, 10.945],
    ]);
  });

  test('a filled shape with a dark stroke is that line alone', async () => {
    expect(
      (await lines('<rect x="1" y="1" width="5" height="5" stroke="#000" stroke-width="0.1"/>')).paths,
    ).toEqual(['M1 1L6 1L6 6L1 6Z']);
  });

  test('gradients whose stops are all dark are dark', async () => {
    const inner =
      '<linearGradient id="g"><stop stop-color="#000"/><stop offset="1" stop-color="#333"/></linearGradient><rect x="5" y="4" width="10" height="8" fill="url(#g)"/>';
    expect(boxes((await lines(inner)).paths)).toEqual([[5.035, 4.055, 14.965, 11.945]]);
  });

  test('an empty drawing has no lines', async () => {
    const { paths, report } = await lines('');
    expect(paths).toEqual([]);
    expect(report).toMatchObject({ nodes: 0, paths: 0, lengthMm: 0 });
  });
});

describe('what only a render can tell', () => {
  test('text is traced, strokes beside it stay lines', async () => {
    const inner =
      '<text x="2" y="15" font-size="12" font-family="Manrope" font-weight="800">UB</text><path d="M1 18C10 17 20 19 39 18" fill="none" stroke="#000" stroke-width="0.1"/>';
    const { paths, report } = await lines(inner, {}, undefined, tools);
    expect(paths[0]).toBe('M1 18C10 17 20 19 39 18');
    expect(paths.length).toBe(5);
    expect(report.method).toBe('followed');
    expect(report.hausdorffMm! * 67).toBeLessThan(1.2);
    expect(report.meanBoundaryMm! * 67).toBeLessThan(0.2);
  });

  test('a mask, a filter, a pattern and a two-tone gradient are drawn as they look', async () => {
    const mask =
      '<mask id="m"><rect x="5" y="4" width="10" height="8" fill="#fff"/></mask><rect width="40" height="20" mask="url(#m)"/>';
    const [[left, top, right, bottom]] = boxes((await lines(mask, {}, undefined, tools)).paths);
    [left - 5.035, top - 4.055, right - 14.965, bottom - 11.945].forEach((off) =>
      expect(Math.abs(off)).toBeLessThan(0.02),
    );
    const gradient =
      '<linearGradient id="g"><stop stop-color="#000"/><stop offset="1" stop-color="#fff"/></linearGradient><rect width="40" height="20" fill="url(#g)"/>';
    const { paths, report } = await lines(gradient, {}, undefined, tools);
    expect(paths.length).toBe(1);
    expect(boxes(paths)[0][2]).toBeGreaterThan(19.5);
    expect(boxes(paths)[0][2]).toBeLessThan(20.5);
    expect(report.method).toBe('traced');
  });
});

describe('pictures of pixels', () => {
  const picture = (
    widthPx: number,
    heightPx: number,
    dark: (x: number, y: number) => boolean,
  ): RasterArtwork => ({
    kind: 'raster',
    facts: {} as RasterArtwork['facts'],
    widthPx,
    heightPx,
    luminance: Uint16Array.from({ length: widthPx * heightPx }, (_, n) =>
      dark(n % widthPx, Math.floor(n / widthPx)) ? 0 : 65535,
    ),
  });

  test('are traced in mm, islands smaller than the spot dropped and counted', async () => {
    const artwork = picture(
      800,
      400,
      (x, y) => (x >= 100 && x < 500 && y >= 100 && y < 300) || (x === 700 && y === 50),
    );
    const { paths, report, strokeWidthMm } = await trace(artwork, settings, tools);
    expect(strokeWidthMm).toBe(0.09);
    expect(paths.length).toBe(1);
    const [[left, top, right, bottom]] = boxes(paths);
    [left - 5.035, top - 5.055, right - 24.965, bottom - 14.945].forEach((off) =>
      expect(Math.abs(off)).toBeLessThan(0.01),
    );
    expect(report).toMatchObject({ method: 'traced', islandsDropped: 1 });
    expect(report.hausdorffMm).toBeLessThan(1.2 * 0.0125);
  });

  test('dark up to the edge of the picture keeps its outline', async () => {
    const { paths } = await trace(
      picture(80, 40, () => true),
      settings,
      tools,
    );
    const [[left, top, right, bottom]] = boxes(paths);
    [left - 0.035, top - 0.055, right - 39.965, bottom - 19.945].forEach((off) =>
      expect(Math.abs(off)).toBeLessThan(0.01),
    );
  });

  test('turned, they are turned clockwise', async () => {
    const artwork = picture(200, 400, (x, y) => x < 100 && y < 100);
    const { paths } = await trace(artwork, { ...settings, quarterTurns: 1 }, tools);
    const [[left, top, right, bottom]] = boxes(paths);
    [left - 30.035, top - 0.055, right - 39.965, bottom - 9.945].forEach((off) =>
      expect(Math.abs(off)).toBeLessThan(0.02),
    );
  });

  test('dots are refused with a sentence', async () => {
    const dots = picture(800, 400, (x, y) => (x + y) % 2 === 0);
    await expect(
      trace(dots, { ...settings, spot: { ...settings.spot, widthMm: 0.02, heightMm: 0.02 } }, tools),
    ).rejects.toMatchObject({ code: 'too-complex' });
  });

  test('nothing dark and 1 × 1 pixel', async () => {
    expect(
      (
        await trace(
          picture(30, 20, () => false),
          settings,
          tools,
        )
      ).paths,
    ).toEqual([]);
    expect(
      (
        await trace(
          picture(1, 1, () => true),
          settings,
          tools,
        )
      ).paths.length,
    ).toBe(1);
  });
});
