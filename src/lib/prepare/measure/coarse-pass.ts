import { closedLoops } from '../../imaging/closed-loops';
import { contourOf } from '../../imaging/contour';
import { cappedDistance } from '../../imaging/distance';
import { divide, type Field } from '../../imaging/field';
import { fineLines } from '../../imaging/fine-lines';
import { medialAxis } from '../../imaging/medial-axis';
import { extentAlong, type LineExtents } from './line-extents';

/** Widths under this many line extents are looked at closely. */
export const CLOSE_LOOK_EXTENTS = 1.5;
/** What a coarse width may be wrong by, px. */
const COARSE_ERROR_PX = 0.4;

/**
 * Calls back for every place of a coarse window that may hold something too thin or too small.
 * The same middle lines as in the close look, at a scale where a line extent is about two pixels; and lines too faint to
 * reach the level.
 * @param field coverage; unchanged
 * @param level that parts burned from unburned, 0–255
 * @param extents at the coarse scale; unchanged
 * @param mark receives x and y in px of the field
 * @param faintest as `fineLines`
 */
export function suspectPlaces(
  field: Field,
  level: number,
  extents: LineExtents,
  mark: (x: number, y: number) => void,
  faintest: number,
): void {
  for (const side of [0, 1] as const) {
    const fine = fineLines(field, side, faintest);
    for (let n = 0; n < fine.count; n++) mark(fine.x[n], fine.y[n]);
    faintDots(field, side, faintest, mark);
  }
  const division = divide(field, level);
  if (!division.edgeBlocks.includes(1)) return;
  const contour = contourOf(field, division, level);
  const widest = CLOSE_LOOK_EXTENTS * extents.largestPx + COARSE_ERROR_PX;
  const squared = cappedDistance(division, Math.min(15, Math.ceil(widest / 2 + 2)));
  for (const side of [0, 1] as const) {
    const points = medialAxis(division, squared, contour, side, widest);
    for (let n = 0; n < points.count; n++) {
      const across = points.across[n];
      const along = across > 0 ? across - Math.PI / 2 : across + Math.PI / 2;
      const limit = CLOSE_LOOK_EXTENTS * largestNear(extents, along) + COARSE_ERROR_PX;
      if (points.width[n] < limit) mark(points.x[n], points.y[n]);
    }
  }
  for (const loop of closedLoops(contour, Math.ceil(10 * extents.largestPx + 12))) {
    if (Math.abs(loop.areaPx2) < 2 * extents.spotAreaPx2 + 4)
      mark((loop.left + loop.right) / 2, (loop.top + loop.bottom) / 2);
  }
}

/** Marks dots that a few pixels share, so that none of them need reach the level. */
function faintDots(
  { width, height, data }: Field,
  side: 0 | 1,
  faintest: number,
  mark: (x: number, y: number) => void,
): void {
  const flip = side === 1 ? 0 : 255;
  for (let y = 2; y < height - 2; y++) {
    for (let x = 2; x < width - 2; x++) {
      const i = y * width + x;
      const v = data[i] ^ flip;
      if (v < faintest || v > 255 - faintest) continue;
      const low = v / 3;
      const alone =
        (data[i - 2] ^ flip) < low &&
        (data[i + 2] ^ flip) < low &&
        (data[i - 2 * width] ^ flip) < low &&
        (data[i + 2 * width] ^ flip) < low;
      if (alone) mark(x + 0.5, y + 0.5);
    }
  }
}

/** A coarse direction may be off by some degrees. */
function largestNear(extents: LineExtents, along: number): number {
  const off = Math.PI / 15;
  const turn = (a: number): number => (a > Math.PI / 2 ? a - Math.PI : a < -Math.PI / 2 ? a + Math.PI : a);
  return Math.max(
    extentAlong(extents, along),
    extentAlong(extents, turn(along + off)),
    extentAlong(extents, turn(along - off)),
  );
}
