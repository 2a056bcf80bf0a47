import type { Check } from '../check';
import { counted } from '../words';
import { judgeSmall } from './small';

/** Holes smaller than the spot: they close. */
export const pinhole: Check = {
  id: 'pinhole',
  title: 'Pinholes',
  check: ({ pinholes }) =>
    judgeSmall(
      pinholes,
      (count) =>
        `${counted(count, 'hole')} ${count === 1 ? 'is' : 'are'} smaller than the spot and ${count === 1 ? 'closes' : 'close'} up. ` +
        'Fill what is a flaw; enlarge what is meant.',
    ),
};
