import type { LightnessRaster } from '../../imaging/raster';
import type { Artwork, VectorArtwork } from '../artwork';
import { renderVector } from '../svg/render-vector';
import type { PipelineTools } from '../tools';
import type { ScanFrame } from './scan-frame';
import { skewReader } from './skew';
import {
  asCodes,
  makeLinear,
  resampleWhole,
  uprightReader,
  type Grey,
  type Light,
  type RowReader,
} from './upright';

export interface ResampleSettings {
  widthMm: number;
  heightMm: number;
  mirror: boolean;
  /** linear light for tone, coverage for linework and solid */
  light: Light;
  /** luminance beyond the artwork's edge in a turned frame, 0–65535: what stays untouched */
  outside: number;
}

const BAND_PX = 262_144;
const RENDER_PX = 8_000_000;
const MAX_SKEW_SOURCE_PX = 50_000_000;
// A turned frame reads between pixels; a source a little finer than the pitch keeps that from blurring.
const SKEW_FINENESS = 1.5;

const greyOf = (artwork: Extract<Artwork, { kind: 'raster' }>): Grey => ({
  width: artwork.widthPx,
  height: artwork.heightPx,
  data: artwork.luminance,
});

/**
 * The whole artwork, upright, at columns × rows over its extent: a picture is resampled, a drawing rendered.
 * @param artwork as it is placed, turned already; unchanged
 * @param light linear for tone, coverage for linework and solid
 * @returns luminance 0–65535
 * @throws ArtworkError what rendering a drawing throws
 */
export async function placedGrey(
  artwork: Artwork,
  columns: number,
  rows: number,
  light: Light,
  tools: Pick<PipelineTools, 'renderSvg'>,
): Promise<Grey> {
  if (artwork.kind === 'raster') return resampleWhole(greyOf(artwork), columns, rows, light);
  return {
    width: columns,
    height: rows,
    data: await renderVector(artwork, { widthPx: columns, heightPx: rows }, tools),
  };
}

async function turnedReader(
  artwork: Artwork,
  frame: ScanFrame,
  settings: ResampleSettings,
  tools: PipelineTools,
): Promise<RowReader> {
  const { widthMm, heightMm } = settings;
  const wanted = SKEW_FINENESS / Math.min(frame.pitchXMm, frame.pitchYMm);
  const perMm = Math.min(wanted, Math.sqrt(MAX_SKEW_SOURCE_PX / (widthMm * heightMm)));
  const columns = Math.max(1, Math.round(widthMm * perMm));
  const rows = Math.max(1, Math.round(heightMm * perMm));
  const grey = await placedGrey(artwork, columns, rows, settings.light, tools);
  const coverage = settings.light === 'coverage';
  // A mirrored artwork scanned at an angle is the artwork scanned at the opposite angle, each row reversed afterwards.
  const angleDeg = settings.mirror ? -frame.angleDeg : frame.angleDeg;
  const source = { grey: coverage ? asCodes(grey) : grey, widthMm, heightMm };
  const read = skewReader(source, frame, angleDeg, settings.outside);
  return (count) => {
    const band = read(count);
    if (coverage) makeLinear(band);
    return band;
  };
}

/** Gives the rows of a drawing, rendering them in parts so that memory does not grow with the area. */
function drawingReader(artwork: VectorArtwork, frame: ScanFrame, tools: PipelineTools) {
  const { columns, rows } = frame;
  const height = Math.max(1, Math.floor(RENDER_PX / columns));
  let rendered: Grey = { width: columns, height: 0, data: new Uint16Array(0) };
  let start = 0;
  let done = 0;
  return async (count: number): Promise<Uint16Array> => {
    if (done === start + rendered.height) {
      start = done;
      const to = Math.min(rows, start + height);
      const part = { left: 0, top: start / rows, width: 1, height: (to - start) / rows };
      const data = await renderVector(artwork, { widthPx: columns, heightPx: to - start, part }, tools);
      rendered = { width: columns, height: to - start, data };
    }
    const taken = Math.min(count, start + rendered.height - done);
    const from = (done - start) * columns;
    done += taken;
    return rendered.data.subarray(from, from + taken * columns);
  };
}

/**
 * The placed artwork at the pitch of one pass, in bands of rows from the top.
 * Upright frames are resampled axis by axis and drawings rendered straight at the pitch; turned frames are read between
 * the pixels of an upright picture finer than the pitch.
 * @param artwork as it is placed, turned already; unchanged
 * @param frame the pass's pixels; unchanged
 * @param settings placement, light and what lies outside
 * @param tools used for drawings alone
 * @returns bands that together are frame.rows high; a band's data may be filled again once the next is asked for
 * @throws ArtworkError what rendering a drawing throws
 * @example a picture of 2400 × 1600 px on 300 × 200 mm at 0.06 mm gives bands of 5000 columns, 3333 rows in all
 */
export async function* resample(
  artwork: Artwork,
  frame: ScanFrame,
  settings: ResampleSettings,
  tools: PipelineTools,
): AsyncGenerator<LightnessRaster> {
  const { columns, rows, pitchXMm, pitchYMm } = frame;
  const read =
    frame.angleDeg !== 0
      ? await turnedReader(artwork, frame, settings, tools)
      : artwork.kind === 'vector'
        ? drawingReader(artwork, frame, tools)
        : uprightReader(greyOf(artwork), columns, rows, settings.light);
  const count = Math.max(1, Math.floor(BAND_PX / columns));
  for (let row = 0; row < rows;) {
    const data = await read(count);
    const height = data.length / columns;
    yield { kind: 'lightness', width: columns, height, data, pitchXMm, pitchYMm };
    row += height;
  }
}
