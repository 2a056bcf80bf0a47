/** Millimetres in one international inch: the only place where this number stands. */
export const MM_PER_INCH = 25.4;
/** CSS reference pixels per inch (CSS Values and Units 4, section 6.2). */
export const CSS_PX_PER_INCH = 96;
/** PostScript points per inch (PDF 32000-1, default user space). */
export const POINTS_PER_INCH = 72;

export const inchesToMm = (inches: number): number => inches * MM_PER_INCH;
export const mmToInches = (mm: number): number => mm / MM_PER_INCH;
export const mmToPoints = (mm: number): number => (mm / MM_PER_INCH) * POINTS_PER_INCH;
export const cssPxToMm = (px: number): number => (px / CSS_PX_PER_INCH) * MM_PER_INCH;
/** Pixels per inch at a pixel pitch in mm. 0.05 gives 508. */
export const pitchToPpi = (pitchMm: number): number => MM_PER_INCH / pitchMm;
/** Pixel pitch in mm at a resolution in pixels per inch. 508 gives 0.05. */
export const ppiToPitch = (ppi: number): number => MM_PER_INCH / ppi;
/** Scan lines per centimetre at a line pitch in mm. 0.1 gives 100. */
export const pitchToLinesPerCm = (pitchMm: number): number => 10 / pitchMm;
/** Whole pixels per metre, as PNG and BMP store a resolution (ISO/IEC 15948, pHYs). 0.06 gives 16667. */
export const pitchToPxPerMetre = (pitchMm: number): number => Math.round(1000 / pitchMm);

/**
 * Number of scan lines that cover an extent: the extent divided by the pitch, rounded to the nearest, at least 1.
 * @param extentMm extent in mm, above 0
 * @param pitchMm line pitch in mm, above 0
 * @throws RangeError when either is not a finite number above 0
 * @example scanLines(200, 0.06) === 3333
 */
export function scanLines(extentMm: number, pitchMm: number): number {
  if (!(extentMm > 0) || !Number.isFinite(extentMm)) {
    throw new RangeError(`expected extentMm above 0, got ${extentMm}`);
  }
  if (!(pitchMm > 0) || !Number.isFinite(pitchMm))
    throw new RangeError(`expected pitchMm above 0, got ${pitchMm}`);
  return Math.max(1, Math.round(extentMm / pitchMm));
}
