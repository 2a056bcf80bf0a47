import { luminanceOfLstar } from '@/lib/imaging/cie-lightness';
import { linearToSrgb, LUMINANCE_WEIGHTS, srgbToLinear } from '@/lib/imaging/srgb';

/** A colour of the same hue at another lightness L*, sRGB hexadecimal: its linear light scaled. */
export function withLightness(colour: string, lstar: number): string {
  const [red, green, blue] = [1, 3, 5].map((at) =>
    srgbToLinear(parseInt(colour.slice(at, at + 2), 16) / 255),
  );
  const now = LUMINANCE_WEIGHTS.red * red + LUMINANCE_WEIGHTS.green * green + LUMINANCE_WEIGHTS.blue * blue;
  const scale = luminanceOfLstar(lstar) / Math.max(now, 1e-4);
  const code = (linear: number) => Math.round(255 * linearToSrgb(Math.min(1, linear * scale)));
  return `#${[red, green, blue].map((linear) => code(linear).toString(16).padStart(2, '0')).join('')}`;
}
