import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { readSvg } from '../../src/lib/prepare/svg/read-svg';
import { luminanceOverWhite, renderVector } from '../../src/lib/prepare/svg/render-vector';
import { turnVector } from '../../src/lib/prepare/svg/turn-vector';
import { windowSvg } from '../../src/lib/prepare/svg/window-svg';
import { nodeTools } from '../../src/rendering/node-tools';
import { unpackWoff } from '../../src/rendering/woff';

const tools = nodeTools();
const read = (inner: string, root = 'viewBox="0 0 40 20"') =>
  readSvg(new TextEncoder().encode(`<svg xmlns="http://www.w3.org/2000/svg" ${root}>${inner}</svg>`));

/** Picture as rows of # for dark and . for light. */
async function grid(
  inner: string,
  widthPx: number,
  heightPx: number,
  turns: 0 | 1 | 2 | 3 = 0,
  root?: string,
) {
  const light = await renderVector(turnVector(await read(inner, root), turns), { widthPx, heightPx }, tools);
  return Array.from({ length: heightPx }, (_, row) =>
    Array.from(light.subarray(row * widthPx, (row + 1) * widthPx), (value) =>
      value < 32768 ? '#' : '.',
    ).join(''),
  );
}

describe('rendering', () => {
  const corner = '<rect width="20" height="10"/><rect x="30" y="15" width="10" height="5"/>';

  test('exactly the asked pixels, whatever the units', async () => {
    expect(await grid(corner, 8, 4)).toEqual(['####....', '####....', '........', '......##']);
    expect(await grid(corner, 8, 4, 0, 'width="1in" height="12.7mm" viewBox="0 0 40 20"')).toEqual([
      '####....',
      '####....',
      '........',
      '......##',
    ]);
  });

  test('quarter turns go clockwise', async () => {
    expect(await grid(corner, 4, 8, 1)).toEqual([
      '..##',
      '..##',
      '..##',
      '..##',
      '....',
      '....',
      '#...',
      '#...',
    ]);
    expect(await grid(corner, 8, 4, 2)).toEqual(['##......', '........', '....####', '....####']);
    expect(await grid(corner, 4, 8, 3)).toEqual([
      '...#',
      '...#',
      '....',
      '....',
      '##..',
      '##..',
      '##..',
      '##..',
    ]);
  });

  test('parts of a drawing are the same pixels as the whole', async () => {
    const artwork = await read(
      '<circle cx="20" cy="10" r="9"/><text x="5%" y="12" font-size="8">umber</text>',
    );
    const whole = await renderVector(artwork, { widthPx: 400, heightPx: 200 }, tools);
    const part = { left: 0.25, top: 0.5, width: 0.5, height: 0.25 };
    const window = await renderVector(artwork, { widthPx: 200, heightPx: 50, part }, tools);
    let worst = 0;
    for (let row = 0; row < 50; row += 1) {
      for (let column = 0; column < 200; column += 1) {
        const same = whole[(row + 100) * 400 + column + 100];
        worst = Math.max(worst, Math.abs(window[row * 200 + column] - same));
      }
    }
    expect(worst).toBeLessThan(65535 * 0.02);
  });

  test('a letterboxed page, percentages and slices keep their place', async () => {
    const square = '<rect width="100%" height="100%"/>';
    expect(await grid(square, 8, 4, 0, 'width="8" height="4" viewBox="0 0 1 1"')).toEqual(
      Array(4).fill('..####..'),
    );
    const aside = 'width="8" height="4" viewBox="0 0 1 1" preserveAspectRatio="xMinYMid"';
    expect(await grid(square, 8, 4, 0, aside)).toEqual(Array(4).fill('####....'));
    const cut = 'width="4" height="2" viewBox="0 0 2 2" preserveAspectRatio="xMidYMin slice"';
    expect(await grid('<rect width="2" height="0.5"/>', 4, 2, 0, cut)).toEqual(['####', '....']);
  });

  test('text is drawn with the shipped font in every weight, other families with the same', async () => {
    const ink = async (attributes: string) => {
      const light = await renderVector(
        await read(`<text x="1" y="16" font-size="14" ${attributes}>Agß</text>`),
        { widthPx: 400, heightPx: 200 },
        tools,
      );
      return light.reduce((sum, value) => sum + (value < 32768 ? 1 : 0), 0);
    };
    const [light, bold, regular, other] = [
      await ink('font-family="Manrope" font-weight="200"'),
      await ink('font-family="Manrope" font-weight="800"'),
      await ink('font-family="Manrope"'),
      await ink('font-family="Nowhere Sans"'),
    ];
    expect(light).toBeGreaterThan(1000);
    expect(regular).toBeGreaterThan(1.5 * light);
    expect(bold).toBeGreaterThan(1.3 * regular);
    expect(other).toBe(regular);
  });

  test('many windows at once come back in order', async () => {
    const artwork = await read(corner);
    const windows = Array.from({ length: 12 }, (_, index) => ({
      left: index / 12,
      top: 0,
      width: 1 / 12,
      height: 1,
    }));
    const drawn = await Promise.all(
      windows.map((part) => renderVector(artwork, { widthPx: 1, heightPx: 4, part }, tools)),
    );
    expect(drawn.map((light) => (light[0] < 20000 ? '#' : '.')).join('')).toBe('######......');
  });

  test('more pixels than allowed are refused before anything is drawn', async () => {
    const artwork = await read(corner);
    await expect(tools.renderSvg(artwork.svg, { widthPx: 10_000, heightPx: 10_000 })).rejects.toThrow(
      RangeError,
    );
    expect(() => windowSvg(artwork.svg, { widthPx: 0, heightPx: 1 })).toThrow(RangeError);
    expect(() => windowSvg(artwork.svg, { widthPx: 1.5, heightPx: 1 })).toThrow(RangeError);
    expect(() => windowSvg(new Uint8Array(5), { widthPx: 1, heightPx: 1 })).toThrow(TypeError);
  });
});

test('luminance over white: transparent is white, grey goes to linear light, colour by CIE Y', () => {
  const light = luminanceOverWhite(
    Uint8Array.of(0, 0, 0, 0, 0, 0, 0, 255, 188, 188, 188, 255, 255, 0, 0, 255, 0, 0, 0, 128),
  );
  expect(light[0]).toBe(65535);
  expect(light[1]).toBe(0);
  expect(light[2] / 65535).toBeCloseTo(0.5029, 3);
  expect(light[3] / 65535).toBeCloseTo(0.2126, 4);
  expect(light[4] / 65535).toBeCloseTo(0.2122, 3);
});

test('a WOFF unpacks to the font that it holds', () => {
  const folder = join('node_modules', '@fontsource', 'manrope', 'files');
  for (const name of readdirSync(folder).filter((file) => /latin-[48]00-normal\.woff$/.test(file))) {
    const font = unpackWoff(readFileSync(join(folder, name)));
    expect(font.readUInt32BE(0)).toBe(0x00010000);
    expect(font.length).toBe(readFileSync(join(folder, name)).readUInt32BE(16));
  }
  expect(() => unpackWoff(Buffer.alloc(50))).toThrow(TypeError);
});
