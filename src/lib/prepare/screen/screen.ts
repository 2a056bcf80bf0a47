import type { ScreenName, Treatment } from '../settings';
import { bayerRanks } from './bayer';
import { diffuse } from './diffuse';
import { evenGrainRanks } from './even-grain';
import { FLOYD_STEINBERG, JARVIS_JUDICE_NINKE, STUCKI } from './kernels';
import { powerLevels } from './power-levels';
import type { Screener } from './screener';
import { compareWith } from './threshold-matrix';
import { twoLevels } from './two-levels';

const BAYER_SIDE = 16;
const EVEN_GRAIN_SIDE = 128;

export interface ScreenSettings {
  treatment: Treatment;
  screen: ScreenName;
  dividingLstar: number;
}

function halftone(name: ScreenName, width: number): Screener {
  switch (name) {
    case 'even-grain':
      return compareWith(evenGrainRanks(EVEN_GRAIN_SIDE), width);
    case 'published:floyd-steinberg-1976':
      return diffuse(FLOYD_STEINBERG, width);
    case 'published:jarvis-judice-ninke-1976':
      return diffuse(JARVIS_JUDICE_NINKE, width);
    case 'published:stucki-1981':
      return diffuse(STUCKI, width);
    case 'published:bayer-1973':
      return compareWith(bayerRanks(BAYER_SIDE), width);
  }
}

/**
 * The screener that turns burn into marks: the halftone method asked for, two levels for linework and solid, power levels
 * for continuous tone.
 * @param settings treatment, method and dividing level; unchanged
 * @param width pixels a row, 1 or more
 * @throws RangeError as the method throws it
 * @example screen({ treatment: 'halftone', screen: 'even-grain', dividingLstar: 53.4 }, 100)
 */
export function screen({ treatment, screen: name, dividingLstar }: ScreenSettings, width: number): Screener {
  switch (treatment) {
    case 'halftone':
      return halftone(name, width);
    case 'linework':
    case 'solid':
      return twoLevels(dividingLstar);
    case 'continuous':
      return powerLevels();
  }
}
