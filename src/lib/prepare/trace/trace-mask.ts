import type { MaskRaster } from '../../imaging/raster';
import { spotArea } from '../../machines/spot';
import { ArtworkError, type PipelineTools } from '../tools';
import { boundaryDistance } from './boundary-distance';
import { flatten, readPathData, transformCurve, type Matrix } from './curve';
import { dropIslands } from './drop-islands';
import type { TraceSettings } from './linework';
import type { Region } from './region';

/** White pixels round the mask, so that no outline runs along the picture's edge. */
const MARGIN_PX = 1;
/** Corner threshold, potrace's alphamax: its own default keeps corners; eased rounds all but the sharpest. */
const CORNER_THRESHOLD = { kept: 1, eased: 1.2 } as const;
const CURVE_TOLERANCE_PX = 0.2;
const CHORD_TOLERANCE_PX = 0.1;
/** A mask that turns over more often than this along its rows is made of dots, not of shapes. */
const MAX_TURNS_SHARE = 0.2;
const DOTS_FROM_PX = 250_000;

export interface TracedMask {
  /** dark areas, mm */
  region: Region;
  islandsDropped: number;
  meanBoundaryMm: number | null;
  hausdorffMm: number | null;
}

function assertShapes({ data, width }: MaskRaster): void {
  if (data.length < DOTS_FROM_PX) return;
  let turns = 0;
  for (let index = 1; index < data.length; index += 1) {
    if (index % width !== 0 && data[index] !== data[index - 1]) turns += 1;
  }
  if (turns / data.length <= MAX_TURNS_SHARE) return;
  const message =
    'This picture is made of many small dots, so it has no lines to follow. ' +
    'Choose halftone or solid, or send the picture as it was before it was turned into dots.';
  throw new ArtworkError('too-complex', message);
}

/** Luminance with a white margin, as the tracer takes it. */
function greyOf({ data, width, height }: MaskRaster): { grey: Uint8Array; width: number; height: number } {
  const [wide, high] = [width + 2 * MARGIN_PX, height + 2 * MARGIN_PX];
  const grey = new Uint8Array(wide * high).fill(255);
  for (let row = 0; row < height; row += 1) {
    const target = (row + MARGIN_PX) * wide + MARGIN_PX;
    for (let column = 0; column < width; column += 1) {
      if (data[row * width + column] === 1) grey[target + column] = 0;
    }
  }
  return { grey, width: wide, height: high };
}

/**
 * Dark areas of a mask with smooth outlines, in mm.
 * Parts smaller than the spot's area are dropped, then potrace finds the outlines in a process of its own.
 * @param mask 1 dark; unchanged
 * @param settings spot and corners
 * @param tools only `traceGrey` is used
 * @returns areas, how many islands were dropped, and how far the outlines lie from the mask's own boundary
 * @throws ArtworkError too-complex when the mask is made of dots, too-slow when it cannot be traced in time
 * @see Selinger, Potrace: a polygon-based tracing algorithm, 2003
 */
export async function traceMask(
  mask: MaskRaster,
  settings: Pick<TraceSettings, 'spot' | 'corners'>,
  tools: Pick<PipelineTools, 'traceGrey'>,
): Promise<TracedMask> {
  assertShapes(mask);
  const { width, height, pitchXMm, pitchYMm } = mask;
  const smallest = Math.floor(spotArea(settings.spot) / (pitchXMm * pitchYMm));
  const data = mask.data.slice();
  const { islands } = dropIslands(data, width, height, smallest);
  const padded = greyOf({ ...mask, data });
  const path = await tools.traceGrey(padded.grey, padded.width, padded.height, {
    smallestIslandPx: 0,
    cornerThreshold: CORNER_THRESHOLD[settings.corners],
    curveTolerancePx: CURVE_TOLERANCE_PX,
  });
  const curves = readPathData(path);
  const shift: Matrix = [1, 0, 0, 1, -MARGIN_PX, -MARGIN_PX];
  const outlinesPx = curves.map((curve) => flatten(transformCurve(curve, shift), CHORD_TOLERANCE_PX));
  const distance = boundaryDistance(outlinesPx, data, width, height);
  const pitch = Math.max(pitchXMm, pitchYMm);
  return {
    // The tracer's outlines do not cross, and holes turn the other way: they are an area as they stand.
    region: outlinesPx.map((outline) => outline.map(([x, y]) => [x * pitchXMm, y * pitchYMm] as const)),
    islandsDropped: islands,
    meanBoundaryMm: distance && distance.meanPx * pitch,
    hausdorffMm: distance && distance.hausdorffPx * pitch,
  };
}
