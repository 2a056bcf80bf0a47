import { scanLines } from '../../units';
import type { Scan } from '../settings';

/** A point in the placed artwork's frame: mm from its left and top edges. */
export interface PointMm {
  xMm: number;
  yMm: number;
}

/** Where the pixels of one pass lie on the placed artwork. */
export interface ScanFrame {
  /** pixels across and down in the file */
  columns: number;
  rows: number;
  pitchXMm: number;
  pitchYMm: number;
  /** what the file holds, mm */
  widthMm: number;
  heightMm: number;
  /** angle of the scan lines to X, degrees, in −180 … 180; positive turns from X towards Y, which runs down */
  directionDeg: number;
  /** scan lines are rows of the file, or its columns at ±90° */
  linesAre: 'rows' | 'columns';
  /** angle of the file's own X to the artwork's X, degrees: 0 for the upright directions 0, ±90 and 180 */
  angleDeg: number;
  /** top left corner of the file, in the artwork's frame */
  origin: PointMm;
  /** corners of the file in the artwork's frame, clockwise from its top left */
  outline: PointMm[];
}

const isMultiple = (deg: number, of: number): boolean => Math.abs(deg % of) < 1e-9;

function frameOf(extentX: number, extentY: number, pitchX: number, pitchY: number) {
  return {
    columns: scanLines(extentX, pitchX),
    rows: scanLines(extentY, pitchY),
    pitchXMm: pitchX,
    pitchYMm: pitchY,
    widthMm: extentX,
    heightMm: extentY,
  };
}

function uprightFrame(widthMm: number, heightMm: number, scan: Scan): ScanFrame {
  const down = !isMultiple(scan.directionDeg, 180);
  const [pitchX, pitchY] = down
    ? [scan.linePitchMm, scan.alongPitchMm]
    : [scan.alongPitchMm, scan.linePitchMm];
  return {
    ...frameOf(widthMm, heightMm, pitchX, pitchY),
    directionDeg: scan.directionDeg,
    linesAre: down ? 'columns' : 'rows',
    angleDeg: 0,
    origin: { xMm: 0, yMm: 0 },
    outline: [
      { xMm: 0, yMm: 0 },
      { xMm: widthMm, yMm: 0 },
      { xMm: widthMm, yMm: heightMm },
      { xMm: 0, yMm: heightMm },
    ],
  };
}

/** The smallest rectangle along and across the scan lines that holds the whole artwork. */
function turnedFrame(widthMm: number, heightMm: number, scan: Scan): ScanFrame {
  const angle = (scan.directionDeg * Math.PI) / 180;
  const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
  const corners = [0, widthMm].flatMap((x) =>
    [0, heightMm].map((y) => ({ u: x * cos + y * sin, v: y * cos - x * sin })),
  );
  const left = Math.min(...corners.map(({ u }) => u));
  const top = Math.min(...corners.map(({ v }) => v));
  const along = Math.max(...corners.map(({ u }) => u)) - left;
  const across = Math.max(...corners.map(({ v }) => v)) - top;
  const at = (u: number, v: number): PointMm => ({ xMm: u * cos - v * sin, yMm: u * sin + v * cos });
  return {
    ...frameOf(along, across, scan.alongPitchMm, scan.linePitchMm),
    directionDeg: scan.directionDeg,
    linesAre: 'rows',
    angleDeg: scan.directionDeg,
    origin: at(left, top),
    outline: [at(left, top), at(left + along, top), at(left + along, top + across), at(left, top + across)],
  };
}

/**
 * The pixels that cover a placed artwork for one pass: one row, or at ±90° one column, of pixels per scan line.
 * Upright directions keep the artwork's own frame; any other takes the smallest rectangle along the scan lines.
 * @param widthMm placed width, mm, above 0
 * @param heightMm placed height, mm, above 0
 * @param scan direction and pitches; unchanged
 * @returns counts rounded to the nearest, at least 1 each way
 * @throws RangeError when a size or pitch is not above 0
 * @example scanFrame(300, 200, { directionDeg: 0, linePitchMm: 0.06, alongPitchMm: 0.06 }) // 5000 columns, 3333 rows
 */
export function scanFrame(widthMm: number, heightMm: number, scan: Scan): ScanFrame {
  const frame = isMultiple(scan.directionDeg, 90) ? uprightFrame : turnedFrame;
  return frame(widthMm, heightMm, scan);
}

/** The scan of a perpendicular pass: direction + 90° brought into −180 … 180, with its own pitches. */
export function perpendicularScan(directionDeg: number, pitches: Omit<Scan, 'directionDeg'>): Scan {
  const turned = directionDeg + 90;
  return { ...pitches, directionDeg: turned > 180 ? turned - 360 : turned };
}
