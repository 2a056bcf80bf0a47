export interface FileNameParts {
  label: string;
  pass: 1 | 2;
  linePitchMm: number;
  directionDeg: number;
  /** 64 hexadecimal digits */
  preparationKey: string;
  /** without the dot */
  extension: string;
}

/**
 * Name of a prepared file: order or artwork, pass, pitch, angle, and the first eight digits of the preparation key.
 * @param parts unchanged
 * @example 'UMB-1-pass1-0.110mm-0deg-1a2b3c4d.png'
 */
export function fileName({
  label,
  pass,
  linePitchMm,
  directionDeg,
  preparationKey,
  extension,
}: FileNameParts): string {
  const angle = `${Number(directionDeg.toFixed(2))}deg`;
  return `${label}-pass${pass}-${linePitchMm.toFixed(3)}mm-${angle}-${preparationKey.slice(0, 8)}.${extension}`;
}
