import { PNG } from 'pngjs';
import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import type { LevelRaster, MarkRaster } from '../../../src/lib/prepare/mark-raster';
import { meanBurn } from '../../../src/lib/prepare/mark-raster';
import { writeBmp } from '../../../src/lib/prepare/package/bmp';
import { fileName } from '../../../src/lib/prepare/package/file-name';
import { packBits } from '../../../src/lib/prepare/package/pack-bits';
import { writePicture, writePng } from '../../../src/lib/prepare/package/png';
import { writeTiff } from '../../../src/lib/prepare/package/tiff';
import { writeRaster } from '../../../src/lib/prepare/package/write-raster';
import { maskOf } from '../draw-mask';

const levels = (width: number, height: number): LevelRaster => ({
  kind: 'levels',
  width,
  height,
  pitchXMm: 0.06,
  pitchYMm: 0.11,
  data: Uint8Array.from({ length: width * height }, (_, i) => (i * 37 + 5) % 256),
});

const MARKS: [string, MarkRaster][] = [
  ['1 × 1 burned', maskOf(['#'])],
  ['1 × 1 untouched', maskOf(['.'])],
  ['8 × 1', maskOf(['#.#..##.'])],
  ['9 × 3', maskOf(['#........', '........#', '#########'])],
  ['1 × 5', maskOf(['#', '.', '.', '#', '#'])],
  ['all burned', maskOf(Array<string>(7).fill('#'.repeat(13)))],
  ['all untouched', maskOf(Array<string>(7).fill('.'.repeat(33)))],
  ['levels 5 × 3', levels(5, 3)],
  ['levels 1 × 1', levels(1, 1)],
  ['levels 64 × 40', levels(64, 40)],
];

const greyOf = ({ kind, data }: MarkRaster): number[] =>
  Array.from(data, (sample) => (kind === 'mask' ? 255 * (1 - sample) : sample));

/** A BMP read by this test's own few lines. */
function readBmp(file: Uint8Array): {
  width: number;
  height: number;
  perMetre: [number, number];
  grey: number[];
} {
  const view = new DataView(file.buffer, file.byteOffset, file.byteLength);
  const [width, height, bits] = [view.getInt32(18, true), view.getInt32(22, true), view.getUint16(28, true)];
  const start = view.getUint32(10, true);
  const stride = Math.ceil((width * bits) / 32) * 4;
  const grey: number[] = [];
  for (let y = height - 1; y >= 0; y--) {
    for (let x = 0; x < width; x++) {
      const at = start + y * stride;
      const index = bits === 8 ? file[at + x] : (file[at + (x >> 3)] >> (7 - (x & 7))) & 1;
      grey.push(file[54 + 4 * index]);
    }
  }
  return { width, height, perMetre: [view.getInt32(38, true), view.getInt32(42, true)], grey };
}

describe.each(MARKS)('%s', (_, marks) => {
  test('PNG: every pixel, read by pngjs', async () => {
    const png = PNG.sync.read(Buffer.from(await writePng(marks)));
    expect([png.width, png.height]).toEqual([marks.width, marks.height]);
    expect(Array.from({ length: marks.data.length }, (_pixel, i) => png.data[4 * i])).toEqual(greyOf(marks));
  });

  test('PNG: greyscale of 1 or 8 bits with the pitch in pHYs', async () => {
    const file = await writePng(marks);
    const view = new DataView(file.buffer, file.byteOffset);
    expect([file[24], file[25]]).toEqual([marks.kind === 'mask' ? 1 : 8, 0]);
    expect(new TextDecoder().decode(file.subarray(37, 41))).toBe('pHYs');
    expect([view.getUint32(41), view.getUint32(45), file[49]]).toEqual([
      Math.round(1000 / marks.pitchXMm),
      Math.round(1000 / marks.pitchYMm),
      1,
    ]);
  });

  test('BMP: every pixel and the pitch', () => {
    const bmp = readBmp(writeBmp(marks));
    expect(bmp).toMatchObject({ width: marks.width, height: marks.height });
    expect(bmp.perMetre).toEqual([Math.round(1000 / marks.pitchXMm), Math.round(1000 / marks.pitchYMm)]);
    expect(bmp.grey).toEqual(greyOf(marks));
  });

  test('TIFF: every pixel', async () => {
    const { data, info } = await sharp(await writeTiff(marks))
      .toColourspace('b-w')
      .raw()
      .toBuffer({ resolveWithObject: true });
    expect([info.width, info.height, info.channels]).toEqual([marks.width, marks.height, 1]);
    expect([...data]).toEqual(greyOf(marks));
  });

  test.each(['png', 'tiff', 'bmp'] as const)('%s: the same bytes every time', async (format) => {
    expect(await writeRaster(marks, format)).toEqual(await writeRaster(marks, format));
  });
});

test('bits beyond the last pixel are untouched', () => {
  expect([...packBits(maskOf(['#.#.']), 1, 0)]).toEqual([0b0101_1111]);
  expect([...packBits(maskOf(['#########', '.........']), 4, 1)]).toEqual([
    0, 0, 0x7f, 255, 255, 0, 255, 255, 255, 255,
  ]);
});

test('mean burn of dots and of levels', () => {
  expect(meanBurn(maskOf(['#...']))).toBe(0.25);
  expect(meanBurn({ ...levels(2, 1), data: Uint8Array.of(0, 255) })).toBe(0.5);
});

test('a picture in colours out of a palette', async () => {
  const file = await writePicture(2, 1, Uint8Array.of(0, 1), Uint8Array.of(10, 20, 30, 200, 100, 0));
  const png = PNG.sync.read(Buffer.from(file));
  expect([...png.data]).toEqual([10, 20, 30, 255, 200, 100, 0, 255]);
});

test('file names say order, pass, pitch, angle and key', () => {
  const parts = {
    label: 'UMB-1042',
    pass: 1,
    linePitchMm: 0.11,
    directionDeg: 0,
    preparationKey: '1a2b3c4d5e',
    extension: 'png',
  } as const;
  expect(fileName(parts)).toBe('UMB-1042-pass1-0.110mm-0deg-1a2b3c4d.png');
  expect(fileName({ ...parts, pass: 2, directionDeg: 112.5, linePitchMm: 0.0707107 })).toBe(
    'UMB-1042-pass2-0.071mm-112.5deg-1a2b3c4d.png',
  );
});
