import type { Facts } from '../../preflight/facts';
import type { Treatment } from '../settings';

export interface Suggestion {
  treatment: Treatment;
  /** one plain sentence */
  reason: string;
}

/** Tonal share from which an artwork is taken for a photograph. */
export const PHOTOGRAPH_SHARE = 0.5;

const percent = (share: number): string => `${Math.round(share * 100)} %`;

/**
 * The treatment that suits an artwork, and why.
 * Tones and tints ask for dots; fine lines are followed; everything else is filled.
 * @param tone measured shares; unchanged
 * @param vector whether the artwork is a drawing whose lines can be followed
 * @returns a treatment with its reason
 */
export function suggestTreatment(tone: Facts['tone'], vector: boolean): Suggestion {
  if (tone.tonalShare >= PHOTOGRAPH_SHARE) {
    return { treatment: 'halftone', reason: 'This is a photograph: its greys need dots of burn.' };
  }
  if (tone.tonalShare >= 0.05) {
    return {
      treatment: 'halftone',
      reason: `About ${percent(tone.tonalShare)} of it is shaded like a photograph: those greys need dots of burn.`,
    };
  }
  if (tone.tintShare >= 0.03) {
    return {
      treatment: 'halftone',
      reason: `About ${percent(tone.tintShare)} of it is a flat grey or colour: dots of burn keep it apart from black.`,
    };
  }
  if (vector && tone.thinShare >= 0.6) {
    return { treatment: 'linework', reason: 'It is drawn in fine lines: following them keeps them sharp.' };
  }
  return { treatment: 'solid', reason: 'It has two levels and filled shapes: they are burned solid.' };
}
