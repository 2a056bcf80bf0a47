import type { Artwork } from './artwork';
import type { MarkRaster } from './mark-raster';
import { resample } from './resample/resample';
import type { ScanFrame } from './resample/scan-frame';
import { screen } from './screen/screen';
import type { Settings } from './settings';
import { burnTable, untouchedLuminance } from './tone/burn-table';
import { toner } from './tone/tone';
import type { PipelineTools } from './tools';
import type { Stopwatch } from './stopwatch';

/** Reverses every row, in place: the file of a mirrored artwork. */
function reverseRows(rows: Uint8Array, width: number): void {
  for (let start = 0; start < rows.length; start += width) rows.subarray(start, start + width).reverse();
}

export interface MarkSurroundings {
  tools: PipelineTools;
  /** takes the time of each stage */
  stopwatch: Stopwatch;
  /** told the share of the rows that are done, 0–1 */
  onProgress: (share: number) => void;
}

/**
 * What one pass marks: the artwork brought to the pitch, turned into burn, and screened, band by band.
 * Bands keep memory from growing with the area; only the finished dots or levels are held whole.
 * @param artwork as it is placed, turned already; unchanged
 * @param frame the pass's pixels; unchanged
 * @param settings placement, treatment, tone, screen; unchanged
 * @param around tools, stopwatch and progress
 * @returns dots, or power levels for continuous tone
 * @throws ArtworkError what resampling throws
 * @example a black artwork of 10 × 10 mm at 0.1 mm, solid: 100 × 100 dots, all burned
 */
export async function mark(
  artwork: Artwork,
  frame: ScanFrame,
  settings: Settings,
  { tools, stopwatch, onProgress }: MarkSurroundings,
): Promise<MarkRaster> {
  const { columns: width, rows: height, pitchXMm, pitchYMm } = frame;
  const tonal = settings.treatment === 'halftone' || settings.treatment === 'continuous';
  const placement = {
    widthMm: settings.widthMm,
    heightMm: settings.heightMm,
    mirror: settings.mirror,
    light: tonal ? 'linear' : 'coverage',
    outside: untouchedLuminance(settings),
  } as const;
  const bands = resample(artwork, frame, placement, tools);
  const toned = toner(burnTable(settings));
  const screener = screen(settings, width);
  const next = () => stopwatch.time('resample', () => bands.next());
  const data = new Uint8Array(width * height);
  let done = 0;
  const keep = (until: number): void => {
    if (settings.mirror) reverseRows(data.subarray(done, until), width);
    done = until;
    onProgress(done / data.length);
  };
  for (let band = await next(); !band.done; band = await next()) {
    const lightness = band.value;
    const burn = stopwatch.timeNow('tone', () => toned(lightness));
    stopwatch.timeNow('screen', () => keep(screener.push(burn.data, data, done)));
  }
  stopwatch.timeNow('screen', () => keep(screener.end(data, done)));
  const kind = settings.treatment === 'continuous' ? 'levels' : 'mask';
  return { kind, width, height, data, pitchXMm, pitchYMm };
}
