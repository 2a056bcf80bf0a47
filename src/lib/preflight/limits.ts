import type { Spot } from '../machines/spot';

/** What facts are held against. */
export interface Limits {
  spot: Spot;
  /** null: not chosen yet, and the suggestion stands in for it */
  treatment: 'linework' | 'solid' | 'halftone' | 'continuous';
  /** whether the artwork is a photograph or shaded over most of its area */
  photograph: boolean;
  /** smallest width without hairline and fill-in, mm, where it was looked for and found */
  smallestSoundWidthMm?: number | null;
}

/** Whether greys are burned as greys. */
export const burnsTones = ({ treatment }: Limits): boolean =>
  treatment === 'halftone' || treatment === 'continuous';
