import { luminanceOfLstar } from '../../imaging/cie-lightness';
import type { MaskRaster } from '../../imaging/raster';
import { codeValues, FULL_LUMINANCE } from '../../imaging/srgb';
import type { RasterArtwork } from '../artwork';
import type { TraceSettings } from './linework';

/** Pixels that a mask may have; tracing takes memory and time for each. */
const MAX_MASK_PX = 12_000_000;
/** The spot's smaller side in mask pixels, where the artwork is fine enough for it. */
const PX_PER_SPOT = 6;
/** A coarse artwork's edges are smooth greys: so many mask pixels a side find where they pass the dividing level. */
const MAX_ENLARGEMENT = 4;

/**
 * Columns and rows of the mask to trace: fine against the spot, never more than four times the artwork's own pixels a side.
 * @param ownPx the artwork's columns and rows; null for a drawing, which is as fine as asked
 */
export function maskSize(
  settings: Pick<TraceSettings, 'widthMm' | 'heightMm' | 'spot'>,
  ownPx: { widthPx: number; heightPx: number } | null,
): { width: number; height: number } {
  const { widthMm, heightMm, spot } = settings;
  const fine = PX_PER_SPOT / Math.min(spot.widthMm, spot.heightMm);
  const most = Math.sqrt(MAX_MASK_PX / (widthMm * heightMm));
  const own = ownPx
    ? MAX_ENLARGEMENT * Math.max(ownPx.widthPx / widthMm, ownPx.heightPx / heightMm)
    : Infinity;
  const pxPerMm = Math.min(fine, most, own);
  return {
    width: Math.max(1, Math.round(widthMm * pxPerMm)),
    height: Math.max(1, Math.round(heightMm * pxPerMm)),
  };
}

interface Taps {
  first: Int32Array;
  last: Int32Array;
  /** weight of the first and the last sample; those between weigh 1 */
  firstWeight: Float32Array;
  lastWeight: Float32Array;
}

/** Samples under each target pixel: a share of the area when made smaller, two neighbours when enlarged. */
function taps(from: number, to: number): Taps {
  const made: Taps = {
    first: new Int32Array(to),
    last: new Int32Array(to),
    firstWeight: new Float32Array(to),
    lastWeight: new Float32Array(to),
  };
  const step = from / to;
  for (let index = 0; index < to; index += 1) {
    if (step >= 1) {
      const [start, end] = [index * step, Math.min(from, (index + 1) * step)];
      made.first[index] = Math.floor(start);
      made.last[index] = Math.min(from - 1, Math.ceil(end) - 1);
      made.firstWeight[index] =
        made.first[index] === made.last[index] ? end - start : made.first[index] + 1 - start;
      made.lastWeight[index] = made.first[index] === made.last[index] ? 0 : end - made.last[index];
    } else {
      const centre = Math.min(from - 1, Math.max(0, (index + 0.5) * step - 0.5));
      made.first[index] = Math.floor(centre);
      made.last[index] = Math.min(from - 1, made.first[index] + 1);
      made.firstWeight[index] = 1 - (centre - made.first[index]);
      made.lastWeight[index] = centre - made.first[index];
    }
  }
  return made;
}

/**
 * Dark parts of a picture as a mask: code values brought to the mask's pixels by area or, enlarged, in straight lines between
 * neighbours, then divided. Edges are blended in code values, so the code value of the dividing level is where an edge lies.
 * @param artwork turned as it is placed; unchanged
 * @returns 1 where the picture is darker than the dividing level
 */
export function rasterMask(
  artwork: RasterArtwork,
  settings: Pick<TraceSettings, 'widthMm' | 'heightMm' | 'spot' | 'dividingLstar'>,
): MaskRaster {
  const { widthPx, heightPx, luminance } = artwork;
  const { width, height } = maskSize(settings, artwork);
  const codes = codeValues();
  const divide = codes[Math.round(luminanceOfLstar(settings.dividingLstar) * FULL_LUMINANCE)];
  const [across, down] = [taps(widthPx, width), taps(heightPx, height)];
  const whole = (taken: Taps, index: number): number =>
    taken.firstWeight[index] +
    taken.lastWeight[index] +
    Math.max(0, taken.last[index] - taken.first[index] - 1);
  const data = new Uint8Array(width * height);
  const column = new Float32Array(widthPx);
  for (let row = 0; row < height; row += 1) {
    column.fill(0);
    for (let source = down.first[row]; source <= down.last[row]; source += 1) {
      const ends =
        source === down.first[row]
          ? down.firstWeight[row]
          : source === down.last[row]
            ? down.lastWeight[row]
            : 1;
      if (ends === 0) continue;
      const start = source * widthPx;
      for (let x = 0; x < widthPx; x += 1) column[x] += ends * codes[luminance[start + x]];
    }
    const rowWhole = whole(down, row);
    for (let x = 0; x < width; x += 1) {
      const [first, last] = [across.first[x], across.last[x]];
      let sum = across.firstWeight[x] * column[first];
      if (last > first) sum += across.lastWeight[x] * column[last];
      for (let between = first + 1; between < last; between += 1) sum += column[between];
      data[row * width + x] = sum / (rowWhole * whole(across, x)) < divide ? 1 : 0;
    }
  }
  return {
    kind: 'mask',
    width,
    height,
    pitchXMm: settings.widthMm / width,
    pitchYMm: settings.heightMm / height,
    data,
  };
}
