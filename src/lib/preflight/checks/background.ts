import type { Check } from '../check';
import { burnsTones } from '../limits';

/** A border as light as this is meant as white, and counts as white from the second figure on, L*. */
const LIGHT_LSTAR = 80;
const WHITE_LSTAR = 99.2;
/** Share of the border that must be alike, 0–1. */
const ALIKE = 0.6;

/** A background that is nearly but not quite white: in a halftone it is burned as scattered dots. */
export const background: Check = {
  id: 'background',
  title: 'Background not quite white',
  check({ tone }, limits) {
    const { borderLstar, borderShare } = tone;
    if (borderShare < ALIKE || borderLstar < LIGHT_LSTAR || borderLstar >= WHITE_LSTAR) return null;
    return {
      severity: burnsTones(limits) ? 'warning' : 'note',
      count: 1,
      places: [],
      measured: { value: borderLstar, limit: WHITE_LSTAR, unit: 'L*' },
      advice: burnsTones(limits)
        ? `The background is L* ${borderLstar.toFixed(1)}, not white (100), and would be burned as scattered dots. Make it pure white or transparent, or let us set the white point.`
        : `The background is L* ${borderLstar.toFixed(1)}, not white (100). Burned solid it stays untouched; as a halftone it would not.`,
    };
  },
};
