import { expect } from 'vitest';
import { moveTime, runOff, scanTime } from '../../src/lib/machines/scan-time';
import { referenceCheck } from './check';
import { readTable } from './read-table';

referenceCheck(
  {
    what: 'rest-to-rest moves and run-off, trapezoid and triangle',
    basis: 'computed',
    source: 'trapezoid_moves.csv: an independent program; one row integrated numerically',
    within: '1e-6 s',
  },
  () => {
    for (const row of readTable('trapezoid_moves.csv')) {
      const [length, v, a] = [Number(row.L_mm), Number(row.v_mm_s), Number(row.a_mm_s2)];
      expect(Math.abs(moveTime(length, v, a) - Number(row.rest_to_rest_s))).toBeLessThan(1e-6);
      expect(Math.abs(runOff(v, a) - Number(row.run_off_each_side_mm))).toBeLessThan(1e-6);
    }
  },
);

referenceCheck(
  {
    what: 'scanning time of seven rasters, one-way and two-way, with run-off',
    basis: 'computed',
    source: 'raster_job_times.csv: an independent program',
    within: '1e-6 s',
  },
  () => {
    const rows = readTable('raster_job_times.csv').filter((row) => row.run_off === 'True');
    expect(rows.length).toBeGreaterThan(5);
    for (const row of rows) {
      const seconds = scanTime({
        lines: Number(row.lines),
        lineMm: Number(row.W),
        linePitchMm: Number(row.pitch),
        speedMmPerS: Number(row.v),
        accelerationMmPerS2: Number(row.a),
        scanning: row.bidirectional === 'True' ? 'two-way' : 'one-way',
      });
      expect(Math.abs(seconds - Number(row.seconds))).toBeLessThan(1e-6);
    }
  },
);
