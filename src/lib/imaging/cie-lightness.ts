const EPSILON = 216 / 24_389;
const KAPPA = 24_389 / 27;

/**
 * CIE lightness L* of a relative luminance.
 * 116·Y^(1/3) − 16, and the straight piece near black.
 * @param luminance relative luminance, ratio 0–1
 * @returns L*, 0–100
 * @throws RangeError when luminance is not a finite number from 0
 * @example lstarOfLuminance(0.18) // 49.496
 * @see CIE 15:2018, 8.2.1
 */
export function lstarOfLuminance(luminance: number): number {
  if (!(luminance >= 0) || !Number.isFinite(luminance)) {
    throw new RangeError(`expected luminance from 0, got ${luminance}`);
  }
  return luminance > EPSILON ? 116 * Math.cbrt(luminance) - 16 : KAPPA * luminance;
}

/**
 * Relative luminance of a CIE lightness L*: the inverse of `lstarOfLuminance`.
 * @param lstar L*, 0–100
 * @returns relative luminance, ratio 0–1
 * @throws RangeError when L* lies outside 0–100
 * @example luminanceOfLstar(50) // 0.18419
 * @see CIE 15:2018, 8.2.1
 */
export function luminanceOfLstar(lstar: number): number {
  if (!(lstar >= 0 && lstar <= 100)) throw new RangeError(`expected L* from 0 to 100, got ${lstar}`);
  return lstar > KAPPA * EPSILON ? ((lstar + 16) / 116) ** 3 : lstar / KAPPA;
}
