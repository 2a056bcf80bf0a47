import { expect } from 'vitest';
import type { MaskRaster } from '../../src/lib/imaging/raster';
import type { Firing, Spot } from '../../src/lib/machines/spot';
import { coverByTable } from '../../src/lib/prepare/forecast/cover-by-table';
import { coverTable } from '../../src/lib/prepare/forecast/cover-table';
import { firedSpot } from '../../src/lib/prepare/forecast/fired-spot';
import { bayerRanks } from '../../src/lib/prepare/screen/bayer';
import { referenceCheck } from './check';
import { readTable } from './read-table';

const PITCH = 0.1;
const TILE = 8;
const TILES = 4;
const SIDE = TILE * TILES;

/** An 8 × 8 pattern laid side by side, so that its middle has no border. */
function tiled(isBurned: (x: number, y: number) => boolean): MaskRaster {
  const data = Uint8Array.from({ length: SIDE * SIDE }, (_, i) =>
    isBurned(i % TILE, Math.floor(i / SIDE) % TILE) ? 1 : 0,
  );
  return { kind: 'mask', width: SIDE, height: SIDE, data, pitchXMm: PITCH, pitchYMm: PITCH };
}

/** Share of the middle of a pattern that round spots mark. */
function covered(mask: MaskRaster, spotMm: number, firing: Firing): number {
  const spot: Spot = { widthMm: spotMm, heightMm: spotMm, shape: 'ellipse' };
  const fired = firedSpot(spot, { firing, xMm: PITCH, yMm: 0, fileAngleDeg: 0 });
  let row = 0;
  let sum = 0;
  coverByTable(mask, coverTable(fired, PITCH, PITCH, 1), (shares) => {
    if (row >= TILE && row < SIDE - TILE) for (let x = TILE; x < SIDE - TILE; x++) sum += shares[x];
    row++;
  });
  return sum / 65_535 / (SIDE - 2 * TILE) ** 2;
}

const bayer = bayerRanks(TILE).ranks;
const bayerTone = (of64: number): MaskRaster => tiled((x, y) => bayer[y * TILE + x] < of64);
const PATTERNS: Readonly<Record<string, MaskRaster>> = {
  'single dot in 8x8': tiled((x, y) => x === 0 && y === 0),
  checkerboard: tiled((x, y) => (x + y) % 2 === 0),
  '1-on 1-off rows': tiled((_, y) => y % 2 === 0),
};

referenceCheck(
  {
    what: 'forecast, pulsed: area that round spots cover on dots, rows, checkerboard and Bayer tones, six ratios of spot to pitch',
    basis: 'computed',
    source:
      'pappas_neuhoff_patterns.csv: α, β, γ of Pappas & Neuhoff’s hard circular dots, pitch ÷ spot 0.5 to 0.707',
    within: '0.004',
  },
  () => {
    let compared = 0;
    for (const row of readTable('pappas_neuhoff_patterns.csv')) {
      const of64 = /^bayer8 (\d+)\/64$/.exec(row.pattern);
      const mask = of64 ? bayerTone(Number(of64[1])) : PATTERNS[row.pattern];
      if (!mask) continue;
      const found = covered(mask, Number(row.rho) * Math.SQRT2 * PITCH, 'pulsed');
      expect(Math.abs(found - Number(row.covered_fraction)), `${row.pattern} at ${row.rho}`).toBeLessThan(
        0.004,
      );
      compared++;
    }
    expect(compared).toBeGreaterThan(40);
  },
);

referenceCheck(
  {
    what: 'forecast, pulsed: area of Bayer tones at pitch ÷ spot 0.5 to 1.25',
    basis: 'computed',
    source: 'spot_dot_gain.csv: discs drawn on 20 × 20 sub-pixels',
    within: '0.01',
  },
  () => {
    for (const row of readTable('spot_dot_gain.csv')) {
      const found = covered(
        bayerTone(Math.round(64 * Number(row.bayer8_bits))),
        PITCH / Number(row.pitch_over_spot),
        'pulsed',
      );
      expect(Math.abs(found - Number(row.bayer8_area)), JSON.stringify(row)).toBeLessThan(0.01);
    }
  },
);

referenceCheck(
  {
    what: 'forecast: a checkerboard and a solid, pulsed and swept, at pitch ÷ spot 1 and 0.886',
    basis: 'computed',
    source: 'stadium and disc geometry, computed for this project',
    within: '0.003',
  },
  () => {
    const board = PATTERNS.checkerboard;
    const solid = bayerTone(64);
    const cases: [MaskRaster, number, Firing, number][] = [
      [board, 1, 'swept', 0.891],
      [board, 1, 'pulsed', 0.391],
      [board, 0.886, 'swept', 0.978],
      [board, 0.886, 'pulsed', 0.501],
      [solid, 1, 'swept', 1],
      [solid, 1, 'pulsed', 0.785],
    ];
    for (const [mask, ratio, firing, wanted] of cases) {
      expect(Math.abs(covered(mask, PITCH / ratio, firing) - wanted), `${firing} at ${ratio}`).toBeLessThan(
        0.003,
      );
    }
  },
);
