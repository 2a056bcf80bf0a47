import { createHash } from 'node:crypto';
import sharp, { type Sharp } from 'sharp';
import { describe, expect, test } from 'vitest';
import type { RasterArtwork } from '../../../src/lib/prepare/artwork';
import { ingest } from '../../../src/lib/prepare/ingest/ingest';
import { ArtworkError } from '../../../src/lib/prepare/tools';
import { bmp } from './draw-bmp';

const tools = { sha256: (bytes: Uint8Array | string) => createHash('sha256').update(bytes).digest('hex') };

async function read(bytes: Uint8Array): Promise<RasterArtwork> {
  const artwork = await ingest(bytes, tools);
  if (artwork.kind !== 'raster') throw new Error('expected a raster');
  return artwork;
}

async function trouble(bytes: Uint8Array): Promise<ArtworkError> {
  const error: unknown = await ingest(bytes, tools).then(
    () => null,
    (reason: unknown) => reason,
  );
  expect(error).toBeInstanceOf(ArtworkError);
  return error as ArtworkError;
}

const linear = (code: number): number => {
  const c = code / 255;
  return c <= 0.04045 ? c / 12.92 : ((c + 0.055) / 1.055) ** 2.4;
};
const luminance = (r: number, g: number, b: number): number =>
  65_535 * (0.2126 * linear(r) + 0.7152 * linear(g) + 0.0722 * linear(b));

/** Four pixels: red, mid grey over black, white. */
const RGB = Uint8Array.of(200, 10, 30, 128, 128, 128, 0, 0, 0, 255, 255, 255);
const picture = (): Sharp => sharp(RGB, { raw: { width: 2, height: 2, channels: 3 } });
const WANTED = [luminance(200, 10, 30), luminance(128, 128, 128), 0, 65_535];

const LOSSLESS = { png: {}, webp: { lossless: true }, tiff: { compression: 'lzw' }, gif: {} } as const;

/** A smooth picture that survives lossy coding. */
const smooth = (): Sharp =>
  sharp(
    Uint8Array.from({ length: 64 * 48 * 3 }, (_, i) => 40 + (Math.floor(i / 3) % 64) * 3),
    {
      raw: { width: 64, height: 48, channels: 3 },
    },
  );

describe('kinds of picture', () => {
  test.each(['png', 'webp', 'tiff', 'gif'] as const)('%s without loss keeps every pixel', async (format) => {
    const bytes = await picture().toFormat(format, LOSSLESS[format]).toBuffer();
    const artwork = await read(bytes);
    expect(artwork.facts).toMatchObject({
      format,
      kind: 'raster',
      widthPx: 2,
      heightPx: 2,
      bytes: bytes.length,
    });
    expect(artwork.facts.sha256).toBe(tools.sha256(bytes));
    WANTED.forEach((wanted, i) => expect(Math.abs(artwork.luminance[i] - wanted)).toBeLessThanOrEqual(1));
  });

  test.each(['jpeg', 'webp', 'avif'] as const)('%s with loss comes close', async (format) => {
    const artwork = await read(await smooth().toFormat(format, { quality: 90 }).toBuffer());
    expect([artwork.widthPx, artwork.heightPx]).toEqual([64, 48]);
    for (const column of [0, 20, 63]) {
      const code = 40 + column * 3;
      expect(Math.abs(artwork.luminance[24 * 64 + column] - luminance(code, code, code))).toBeLessThan(2500);
    }
  });

  test('a palette PNG, and one of two greys', async () => {
    const palette = await read(await picture().png({ palette: true, colours: 4, dither: 0 }).toBuffer());
    expect(palette.luminance[3]).toBe(65_535);
    const two = await read(
      await sharp(Uint8Array.of(0, 255, 255, 0), { raw: { width: 2, height: 2, channels: 1 } })
        .png({ palette: true, colours: 2 })
        .toBuffer(),
    );
    expect([...two.luminance]).toEqual([0, 65_535, 65_535, 0]);
  });

  test('16 bits a channel keep their steps', async () => {
    const codes = Uint16Array.from({ length: 9 }, (_, i) => 30_000 + Math.floor(i / 3));
    const bytes = await sharp(codes, { raw: { width: 3, height: 1, channels: 3 } })
      .toColourspace('rgb16')
      .png()
      .toBuffer();
    const { luminance: samples } = await read(bytes);
    expect(samples[0]).toBeLessThan(samples[2]);
    expect(Math.abs(samples[0] - 65_535 * linear((30_000 / 65_535) * 255))).toBeLessThanOrEqual(1);
  });

  test('16-bit grey', async () => {
    const bytes = await sharp(Uint16Array.of(0, 32_768, 65_535), {
      raw: { width: 3, height: 1, channels: 1 },
    })
      .toColourspace('grey16')
      .png()
      .toBuffer();
    const { luminance: samples } = await read(bytes);
    expect(samples[0]).toBe(0);
    expect(Math.abs(samples[1] - 65_535 * linear((32_768 / 65_535) * 255))).toBeLessThanOrEqual(1);
    expect(samples[2]).toBe(65_535);
  });

  test('CMYK is converted, and that is said', async () => {
    const bytes = await sharp({ create: { width: 8, height: 8, channels: 3, background: '#ffffff' } })
      .toColourspace('cmyk')
      .jpeg()
      .toBuffer();
    expect((await sharp(bytes).metadata()).space).toBe('cmyk');
    const artwork = await read(bytes);
    expect(artwork.luminance[0]).toBeGreaterThan(62_000);
    expect(artwork.facts.remarks.join(' ')).toMatch(/CMYK/);
  });

  test('a colour profile is converted to sRGB, and that is said', async () => {
    const bytes = await picture().withIccProfile('p3').png().toBuffer();
    const artwork = await read(bytes);
    WANTED.forEach((wanted, i) => expect(Math.abs(artwork.luminance[i] - wanted)).toBeLessThan(900));
    expect(artwork.facts.remarks.join(' ')).toMatch(/profile/i);
  });
});

describe('transparency', () => {
  const rgba = (...pixels: number[]): Promise<Buffer> =>
    sharp(Uint8Array.from(pixels), { raw: { width: pixels.length / 4, height: 1, channels: 4 } })
      .png()
      .toBuffer();

  test('is not engraved: white, whatever colour lies under it', async () => {
    const artwork = await read(await rgba(0, 0, 0, 0, 255, 0, 0, 0, 0, 0, 0, 255));
    expect([...artwork.luminance]).toEqual([65_535, 65_535, 0]);
    expect(artwork.facts.remarks.join(' ')).toMatch(/not engraved/);
  });

  test('half of it is blended in code values', async () => {
    const { luminance: samples } = await read(await rgba(0, 0, 0, 128));
    expect(Math.abs(samples[0] - luminance(127, 127, 127))).toBeLessThanOrEqual(2);
  });

  test('with grey', async () => {
    const bytes = await sharp(Uint8Array.of(0, 0, 0, 255, 90, 128), {
      raw: { width: 3, height: 1, channels: 2 },
    })
      .png()
      .toBuffer();
    const { luminance: samples } = await read(bytes);
    expect([samples[0], samples[1]]).toEqual([65_535, 0]);
    const code = 255 + ((90 - 255) * 128) / 255;
    expect(Math.abs(samples[2] - luminance(code, code, code))).toBeLessThanOrEqual(2);
  });
});

describe('orientation', () => {
  test.each([1, 2, 3, 4, 5, 6, 7, 8])('EXIF %i is applied', async (orientation) => {
    // Top left pixel black, the rest white: where it lies afterwards tells the orientation.
    const raw = new Uint8Array(3 * 2 * 3).fill(255).fill(0, 0, 3);
    const bytes = await sharp(raw, { raw: { width: 3, height: 2, channels: 3 } })
      .withMetadata({ orientation })
      .tiff()
      .toBuffer();
    const { widthPx, heightPx, luminance: samples } = await read(bytes);
    const swapped = orientation >= 5;
    expect([widthPx, heightPx]).toEqual(swapped ? [2, 3] : [3, 2]);
    const [row, column] = [
      [0, 0],
      [0, 2],
      [1, 2],
      [1, 0],
      [0, 0],
      [0, 1],
      [2, 1],
      [2, 0],
    ][orientation - 1];
    expect(samples.indexOf(0)).toBe(row * widthPx + column);
  });
});

describe('several pictures in a file', () => {
  const frames = (): Sharp =>
    sharp(new Uint8Array(4 * 8 * 3).fill(200, 48), {
      raw: { width: 4, height: 8, channels: 3, pageHeight: 4 },
    });

  test.each(['gif', 'webp'] as const)(
    'an animated %s gives its first frame, and that is said',
    async (format) => {
      const bytes = await frames()
        .toFormat(format, format === 'webp' ? { lossless: true } : {})
        .toBuffer();
      expect((await sharp(bytes).metadata()).pages).toBe(2);
      const artwork = await read(bytes);
      expect([artwork.widthPx, artwork.heightPx]).toEqual([4, 4]);
      expect(artwork.luminance[0]).toBe(0);
      expect(artwork.facts.remarks.join(' ')).toMatch(/First frame/);
    },
  );
});

describe('own size', () => {
  test.each([
    ['png', 300],
    ['jpeg', 254],
    ['tiff', 508],
  ] as const)('%s at %i to the inch', async (format, ppi) => {
    const bytes = await smooth().withMetadata({ density: ppi }).toFormat(format).toBuffer();
    const { facts } = await read(bytes);
    expect(facts.ownWidthMm).toBeCloseTo((64 / ppi) * 25.4, 2);
    expect(facts.ownHeightMm).toBeCloseTo((48 / ppi) * 25.4, 2);
  });

  test('a turned photograph has its sides exchanged', async () => {
    const bytes = await smooth().withMetadata({ density: 254, orientation: 6 }).jpeg().toBuffer();
    const { facts } = await read(bytes);
    expect([facts.widthPx, facts.heightPx]).toEqual([48, 64]);
    expect(facts.ownWidthMm).toBeCloseTo(4.8, 3);
  });

  test.each([72, 96])('%i to the inch is a placeholder and no size', async (ppi) => {
    const { facts } = await read(await smooth().withMetadata({ density: ppi }).png().toBuffer());
    expect(facts.ownWidthMm).toBeNull();
  });

  test('none is stated', async () =>
    expect((await read(await smooth().webp().toBuffer())).facts.ownWidthMm).toBeNull());
});

describe('BMP', () => {
  test.each([1, 8, 24, 32] as const)('of %i bits, odd width, bottom up', async (bits) => {
    const rows = ['#..#.', '.#.##', '#####'];
    const artwork = await read(bmp(rows, bits, 20_000));
    expect([artwork.widthPx, artwork.heightPx]).toEqual([5, 3]);
    expect([...artwork.luminance].map((y) => (y === 0 ? '#' : '.')).join('')).toBe(rows.join(''));
    expect(artwork.facts).toMatchObject({ format: 'bmp', ownWidthMm: 0.25 });
  });

  test('cut short', async () =>
    expect((await trouble(bmp(['#..#.'], 24, 0).subarray(0, 60))).code).toBe('truncated'));

  test('compressed', async () => {
    const file = bmp(['#..#.'], 8, 0);
    new DataView(file.buffer).setUint32(30, 1, true);
    expect((await trouble(file)).code).toBe('unsupported-format');
  });

  test('with a header that promises too much', async () => {
    const file = bmp(['#'], 24, 0);
    new DataView(file.buffer).setInt32(18, 1_000_000, true);
    expect((await trouble(file)).code).toMatch(/truncated|too-large/);
  });
});

describe('trouble', () => {
  test('no bytes at all', async () => expect((await trouble(new Uint8Array(0))).code).toBe('empty-file'));

  test('more than the cap on bytes', async () => {
    const error = await trouble(new Uint8Array(64 * 1024 * 1024 + 1));
    expect(error.code).toBe('too-large');
    expect(error.message).toMatch(/64 MiB/);
  });

  test('more pixels than the cap, told from the header in no time', async () => {
    const bytes = await sharp({
      create: { width: 10_000, height: 5001, channels: 3, background: '#fff' },
      limitInputPixels: false,
    })
      .png({ compressionLevel: 9 })
      .toBuffer();
    const since = performance.now();
    const error = await trouble(bytes);
    expect(error.code).toBe('too-large');
    expect(error.message).toMatch(/10000 × 5001/);
    expect(performance.now() - since).toBeLessThan(2000);
  });

  test('AVIF, whose decoder takes more memory, has a lower cap', async () => {
    const large = sharp({ create: { width: 5000, height: 4001, channels: 3, background: '#888' } });
    const error = await trouble(await large.avif({ effort: 0 }).toBuffer());
    expect(error.code).toBe('too-large');
    expect(error.message).toMatch(/20.0 million of AVIF/);
  });

  test('1 × 50,000 and 1 × 1 are fine', async () => {
    const tall = await read(
      await sharp({ create: { width: 1, height: 50_000, channels: 3, background: '#000' } })
        .png()
        .toBuffer(),
    );
    expect([tall.widthPx, tall.heightPx, tall.luminance[49_999]]).toEqual([1, 50_000, 0]);
    const dot = await read(
      await sharp({ create: { width: 1, height: 1, channels: 3, background: '#fff' } })
        .png()
        .toBuffer(),
    );
    expect([...dot.luminance]).toEqual([65_535]);
  });

  const noisy = (): Sharp =>
    sharp({
      create: {
        width: 200,
        height: 150,
        channels: 3,
        background: '#888',
        noise: { type: 'gaussian', mean: 128, sigma: 40 },
      },
    });
  test.each(['png', 'jpeg', 'webp', 'tiff', 'gif', 'avif'] as const)(
    '%s cut short never gives half a picture',
    async (format) => {
      const bytes = await noisy().toFormat(format).toBuffer();
      for (const share of [0.05, 0.5, 0.97]) {
        const error = await trouble(bytes.subarray(0, Math.floor(bytes.length * share)));
        expect(['truncated', 'unreadable']).toContain(error.code);
        expect(error.message).toMatch(/Export it again|export it again/);
        expect(error.message).not.toMatch(/vips|Vips|buffer/);
      }
    },
  );

  test('a picture with a wrong name is read for what it is; text that claims to be one is not', async () => {
    const png = await picture().png().toBuffer();
    expect((await read(png)).facts.format).toBe('png');
    expect((await trouble(new TextEncoder().encode('this is not a picture'))).code).toBe(
      'unsupported-format',
    );
  });

  test('a picture whose first bytes alone are right', async () => {
    const fake = new Uint8Array(400).fill(7);
    fake.set([0xff, 0xd8, 0xff, 0xe0]);
    expect(['truncated', 'unreadable']).toContain((await trouble(fake)).code);
  });
});
