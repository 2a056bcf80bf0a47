import type { Settings } from '../settings';
import { ArtworkError } from '../tools';
import { perpendicularScan, scanFrame, type ScanFrame } from './scan-frame';

/** Most pixels that one pass may have. */
export const MAX_PASS_PX = 250_000_000;

/**
 * The frames of all passes that settings ask for, first the main one.
 * @param settings placed size, scan, perpendicular pass and treatment; unchanged
 * @returns one frame or two; lines that are followed have one, since only areas are scanned a second time across
 * @throws ArtworkError `too-large` where a pass would have more pixels than MAX_PASS_PX
 * @example passFrames(settings of 300 × 200 mm at 0.06 mm)[0].columns // 5000
 */
export function passFrames(
  settings: Pick<Settings, 'widthMm' | 'heightMm' | 'scan' | 'perpendicular' | 'treatment'>,
): ScanFrame[] {
  const { widthMm, heightMm, scan, perpendicular, treatment } = settings;
  const across = treatment === 'linework' ? null : perpendicular;
  const scans = [scan, ...(across ? [perpendicularScan(scan.directionDeg, across)] : [])];
  return scans.map((passScan) => {
    const frame = scanFrame(widthMm, heightMm, passScan);
    if (frame.columns * frame.rows <= MAX_PASS_PX) return frame;
    throw new ArtworkError(
      'too-large',
      `At this pitch the file would have ${frame.columns} × ${frame.rows} pixels; we prepare up to ` +
        `${MAX_PASS_PX / 1e6} million. Choose a wider pitch or a smaller size.`,
    );
  });
}
