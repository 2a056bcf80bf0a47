import { luminanceOfLstar } from '../../imaging/cie-lightness';
import { codeValues, FULL_LUMINANCE } from '../../imaging/srgb';
import type { StockTone, Tone, Treatment } from '../settings';

const clamp01 = (value: number): number => Math.min(1, Math.max(0, value));

/** Luminance between the black and the white point, stretched to 0–1 and bent by gamma. */
function adjusted(luminance: number, { blackPoint, whitePoint, gamma }: Tone): number {
  return clamp01((luminance - blackPoint) / (whitePoint - blackPoint)) ** gamma;
}

/** How an asked luminance becomes coverage on a stock: c = (Yg − Y) ÷ (Yg − Ym), whichever of the two is the lighter. */
function coverageOn(stock: StockTone, mode: Tone['mode']): (luminance: number) => number {
  const ground = luminanceOfLstar(stock.groundLstar);
  const mark = luminanceOfLstar(stock.markLstar);
  if (stock.direction === 'darkens' ? mark >= ground : mark <= ground) {
    throw new RangeError(
      `expected a mark that ${stock.direction} its ground, got L* ${stock.markLstar} on ${stock.groundLstar}`,
    );
  }
  const low = Math.min(ground, mark);
  const high = Math.max(ground, mark);
  return (luminance) => {
    const asked = mode === 'scaled' ? low + luminance * (high - low) : luminance;
    return clamp01((ground - asked) / (ground - mark));
  };
}

export interface BurnSettings {
  treatment: Treatment;
  tone: Tone;
  stock: StockTone | null;
}

/**
 * The burn that each 16-bit sample of luminance asks for: the one place where light becomes burn.
 * Linework and solid: coverage, 1 − code value. Tone: black and white point, gamma, then 1 − luminance, or the coverage
 * that brings the stock between its ground and its full mark to the asked luminance (Murray–Davies, n = 1).
 * @param settings treatment, tone and stock; unchanged
 * @returns 65,536 entries, ratios 0–1
 * @throws RangeError when the white point is not above the black point, or the stock's mark lies on the wrong side of its ground
 * @example burnTable({ treatment: 'halftone', tone: absolute, stock: null })[32768] // 0.5
 */
export function burnTable({ treatment, tone, stock }: BurnSettings): Float32Array {
  if (treatment === 'linework' || treatment === 'solid') return codeValues().map((code) => 1 - code);
  if (!(tone.whitePoint > tone.blackPoint)) {
    throw new RangeError(
      `expected a white point above the black point ${tone.blackPoint}, got ${tone.whitePoint}`,
    );
  }
  const coverage = stock ? coverageOn(stock, tone.mode) : (luminance: number): number => 1 - luminance;
  return Float32Array.from({ length: FULL_LUMINANCE + 1 }, (_, y) =>
    coverage(adjusted(y / FULL_LUMINANCE, tone)),
  );
}

/**
 * The luminance that is left untouched on a stock: black where burning lightens, white elsewhere.
 * @example untouchedLuminance({ treatment: 'solid', stock: null }) // 65535
 */
export function untouchedLuminance({ treatment, stock }: Pick<BurnSettings, 'treatment' | 'stock'>): number {
  const tonal = treatment === 'halftone' || treatment === 'continuous';
  return tonal && stock?.direction === 'lightens' ? 0 : FULL_LUMINANCE;
}
