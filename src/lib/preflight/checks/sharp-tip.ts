import type { Check } from '../check';
import { counted } from '../words';

/** Tips that end thinner than the line extent: they come out blunt, which is only worth a note. */
export const sharpTip: Check = {
  id: 'sharp-tip',
  title: 'Sharp tips',
  check: ({ sharpTips: { count, places } }) =>
    count === 0
      ? null
      : {
          severity: 'note',
          count,
          places,
          minMm: null,
          advice: `${counted(count, 'tip')} will come out a little blunt: the spot is rounder than the drawing. Nothing to do unless the points matter.`,
        },
};
