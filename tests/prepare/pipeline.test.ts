import { createHash } from 'node:crypto';
import { PNG } from 'pngjs';
import sharp from 'sharp';
import { describe, expect, test } from 'vitest';
import { canonicalJson, manifestSchema } from '../../src/lib/prepare/manifest';
import {
  checkArtwork,
  prepareArtwork,
  preparationKey,
  type CheckSettings,
  type Prepared,
} from '../../src/lib/prepare/pipeline';
import { checkReportSchema, PASSAGE, PASSAGE_MAX_PX, reportSchema } from '../../src/lib/prepare/report';
import {
  settingsSchema,
  type MachineRun,
  type Settings,
  type SettingsInput,
} from '../../src/lib/prepare/settings';
import { ArtworkError, type PipelineTools } from '../../src/lib/prepare/tools';
import { nodeTools } from '../../src/rendering/node-tools';

const tools: PipelineTools = nodeTools();
const sha256 = (bytes: Uint8Array | string): string => createHash('sha256').update(bytes).digest('hex');
const spot = { widthMm: 0.07, heightMm: 0.11, shape: 'ellipse' } as const;

const settings = (more: Partial<SettingsInput> = {}): Settings =>
  settingsSchema.parse({
    widthMm: 12,
    heightMm: 8,
    spot,
    treatment: 'halftone',
    scan: { directionDeg: 0, linePitchMm: 0.1, alongPitchMm: 0.1 },
    tone: {},
    label: 'test',
    ...more,
  });
const prepare = (bytes: Uint8Array, more: Partial<SettingsInput> = {}): Promise<Prepared> =>
  prepareArtwork(bytes, { settings: settings(more), artworkVersion: 1 }, tools);

/** A grey ramp with a black square in its top left corner: neither side nor turn looks like another. */
const picture = (): Promise<Buffer> => {
  const data = Uint8Array.from({ length: 240 * 160 }, (_, i) =>
    i % 240 < 60 && i < 240 * 60 ? 0 : 60 + ((i % 240) * 180) / 240,
  );
  return sharp(data, { raw: { width: 240, height: 160, channels: 1 } })
    .png()
    .toBuffer();
};
const DRAWING = new TextEncoder().encode(
  '<svg xmlns="http://www.w3.org/2000/svg" width="12mm" height="8mm" viewBox="0 0 12 8">' +
    '<rect x="1" y="1" width="4" height="3"/><path d="M2 6H10" fill="none" stroke="#000" stroke-width="0.4"/></svg>',
);

/** Rows of a prepared PNG, # burned. */
function dots(prepared: Prepared, index = 0): string[] {
  const file = prepared.files.filter(({ name }) => name.endsWith('.png'))[index];
  const { width, height, data } = PNG.sync.read(Buffer.from(file.bytes));
  return Array.from({ length: height }, (_, y) =>
    Array.from({ length: width }, (_cell, x) => (data[4 * (y * width + x)] < 128 ? '#' : '.')).join(''),
  );
}
const share = (rows: string[]): number => rows.join('').replaceAll('.', '').length / rows.join('').length;
const reversed = (rows: string[]): string[] => rows.map((row) => [...row].reverse().join(''));

describe('a preparation', () => {
  test('of a picture: files, pictures, report and manifest agree', async () => {
    const bytes = await picture();
    const prepared = await prepare(bytes);
    const { report, manifest, files } = prepared;
    expect(reportSchema.parse(report)).toEqual(report);
    expect(manifestSchema.parse(manifest)).toEqual(manifest);
    expect(prepared.manifestSha256).toBe(sha256(canonicalJson(manifest)));
    expect(report.manifestSha256).toBe(prepared.manifestSha256);
    expect(report.preparationKey).toBe(prepared.key);
    expect(manifest.artworkSha256).toBe(sha256(bytes));
    expect(files.map(({ name }) => name)).toEqual(
      ['png', 'tiff', 'bmp'].map((end) => `test-pass1-0.100mm-0deg-${prepared.key.slice(0, 8)}.${end}`),
    );
    files.forEach((file, i) => {
      expect(report.files[i]).toMatchObject({
        name: file.name,
        bytes: file.bytes.length,
        sha256: sha256(file.bytes),
      });
      expect(report.files[i]).toMatchObject({
        role: 'raster',
        widthPx: 120,
        heightPx: 80,
        widthMm: 12,
        heightMm: 8,
      });
    });
    expect(manifest.files).toEqual(report.files);
    expect(report.passes).toHaveLength(1);
    expect(report.passes[0]).toMatchObject({
      lines: 80,
      pixelsAlong: 120,
      scanFrame: null,
      doseJPerMm2: null,
    });
    expect(report.passes[0].meanBurn).toBeCloseTo(share(dots(prepared)), 9);
    expect(report.smallestSoundWidthMm).toBeNull();
    expect(Object.keys(prepared.pictures)).toEqual([...PASSAGE]);
    for (const name of PASSAGE) {
      const meta = await sharp(prepared.pictures[name]).metadata();
      expect([meta.format, meta.width, meta.height]).toEqual(['png', 960, 640]);
      expect(meta.width).toBeLessThanOrEqual(PASSAGE_MAX_PX);
    }
    expect(Object.keys(prepared.timings)).toEqual(
      expect.arrayContaining([
        'ingest',
        'measure',
        'preflight',
        'resample',
        'tone',
        'screen',
        'package',
        'forecast',
      ]),
    );
    expect(JSON.stringify(report)).not.toContain('timings');
  });

  test('of the same thing gives the same bytes and the same key; the key is known before', async () => {
    const bytes = await picture();
    const [first, second] = [await prepare(bytes), await prepare(bytes)];
    expect(second.files).toEqual(first.files);
    expect(second.pictures).toEqual(first.pictures);
    expect(second.manifestSha256).toBe(first.manifestSha256);
    const request = { artworkSha256: sha256(bytes), settings: settings(), artworkVersion: 1 };
    expect(preparationKey(request, { sha256 })).toBe(first.key);
    expect(preparationKey({ ...request, artworkVersion: 2 }, { sha256 })).not.toBe(first.key);
    expect(preparationKey({ ...request, settings: settings({ mirror: true }) }, { sha256 })).not.toBe(
      first.key,
    );
  });

  test('tells its stages in order, each from 0 to 1', async () => {
    const told: [string, number][] = [];
    await prepareArtwork(
      await picture(),
      { settings: settings(), artworkVersion: 1 },
      tools,
      (stage, progress) => told.push([stage, progress]),
    );
    const names = [...new Set(told.map(([stage]) => stage))];
    expect(names).toEqual([
      'ingest',
      'measure',
      'sound-width',
      'preflight',
      'mark',
      'trace',
      'package',
      'forecast',
    ]);
    for (const name of names) {
      const shares = told.filter(([stage]) => stage === name).map(([, progress]) => progress);
      expect(shares).toEqual([...shares].sort((a, b) => a - b));
      expect([shares[0], shares[shares.length - 1]]).toEqual([0, 1]);
    }
  });

  test('keeps the mean burn that tone asks for', async () => {
    const { report } = await prepare(await picture());
    const rows = dots(await prepare(await picture(), { screen: 'even-grain' }));
    expect(Math.abs(report.passes[0].meanBurn - share(rows))).toBeLessThan(0.005);
    expect(rows[3].slice(0, 20)).toBe('#'.repeat(20));
  });
});

describe('placement', () => {
  test('a mirrored file holds the same dots, each row reversed', async () => {
    const bytes = await picture();
    expect(dots(await prepare(bytes, { mirror: true }))).toEqual(reversed(dots(await prepare(bytes))));
  });

  test('quarter turns turn the artwork clockwise', async () => {
    const solid = { treatment: 'solid', widthMm: 8, heightMm: 12, quarterTurns: 1 } as const;
    const rows = dots(await prepare(await picture(), solid));
    expect([rows.length, rows[0].length]).toEqual([120, 80]);
    // The square that was top left is top right.
    expect(rows[5]).toMatch(/\.*#{30}$/);
    expect(rows[100]).not.toMatch(/#{30}$/);
  });

  test('at 90° the columns are the scan lines', async () => {
    const { report, files } = await prepare(await picture(), {
      scan: { directionDeg: 90, linePitchMm: 0.08, alongPitchMm: 0.05 },
    });
    expect(report.passes[0]).toMatchObject({
      lines: 150,
      pixelsAlong: 160,
      linePitchMm: 0.08,
      alongPitchMm: 0.05,
    });
    const view = new DataView(files[0].bytes.buffer, files[0].bytes.byteOffset);
    expect([view.getUint32(16), view.getUint32(20), view.getUint32(41), view.getUint32(45)]).toEqual([
      150, 160, 12_500, 20_000,
    ]);
  });

  test('at another angle the file lies in the scan frame, empty in its corners', async () => {
    const prepared = await prepare(DRAWING, {
      treatment: 'solid',
      scan: { directionDeg: 30, linePitchMm: 0.1, alongPitchMm: 0.1 },
    });
    const { scanFrame, lines, pixelsAlong } = prepared.report.passes[0];
    expect(scanFrame).toMatchObject({ angleDeg: 30, outline: expect.any(Array) });
    expect(lines).toBe(Math.round((12 * Math.sin(Math.PI / 6) + 8 * Math.cos(Math.PI / 6)) / 0.1));
    expect(pixelsAlong).toBe(Math.round((12 * Math.cos(Math.PI / 6) + 8 * Math.sin(Math.PI / 6)) / 0.1));
    const rows = dots(prepared);
    expect([rows.length, rows[0].length]).toEqual([lines, pixelsAlong]);
    // The same ink, whatever the frame: 12 mm² of rectangle and 3.2 mm² of line.
    expect(rows.join('').replaceAll('.', '').length * 0.01).toBeCloseTo(15.2, 1);
    // The middle of the rectangle, carried into the frame.
    const [dx, dy] = [3 - (scanFrame?.originXMm ?? 0), 2.5 - (scanFrame?.originYMm ?? 0)];
    const [u, v] = [
      dx * Math.cos(Math.PI / 6) + dy * Math.sin(Math.PI / 6),
      dy * Math.cos(Math.PI / 6) - dx * Math.sin(Math.PI / 6),
    ];
    expect(rows[Math.floor(v / 0.1)][Math.floor(u / 0.1)]).toBe('#');
    expect(rows[0][0]).toBe('.');
  });

  test('mirrored at an angle it is the mirrored artwork at that angle', async () => {
    const scan = { directionDeg: 30, linePitchMm: 0.1, alongPitchMm: 0.1 };
    const mirroredDrawing = new TextEncoder().encode(
      new TextDecoder()
        .decode(DRAWING)
        .replace('<rect', '<g transform="translate(12 0) scale(-1 1)"><rect')
        .replace('</svg>', '</g></svg>'),
    );
    const there = dots(await prepare(DRAWING, { treatment: 'solid', scan, mirror: true }));
    const here = dots(await prepare(mirroredDrawing, { treatment: 'solid', scan }));
    const differing = there
      .join('')
      .split('')
      .filter((cell, i) => cell !== here.join('')[i]).length;
    expect(differing / there.join('').length).toBeLessThan(0.01);
  });

  test('a perpendicular pass has files, lines and name of its own', async () => {
    const prepared = await prepare(await picture(), {
      perpendicular: { linePitchMm: 0.08, alongPitchMm: 0.1 },
      formats: ['png'],
    });
    expect(prepared.files.map(({ name }) => name.replace(/-[0-9a-f]{8}/, ''))).toEqual([
      'test-pass1-0.100mm-0deg.png',
      'test-pass2-0.080mm-90deg.png',
    ]);
    expect(prepared.report.passes[1]).toMatchObject({
      pass: 2,
      directionDeg: 90,
      lines: 150,
      pixelsAlong: 80,
    });
    expect(dots(prepared, 1)[0]).toHaveLength(150);
  });
});

describe('treatments', () => {
  test('solid parts a drawing in two at its true size', async () => {
    const rows = dots(await prepare(DRAWING, { treatment: 'solid' }));
    expect(rows[25].slice(0, 60)).toBe('.'.repeat(10) + '#'.repeat(40) + '.'.repeat(10));
    expect(rows.filter((row) => row[90] === '#')).toHaveLength(4);
  });

  test('linework gives SVG and PDF, and says how it was found', async () => {
    const { files, report } = await prepare(DRAWING, { treatment: 'linework' });
    expect(files.map(({ mediaType }) => mediaType)).toEqual(['image/svg+xml', 'application/pdf']);
    expect(report.files[0]).toMatchObject({ role: 'linework', widthPx: null, widthMm: 12, heightMm: 8 });
    expect(report.trace?.method).toBe('followed');
    expect(report.trace?.lengthMm).toBeGreaterThan(8 + 2 * (4 + 3) - 1);
    expect(report.totalDoseJPerMm2).toBeNull();
  });

  test('continuous tone gives 255·(1 − burn)', async () => {
    const { files, report } = await prepare(await picture(), { treatment: 'continuous', formats: ['png'] });
    const png = PNG.sync.read(Buffer.from(files[0].bytes));
    expect(files[0].bytes[24]).toBe(8);
    expect(png.data[0]).toBe(0);
    const code = 60 + (239 * 180) / 240;
    const light = ((code / 255 + 0.055) / 1.055) ** 2.4;
    expect(Math.abs(png.data[4 * (40 * 120 + 119)] - 255 * light)).toBeLessThan(4);
    expect(report.passes[0].meanBurn).toBeGreaterThan(0.5);
  });

  test('a stock that lightens burns the light parts and leaves what lies outside', async () => {
    const stock = {
      name: 'slate',
      direction: 'lightens',
      groundLstar: 30,
      markLstar: 70,
      groundColour: '#444444',
      markColour: '#bbbbbb',
    } as const;
    const prepared = await prepare(await picture(), {
      stock,
      scan: { directionDeg: 45, linePitchMm: 0.1, alongPitchMm: 0.1 },
    });
    const rows = dots(prepared);
    expect(rows[0][0]).toBe('.');
    const middle = rows[Math.floor(rows.length / 2)];
    expect(middle).toContain('#');
  });

  test('what is transparent is not engraved, whichever way the stock turns', async () => {
    const dark = {
      name: 'slate',
      direction: 'lightens',
      groundLstar: 30,
      markLstar: 70,
      groundColour: '#444444',
      markColour: '#bbbbbb',
    } as const;
    const rgba = Uint8Array.from({ length: 24 * 16 * 4 }, (_, i) =>
      i % 4 === 3 ? (Math.floor(i / 4) % 24 < 12 ? 255 : 0) : 255,
    );
    const half = await sharp(rgba, { raw: { width: 24, height: 16, channels: 4 } })
      .png()
      .toBuffer();
    const lightened = dots(await prepare(half, { stock: dark, formats: ['png'] }));
    expect(lightened[40].slice(0, 50)).toBe('#'.repeat(50));
    expect(lightened[40].slice(70)).toBe('.'.repeat(50));
    const drawn = dots(await prepare(DRAWING, { stock: dark, formats: ['png'] }));
    expect(share(drawn)).toBe(0);
    expect(share(dots(await prepare(half, { formats: ['png'] })))).toBe(0);
  });
});

describe('dose and time', () => {
  const machine: MachineRun = {
    name: 'Bench laser',
    bedWidthMm: 400,
    bedHeightMm: 300,
    accelerationMmPerS2: 3000,
    wattsAtFull: 10,
    powerCurve: [],
    scanning: 'two-way',
    maxSpeedMmPerS: 500,
  };
  const recipe = {
    powerPercent: 50,
    speedMmPerS: 100,
    perpendicular: { powerPercent: 100, speedMmPerS: 200 },
    focusOffsetMm: 0,
    typedBy: 'A. Designer',
  };

  test('are known where machine and recipe are', async () => {
    const { report } = await prepare(await picture(), {
      machine,
      recipe,
      formats: ['png'],
      perpendicular: { linePitchMm: 0.1, alongPitchMm: 0.1 },
    });
    expect(report.passes[0]).toMatchObject({ doseJPerMm2: 0.5, assumesLinearPower: true });
    expect(report.passes[0].runOffMm).toBeCloseTo(100 ** 2 / 6000, 9);
    expect(report.passes[0].scanSeconds).toBeCloseTo(
      80 * (0.12 + 200 / 3000) + 79 * 2 * Math.sqrt(0.1 / 3000),
      6,
    );
    expect(report.passes[1].doseJPerMm2).toBeCloseTo(0.5, 9);
    expect(report.totalDoseJPerMm2).toBeCloseTo(1, 9);
    expect(report.totalSeconds).toBeCloseTo(
      (report.passes[0].scanSeconds ?? 0) + (report.passes[1].scanSeconds ?? 0),
      9,
    );
  });

  test('are not known where one is missing', async () => {
    const { report } = await prepare(await picture(), { machine, formats: ['png'] });
    expect(report).toMatchObject({ totalDoseJPerMm2: null, totalSeconds: null });
  });
});

describe('a check', () => {
  const asked: CheckSettings = {
    widthMm: null,
    heightMm: null,
    quarterTurns: 0,
    spot,
    firing: 'swept',
    directionDeg: 0,
    linePitchMm: null,
    treatment: null,
    dividingLstar: 53.4,
    blank: null,
    machine: null,
  };

  test('of a drawing takes its own size and shows it', async () => {
    const { report, picture: shown, timings } = await checkArtwork(DRAWING, asked, tools);
    expect(checkReportSchema.parse(report)).toEqual(report);
    expect(report).toMatchObject({
      widthMm: 12,
      heightMm: 8,
      sizeAcrossMm: 0.11,
      artwork: { format: 'svg', sha256: sha256(DRAWING) },
    });
    expect(report.smallestSoundWidthMm).toBeGreaterThan(0);
    expect(report.findings.filter(({ severity }) => severity === 'blocker')).toEqual([]);
    const meta = await sharp(shown).metadata();
    expect([meta.width, meta.height]).toEqual([1600, 1067]);
    expect(Object.keys(timings)).toContain('measure');
  });

  test('of a picture without a size takes 100 mm, turned as it is placed', async () => {
    const { report, picture: shown } = await checkArtwork(
      await picture(),
      { ...asked, quarterTurns: 3 },
      tools,
    );
    expect(report).toMatchObject({ widthMm: 100, heightMm: 150 });
    const meta = await sharp(shown).metadata();
    expect([meta.width, meta.height]).toEqual([160, 240]);
    const { data } = await sharp(shown).toColourspace('b-w').raw().toBuffer({ resolveWithObject: true });
    // Turned back by a quarter, the square lies bottom left.
    expect(data[235 * 160 + 5]).toBeLessThan(20);
    expect(data[5 * 160 + 5]).toBeGreaterThan(100);
  });
});

describe('what cannot be prepared', () => {
  test('too many pixels for one pass', async () => {
    const tiny = {
      widthMm: 3000,
      heightMm: 3000,
      scan: { directionDeg: 0, linePitchMm: 0.01, alongPitchMm: 0.01 },
    };
    const error: unknown = await prepare(await picture(), tiny).catch((reason: unknown) => reason);
    expect(error).toBeInstanceOf(ArtworkError);
    expect(error).toMatchObject({ code: 'too-large', message: expect.stringContaining('wider pitch') });
  });

  test('no picture at all', async () => {
    await expect(prepare(new Uint8Array(0))).rejects.toMatchObject({ code: 'empty-file' });
  });
});
