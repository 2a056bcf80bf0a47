import type { Spot } from '../../machines/spot';
import type { MachineRun, Settings, Treatment } from '../settings';

/** What measure must know of the job. */
export interface MeasureSettings {
  /** placed size after the quarter turns, mm */
  widthMm: number;
  heightMm: number;
  quarterTurns: 0 | 1 | 2 | 3;
  spot: Spot;
  /** angle of the scan lines to X, degrees */
  directionDeg: number;
  linePitchMm: number;
  /** null: not chosen yet */
  treatment: Treatment | null;
  /** L* that parts burned from unburned */
  dividingLstar: number;
  blank: Settings['blank'];
  machine: MachineRun | null;
  /** scanning speed, mm/s; null or absent where no recipe is known */
  speedMmPerS?: number | null;
}
