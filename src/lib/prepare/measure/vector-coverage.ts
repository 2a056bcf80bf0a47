import { LUMINANCE_WEIGHTS, linearToSrgb, srgbToLinear } from '../../imaging/srgb';
import type { VectorArtwork } from '../artwork';
import type { PipelineTools } from '../tools';
import { onArtwork, type CoverageSource, type CoverageWindow } from './coverage-source';

const LINEAR = Float32Array.from({ length: 256 }, (_, code) => srgbToLinear(code / 255));
/** Coverage 0–255 of full ink by its relative luminance in steps of 1/4095. */
const COVERAGE = Float32Array.from({ length: 4096 }, (_, y) => 255 * (1 - linearToSrgb(y / 4095)));

function coverageOfPixel(r: number, g: number, b: number, alpha: number): number {
  if (r === g && g === b) return (alpha * (255 - r)) / 255;
  const y =
    LUMINANCE_WEIGHTS.red * LINEAR[r] +
    LUMINANCE_WEIGHTS.green * LINEAR[g] +
    LUMINANCE_WEIGHTS.blue * LINEAR[b];
  return (alpha * COVERAGE[Math.round(y * 4095)]) / 255;
}

/** Highest number of pixels that are drawn in one go. */
const STRIP_PX = 4_000_000;

/**
 * Coverage of a drawing, rendered at the scale that is asked for, strip by strip.
 * @param artwork unchanged and kept
 * @param tools draws the SVG
 * @returns a source that resolves any scale
 */
export function vectorCoverage(
  artwork: VectorArtwork,
  tools: Pick<PipelineTools, 'renderSvg'>,
): CoverageSource {
  const read = async (window: CoverageWindow): Promise<Uint8Array> => {
    const out = new Uint8Array(window.width * window.height);
    const part = onArtwork(window);
    if (!part) return out;
    const columns = part.right - part.left;
    const strip = Math.max(1, Math.floor(STRIP_PX / columns));
    for (let top = part.top; top < part.bottom; top += strip) {
      const rows = Math.min(strip, part.bottom - top);
      const pixels = await tools.renderSvg(artwork.svg, {
        widthPx: columns,
        heightPx: rows,
        part: {
          left: part.left / window.artWidthPx,
          top: top / window.artHeightPx,
          width: columns / window.artWidthPx,
          height: rows / window.artHeightPx,
        },
      });
      layStrip(
        pixels,
        columns,
        rows,
        out,
        (top - window.top) * window.width + part.left - window.left,
        window.width,
      );
    }
    return out;
  };
  return { nativePx: null, read };
}

function layStrip(
  pixels: Uint8Array,
  columns: number,
  rows: number,
  out: Uint8Array,
  at: number,
  stride: number,
): void {
  let i = 0;
  for (let y = 0; y < rows; y++) {
    for (let to = at + y * stride; to < at + y * stride + columns; to++, i += 4) {
      const alpha = pixels[i + 3];
      if (alpha) out[to] = Math.round(coverageOfPixel(pixels[i], pixels[i + 1], pixels[i + 2], alpha));
    }
  }
}
