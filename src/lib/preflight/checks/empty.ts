import type { Check } from '../check';
import { burnsTones } from '../limits';

/** Mean coverage under which even a halftone burns nothing, ratio. */
const NOTHING = 0.0005;

/** Artwork of which nothing would be burned. */
export const empty: Check = {
  id: 'empty',
  title: 'Nothing to engrave',
  check({ tone }, limits) {
    const bare = tone.meanCoverage < NOTHING && tone.burnedShare === 0;
    if (bare) {
      return {
        severity: 'blocker',
        count: 1,
        places: [],
        advice:
          'The artwork is blank: nothing in it is darker than the background. Check that the right file was sent.',
      };
    }
    if (tone.burnedShare > 0 || burnsTones(limits)) return null;
    return {
      severity: 'blocker',
      count: 1,
      places: [],
      measured: { value: tone.darkLstar, limit: null, unit: 'L*' },
      advice:
        'Everything in the artwork is too light to count as dark, so nothing would be burned. Make the drawing darker, or have it burned as a halftone.',
    };
  },
};
