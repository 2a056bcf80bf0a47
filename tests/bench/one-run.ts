import { readFileSync } from 'node:fs';
import path from 'node:path';
import { prepareArtwork } from '../../src/lib/prepare/pipeline';
import { settingsSchema } from '../../src/lib/prepare/settings';
import { nodeTools } from '../../src/rendering/node-tools';
import { BITMAPS, type BitmapName } from './inputs';

// One measured run in a process of its own: prints milliseconds and the peak of the process's memory as JSON.

const root = path.resolve(import.meta.dirname, '../..');
const tools = nodeTools({ root });

async function halftone(jpeg: string): Promise<Record<string, number>> {
  const settings = settingsSchema.parse({
    widthMm: 300,
    heightMm: 200,
    spot: { widthMm: 0.06, heightMm: 0.06 },
    treatment: 'halftone',
    scan: { directionDeg: 0, linePitchMm: 0.06, alongPitchMm: 0.06 },
    tone: {},
    formats: ['png'],
    label: 'bench',
  });
  const { timings } = await prepareArtwork(readFileSync(jpeg), { settings, artworkVersion: 1 }, tools);
  return timings;
}

const TRACE = { smallestIslandPx: 2, cornerThreshold: 1, curveTolerancePx: 0.2 };
const TINY = 16;

async function trace(name: BitmapName): Promise<Record<string, number>> {
  const { grey, width, height } = await BITMAPS[name]();
  // The first request starts the child; what is measured is the work alone, as with the other program.
  await tools.traceGrey(new Uint8Array(TINY * TINY).fill(255), TINY, TINY, TRACE);
  const began = performance.now();
  await tools.traceGrey(grey, width, height, TRACE);
  return { trace: performance.now() - began };
}

const [what, argument] = process.argv.slice(2);
const isBitmap = (name: string): name is BitmapName => Object.hasOwn(BITMAPS, name);
if (what !== 'halftone' && !isBitmap(argument)) throw new Error(`expected a bitmap, got ${argument}`);
const timings = what === 'halftone' ? await halftone(argument) : await trace(argument as BitmapName);
console.log(JSON.stringify({ timings, peakMb: process.resourceUsage().maxRSS / 1024 }));
