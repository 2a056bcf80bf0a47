// Makes the front page's plate by our own pipeline: node --import tsx src/tooling/make-front-picture.ts
import { mkdirSync, writeFileSync } from 'node:fs';
import sharp from 'sharp';
import { checkArtwork, prepareArtwork } from '../lib/prepare/pipeline';
import { scanFor, settingsSchema } from '../lib/prepare/settings';
import { nodeTools } from '../rendering/node-tools';
import { drawFern } from './draw-fern';

const WIDTH_MM = 120;
const spot = { widthMm: 0.07, heightMm: 0.11, shape: 'ellipse' } as const;
const stock = {
  name: 'Birch plywood 4 mm',
  direction: 'darkens',
  groundLstar: 82.7,
  markLstar: 27.9,
  groundColour: '#e3cba3',
  markColour: '#5a3b22',
} as const;

const tools = nodeTools();
const bytes = Buffer.from(drawFern());
const { report } = await checkArtwork(
  bytes,
  {
    widthMm: WIDTH_MM,
    heightMm: null,
    quarterTurns: 0,
    spot,
    firing: 'swept',
    directionDeg: 0,
    linePitchMm: null,
    treatment: 'solid',
    dividingLstar: 53.4,
    blank: null,
    machine: null,
  },
  tools,
);
const heightMm = Number(report.heightMm.toFixed(2));
const settings = settingsSchema.parse({
  widthMm: WIDTH_MM,
  heightMm,
  spot,
  treatment: 'solid',
  scan: scanFor(spot, 0),
  tone: {},
  stock,
  label: 'fern',
});
const { pictures } = await prepareArtwork(bytes, { settings, artworkVersion: 1 }, tools);

mkdirSync('public/front', { recursive: true });
await sharp(pictures.burned)
  .resize({ width: 2000, withoutEnlargement: true })
  .webp({ quality: 80 })
  .toFile('public/front/fern-burned.webp');
const plate = {
  widthMm: WIDTH_MM,
  heightMm,
  linePitchMm: settings.scan.linePitchMm,
  smallestSoundWidthMm: report.smallestSoundWidthMm,
  findings: report.findings.map((finding) => ({ ...finding, places: finding.places.slice(0, 12) })),
};
writeFileSync('src/components/front/fern-plate.json', `${JSON.stringify(plate, null, 1)}\n`);
console.log(
  report.findings.map(({ id, severity, count }) => `${severity} ${id} ${count}`).join(', '),
  report.smallestSoundWidthMm,
);
