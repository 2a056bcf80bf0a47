import type { Firing, Spot } from '../../machines/spot';
import type { MarkRaster } from '../mark-raster';
import type { ScanFrame } from '../resample/scan-frame';
import { skewReader } from '../resample/skew';
import { resampleWhole, type Grey } from '../resample/upright';
import { blockMeans } from './block-means';
import { coverByLevels, coverByTable, type RowSink } from './cover-by-table';
import { coverByPoints } from './cover-by-points';
import { coverTable } from './cover-table';
import { firedSpot, reachPx, type Sweep } from './fired-spot';

/** Pixels of a picture that shows the whole placed artwork, upright, with square pixels. */
export interface PictureSize {
  columns: number;
  rows: number;
  widthMm: number;
  heightMm: number;
}

const MOST_PARTS = 8;

/** Pixels of the picture for each pixel of the file. */
const perPixelOf = (marks: MarkRaster, frame: ScanFrame, picture: PictureSize): number =>
  frame.angleDeg === 0
    ? Math.min(picture.columns / marks.width, picture.rows / marks.height)
    : (picture.columns / picture.widthMm) * Math.min(marks.pitchXMm, marks.pitchYMm);

/** What one pass marks, in the file's own frame: finer than the picture where there is room, in blocks where there is not. */
function markedInFile(
  marks: MarkRaster,
  cover: (parts: number, sink: RowSink) => void,
  mostParts: number,
  perPixel: number,
): Grey {
  const parts = Math.max(1, Math.min(mostParts, Math.ceil(perPixel)));
  const block = Math.max(1, Math.floor(1 / perPixel));
  const { sink, means } = blockMeans(marks.width * parts, marks.height * parts, block);
  cover(parts, sink);
  return means;
}

/** Brings shares in the file's frame into the upright picture. */
export function intoPicture(grey: Grey, frame: ScanFrame, picture: PictureSize): Grey {
  const { columns, rows } = picture;
  if (frame.angleDeg === 0) return resampleWhole(grey, columns, rows, 'linear');
  const upright: ScanFrame = {
    ...frame,
    columns,
    rows,
    pitchXMm: picture.widthMm / columns,
    pitchYMm: picture.heightMm / rows,
  };
  const source = { grey, widthMm: frame.columns * frame.pitchXMm, heightMm: frame.rows * frame.pitchYMm };
  return { width: columns, height: rows, data: skewReader(source, upright, -frame.angleDeg, 0)(rows) };
}

/**
 * Share of each pixel of a picture that one pass marks, 0–65535.
 * Every fired pixel marks the spot at its true size, alone or drawn across the pixel; what several spots reach counts once.
 * @param marks dots or power levels of the pass; unchanged
 * @param frame where they lie; unchanged
 * @param spot mm; unchanged
 * @param firing pulsed or swept
 * @param picture pixels asked for
 * @returns shares in the upright picture
 * @example all dots fired, swept, at the spot's pitch: 65535 everywhere
 */
export function markedShare(
  marks: MarkRaster,
  frame: ScanFrame,
  spot: Spot,
  firing: Firing,
  picture: PictureSize,
): Grey {
  const { pitchXMm, pitchYMm } = marks;
  const down = frame.linesAre === 'columns';
  const sweep: Sweep = {
    firing,
    xMm: down ? 0 : pitchXMm,
    yMm: down ? pitchYMm : 0,
    fileAngleDeg: frame.angleDeg,
  };
  const fired = firedSpot(spot, sweep);
  const reach = reachPx(spot, sweep, pitchXMm, pitchYMm);
  const far = reach.x > 1 || reach.y > 1;
  const inFile = markedInFile(
    marks,
    (parts, sink) => {
      if (marks.kind === 'levels')
        coverByLevels(marks.data, marks.width, coverTable(fired, pitchXMm, pitchYMm, parts), sink);
      else if (far) coverByPoints(marks, fired, reach, sink);
      else coverByTable(marks, coverTable(fired, pitchXMm, pitchYMm, parts), sink);
    },
    far && marks.kind === 'mask' ? 1 : MOST_PARTS,
    perPixelOf(marks, frame, picture),
  );
  return intoPicture(inFile, frame, picture);
}

/** Rows of dots or levels as shares, each pixel repeated `parts` times along X and Y so that it stays a square. */
function repeatPixels({ kind, width, data }: MarkRaster, parts: number, sink: RowSink): void {
  const shares = Uint16Array.from({ length: 256 }, (_, sample) =>
    kind === 'mask' ? Math.min(1, sample) * 65_535 : (255 - sample) * 257,
  );
  const line = new Uint16Array(width * parts);
  for (let start = 0; start < data.length; start += width) {
    if (parts === 1) for (let x = 0; x < width; x++) line[x] = shares[data[start + x]];
    else for (let x = 0; x < width; x++) line.fill(shares[data[start + x]], x * parts, (x + 1) * parts);
    for (let i = 0; i < parts; i++) sink(line);
  }
}

/**
 * Share of each pixel of a picture that is asked to burn, before any spot is thought of.
 * @param marks dots or power levels of the pass; unchanged
 * @param frame where they lie; unchanged
 * @param picture pixels asked for
 * @returns shares in the upright picture, 0–65535
 * @example a mask with every second row burned, at half its pixels: 32768 everywhere
 */
export function burnedShare(marks: MarkRaster, frame: ScanFrame, picture: PictureSize): Grey {
  const inFile = markedInFile(
    marks,
    (parts, sink) => repeatPixels(marks, parts, sink),
    MOST_PARTS,
    perPixelOf(marks, frame, picture),
  );
  return intoPicture(inFile, frame, picture);
}
