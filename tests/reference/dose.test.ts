import { expect } from 'vitest';
import { dose } from '../../src/lib/machines/dose';
import { referenceCheck } from './check';
import { readTable } from './read-table';

const BEAM_MM = 10;
const WATTS = 45;

referenceCheck(
  {
    what: 'dose of eight beech patches, power ÷ (speed × pitch)',
    basis: 'published',
    source:
      'Acta Facultatis Xylologiae Zvolen 61(1), 2019, table 1 (published_dose_check.csv); the row at 18 mm/s is off by 2 % in print',
    within: '0.6 %, one row 2.1 %',
  },
  () => {
    for (const row of readTable('published_dose_check.csv')) {
      const speed = Number(row.v_mm_s);
      const published = Number(row.published_H_J_cm2);
      const difference = Math.abs((100 * dose(WATTS, speed, BEAM_MM)) / published - 1);
      expect(difference).toBeLessThan(speed === 18 ? 0.021 : 0.006);
    }
  },
);

referenceCheck(
  {
    what: 'dose of a grid of powers, speeds and pitches',
    basis: 'computed',
    source: 'fluence.csv: P ÷ (v · pitch)',
    within: 'last printed digit',
  },
  () => {
    for (const row of readTable('fluence.csv')) {
      const found = dose(Number(row.P_W), Number(row.v_mm_s), Number(row.pitch_mm));
      expect(found).toBeCloseTo(Number(row.J_per_mm2), 5);
    }
  },
);
