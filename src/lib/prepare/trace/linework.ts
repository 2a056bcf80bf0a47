import type { TraceReport } from '../report';
import type { Settings } from '../settings';

/** Lines to be followed, in mm on the placed artwork: origin top left, x to the right, y down. */
export interface Linework {
  widthMm: number;
  heightMm: number;
  /** one width for all lines, mm: the mean side of the spot; how wide a line burns in a direction is its line extent */
  strokeWidthMm: number;
  /** SVG path data, one line each: M, then L and C with absolute coordinates in mm, Z where the line closes */
  paths: string[];
  report: Omit<TraceReport, 'optimised'>;
}

/** Settings that decide where the lines run. */
export type TraceSettings = Pick<
  Settings,
  'widthMm' | 'heightMm' | 'quarterTurns' | 'spot' | 'dividingLstar' | 'corners'
>;
