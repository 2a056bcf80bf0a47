import { luminanceOfLstar } from '../../imaging/cie-lightness';
import { linearToSrgb } from '../../imaging/srgb';
import type { Screener } from './screener';

/**
 * Parts burned from untouched at a lightness.
 * Coverage (1 − code value) above that of the dividing level burns.
 * @param dividingLstar L* of the dividing level, 0–100
 * @returns a screener whose rows never lag
 * @throws RangeError when L* lies outside 0–100
 * @example twoLevels(53.4) burns a pixel that black covers by more than half
 */
export function twoLevels(dividingLstar: number): Screener {
  const level = 1 - linearToSrgb(luminanceOfLstar(dividingLstar));
  return {
    push(burn, dots, at) {
      for (let i = 0; i < burn.length; i++) dots[at + i] = burn[i] > level ? 1 : 0;
      return at + burn.length;
    },
    end: (_dots, at) => at,
  };
}
