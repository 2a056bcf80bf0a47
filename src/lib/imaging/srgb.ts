/**
 * Linear light of an sRGB code value.
 * Inverse of the sRGB transfer function.
 * @param code code value, ratio 0–1
 * @returns linear light, ratio 0–1
 * @example srgbToLinear(128 / 255) // 0.21586
 * @see IEC 61966-2-1:1999, break points 0.04045 and 0.0031308
 */
export function srgbToLinear(code: number): number {
  return code <= 0.04045 ? code / 12.92 : Math.pow((code + 0.055) / 1.055, 2.4);
}

/**
 * The sRGB code value of linear light.
 * The sRGB transfer function.
 * @param linear linear light, ratio 0–1
 * @returns code value, ratio 0–1
 * @example linearToSrgb(0.5) // 0.735357, code 187.516 of 255
 * @see IEC 61966-2-1:1999
 */
export function linearToSrgb(linear: number): number {
  return linear <= 0.0031308 ? linear * 12.92 : 1.055 * Math.pow(linear, 1 / 2.4) - 0.055;
}

/** Shares of red, green and blue linear light in relative luminance (IEC 61966-2-1, D65). */
export const LUMINANCE_WEIGHTS = { red: 0.2126, green: 0.7152, blue: 0.0722 } as const;

/** Highest sample of a lightness raster: relative luminance 1. */
export const FULL_LUMINANCE = 65_535;

let codeOfLuminance: Float32Array | null = null;

/**
 * Code value 0–1 of every 16-bit sample of relative luminance: 65,536 entries, worked out once.
 * @returns a table that callers must not change
 * @example codeValues()[65535] // 1
 */
export function codeValues(): Float32Array {
  codeOfLuminance ??= Float32Array.from({ length: FULL_LUMINANCE + 1 }, (_, y) =>
    linearToSrgb(y / FULL_LUMINANCE),
  );
  return codeOfLuminance;
}

let luminanceOfCode: Float32Array | null = null;

/**
 * Linear light 0–1 of every 16-bit code value: 65,536 entries, worked out once.
 * @returns a table that callers must not change
 * @example linearValues()[0] // 0
 */
export function linearValues(): Float32Array {
  luminanceOfCode ??= Float32Array.from({ length: 65_536 }, (_, code) => srgbToLinear(code / 65_535));
  return luminanceOfCode;
}

/**
 * Red, green and blue linear light, ratios 0–1, of a colour as `#rrggbb`.
 * @throws RangeError when the text is not # and six hexadecimal digits
 * @example linearOfHex('#ffffff') // [1, 1, 1]
 */
export function linearOfHex(colour: string): [number, number, number] {
  const match = /^#([0-9a-f]{2})([0-9a-f]{2})([0-9a-f]{2})$/i.exec(colour);
  if (!match) throw new RangeError(`expected a colour as #rrggbb, got ${colour}`);
  const channel = (digits: string): number => srgbToLinear(parseInt(digits, 16) / 255);
  return [channel(match[1]), channel(match[2]), channel(match[3])];
}
