import { describe, expect } from 'vitest';
import type { LevelRaster, MarkRaster } from '../../src/lib/prepare/mark-raster';
import { writeBmp } from '../../src/lib/prepare/package/bmp';
import { writePng } from '../../src/lib/prepare/package/png';
import { writeTiff } from '../../src/lib/prepare/package/tiff';
import type { MaskRaster } from '../../src/lib/imaging/raster';
import { needsTool } from '../setup/reference-tool';
import { referenceCheck } from './check';
import { asPillowSees, figure, printed } from './read-outside';

const MM_PER_INCH = 25.4;
const MM_PER_METRE = 1000;
const PITCHES = [
  [0.06, 0.06],
  [0.05, 0.11],
  [0.0847, 0.07],
] as const;

/** Dots without any symmetry: a wrong order of rows, columns or bits, or a wrong polarity, cannot pass unseen. */
function dots(width: number, height: number, pitchXMm: number, pitchYMm: number): MaskRaster {
  const data = Uint8Array.from({ length: width * height }, (_, i) => ((i * i + 3 * i) % 7 < 2 ? 1 : 0));
  return { kind: 'mask', width, height, pitchXMm, pitchYMm, data };
}

function levels(width: number, height: number, pitchXMm: number, pitchYMm: number): LevelRaster {
  const data = Uint8Array.from({ length: width * height }, (_, i) => (i * 37) % 256);
  return { kind: 'levels', width, height, pitchXMm, pitchYMm, data };
}

const SIZES = [
  [1, 1],
  [1, 9],
  [8, 3],
  [13, 7],
  [333, 201],
] as const;
const MARKS: MarkRaster[] = PITCHES.flatMap(([x, y]) =>
  SIZES.flatMap(([width, height]) => [dots(width, height, x, y), levels(width, height, x, y)]),
);

/** Burned is black: what a reader must see of marks. */
const greyOf = (marks: MarkRaster): number[] =>
  Array.from(marks.data, (sample) => (marks.kind === 'mask' ? 255 * (1 - sample) : sample));

/** A size read from a file against the placed size: off by less than half a pixel. */
function expectSize(marks: MarkRaster, widthMm: number, heightMm: number): void {
  expect(Math.abs(widthMm - marks.width * marks.pitchXMm)).toBeLessThan(marks.pitchXMm / 2);
  expect(Math.abs(heightMm - marks.height * marks.pitchYMm)).toBeLessThan(marks.pitchYMm / 2);
}

describe('PNG', () => {
  referenceCheck(
    {
      what: 'PNG: checksums, greyscale of 1 or 8 bits, and placed size from pHYs',
      basis: 'computed',
      source: 'pngcheck 3.0.3',
      within: 'half a pixel',
    },
    async () => {
      needsTool('pngcheck');
      for (const marks of MARKS) {
        const text = printed('pngcheck', ['-v'], await writePng(marks), 'marks.png');
        const bits = marks.kind === 'mask' ? 1 : 8;
        expect(text).toContain(
          `${marks.width} x ${marks.height} image, ${bits}-bit grayscale, non-interlaced`,
        );
        expect(text).toContain('No errors detected');
        const perMetre = /pHYs at offset [^:]*: (\d+)x(\d+) pixels\/meter/.exec(text);
        expect(perMetre, text).not.toBeNull();
        const [, x, y] = (perMetre ?? []).map(Number);
        expectSize(marks, (marks.width / x) * MM_PER_METRE, (marks.height / y) * MM_PER_METRE);
      }
    },
  );
  referenceCheck(
    { what: 'PNG: every pixel, burned is black', basis: 'computed', source: 'Pillow 9.4.0' },
    async () => {
      needsTool('python3-pil');
      for (const marks of MARKS.slice(0, 2 * SIZES.length)) {
        expect(asPillowSees(await writePng(marks), 'marks.png').grey).toEqual(greyOf(marks));
      }
    },
  );
});

describe('TIFF', () => {
  referenceCheck(
    {
      what: 'TIFF: 1 bit by CCITT group 4 or 8 bit, and placed size from its resolution',
      basis: 'computed',
      source: 'tiffinfo of libtiff 4.5.0',
      within: 'half a pixel',
    },
    async () => {
      needsTool('tiffinfo');
      for (const marks of MARKS) {
        const text = printed('tiffinfo', [], await writeTiff(marks), 'marks.tif');
        expect(figure(text, /Image Width: (\d+)/)).toBe(marks.width);
        expect(figure(text, /Image Length: (\d+)/)).toBe(marks.height);
        expect(figure(text, /Bits\/Sample: (\d+)/)).toBe(marks.kind === 'mask' ? 1 : 8);
        if (marks.kind === 'mask') expect(text).toContain('CCITT Group 4');
        const unitMm = text.includes('pixels/cm') ? 10 : MM_PER_INCH;
        const x = figure(text, /Resolution: ([\d.]+),/);
        const y = figure(text, /Resolution: [\d.]+, ([\d.]+)/);
        expectSize(marks, (marks.width / x) * unitMm, (marks.height / y) * unitMm);
      }
    },
  );
  referenceCheck(
    {
      what: 'TIFF: every pixel and its polarity, burned is black',
      basis: 'computed',
      source: 'Pillow 9.4.0',
    },
    async () => {
      needsTool('python3-pil');
      for (const marks of MARKS.slice(0, 2 * SIZES.length)) {
        expect(asPillowSees(await writeTiff(marks), 'marks.tif').grey).toEqual(greyOf(marks));
      }
    },
  );
});

describe('BMP', () => {
  referenceCheck(
    {
      what: 'BMP: placed size from the header',
      basis: 'published',
      source: 'BITMAPINFOHEADER: whole pixels per metre at offsets 38 and 42',
      within: 'half a pixel',
    },
    () => {
      for (const marks of MARKS) {
        const file = writeBmp(marks);
        const view = new DataView(file.buffer, file.byteOffset);
        expect(view.getUint32(2, true)).toBe(file.length);
        const [x, y] = [view.getInt32(38, true), view.getInt32(42, true)];
        expectSize(marks, (marks.width / x) * MM_PER_METRE, (marks.height / y) * MM_PER_METRE);
      }
    },
  );
  referenceCheck(
    { what: 'BMP: every pixel, burned is black', basis: 'computed', source: 'Pillow 9.4.0' },
    () => {
      needsTool('python3-pil');
      for (const marks of MARKS.slice(0, 2 * SIZES.length)) {
        expect(asPillowSees(writeBmp(marks), 'marks.bmp').grey).toEqual(greyOf(marks));
      }
    },
  );
});
