import type { Check } from '../check';
import { counted } from '../words';
import { judgeSmall } from './small';

/** Islands smaller than the spot: dust, or dots that come out larger than drawn. */
export const speck: Check = {
  id: 'speck',
  title: 'Specks',
  check: ({ specks }) =>
    judgeSmall(
      specks,
      (count) =>
        `${counted(count, 'dot')} ${count === 1 ? 'is' : 'are'} smaller than the spot and ${count === 1 ? 'comes' : 'come'} ` +
        'out larger than drawn, or not at all. Delete what is dust; enlarge what is meant.',
    ),
};
