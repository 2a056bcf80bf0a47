import { expect } from 'vitest';
import { bayerRanks } from '../../src/lib/prepare/screen/bayer';
import { diffuse } from '../../src/lib/prepare/screen/diffuse';
import { evenGrainRanks } from '../../src/lib/prepare/screen/even-grain';
import { FLOYD_STEINBERG, JARVIS_JUDICE_NINKE, STUCKI } from '../../src/lib/prepare/screen/kernels';
import { screenWhole, type Screener } from '../../src/lib/prepare/screen/screener';
import { compareWith } from '../../src/lib/prepare/screen/threshold-matrix';
import { referenceCheck } from './check';
import { readTable } from './read-table';
import { spectrumOf } from './spectrum';

const SIDE = 256;
const rows = readTable('halftone_flat_metrics.csv');
const greysOf = (method: string): { grey: number; meanError: number; low: number }[] =>
  rows
    .filter((row) => row.method === method)
    .map((row) => ({
      grey: Number(row.grey),
      meanError: Number(row.mean_error),
      low: Number(row.energy_fraction_below_half_fg),
    }));

const flat = (screener: Screener, burn: number): Uint8Array =>
  screenWhole(screener, new Float64Array(SIDE * SIDE).fill(burn));
const mean = (dots: Uint8Array): number => dots.reduce((sum, dot) => sum + dot, 0) / dots.length;

const DIFFUSIONS = [
  ['floyd-steinberg/serp', FLOYD_STEINBERG],
  ['jarvis-judice-ninke/serp', JARVIS_JUDICE_NINKE],
  ['stucki/serp', STUCKI],
] as const;

referenceCheck(
  {
    what: 'mean error of flats under Floyd–Steinberg, Jarvis–Judice–Ninke and Stucki, serpentine',
    basis: 'computed',
    source: 'halftone_flat_metrics.csv: an independent program on 256 × 256 flats',
    within: '1e-6, and 0.004 throughout',
  },
  () => {
    for (const [name, kernel] of DIFFUSIONS) {
      expect(greysOf(name).length, name).toBeGreaterThan(3);
      for (const { grey, meanError } of greysOf(name)) {
        const found = mean(flat(diffuse(kernel, SIDE), grey)) - grey;
        expect(Math.abs(found - meanError), `${name} at ${grey}`).toBeLessThan(1.1e-6);
        expect(Math.abs(found)).toBeLessThan(0.004);
      }
    }
  },
);

referenceCheck(
  {
    what: 'even grain has no coarse grain: share of energy below half the principal frequency, at five greys',
    basis: 'computed',
    source:
      'halftone_flat_metrics.csv, rows void-cluster32; Ulichney, SPIE 1913, 1993; white noise has 10 % at 1/8',
    within: 'at most the table’s value + 0.02',
  },
  () => {
    const table = greysOf('void-cluster32');
    expect(table).toHaveLength(5);
    for (const { grey, low } of table) {
      const dots = flat(compareWith(evenGrainRanks(128), SIDE), grey);
      expect(Math.abs(mean(dots) - grey)).toBeLessThan(0.5 / 128 ** 2 + 1e-9);
      expect(spectrumOf(dots, SIDE, grey).shareBelowHalf, `at ${grey}`).toBeLessThan(low + 0.02);
    }
  },
);

referenceCheck(
  {
    what: 'Bayer’s squares of 2, 4, 8 and 16',
    basis: 'computed',
    source: 'bayer_matrices.json: the recursion of Bayer, IEEE ICC 1973, in an independent program',
    within: 'exact',
  },
  async () => {
    const { default: tables } = await import('./data/bayer_matrices.json');
    for (const size of [2, 4, 8, 16] as const) {
      expect([...bayerRanks(size).ranks]).toEqual(tables[`${size}`].flat());
    }
  },
);

referenceCheck(
  {
    what: 'mean of flats under Bayer’s square of 16',
    basis: 'computed',
    source: 'ranks are a permutation: burn b burns round(256 b) of 256',
    within: '0.004',
  },
  () => {
    for (const burn of [0.03125, 0.125, 0.25, 0.4, 0.5, 0.77]) {
      expect(Math.abs(mean(flat(compareWith(bayerRanks(16), SIDE), burn)) - burn)).toBeLessThan(0.004);
    }
  },
);
