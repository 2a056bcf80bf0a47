import type { Artwork } from '../artwork';
import { turnArtwork } from '../resample/turn';
import type { PipelineTools } from '../tools';
import { areaMask } from './area-mask';
import { curveLength, writePathData, type Curve } from './curve';
import { fitOutline } from './fit-outline';
import { follow } from './follow';
import { insetOutlines } from './inset';
import type { Linework, TraceSettings } from './linework';
import { rasterMask } from './raster-mask';
import { readDrawing } from './read-drawing';
import { simplify, type Region } from './region';
import { traceMask, type TracedMask } from './trace-mask';

type Tools = Pick<PipelineTools, 'renderSvg' | 'traceGrey'>;

/** Chords stay this share of the spot's smaller side from the curves that they stand for. */
const CHORD_SHARE = 1 / 50;

interface Found {
  method: 'followed' | 'traced';
  lines: Curve[];
  areas: Region;
  traced: TracedMask | null;
}

async function find(
  artwork: Artwork,
  settings: TraceSettings,
  toleranceMm: number,
  tools: Tools,
): Promise<Found> {
  if (artwork.kind === 'raster') {
    const traced = await traceMask(rasterMask(artwork, settings), settings, tools);
    return { method: 'traced', lines: [], areas: traced.region, traced };
  }
  const { drawing, root, styles } = readDrawing(artwork.svg, settings, toleranceMm);
  const { lines, areas } = follow(drawing, toleranceMm);
  if (areas) return { method: 'followed', lines, areas, traced: null };
  const mask = await areaMask(root, styles, drawing.followed, settings, tools);
  const traced = await traceMask(mask, settings, tools);
  return { method: lines.length > 0 ? 'followed' : 'traced', lines, areas: traced.region, traced };
}

const nodesOf = ({ pieces, closed }: Curve): number => pieces.length + (closed ? 0 : 1);

/**
 * Lines that burn an artwork. In a drawing, dark strokes are followed along their centres with their curves kept, and dark
 * fills are followed along their outlines, drawn in by half the line extent so that the burned edge lies where the drawn one
 * does. Text, pictures, masks and whatever else has no outline of its own is rendered finely and traced, as a picture of
 * pixels is.
 * @param artwork as sent; unchanged
 * @param settings placed size and quarter turns, spot, dividing level and corners
 * @param tools `renderSvg` and `traceGrey` are used
 * @returns lines in mm; none for an artwork without ink
 * @throws ArtworkError when it takes too long or holds nothing that can be followed
 * Accuracy: filled outlines within a fiftieth of the spot; traced ones as the report says.
 */
export async function trace(artwork: Artwork, settings: TraceSettings, tools: Tools): Promise<Linework> {
  const { widthMm, heightMm, spot } = settings;
  const toleranceMm = Math.min(spot.widthMm, spot.heightMm) * CHORD_SHARE;
  const turned = turnArtwork(artwork, settings.quarterTurns);
  const { method, lines, areas, traced } = await find(turned, settings, toleranceMm, tools);
  const outlines = insetOutlines(simplify(areas, toleranceMm), spot).map((outline) =>
    fitOutline(outline, toleranceMm),
  );
  const curves = [...lines, ...outlines];
  return {
    widthMm,
    heightMm,
    strokeWidthMm: Math.round(((spot.widthMm + spot.heightMm) / 2) * 1e4) / 1e4,
    paths: curves.map(writePathData),
    report: {
      method,
      nodes: curves.reduce((sum, curve) => sum + nodesOf(curve), 0),
      paths: curves.length,
      islandsDropped: traced?.islandsDropped ?? 0,
      meanBoundaryMm: traced?.meanBoundaryMm ?? null,
      hausdorffMm: traced?.hausdorffMm ?? null,
      lengthMm: curves.reduce((sum, curve) => sum + curveLength(curve, toleranceMm), 0),
    },
  };
}
