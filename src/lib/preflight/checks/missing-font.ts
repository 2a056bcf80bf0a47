import type { Check } from '../check';
import { counted, listed } from '../words';

/** Live text in a font that is not here: another one stands in for it. */
export const missingFont: Check = {
  id: 'missing-font',
  title: 'Font missing',
  check: ({ missingFonts }) =>
    missingFonts.length === 0
      ? null
      : {
          severity: 'warning',
          count: missingFonts.length,
          places: [],
          advice: `The text asks for ${counted(missingFonts.length, 'font')} that we do not have (${listed(missingFonts)}); another one stands in and the letters look different. Turn the text into outlines and send the file again.`,
        },
};
