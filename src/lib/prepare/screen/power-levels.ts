import type { Screener } from './screener';

/**
 * No screen: burn as power levels for continuous tone, 255·(1 − burn) rounded.
 * @returns a screener whose rows never lag and hold levels instead of dots
 * @example screenWhole(powerLevels(), Float32Array.of(0, 0.5, 1)) // 255, 128, 0
 */
export function powerLevels(): Screener {
  return {
    push(burn, levels, at) {
      for (let i = 0; i < burn.length; i++) levels[at + i] = 255 * (1 - burn[i]) + 0.5;
      return at + burn.length;
    },
    end: (_levels, at) => at,
  };
}
