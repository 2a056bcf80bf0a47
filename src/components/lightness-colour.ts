import { lstarOfLuminance, luminanceOfLstar } from '@/lib/imaging/cie-lightness';
import { linearOfHex, linearToSrgb, LUMINANCE_WEIGHTS } from '@/lib/imaging/srgb';

function luminanceOf([red, green, blue]: readonly [number, number, number]): number {
  return LUMINANCE_WEIGHTS.red * red + LUMINANCE_WEIGHTS.green * green + LUMINANCE_WEIGHTS.blue * blue;
}

/** L* of an sRGB hexadecimal colour. */
export function lstarOf(colour: string): number {
  return lstarOfLuminance(luminanceOf(linearOfHex(colour)));
}

/** A colour of the same hue at another lightness L*, sRGB hexadecimal: its linear light scaled. */
export function withLightness(colour: string, lstar: number): string {
  const linear = linearOfHex(colour);
  const scale = luminanceOfLstar(lstar) / Math.max(luminanceOf(linear), 1e-4);
  const code = (value: number) => Math.round(255 * linearToSrgb(Math.min(1, value * scale)));
  return `#${linear.map((value) => code(value).toString(16).padStart(2, '0')).join('')}`;
}
