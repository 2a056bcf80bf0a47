// Prepares one small picture many times and prints the memory in MB after every five; started by soak.test.ts.
import sharp from 'sharp';
import { prepareArtwork } from '../../src/lib/prepare/pipeline';
import { scanFor, settingsSchema } from '../../src/lib/prepare/settings';
import { nodeTools } from '../../src/rendering/node-tools';

const [width, height, times] = [600, 400, 30];
const grey = Buffer.alloc(width * height, 0).map((_, i) => ((i % width) * 255) / width);
const picture = await sharp(grey, { raw: { width, height, channels: 1 } })
  .png()
  .toBuffer();
const spot = { widthMm: 0.1, heightMm: 0.1, shape: 'ellipse' } as const;
const settings = settingsSchema.parse({
  widthMm: 60,
  heightMm: 40,
  spot,
  treatment: 'halftone',
  scan: scanFor(spot, 0),
  tone: {},
  label: 'soak',
});
const tools = nodeTools();
const memory: number[] = [];
for (let n = 1; n <= times; n++) {
  await prepareArtwork(picture, { settings, artworkVersion: n }, tools);
  if (n % 5 === 0) memory.push(Math.round(process.memoryUsage().rss / 2 ** 20));
}
console.log(JSON.stringify(memory));
