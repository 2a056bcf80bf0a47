import { describe, expect, test } from 'vitest';
import { moveTime, runOff, scanTime } from '../../src/lib/machines/scan-time';

describe('moves', () => {
  test('run-off is v² ÷ 2a', () => expect(runOff(300, 3000)).toBe(15));
  test('long moves reach full speed, short ones do not', () => {
    expect(moveTime(100, 300, 3000)).toBeCloseTo(0.433333, 6);
    expect(moveTime(10, 300, 3000)).toBeCloseTo(2 * Math.sqrt(10 / 3000), 12);
    expect(moveTime(0, 300, 3000)).toBe(0);
  });
  test('both rules agree where they meet', () => {
    expect(moveTime(30 - 1e-9, 300, 3000)).toBeCloseTo(moveTime(30, 300, 3000), 6);
  });
  test('refuse what cannot be', () => {
    expect(() => moveTime(-1, 300, 3000)).toThrow(RangeError);
    expect(() => moveTime(1, 0, 3000)).toThrow(RangeError);
    expect(() => runOff(300, 0)).toThrow(RangeError);
  });
});

describe('scanning time', () => {
  const job = { lines: 1000, lineMm: 100, linePitchMm: 0.1, speedMmPerS: 300, accelerationMmPerS2: 3000 };
  test('two-way', () => expect(scanTime({ ...job, scanning: 'two-way' })).toBeCloseTo(544.868792, 6));
  test('one-way takes about twice as long', () =>
    expect(scanTime({ ...job, scanning: 'one-way' })).toBeCloseTo(1066.133333, 6));
  test('a single line has no step', () =>
    expect(scanTime({ ...job, lines: 1, scanning: 'two-way' })).toBeCloseTo(0.533333, 6));
  test('refuses no lines', () =>
    expect(() => scanTime({ ...job, lines: 0, scanning: 'two-way' })).toThrow(RangeError));
});
