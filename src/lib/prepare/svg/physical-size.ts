import { cssPxToMm, CSS_PX_PER_INCH, MM_PER_INCH, POINTS_PER_INCH } from '../../units';
import { ArtworkError } from '../tools';

/** Absolute lengths in CSS px, and font-relative ones at the initial font size of 16 px (CSS Values and Units 4, section 6). */
const PX_PER_UNIT: Record<string, number> = {
  '': 1,
  px: 1,
  in: CSS_PX_PER_INCH,
  cm: (CSS_PX_PER_INCH / MM_PER_INCH) * 10,
  mm: CSS_PX_PER_INCH / MM_PER_INCH,
  q: CSS_PX_PER_INCH / MM_PER_INCH / 4,
  pt: CSS_PX_PER_INCH / POINTS_PER_INCH,
  pc: (CSS_PX_PER_INCH / POINTS_PER_INCH) * 12,
  em: 16,
  rem: 16,
  ex: 8,
  ch: 8,
};

const LENGTH = /^\s*([+-]?(?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)\s*([a-z]*)\s*$/i;

/**
 * A length in CSS px.
 * @param text as an attribute holds it; a percentage, `auto` and unknown units give null
 * @example lengthPx('25.4mm') === 96
 */
export function lengthPx(text: string | undefined): number | null {
  const match = text === undefined ? null : LENGTH.exec(text);
  if (!match) return null;
  const unit = PX_PER_UNIT[match[2].toLowerCase()];
  return unit === undefined ? null : Number(match[1]) * unit;
}

/** Four numbers of a viewBox, or null where there is none that can be read. */
export function readViewBox(text: string | undefined): [number, number, number, number] | null {
  const numbers = (text ?? '')
    .trim()
    .split(/[\s,]+/)
    .map(Number);
  if (text === undefined || numbers.length !== 4 || numbers.some((value) => !Number.isFinite(value)))
    return null;
  return numbers as [number, number, number, number];
}

export interface Page {
  /** size that the file states, mm; null where it states none */
  ownWidthMm: number | null;
  ownHeightMm: number | null;
  /** nominal size in CSS px, used for the proportions */
  widthPx: number;
  heightPx: number;
  /** what the drawing's own units are fitted to */
  viewBox: [number, number, number, number];
  /** the whole page in the drawing's own units, letterbox included */
  frame: [number, number, number, number];
}

const MAX_SIDE_PX = 400_000;
const MIN_SIDE_PX = 0.05;
const MAX_USER_UNITS = 1e7;
const MIN_USER_UNITS = 1e-4;
const MAX_ASPECT = 10_000;

const absurd = (what: string): ArtworkError =>
  new ArtworkError(
    'unreadable',
    `This drawing states ${what}. Set the page to the drawing's real size and save it again.`,
  );

function assertSound(widthPx: number, heightPx: number, viewBox: readonly number[]): void {
  const [left, top, width, height] = viewBox;
  if (!(width > 0) || !(height > 0) || !(widthPx > 0) || !(heightPx > 0)) throw absurd('a page without area');
  const sides = [widthPx, heightPx];
  if (sides.some((side) => side > MAX_SIDE_PX || side < MIN_SIDE_PX))
    throw absurd('a page of an impossible size');
  const units = [width, height];
  if (units.some((unit) => unit > MAX_USER_UNITS || unit < MIN_USER_UNITS))
    throw absurd('an impossible viewBox');
  if (Math.abs(left) > MAX_USER_UNITS || Math.abs(top) > MAX_USER_UNITS)
    throw absurd('an impossible viewBox');
  if (widthPx / heightPx > MAX_ASPECT || heightPx / widthPx > MAX_ASPECT)
    throw absurd('an impossibly narrow page');
}

const ALIGN: Record<string, number> = { min: 0, mid: 0.5, max: 1 };

/** The page in user units: what preserveAspectRatio leaves beside the viewBox, or cuts from it (SVG 2, section 8.7). */
function frameOf(widthPx: number, heightPx: number, viewBox: Page['viewBox'], aspect: string): Page['frame'] {
  const [left, top, width, height] = viewBox;
  if (/\bnone\b/.test(aspect)) return viewBox;
  const [scaleX, scaleY] = [widthPx / width, heightPx / height];
  const scale = /\bslice\b/.test(aspect) ? Math.max(scaleX, scaleY) : Math.min(scaleX, scaleY);
  const [, alignX = 'mid', alignY = 'mid'] = /x(min|mid|max)y(min|mid|max)/i.exec(aspect.toLowerCase()) ?? [];
  const [frameWidth, frameHeight] = [widthPx / scale, heightPx / scale];
  return [
    left - (frameWidth - width) * ALIGN[alignX],
    top - (frameHeight - height) * ALIGN[alignY],
    frameWidth,
    frameHeight,
  ];
}

/**
 * Page of a drawing from the root's own width, height, viewBox and preserveAspectRatio.
 * A side that is missing follows from the other and the viewBox; with neither, the viewBox gives proportions and no size.
 * @param attributes of the root element; unchanged
 * @throws ArtworkError unknown-size when there is neither size nor viewBox, unreadable when they are absurd
 * @example physicalSize({ width: '50mm', height: '1in' }).ownHeightMm === 25.4
 */
export function physicalSize(attributes: Record<string, string>): Page {
  const [statedWidth, statedHeight] = [lengthPx(attributes.width), lengthPx(attributes.height)];
  const stated = readViewBox(attributes.viewBox);
  if (attributes.viewBox !== undefined && !stated && attributes.viewBox.trim() !== '')
    throw absurd('an unreadable viewBox');
  let [widthPx, heightPx] = [statedWidth, statedHeight];
  if (stated) {
    if (!(stated[2] > 0) || !(stated[3] > 0)) throw absurd('a page without area');
    const ratio = stated[2] / stated[3];
    if (widthPx === null && heightPx !== null) widthPx = heightPx * ratio;
    else if (heightPx === null && widthPx !== null) heightPx = widthPx / ratio;
  }
  const sized = widthPx !== null && heightPx !== null;
  if (!sized && !stated) {
    const message =
      'This drawing states neither a size nor a viewBox, so its edges are unknown. Set a page size and save it again.';
    throw new ArtworkError('unknown-size', message);
  }
  const width = sized ? widthPx! : stated![2];
  const height = sized ? heightPx! : stated![3];
  const viewBox = stated ?? [0, 0, width, height];
  assertSound(width, height, viewBox);
  const frame = frameOf(width, height, viewBox, attributes.preserveAspectRatio ?? 'xMidYMid meet');
  return {
    ownWidthMm: sized ? cssPxToMm(width) : null,
    ownHeightMm: sized ? cssPxToMm(height) : null,
    widthPx: width,
    heightPx: height,
    viewBox,
    frame,
  };
}
