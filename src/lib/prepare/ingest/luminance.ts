import { FULL_LUMINANCE, linearValues, LUMINANCE_WEIGHTS } from '../../imaging/srgb';
import type { Pixels } from './pixels';

/** Luminance share of every code value of one channel, 0–65535 scaled; `step` spreads 8-bit codes over the table. */
function shares(weight: number, size: number): Float64Array {
  const linear = linearValues();
  const step = 65_535 / (size - 1);
  return Float64Array.from({ length: size }, (_, code) => linear[code * step] * weight * FULL_LUMINANCE);
}

function opaqueLuminance({ width, height, channels, data }: Pixels, luminance: Uint16Array): void {
  const size = data instanceof Uint16Array ? 65_536 : 256;
  const red = shares(LUMINANCE_WEIGHTS.red, size);
  const green = shares(LUMINANCE_WEIGHTS.green, size);
  const blue = shares(LUMINANCE_WEIGHTS.blue, size);
  for (let i = 0, at = 0; i < width * height; i++, at += channels) {
    luminance[i] = (red[data[at]] + green[data[at + 1]] + blue[data[at + 2]] + 0.5) | 0;
  }
}

/** What a picture is laid over: white is the paper that artwork is drawn on. */
export type Ground = 'white' | 'black';

/** Where alpha is not full: code values are laid over the ground, as every program blends them, then made linear. */
function blendOver(ground: Ground, { width, height, data }: Pixels, luminance: Uint16Array): void {
  const full = data instanceof Uint16Array ? 65_535 : 255;
  const red = shares(LUMINANCE_WEIGHTS.red, 65_536);
  const green = shares(LUMINANCE_WEIGHTS.green, 65_536);
  const blue = shares(LUMINANCE_WEIGHTS.blue, 65_536);
  for (let i = 0, at = 0; i < width * height; i++, at += 4) {
    const alpha = data[at + 3];
    if (alpha === full) continue;
    const scale = (65_535 * alpha) / (full * full);
    const under = (ground === 'white' ? 65_535 - scale * full : 0) + 0.5;
    const y = red[(data[at] * scale + under) | 0] + green[(data[at + 1] * scale + under) | 0];
    luminance[i] = (y + blue[(data[at + 2] * scale + under) | 0] + 0.5) | 0;
  }
}

/**
 * Relative luminance of a picture laid over a ground; over white, what is transparent counts as blank paper.
 * Alpha is blended in code values, then each channel is made linear and weighed (IEC 61966-2-1).
 * @param pixels sRGB code values; unchanged
 * @param ground white, or black for stock that burning lightens
 * @returns width × height samples, 0–65535; within ½ of the exact value
 * @example one black pixel of alpha 128 of 255 over white gives the luminance of code 127
 */
export function luminanceOf(pixels: Pixels, ground: Ground = 'white'): Uint16Array {
  const luminance = new Uint16Array(pixels.width * pixels.height);
  opaqueLuminance(pixels, luminance);
  if (pixels.channels === 4) blendOver(ground, pixels, luminance);
  return luminance;
}
