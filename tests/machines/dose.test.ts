import { describe, expect, test } from 'vitest';
import { dose, opticalPower } from '../../src/lib/machines/dose';

describe('dose', () => {
  test('10 W at 100 mm/s on lines of 0.1 mm is 1 J/mm²', () => expect(dose(10, 100, 0.1)).toBeCloseTo(1, 12));
  test('no power, no dose', () => expect(dose(0, 100, 0.1)).toBe(0));
  test.each([
    [-1, 100, 0.1],
    [10, 0, 0.1],
    [10, 100, 0],
    [10, Infinity, 0.1],
    [NaN, 100, 0.1],
  ])('refuses %d W, %d mm/s, %d mm', (watts, speed, pitch) =>
    expect(() => dose(watts, speed, pitch)).toThrow(RangeError),
  );
});

describe('optical power', () => {
  const curve = [
    { settingPercent: 60, watts: 20 },
    { settingPercent: 20, watts: 4 },
    { settingPercent: 100, watts: 30 },
  ];
  test('without a curve it follows the setting, and says that it is assumed', () => {
    expect(opticalPower({ wattsAtFull: 40, powerCurve: [] }, 25)).toEqual({ watts: 10, assumesLinear: true });
    expect(opticalPower({ wattsAtFull: 40, powerCurve: curve.slice(0, 1) }, 50).assumesLinear).toBe(true);
  });
  test.each([
    [20, 4],
    [40, 12],
    [60, 20],
    [80, 25],
    [100, 30],
    [10, 4],
    [0, 4],
  ])('between measured points: %i % gives %d W', (setting, watts) => {
    expect(opticalPower({ wattsAtFull: 40, powerCurve: curve }, setting)).toEqual({
      watts,
      assumesLinear: false,
    });
  });
  test('beyond the last measured point it stays level', () => {
    expect(opticalPower({ wattsAtFull: 40, powerCurve: curve.slice(0, 2) }, 90).watts).toBe(20);
  });
  test('leaves the curve as it is', () => expect(curve[0].settingPercent).toBe(60));
  test.each([-1, 101, NaN])('refuses %d %', (setting) => {
    expect(() => opticalPower({ wattsAtFull: 40, powerCurve: [] }, setting)).toThrow(RangeError);
  });
});
