import { CSS_PX_PER_INCH, MM_PER_INCH } from '@/lib/units';

/** Width of a bank card, mm (ISO/IEC 7810, size ID-1). */
export const CARD_WIDTH_MM = 85.6;
export const CARD_HEIGHT_MM = 53.98;

const KEY = 'umberline-px-per-mm';
/** CSS reference pixel: what a screen claims before it is measured. */
export const CLAIMED_PX_PER_MM = CSS_PX_PER_INCH / MM_PER_INCH;

/** Pixels per mm of this screen as measured once with a card; null until then, and where nothing can be kept. */
export function keptScale(): number | null {
  try {
    const kept = Number(window.localStorage.getItem(KEY));
    return kept > 1 && kept < 40 ? kept : null;
  } catch {
    return null;
  }
}

export function keepScale(pxPerMm: number): void {
  try {
    window.localStorage.setItem(KEY, String(pxPerMm));
  } catch {
    // A browser that keeps nothing asks again next time.
  }
}
