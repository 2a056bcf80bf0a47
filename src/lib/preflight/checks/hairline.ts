import type { Check } from '../check';
import { judgeThin } from './thin';

/** Strokes narrower than the line extent in their own direction: they come out thicker than drawn, or break up. */
export const hairline: Check = {
  id: 'hairline',
  title: 'Hairlines',
  check: (facts, limits) =>
    judgeThin(facts.hairlines, facts, limits, {
      one: 'stroke',
      many: 'strokes',
      fate: 'the spot cannot draw a line that fine, it comes out thicker or breaks up',
      mend: (enough) => `thicken the strokes to ${enough}`,
    }),
};
