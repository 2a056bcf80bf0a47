import { readFileSync } from 'node:fs';
import path from 'node:path';
import { expect } from 'vitest';
import { prepareArtwork } from '../../src/lib/prepare/pipeline';
import { settingsSchema, type Settings } from '../../src/lib/prepare/settings';
import { nodeTools } from '../../src/rendering/node-tools';
import { needsTool } from '../setup/reference-tool';
import { referenceCheck } from './check';
import { asPillowSees, figure, printed } from './read-outside';

const ROOT = path.resolve(import.meta.dirname, '../..');
const STAMP = readFileSync(path.join(ROOT, 'samples/stamp.bmp'));
const tools = nodeTools({ root: ROOT });

const asked = (change: Partial<Settings>): Settings =>
  settingsSchema.parse({
    widthMm: 30.1,
    heightMm: 24,
    spot: { widthMm: 0.07, heightMm: 0.11 },
    treatment: 'solid',
    scan: { directionDeg: 0, linePitchMm: 0.11, alongPitchMm: 0.11 },
    tone: {},
    label: 'held',
    ...change,
  });

const SETTINGS: Settings[] = [
  asked({}),
  asked({
    widthMm: 47.3,
    heightMm: 31.7,
    scan: { directionDeg: 0, linePitchMm: 0.0847, alongPitchMm: 0.127 },
  }),
  asked({ scan: { directionDeg: 90, linePitchMm: 0.07, alongPitchMm: 0.15 }, treatment: 'halftone' }),
  asked({ widthMm: 24, heightMm: 30.1, quarterTurns: 1, mirror: true, treatment: 'continuous' }),
  asked({ perpendicular: { linePitchMm: 0.2, alongPitchMm: 0.13 } }),
];

/** A size read from a file against the placed one: half a pixel, and what whole pixels per metre cannot express. */
function expectPlaced(widthMm: number, heightMm: number, xMm: number, yMm: number, settings: Settings): void {
  const rounding = settings.widthMm * 1e-4;
  expect(Math.abs(widthMm - settings.widthMm)).toBeLessThanOrEqual(xMm / 2 + rounding);
  expect(Math.abs(heightMm - settings.heightMm)).toBeLessThanOrEqual(yMm / 2 + rounding);
}

referenceCheck(
  {
    what: 'every delivered PNG, TIFF and BMP of five preparations measures the placed size',
    basis: 'computed',
    source: 'pngcheck 3.0.3, tiffinfo of libtiff 4.5.0, a reader of 16 bytes for BMP',
    within: 'half a pixel',
  },
  async () => {
    needsTool('pngcheck', 'tiffinfo');
    for (const settings of SETTINGS) {
      const { files, manifest } = await prepareArtwork(STAMP, { settings, artworkVersion: 1 }, tools);
      expect(files).toHaveLength(settings.perpendicular ? 6 : 3);
      for (const [index, { name, bytes }] of files.entries()) {
        const { directionDeg, linePitchMm, alongPitchMm } = manifest.files[index];
        const [xMm, yMm] =
          directionDeg % 180 === 0 ? [alongPitchMm, linePitchMm] : [linePitchMm, alongPitchMm];
        if (name.endsWith('.png')) {
          const text = printed('pngcheck', ['-v'], bytes, name);
          const perMetre = /(\d+)x(\d+) pixels\/meter/.exec(text) ?? [];
          const widthMm = (figure(text, /(\d+) x \d+ image/) / Number(perMetre[1])) * 1000;
          const heightMm = (figure(text, /\d+ x (\d+) image/) / Number(perMetre[2])) * 1000;
          expectPlaced(widthMm, heightMm, xMm, yMm, settings);
        } else if (name.endsWith('.bmp')) {
          const view = new DataView(bytes.buffer, bytes.byteOffset);
          const [columns, rows, x, y] = [18, 22, 38, 42].map((at) => view.getInt32(at, true));
          expectPlaced((columns / x) * 1000, (rows / y) * 1000, xMm, yMm, settings);
        } else {
          const text = printed('tiffinfo', [], bytes, name);
          const unitMm = text.includes('pixels/cm') ? 10 : 25.4;
          const widthMm =
            (figure(text, /Image Width: (\d+)/) / figure(text, /Resolution: ([\d.]+),/)) * unitMm;
          const heightMm =
            (figure(text, /Image Length: (\d+)/) / figure(text, /Resolution: [\d.]+, ([\d.]+)/)) * unitMm;
          expectPlaced(widthMm, heightMm, xMm, yMm, settings);
        }
      }
    }
  },
  120_000,
);

referenceCheck(
  {
    what: 'PNG, TIFF and BMP of one pass hold the same pixels, and the mark is where the artwork has ink',
    basis: 'computed',
    source: 'Pillow 9.4.0',
  },
  async () => {
    needsTool('python3-pil');
    const { files } = await prepareArtwork(STAMP, { settings: asked({}), artworkVersion: 1 }, tools);
    const [first, ...others] = files.map(({ bytes, name }) => asPillowSees(bytes, name));
    for (const other of others) expect(other).toEqual(first);
    const at = (fx: number, fy: number): number =>
      first.grey[Math.floor(fy * first.height) * first.width + Math.floor(fx * first.width)];
    // The bar through the middle, the ring at its top, and the bare ground between them and outside.
    expect([at(0.5, 0.5), at(0.5, 0.14), at(0.5, 0.3), at(0.02, 0.02)]).toEqual([0, 0, 255, 255]);
  },
);
