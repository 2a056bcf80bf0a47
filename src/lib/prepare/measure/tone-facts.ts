import { lstarOfLuminance } from '../../imaging/cie-lightness';
import { cappedDistance, HIGHEST_CAP_PX } from '../../imaging/distance';
import { divide, type Field } from '../../imaging/field';
import { srgbToLinear } from '../../imaging/srgb';
import type { ToneFacts } from '../../preflight/facts';
import type { ToneSurvey } from './tone-survey';

/** L* of a coverage 0–255. */
const lstarOfCoverage = (coverage: number): number => lstarOfLuminance(srgbToLinear(1 - coverage / 255));

/** Coverage that a share of all pixels lies under, 0–255. */
function percentile(histogram: Uint32Array, share: number): number {
  const total = histogram.reduce((a, b) => a + b, 0);
  let sum = 0;
  for (let v = 0; v < 256; v++) {
    sum += histogram[v];
    if (sum >= share * total) return v;
  }
  return 255;
}

/** The most common coverage along the outermost pixels, give or take three levels, and its share. */
function borderOf({ data, width, height }: Field): { coverage: number; share: number } {
  const counts = new Uint32Array(256);
  const deep = Math.max(1, Math.round(Math.min(width, height) * 0.01));
  for (let y = 0; y < height; y++) {
    const edge = y < deep || y >= height - deep;
    for (let x = 0; x < width; x++) {
      if (edge || x < deep || x >= width - deep) counts[data[y * width + x]]++;
      else x = width - deep - 1;
    }
  }
  const total = counts.reduce((a, b) => a + b, 0);
  let best = 0;
  for (let v = 1; v < 256; v++) if (counts[v] > counts[best]) best = v;
  const near = counts.subarray(Math.max(0, best - 3), best + 4).reduce((a, b) => a + b, 0);
  return { coverage: best, share: near / total };
}

/** Share of the burned area that lies within 1.5 line extents of an edge on both sides, about. */
function thinShareOf(field: Field, level: number, extentPx: number): number {
  const division = divide(field, level);
  const reach = Math.min(HIGHEST_CAP_PX - 1, Math.max(1.5, 1.5 * extentPx));
  const squared = cappedDistance(division, Math.ceil(reach) + 1);
  let [burned, deep] = [0, 0];
  for (let i = 0; i < squared.length; i++) {
    if (!division.inside[i]) continue;
    burned++;
    if (squared[i] > reach * reach) deep++;
  }
  if (burned === 0) return 0;
  // Each deep pixel stands for a core around which a rim as wide as the reach belongs to the same thick shape.
  return deep === 0
    ? 1
    : Math.max(0, 1 - (deep + rimOf(squared, division.inside, field.width, reach)) / burned);
}

/** Number of burned pixels within the reach of a deep one, found along rows and columns alone. */
function rimOf(squared: Uint8Array, inside: Uint8Array, width: number, reach: number): number {
  const far = Math.ceil(reach);
  let rim = 0;
  for (let i = 0; i < squared.length; i++) {
    if (!inside[i] || squared[i] > reach * reach) continue;
    for (let d = 1; d <= far; d++) {
      if (isDeep(squared, inside, i - d, reach) || isDeep(squared, inside, i + d, reach)) rim++;
      else if (isDeep(squared, inside, i - d * width, reach) || isDeep(squared, inside, i + d * width, reach))
        rim++;
      else continue;
      break;
    }
  }
  return rim;
}

const isDeep = (squared: Uint8Array, inside: Uint8Array, i: number, reach: number): boolean =>
  i >= 0 && i < squared.length && inside[i] === 1 && squared[i] > reach * reach;

/**
 * Tonal figures of an artwork from its reduced picture.
 * @param field coverage of the whole artwork; unchanged
 * @param survey of the same field; unchanged
 * @param level that parts burned from unburned, 0–255
 * @param extentPx smallest line extent at this scale, px
 * @returns shares 0–1 and L*
 */
export function toneFacts(field: Field, survey: ToneSurvey, level: number, extentPx: number): ToneFacts {
  const { histogram } = survey;
  const total = field.data.length;
  let [burned, sum] = [0, 0];
  for (let v = 0; v < 256; v++) {
    if (v > level) burned += histogram[v];
    sum += v * histogram[v];
  }
  const border = borderOf(field);
  return {
    tonalShare: survey.tonalShare,
    tintShare: survey.tintShare,
    burnedShare: burned / total,
    meanCoverage: sum / total / 255,
    darkLstar: lstarOfCoverage(percentile(histogram, 0.98)),
    lightLstar: lstarOfCoverage(percentile(histogram, 0.02)),
    borderLstar: lstarOfCoverage(border.coverage),
    borderShare: border.share,
    thinShare: thinShareOf(field, level, extentPx),
  };
}
