import { describe, expect, test } from 'vitest';
import { lineTicks, mmTicks, tickPositions } from '@/components/rule-ticks';

describe('mmTicks', () => {
  test.each([
    [80, 640, { short: 1, long: 10 }],
    [120, 640, { short: 1, long: 10 }],
    [300, 640, { short: 5, long: 50 }],
    [1000, 640, { short: 10, long: 100 }],
    [120, 260, { short: 5, long: 50 }],
  ])('%d mm over %d px', (extentMm, widthPx, ticks) => {
    expect(mmTicks(extentMm, widthPx)).toEqual(ticks);
  });

  test('short ticks never stand closer than 4 px, labels never closer than 44', () => {
    for (const extentMm of [5, 37, 84, 300, 812, 3000]) {
      for (const widthPx of [220, 360, 700, 1200]) {
        const { short, long } = mmTicks(extentMm, widthPx);
        expect((short * widthPx) / extentMm).toBeGreaterThanOrEqual(4);
        expect((long * widthPx) / extentMm).toBeGreaterThanOrEqual(44);
      }
    }
  });
});

describe('lineTicks', () => {
  test('a tick per ten lines, a long one per hundred', () => {
    expect(lineTicks(1000, 640)).toEqual({ short: 10, long: 100 });
  });

  test('only hundreds where tens would touch', () => {
    expect(lineTicks(5000, 640)).toEqual({ short: 100, long: 1000 });
    expect(lineTicks(100_000, 360)).toEqual({ short: 1000, long: 10_000 });
  });
});

describe('tickPositions', () => {
  test('from 0 up to the extent, long ones marked', () => {
    expect(tickPositions(30, { short: 10, long: 20 })).toEqual([
      { at: 0, isLong: true },
      { at: 10, isLong: false },
      { at: 20, isLong: true },
      { at: 30, isLong: false },
    ]);
  });

  test('stops before a broken end', () => {
    expect(tickPositions(29.9, { short: 10, long: 20 }).at(-1)?.at).toBe(20);
  });
});
