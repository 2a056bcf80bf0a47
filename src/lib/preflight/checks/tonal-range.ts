import type { Check } from '../check';
import { burnsTones } from '../limits';

/** Range of lightness under which a photograph comes out flat, L*. */
const FLAT_LSTAR = 45;

/** A photograph that uses little of the way from dark to light. */
export const tonalRange: Check = {
  id: 'tonal-range',
  title: 'Little contrast',
  check({ tone }, limits) {
    if (!limits.photograph || !burnsTones(limits)) return null;
    const range = tone.lightLstar - tone.darkLstar;
    if (range >= FLAT_LSTAR) return null;
    return {
      severity: 'warning',
      count: 1,
      places: [],
      measured: { value: range, limit: FLAT_LSTAR, unit: 'L*' },
      advice: `The picture runs only from L* ${Math.round(tone.darkLstar)} to ${Math.round(tone.lightLstar)} and comes out flat. Raise its contrast, or let us set its black and white points.`,
    };
  },
};
