import { execFileSync } from 'node:child_process';
import { expect } from 'vitest';
import { PNG } from 'pngjs';
import { readSvg } from '../../src/lib/prepare/svg/read-svg';
import { renderVector } from '../../src/lib/prepare/svg/render-vector';
import { nodeTools } from '../../src/rendering/node-tools';
import { needsTool } from '../setup/reference-tool';
import { referenceCheck } from './check';

const svg = (root: string, inner = '<rect width="100%" height="100%"/>'): string =>
  `<svg xmlns="http://www.w3.org/2000/svg" ${root}>${inner}</svg>`;
const read = (text: string) => readSvg(new TextEncoder().encode(text));

referenceCheck(
  {
    what: 'absolute lengths of a drawing: 1 in = 2.54 cm = 25.4 mm = 101.6 Q = 72 pt = 6 pc = 96 px',
    basis: 'published',
    source: 'W3C, CSS Values and Units Level 4, section 6.2; SVG 2, section 8.9',
    within: '1e-9 mm',
  },
  async () => {
    for (const length of ['1in', '2.54cm', '25.4mm', '101.6Q', '72pt', '6pc', '96px', '96']) {
      const { facts } = await read(svg(`width="${length}" height="${length}"`));
      expect(facts.ownWidthMm, length).toBeCloseTo(25.4, 9);
    }
  },
);

const PAGES = [
  'width="50mm" height="1in"',
  'width="96pt" height="48pt"',
  'width="10cm" height="4pc"',
  'width="0.5in" height="9mm"',
  'width="20mm" height="3pc"',
  'width="50mm" height="20mm" viewBox="0 0 7 3"',
];
referenceCheck(
  {
    what: 'physical size of a drawing in six mixtures of units',
    basis: 'computed',
    source: 'Debian rsvg-convert 2.54.7 at 300 px per inch, called in the test',
    within: 'half a pixel at 300 px per inch',
  },
  async () => {
    needsTool('rsvg-convert');
    for (const page of PAGES) {
      const text = svg(page);
      const { width, height } = PNG.sync.read(
        execFileSync('rsvg-convert', ['-d', '300', '-p', '300'], { input: text }),
      );
      const { ownWidthMm, ownHeightMm } = (await read(text)).facts;
      // The program rounds up to whole pixels.
      expect(width - (ownWidthMm! / 25.4) * 300, `${page} width`).toBeGreaterThanOrEqual(-0.5);
      expect(width - (ownWidthMm! / 25.4) * 300, `${page} width`).toBeLessThanOrEqual(1);
      expect(height - (ownHeightMm! / 25.4) * 300, `${page} height`).toBeGreaterThanOrEqual(-0.5);
      expect(height - (ownHeightMm! / 25.4) * 300, `${page} height`).toBeLessThanOrEqual(1);
    }
  },
);

referenceCheck(
  {
    what: 'where a viewBox lies on its page under every preserveAspectRatio',
    basis: 'computed',
    source: 'Debian rsvg-convert 2.54.7, called in the test',
    within: '2 % of the pixels at edges',
  },
  async () => {
    needsTool('rsvg-convert');
    const tools = nodeTools();
    const aligns = [
      'none',
      ...['xMin', 'xMid', 'xMax'].flatMap((x) => ['YMin', 'YMid', 'YMax'].map((y) => x + y)),
    ];
    for (const align of aligns) {
      for (const fit of align === 'none' ? ['meet'] : ['meet', 'slice']) {
        const root = `width="120" height="60" viewBox="5 5 30 20" preserveAspectRatio="${align} ${fit}"`;
        const text = svg(root, '<circle cx="15" cy="12" r="6"/><rect x="25" y="18" width="10" height="7"/>');
        const theirs = PNG.sync.read(execFileSync('rsvg-convert', ['-b', 'white'], { input: text }));
        const ours = await renderVector(await read(text), { widthPx: 120, heightPx: 60 }, tools);
        const differ = ours.filter((value, n) => value < 14000 !== theirs.data[4 * n] < 128).length;
        expect(differ / ours.length, `${align} ${fit}`).toBeLessThan(0.02);
      }
    }
  },
);
