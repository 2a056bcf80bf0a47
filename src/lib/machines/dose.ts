import type { Machine } from './machine';

type Power = Pick<Machine, 'wattsAtFull' | 'powerCurve'>;

function assertAbove0(name: string, value: number): void {
  if (!(value > 0) || !Number.isFinite(value)) throw new RangeError(`expected ${name} above 0, got ${value}`);
}

/**
 * Energy that a raster fill puts on an area, J/mm².
 * Power ÷ (speed × pitch); the spot's size does not enter.
 * @param watts mean optical power, W, from 0
 * @param speedMmPerS scanning speed, mm/s, above 0
 * @param linePitchMm distance between scan lines, mm, above 0
 * @throws RangeError when a value is outside its range
 * @example dose(10, 100, 0.1) // 1 J/mm², 100 J/cm²
 * @see Vidholdová, Reinprecht & Igaz, Acta Facultatis Xylologiae Zvolen 61(1), 2019, table 1
 */
export function dose(watts: number, speedMmPerS: number, linePitchMm: number): number {
  if (!(watts >= 0) || !Number.isFinite(watts)) throw new RangeError(`expected watts from 0, got ${watts}`);
  assertAbove0('speedMmPerS', speedMmPerS);
  assertAbove0('linePitchMm', linePitchMm);
  return watts / (speedMmPerS * linePitchMm);
}

/** Optical power at a power setting, and whether it rests on the assumption that power follows the setting in proportion. */
export interface OpticalPower {
  watts: number;
  assumesLinear: boolean;
}

/**
 * Optical power at a power setting, W.
 * Straight between the points of the measured curve and level beyond its ends; in proportion to the setting where there
 * are fewer than two points, which is said.
 * @param machine power at 100 % and its measured curve, in any order; unchanged
 * @param settingPercent power setting, 0–100 %
 * @throws RangeError when the setting lies outside 0–100
 * @example opticalPower({ wattsAtFull: 40, powerCurve: [] }, 25) // { watts: 10, assumesLinear: true }
 */
export function opticalPower({ wattsAtFull, powerCurve }: Power, settingPercent: number): OpticalPower {
  if (!(settingPercent >= 0 && settingPercent <= 100)) {
    throw new RangeError(`expected settingPercent from 0 to 100, got ${settingPercent}`);
  }
  if (powerCurve.length < 2) return { watts: (wattsAtFull * settingPercent) / 100, assumesLinear: true };
  const points = [...powerCurve].sort((a, b) => a.settingPercent - b.settingPercent);
  const above = points.findIndex((point) => point.settingPercent >= settingPercent);
  if (above <= 0)
    return { watts: (above === 0 ? points[0] : points[points.length - 1]).watts, assumesLinear: false };
  const [low, high] = [points[above - 1], points[above]];
  const share = (settingPercent - low.settingPercent) / (high.settingPercent - low.settingPercent);
  return { watts: low.watts + share * (high.watts - low.watts), assumesLinear: false };
}
