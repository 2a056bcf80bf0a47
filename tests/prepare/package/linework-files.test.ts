import { inflateSync } from 'node:zlib';
import { describe, expect, test } from 'vitest';
import { lineworkPdf } from '../../../src/lib/prepare/package/linework-pdf';
import { lineworkSvg } from '../../../src/lib/prepare/package/linework-svg';
import { mirrored } from '../../../src/lib/prepare/package/mirrored';
import { readSvg } from '../../../src/lib/prepare/svg/read-svg';
import { renderVector } from '../../../src/lib/prepare/svg/render-vector';
import { flatten, readPathData } from '../../../src/lib/prepare/trace/curve';
import type { Linework } from '../../../src/lib/prepare/trace/linework';
import { nodeTools } from '../../../src/rendering/node-tools';

const tools = nodeTools();
const linework = (paths: string[], widthMm = 50, heightMm = 30): Linework => ({
  widthMm,
  heightMm,
  strokeWidthMm: 0.09,
  paths,
  report: {
    method: 'followed',
    nodes: 0,
    paths: paths.length,
    islandsDropped: 0,
    meanBoundaryMm: null,
    hausdorffMm: null,
    lengthMm: 0,
  },
});
const PATHS = [
  'M36 10C36 13.3137 33.3137 16 30 16C26.6863 16 24 13.3137 24 10C24 6.6863 26.6863 4 30 4C33.3137 4 36 6.6863 36 10Z',
  'M2.5 20C10 15 15 25 22.5 20',
  'M1 1L1.1 1L1.1 1.1Z',
];
const textOf = (bytes: Uint8Array): string => new TextDecoder().decode(bytes);

describe('lineworkSvg', () => {
  test('true size in mm, one black, one width, no fill, no names', async () => {
    const { bytes, optimised } = await lineworkSvg(linework(PATHS), { mirror: false }, tools);
    const text = textOf(bytes);
    expect(optimised).toBe(true);
    expect(text).toMatch(
      /^<svg xmlns="http:\/\/www\.w3\.org\/2000\/svg" width="50mm" height="30mm" viewBox="0 0 50 30">/,
    );
    expect(text.match(/#[0-9a-f]{3,6}|black|rgb/g)).toEqual(['#000']);
    expect(text.match(/stroke-width="[^"]*"/g)).toEqual(['stroke-width="0.09"']);
    expect(text).toContain('fill="none"');
    expect(text).not.toMatch(/\b(id|class|inkscape|title|layer)\b/);
    expect(text.match(/<path/g)?.length).toBe(3);
    expect((await readSvg(bytes)).facts).toMatchObject({ ownWidthMm: 50, ownHeightMm: 30 });
  });

  test('shortened, the lines run where they ran and stay closed', async () => {
    const { bytes } = await lineworkSvg(linework(PATHS), { mirror: false }, tools);
    const read = [...textOf(bytes).matchAll(/ d="([^"]*)"/g)].map(([, data]) => readPathData(data)[0]);
    read.forEach((curve, n) => {
      const asked = readPathData(PATHS[n])[0];
      expect(curve.closed).toBe(asked.closed);
      const [a, b] = [flatten(curve, 1e-4), flatten(asked, 1e-4)];
      for (const p of a)
        expect(Math.min(...b.map((q) => Math.hypot(p[0] - q[0], p[1] - q[1])))).toBeLessThan(0.15);
    });
  });

  test('the plain drawing is kept where the short one looks different', async () => {
    let renders = 0;
    const fooled = {
      renderSvg: async () => {
        renders += 1;
        return new Uint8Array(16).fill(renders === 1 ? 0 : 255);
      },
    };
    const { bytes, optimised } = await lineworkSvg(linework(PATHS), { mirror: false }, fooled);
    expect(optimised).toBe(false);
    expect(textOf(bytes)).toContain(PATHS[0]);
    const broken = { renderSvg: () => Promise.reject(new Error('not drawn')) };
    expect((await lineworkSvg(linework(PATHS), { mirror: false }, broken)).optimised).toBe(false);
  });

  test('mirrored on request: the picture is the mirror image', async () => {
    const [straight, turned] = await Promise.all(
      [false, true].map(async (mirror) => {
        const { bytes } = await lineworkSvg({ ...linework(PATHS), strokeWidthMm: 2 }, { mirror }, tools);
        return renderVector(await readSvg(bytes), { widthPx: 100, heightPx: 60 }, tools);
      }),
    );
    for (let row = 0; row < 60; row += 1) {
      for (let column = 0; column < 100; column += 1) {
        expect(Math.abs(straight[row * 100 + column] - turned[row * 100 + 99 - column])).toBeLessThan(9000);
      }
    }
  });

  test('the same lines, the same bytes; no lines, a valid empty page', async () => {
    const [once, twice] = [
      await lineworkSvg(linework(PATHS), { mirror: true }, tools),
      await lineworkSvg(linework(PATHS), { mirror: true }, tools),
    ];
    expect(textOf(twice.bytes)).toBe(textOf(once.bytes));
    expect(
      (await readSvg((await lineworkSvg(linework([]), { mirror: false }, tools)).bytes)).facts.ownWidthMm,
    ).toBe(50);
  });
});

describe('lineworkPdf', () => {
  const contents = (bytes: Uint8Array): string => {
    const raw = Buffer.from(bytes);
    const start = raw.indexOf('stream\n') + 7;
    return inflateSync(raw.subarray(start, raw.indexOf('\nendstream'))).toString('latin1');
  };

  test('the page is the placed size in points, dates are fixed', async () => {
    const text = Buffer.from(await lineworkPdf(linework(PATHS), { mirror: false })).toString('latin1');
    const [, width, height] = /\/MediaBox \[0 0 ([\d.]+) ([\d.]+)\]/.exec(text)!;
    expect((Number(width) / 72) * 25.4).toBeCloseTo(50, 3);
    expect((Number(height) / 72) * 25.4).toBeCloseTo(30, 3);
    expect(text).toMatch(/\/CreationDate \d+ 0 R/);
    expect(text.match(/\(D:\d+Z\)/g)).toEqual(['(D:19700101000000Z)', '(D:19700101000000Z)']);
    expect(text).not.toMatch(/D:20\d\d/);
  });

  test('lines are stroked once in black with one width, nothing is filled', async () => {
    const page = contents(await lineworkPdf(linework(PATHS), { mirror: false }));
    expect(page).toMatch(/0\.09 w/);
    expect(page.match(/^S$/gm)?.length).toBe(1);
    expect(page).not.toMatch(/^[fFBb]\*?$/m);
    expect(page).toMatch(/2\.5 20 m\n10 15 15 25 22\.5 20 c/);
  });

  test('mirrored, coordinates are exchanged left and right', async () => {
    expect(contents(await lineworkPdf(linework(PATHS), { mirror: true }))).toMatch(
      /47\.5 20 m\n40 15 35 25 27\.5 20 c/,
    );
  });

  test('the same lines, the same bytes; no lines, an empty page', async () => {
    const [once, twice] = [
      await lineworkPdf(linework(PATHS), { mirror: false }),
      await lineworkPdf(linework(PATHS), { mirror: false }),
    ];
    expect(Buffer.compare(once, twice)).toBe(0);
    expect(contents(await lineworkPdf(linework([]), { mirror: false }))).not.toMatch(/^S$/m);
  });
});

test('mirrored twice is the same', () => {
  const once = mirrored(linework(['M1 2L3 4', ...PATHS]));
  expect(once.paths[0]).toBe('M49 2L47 4');
  expect(mirrored(once).paths).toEqual(['M1 2L3 4', ...PATHS]);
});
