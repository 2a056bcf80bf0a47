import type { Check } from '../check';

/** A file with several pictures, of which the first is used. */
export const firstFrame: Check = {
  id: 'first-frame',
  title: 'First picture used',
  check: ({ severalFrames }) =>
    severalFrames
      ? {
          severity: 'note',
          count: 1,
          places: [],
          advice:
            'The file holds several pictures; the first one is used. If you meant another, send it as a file of its own.',
        }
      : null,
};
