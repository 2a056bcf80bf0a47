import type { Check } from '../check';
import { judgeThin } from './thin';

/** Gaps between strokes narrower than the line extent: they close up. */
export const fillIn: Check = {
  id: 'fill-in',
  title: 'Gaps that fill in',
  check: (facts, limits) =>
    judgeThin(facts.fillIns, facts, limits, {
      one: 'gap',
      many: 'gaps',
      fate: 'the burn on both sides closes it',
      mend: (enough) => `open the gaps to ${enough}`,
    }),
};
