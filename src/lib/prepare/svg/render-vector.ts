import type { VectorArtwork } from '../artwork';
import type { PipelineTools, SvgRenderRequest } from '../tools';

/** sRGB code value to linear light in 65535ths (IEC 61966-2-1). */
const LINEAR = Uint16Array.from({ length: 256 }, (_, code) => {
  const value = code / 255;
  return Math.round(65535 * (value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4));
});

/**
 * Relative luminance of RGBA laid over white: blended in code values, as edges are drawn, then taken to linear light.
 * @param rgba 8 bit, row-major, not premultiplied; unchanged
 * @returns linear light, 0–65535, one sample a pixel
 * @example luminanceOverWhite(Uint8Array.of(0, 0, 0, 0))[0] === 65535
 */
export function luminanceOverWhite(rgba: Uint8Array): Uint16Array {
  const luminance = new Uint16Array(rgba.length / 4);
  for (let index = 0, at = 0; index < luminance.length; index += 1, at += 4) {
    const alpha = rgba[at + 3];
    const ground = 255 - alpha;
    const r = Math.round((rgba[at] * alpha) / 255 + ground);
    const g = Math.round((rgba[at + 1] * alpha) / 255 + ground);
    const b = Math.round((rgba[at + 2] * alpha) / 255 + ground);
    const grey = r === g && g === b;
    luminance[index] = grey
      ? LINEAR[r]
      : Math.round(0.2126 * LINEAR[r] + 0.7152 * LINEAR[g] + 0.0722 * LINEAR[b]);
  }
  return luminance;
}

/**
 * A drawing, or one part of it, as relative luminance over a white ground at exactly the asked pixels.
 * @param artwork unchanged; turn it first with `turnVector` where it is placed with quarter turns
 * @param request pixels, and the part in fractions of the drawing
 * @returns linear light, 0–65535, row-major, widthPx × heightPx
 * @throws ArtworkError too-slow, too-complex or unreadable
 */
export async function renderVector(
  artwork: VectorArtwork,
  request: SvgRenderRequest,
  tools: Pick<PipelineTools, 'renderSvg'>,
): Promise<Uint16Array> {
  return luminanceOverWhite(await tools.renderSvg(artwork.svg, request));
}
