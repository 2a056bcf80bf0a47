import { describe, expect, it } from 'vitest';
import { plainNumber, ruleTicks, stepFor } from '../../../src/components/viewer/rule-ticks';

describe('stepFor', () => {
  it.each([
    [1, 64, 100],
    [7, 64, 10],
    [5, 64, 20],
    [64, 64, 1],
    [640, 64, 0.1],
    [100, 64, 1],
  ])('%f px a unit, at least %i px: %f', (pxPerUnit, least, step) => {
    expect(stepFor(pxPerUnit, least)).toBeCloseTo(step, 9);
  });
});

describe('plainNumber', () => {
  it('groups thousands and drops empty decimals', () => {
    expect([0, 0.5, 12, 1200, 1234567, 0.30000000000000004].map(plainNumber)).toEqual([
      '0',
      '0.5',
      '12',
      '1,200',
      '1,234,567',
      '0.3',
    ]);
  });
});

describe('ruleTicks', () => {
  it('writes millimetres from the left edge, inside the artwork only', () => {
    const { mm } = ruleTicks({ centreXMm: 60, centreYMm: 40, pxPerMm: 5 }, 832, 120, 0.1);
    const labels = mm.filter((t) => t.label !== null);
    expect(labels.map((t) => t.label)).toEqual(['0', '20', '40', '60', '80', '100', '120']);
    expect(labels[0].xPx).toBeCloseTo(116);
  });
  it('draws a tick per ten scan lines and a long one per hundred', () => {
    const { lines, single } = ruleTicks({ centreXMm: 60, centreYMm: 40, pxPerMm: 5 }, 832, 120, 0.1);
    expect(single).toBe(false);
    expect(lines).toHaveLength(121);
    expect(lines[1].xPx - lines[0].xPx).toBeCloseTo(5);
    expect(lines.filter((t) => t.rank === 2)).toHaveLength(13);
    expect(lines.filter((t) => t.rank === 0)).toHaveLength(0);
  });
  it('draws single lines only where each has room', () => {
    const near = ruleTicks({ centreXMm: 60, centreYMm: 40, pxPerMm: 100 }, 800, 120, 0.1);
    expect(near.single).toBe(true);
    expect(near.lines[1].xPx - near.lines[0].xPx).toBeCloseTo(10);
    expect(near.lines.length).toBeLessThanOrEqual(82);
  });
  it('keeps the number of ticks bounded on a bed-sized artwork at the finest pitch', () => {
    const far = ruleTicks({ centreXMm: 1500, centreYMm: 1500, pxPerMm: 0.3 }, 900, 3000, 0.01);
    expect(far.lines.length + far.mm.length).toBeLessThanOrEqual(4000);
  });
});
