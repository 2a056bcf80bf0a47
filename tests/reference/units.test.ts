import { expect } from 'vitest';
import { pitchToLinesPerCm, pitchToPpi, pitchToPxPerMetre, scanLines } from '../../src/lib/units';
import { referenceCheck } from './check';
import { readTable } from './read-table';

referenceCheck(
  {
    what: 'pixels per inch, pixels per metre and lines per cm at 14 pitches',
    basis: 'computed',
    source: 'definition of the inch, 25.4 mm; whole pixels per metre as PNG stores them (ISO/IEC 15948)',
    within: 'last printed digit',
  },
  () => {
    const rows = readTable('pitch_resolution.csv');
    expect(rows).toHaveLength(14);
    for (const row of rows) {
      const pitchMm = Number(row.pitch_mm);
      expect(pitchToPpi(pitchMm)).toBeCloseTo(Number(row.dpi), 5);
      expect(pitchToPxPerMetre(pitchMm)).toBe(Number(row.px_per_m_rounded));
      expect(pitchToLinesPerCm(pitchMm)).toBeCloseTo(Number(row.lines_per_cm), 3);
    }
  },
);

referenceCheck(
  {
    what: '300, 254, 317.5, 508, 600 and 1016 ppi are stored as 11811, 10000, 12500, 20000, 23622 and 40000 per metre',
    basis: 'computed',
    source: 'pngcheck 3.0.3 on files of these resolutions; whole pixels per metre as ISO/IEC 15948 has them',
  },
  () => {
    const stored = [300, 254, 317.5, 508, 600, 1016].map((ppi) => pitchToPxPerMetre(25.4 / ppi));
    expect(stored).toEqual([11811, 10000, 12500, 20000, 23622, 40000]);
  },
);

referenceCheck(
  {
    what: '200 mm at 0.06 mm are 3,333 scan lines',
    basis: 'computed',
    source: 'extent ÷ pitch to the nearest whole line, worked by hand',
  },
  () => expect(scanLines(200, 0.06)).toBe(3333),
);
