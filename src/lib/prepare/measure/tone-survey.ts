import type { Field } from '../../imaging/field';
import type { CellMap } from './windows';

/** Side of a block of the survey, px. */
const SIDE_PX = 8;
const PLAIN = 0;
const EDGE = 1;
const TINT = 2;
const TONAL = 3;
/** Coverage 0–255 up to which a sample counts as bare, and from which as full. */
const BARE = 32;
const FULL = 223;

/** Mean coverage 0–255 between which a flat block is a tint; beyond, it is paper that is not quite white or ink not quite black. */
const LIGHTEST_TINT = 56;
const DARKEST_TINT = 184;

/** What each part of a picture is made of. */
export interface ToneSurvey {
  columns: number;
  rows: number;
  /** one byte a block: 1 where it belongs to a photograph or a gradient */
  tonal: Uint8Array;
  tonalShare: number;
  /** share of blocks that are one flat grey between ink and paper, 0–1 */
  tintShare: number;
  /** number of pixels by coverage, 256 entries */
  histogram: Uint32Array;
}

function kindOfBlock(
  { data, width, height }: Field,
  left: number,
  top: number,
): [kind: number, mean: number] {
  const right = Math.min(width, left + SIDE_PX);
  const bottom = Math.min(height, top + SIDE_PX);
  let [low, high, middle, sum] = [255, 0, 0, 0];
  for (let y = top; y < bottom; y++) {
    for (let i = y * width + left; i < y * width + right; i++) {
      const v = data[i];
      if (v < low) low = v;
      if (v > high) high = v;
      if (v > BARE && v < FULL) middle++;
      sum += v;
    }
  }
  const pixels = (right - left) * (bottom - top);
  const mean = Math.round(sum / pixels);
  if (high <= BARE || low >= FULL) return [PLAIN, mean];
  if (high - low <= 12) return [TINT, mean];
  if (low < 40 && high > 215 && middle < 0.6 * pixels) return [EDGE, mean];
  const near = Math.max(4, 0.12 * (high - low));
  let extremes = 0;
  for (let y = top; y < bottom; y++) {
    for (let i = y * width + left; i < y * width + right; i++) {
      if (data[i] <= low + near || data[i] >= high - near) extremes++;
    }
  }
  return [extremes >= 0.6 * pixels ? EDGE : TONAL, mean];
}

/** Levels apart at which two flat blocks still are the same tint, and the share of all flat blocks that makes a tint. */
const SAME_TINT = 1;
const TINT_CROWD = 0.2;

/** Flat blocks whose grey few others have are steps of a gradient: tonal. */
function settleGradients(kinds: Uint8Array, means: Uint8Array): void {
  const counts = new Uint32Array(256);
  let flat = 0;
  for (let n = 0; n < kinds.length; n++) {
    if (kinds[n] !== TINT) continue;
    counts[means[n]]++;
    flat++;
  }
  for (let n = 0; n < kinds.length; n++) {
    if (kinds[n] !== TINT) continue;
    let crowd = 0;
    for (let v = means[n] - SAME_TINT; v <= means[n] + SAME_TINT; v++) crowd += counts[v] ?? 0;
    if (crowd < TINT_CROWD * flat) kinds[n] = TONAL;
  }
}

/** Tonal where most of the 5 × 5 blocks around are: lone blocks are edges, and edges inside a photograph are part of it. */
function settleTonal(kinds: Uint8Array, columns: number, rows: number): Uint8Array {
  const tonal = new Uint8Array(kinds.length);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      let [tones, all] = [0, 0];
      for (let y = Math.max(0, row - 2); y <= Math.min(rows - 1, row + 2); y++) {
        for (let x = Math.max(0, column - 2); x <= Math.min(columns - 1, column + 2); x++) {
          all++;
          if (kinds[y * columns + x] === TONAL) tones++;
        }
      }
      const own = kinds[row * columns + column];
      if (tones > all * (own === TONAL ? 0.35 : 0.5) && own !== PLAIN) tonal[row * columns + column] = 1;
      else if (tones > all * 0.7) tonal[row * columns + column] = 1;
    }
  }
  return tonal;
}

/**
 * Tells photographs and gradients from drawn parts, block by block.
 * A block of two levels with an edge between them is drawn; one whose samples spread between its extremes is tonal.
 * @param field coverage of the whole artwork, reduced; unchanged
 * @returns shares 0–1, the map of blocks and the histogram
 * @example a picture of black bars on white has tonalShare 0; a ramp from black to white has about 0.8
 */
export function surveyTones(field: Field): ToneSurvey {
  const columns = Math.ceil(field.width / SIDE_PX);
  const rows = Math.ceil(field.height / SIDE_PX);
  const kinds = new Uint8Array(columns * rows);
  const means = new Uint8Array(columns * rows);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const n = row * columns + column;
      [kinds[n], means[n]] = kindOfBlock(field, column * SIDE_PX, row * SIDE_PX);
    }
  }
  settleGradients(kinds, means);
  const tonal = settleTonal(kinds, columns, rows);
  const histogram = new Uint32Array(256);
  for (let i = 0; i < field.data.length; i++) histogram[field.data[i]]++;
  let [tones, tints] = [0, 0];
  for (let n = 0; n < kinds.length; n++) {
    if (tonal[n]) tones++;
    else if (kinds[n] === TINT && means[n] >= LIGHTEST_TINT && means[n] <= DARKEST_TINT) tints++;
  }
  return {
    columns,
    rows,
    tonal,
    tonalShare: tones / kinds.length,
    tintShare: tints / kinds.length,
    histogram,
  };
}

/** The blocks that are not tonal, as a map of what there is to look at; null where nothing is tonal. */
export function drawnCells({ columns, rows, tonal }: ToneSurvey): CellMap | null {
  return tonal.includes(1) ? { columns, rows, marked: tonal.map((value) => 1 - value) } : null;
}

/** Whether a place, in fractions 0–1 of the artwork's width and height, lies in a tonal part. */
export function isTonalAt(survey: ToneSurvey, fx: number, fy: number): boolean {
  const column = Math.min(survey.columns - 1, Math.max(0, Math.floor(fx * survey.columns)));
  const row = Math.min(survey.rows - 1, Math.max(0, Math.floor(fy * survey.rows)));
  return survey.tonal[row * survey.columns + column] === 1;
}
