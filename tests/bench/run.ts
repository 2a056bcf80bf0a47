import { spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { availableParallelism, tmpdir } from 'node:os';
import path from 'node:path';
import { README, replaceBetween } from '../reference/list-checks';
import { asPbm, BITMAPS, photograph, type BitmapName } from './inputs';
import { median } from './median';
import { magickSeconds, pillowSeconds, potraceSeconds, vipsSeconds } from './outside';

export const BEGIN = '<!-- bench: written by npm run bench -- --write -->';
export const END = '<!-- end of bench -->';
const ROUNDS = 5;
/** Stages that take less are not worth a row, s. */
const SHOWN_S = 0.005;
const TO_FILE = ['ingest', 'resample', 'tone', 'screen', 'package'];
const PREFLIGHT = ['measure', 'preflight', 'sound-width'];
const BITMAP_NAMES = Object.keys(BITMAPS) as BitmapName[];

interface Run {
  timings: Record<string, number>;
  peakMb: number;
}

/** One of our runs in a fresh process, so that its peak of memory is its own. */
function ours(what: string, argument: string): Run {
  const script = path.join(import.meta.dirname, 'one-run.ts');
  const outcome = spawnSync(process.execPath, ['--import', 'tsx', script, what, argument], {
    encoding: 'utf8',
  });
  if (outcome.status !== 0) throw new Error(outcome.stderr);
  return JSON.parse(outcome.stdout) as Run;
}

const sumOf = ({ timings }: Run, stages: readonly string[]): number =>
  stages.reduce((sum, stage) => sum + (timings[stage] ?? 0), 0) / 1000;

/** Every contestant once in each round, so that a busy spell of the machine falls on all of them. */
function rounds<Name extends string>(contestants: Record<Name, () => number>): Record<Name, number> {
  const names = Object.keys(contestants) as Name[];
  const all = new Map(names.map((name) => [name, [] as number[]]));
  for (let round = 0; round < ROUNDS; round++)
    for (const name of names) all.get(name)?.push(contestants[name]());
  return Object.fromEntries(names.map((name) => [name, median(all.get(name) ?? [])])) as Record<Name, number>;
}

const seconds = (value: number): string => `${value.toFixed(value < 0.1 ? 3 : 2)} s`;
const times = (value: number, of: number): string => `${(value / of).toFixed(1)} ×`;
const row = (...cells: string[]): string => `| ${cells.join(' | ')} |`;

function halftoneRows(jpeg: string, folder: string): string[] {
  const runs: Run[] = [];
  const outside = rounds({
    ours: () => sumOf(runs[runs.push(ours('halftone', jpeg)) - 1], TO_FILE),
    pillow: () => pillowSeconds(jpeg, folder),
    magick: () => magickSeconds(jpeg, folder),
    vips: () => vipsSeconds(jpeg, folder),
  });
  const peak = Math.round(median(runs.map((run) => run.peakMb)));
  const stage = (name: string): string => seconds(median(runs.map((run) => sumOf(run, [name]))));
  const withPreflight = median(runs.map((run) => sumOf(run, [...TO_FILE, ...PREFLIGHT])));
  const all = Object.keys(runs[0].timings).filter(
    (name) => median(runs.map((run) => sumOf(run, [name]))) >= SHOWN_S,
  );
  return [
    ...all.map((name) => row(`Umberline, ${name} alone`, stage(name), '', '')),
    row(
      'Umberline, halftone to file',
      seconds(outside.ours),
      times(outside.ours, outside.pillow),
      'at most 1.5 ×',
    ),
    row(
      'Umberline, with preflight',
      seconds(withPreflight),
      times(withPreflight, outside.pillow),
      'at most 4 ×',
    ),
    row('Umberline, peak memory of the whole run', `${peak} MB`, '', 'at most 400 MB'),
    row('Pillow: resize, Floyd–Steinberg, 1-bit PNG', seconds(outside.pillow), '1', ''),
    row('ImageMagick, the same', seconds(outside.magick), times(outside.magick, outside.pillow), ''),
    row(
      'libvips, the same by its palette writer',
      seconds(outside.vips),
      times(outside.vips, outside.pillow),
      '',
    ),
  ];
}

async function traceRows(name: BitmapName, folder: string, limit: number): Promise<string[]> {
  const pbm = path.join(folder, `${name.replaceAll(' ', '-')}.pbm`);
  const bitmap = await BITMAPS[name]();
  writeFileSync(pbm, asPbm(bitmap));
  const found = rounds({
    ours: () => sumOf(ours('trace', name), ['trace']),
    potrace: () => potraceSeconds(pbm, folder),
  });
  const what = `${name}, ${bitmap.width} × ${bitmap.height}`;
  return [
    row(
      `Umberline, tracing: ${what}`,
      seconds(found.ours),
      times(found.ours, found.potrace),
      `at most ${limit} ×`,
    ),
    row(`potrace 1.16: ${what}`, seconds(found.potrace), '1', ''),
  ];
}

/** The whole table, with the day and the machine above it. */
async function bench(): Promise<string> {
  const folder = mkdtempSync(path.join(tmpdir(), 'umberline-bench-'));
  try {
    const jpeg = path.join(folder, 'photograph.jpg');
    writeFileSync(jpeg, await photograph());
    const limits: Record<BitmapName, number> = { 'large smooth shape': 18, 'text page': 6 };
    const traced: string[] = [];
    const toned = halftoneRows(jpeg, folder);
    for (const name of BITMAP_NAMES) traced.push(...(await traceRows(name, folder, limits[name])));
    const day = new Date().toISOString().slice(0, 10);
    return [
      `Medians of five, process start not counted; ${day}, ${availableParallelism()} cores, Node ${process.versions.node}. A photograph of 2400 × 1600 pixels to 300 × 200 mm at 0.06 mm (5000 × 3333 pixels), and two bitmaps.`,
      '',
      row('what', 'time', 'beside', 'aim'),
      row('---', '---', '---', '---'),
      ...toned,
      ...traced,
    ].join('\n');
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

const table = await bench();
console.log(table);
if (process.argv.includes('--write'))
  writeFileSync(README, replaceBetween(readFileSync(README, 'utf8'), BEGIN, END, table));
