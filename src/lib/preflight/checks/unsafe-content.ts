import type { Check } from '../check';
import { listed } from '../words';

/** Parts of a drawing that were left out for safety. */
export const unsafeContent: Check = {
  id: 'unsafe-content',
  title: 'Parts left out',
  check: ({ removed }) =>
    removed.length === 0
      ? null
      : {
          severity: 'note',
          count: removed.length,
          places: [],
          advice: `Left out of the drawing for safety: ${listed(removed)}. Compare the picture with yours; if something is missing, embed it as shapes and send it again.`,
        },
};
