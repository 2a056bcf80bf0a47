import { codeValues, linearOfHex, linearToSrgb } from '../../imaging/srgb';
import { writePicture } from '../package/png';
import type { Grey } from '../resample/upright';

/**
 * A grey picture of luminance, as people see it.
 * @param grey luminance 0–65535; unchanged
 * @returns the bytes of an 8-bit greyscale PNG
 * @example luminance 0.5 gives code 188
 */
export async function luminancePicture({ width, height, data }: Grey): Promise<Uint8Array> {
  const codes = Uint8Array.from(codeValues(), (code) => Math.round(255 * code));
  const samples = new Uint8Array(data.length);
  for (let i = 0; i < samples.length; i++) samples[i] = codes[data[i]];
  return writePicture(width, height, samples);
}

/** A grey picture of shares that burn: what burns is dark, mixed as light. */
export async function sharePicture({ width, height, data }: Grey): Promise<Uint8Array> {
  return luminancePicture({ width, height, data: data.map((share) => 65_535 - share) });
}

/**
 * A picture of the engraved piece: the ground's colour, the mark's colour, and their mixture in linear light where a pixel
 * is marked in part.
 * @param grey marked shares 0–65535; unchanged
 * @param groundColour #rrggbb
 * @param markColour #rrggbb
 * @returns the bytes of a PNG with a palette of 256 mixtures
 * @throws RangeError when a colour is not #rrggbb
 */
export async function mixturePicture(
  { width, height, data }: Grey,
  groundColour: string,
  markColour: string,
): Promise<Uint8Array> {
  const [ground, mark] = [linearOfHex(groundColour), linearOfHex(markColour)];
  const palette = Uint8Array.from({ length: 768 }, (_, i) => {
    const [share, channel] = [Math.floor(i / 3) / 255, i % 3];
    return Math.round(255 * linearToSrgb(ground[channel] + share * (mark[channel] - ground[channel])));
  });
  const samples = new Uint8Array(data.length);
  for (let i = 0; i < samples.length; i++) samples[i] = (data[i] + 128) / 257;
  return writePicture(width, height, samples, palette);
}
