import { readFileSync } from 'node:fs';
import path from 'node:path';
import { expect } from 'vitest';
import { diffuse } from '../../src/lib/prepare/screen/diffuse';
import {
  FLOYD_STEINBERG,
  JARVIS_JUDICE_NINKE,
  STUCKI,
  type Kernel,
} from '../../src/lib/prepare/screen/kernels';
import { screenWhole } from '../../src/lib/prepare/screen/screener';
import { referenceCheck } from './check';

interface GoldenCase {
  kernel: string;
  serpentine: boolean;
  input: string;
  rows: string[];
}

const GOLDEN: GoldenCase[] = JSON.parse(
  readFileSync(path.join(import.meta.dirname, 'data', 'error_diffusion_golden.json'), 'utf8'),
);

/** The inputs that the table names: a ramp of 16 columns, x ÷ 15, or a flat square of 16. */
function inputOf(name: string): { width: number; burn: Float64Array } {
  if (name === 'ramp16x8 v=x/15')
    return { width: 16, burn: Float64Array.from({ length: 128 }, (_, i) => (i % 16) / 15) };
  const flat = /^flat16x16 v=([\d.]+)$/.exec(name);
  if (!flat) throw new Error(`unknown input ${name}`);
  return { width: 16, burn: new Float64Array(256).fill(Number(flat[1])) };
}

function dotsOf(kernel: Kernel, { serpentine, input }: GoldenCase): string[] {
  const { width, burn } = inputOf(input);
  const screener = diffuse(kernel, width, serpentine ? 'serpentine' : 'left-to-right');
  const dots = [...screenWhole(screener, burn)];
  return Array.from({ length: dots.length / width }, (_, row) =>
    dots.slice(row * width, (row + 1) * width).join(''),
  );
}

const casesOf = (kernel: string): GoldenCase[] => GOLDEN.filter((golden) => golden.kernel === kernel);

referenceCheck(
  {
    what: 'Floyd–Steinberg dots, ramp and three flats, serpentine and left to right',
    basis: 'computed',
    source:
      'error_diffusion_golden.json: an independent double-precision program; weights of Proc. SID 17(2), 1976',
    within: 'exact',
  },
  () => {
    expect(casesOf('floyd-steinberg')).toHaveLength(8);
    for (const golden of casesOf('floyd-steinberg'))
      expect(dotsOf(FLOYD_STEINBERG, golden)).toEqual(golden.rows);
  },
);

referenceCheck(
  {
    what: 'Jarvis–Judice–Ninke dots, ramp and three flats, serpentine and left to right',
    basis: 'computed',
    source:
      'error_diffusion_golden.json: an independent double-precision program; weights of CGIP 5(1), 1976',
    within: 'exact',
  },
  () => {
    expect(casesOf('jarvis-judice-ninke')).toHaveLength(8);
    for (const golden of casesOf('jarvis-judice-ninke')) {
      expect(dotsOf(JARVIS_JUDICE_NINKE, golden)).toEqual(golden.rows);
    }
  },
);

referenceCheck(
  {
    what: 'Stucki dots, ramp and three flats, serpentine and left to right',
    basis: 'computed',
    source:
      'error_diffusion_golden.json: an independent double-precision program; weights of IBM RZ1060, 1981',
    within: 'exact',
  },
  () => {
    expect(casesOf('stucki')).toHaveLength(8);
    for (const golden of casesOf('stucki')) expect(dotsOf(STUCKI, golden)).toEqual(golden.rows);
  },
);
