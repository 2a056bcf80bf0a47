import { codeValues, FULL_LUMINANCE } from '../../imaging/srgb';
import type { RasterArtwork } from '../artwork';
import { onArtwork, type CoverageSource, type CoverageWindow } from './coverage-source';

let coverageOfLuminance: Uint8Array | null = null;

function coverageTable(): Uint8Array {
  if (!coverageOfLuminance) {
    const codes = codeValues();
    coverageOfLuminance = Uint8Array.from({ length: FULL_LUMINANCE + 1 }, (_, y) =>
      Math.round(255 * (1 - codes[y])),
    );
  }
  return coverageOfLuminance;
}

/** Source pixels that each target pixel takes in along one axis: first, and weights that sum to 1. */
interface Share {
  first: number;
  weights: Float32Array;
}

function sharesOf(from: number, to: number, targetPx: number, sourcePx: number): Share[] {
  const scale = sourcePx / targetPx;
  return Array.from({ length: to - from }, (_, k) => {
    const start = (from + k) * scale;
    const end = Math.min(sourcePx, start + scale);
    const first = Math.min(sourcePx - 1, Math.floor(start + 1e-9));
    const last = Math.min(sourcePx - 1, Math.max(first, Math.ceil(end - 1e-9) - 1));
    const weights = Float32Array.from({ length: last - first + 1 }, (_, n) =>
      Math.max(0, Math.min(end, first + n + 1) - Math.max(start, first + n)),
    );
    const sum = weights.reduce((a, b) => a + b, 0);
    return { first, weights: sum > 0 ? weights.map((w) => w / sum) : weights.fill(1 / weights.length) };
  });
}

/**
 * Coverage of a picture made of pixels: its own at its own scale, mean over area at coarser ones.
 * @param artwork unchanged and kept
 * @returns a source whose native size is the picture's
 */
export function rasterCoverage(artwork: RasterArtwork): CoverageSource {
  const { widthPx, heightPx, luminance } = artwork;
  const table = coverageTable();
  const read = async (window: CoverageWindow): Promise<Uint8Array> => {
    const out = new Uint8Array(window.width * window.height);
    const part = onArtwork(window);
    if (!part) return out;
    if (window.artWidthPx === widthPx && window.artHeightPx === heightPx) {
      for (let y = part.top; y < part.bottom; y++) {
        let to = (y - window.top) * window.width + part.left - window.left;
        for (let i = y * widthPx + part.left; i < y * widthPx + part.right; i++)
          out[to++] = table[luminance[i]];
      }
      return out;
    }
    const across = sharesOf(part.left, part.right, window.artWidthPx, widthPx);
    const down = sharesOf(part.top, part.bottom, window.artHeightPx, heightPx);
    const row = new Float32Array(part.right - part.left);
    down.forEach(({ first, weights }, k) => {
      row.fill(0);
      weights.forEach((weight, n) => addRow(row, luminance, table, (first + n) * widthPx, across, weight));
      out.set(row.map(Math.round), (part.top + k - window.top) * window.width + part.left - window.left);
    });
    return out;
  };
  return { nativePx: { width: widthPx, height: heightPx }, read };
}

function addRow(
  row: Float32Array,
  luminance: Uint16Array,
  table: Uint8Array,
  rowStart: number,
  across: readonly Share[],
  weight: number,
): void {
  for (let x = 0; x < row.length; x++) {
    const { first, weights } = across[x];
    let sum = 0;
    for (let n = 0; n < weights.length; n++) sum += weights[n] * table[luminance[rowStart + first + n]];
    row[x] += weight * sum;
  }
}
