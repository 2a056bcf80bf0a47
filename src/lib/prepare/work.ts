import type { Spot } from '../machines/spot';
import type { Facts } from '../preflight/facts';
import type { Finding } from '../preflight/finding';
import type { Artwork } from './artwork';
import type { Manifest, ManifestFile } from './manifest';
import type { MarkRaster } from './mark-raster';
import type { MeasureSettings } from './measure/measure-settings';
import type { Suggestion } from './measure/suggest-treatment';
import type { CheckReport, PassagePicture, Report } from './report';
import type { ScanFrame } from './resample/scan-frame';
import type { Settings, Treatment } from './settings';
import type { Stopwatch } from './stopwatch';
import type { PipelineTools } from './tools';
import type { Linework } from './trace/linework';

/** What an upload is checked against. */
export interface CheckSettings {
  /** placed size after the quarter turns, mm; null: the artwork's own, else 100 mm across */
  widthMm: number | null;
  heightMm: number | null;
  quarterTurns: 0 | 1 | 2 | 3;
  spot: Spot;
  firing: Settings['firing'];
  directionDeg: number;
  /** null: pitch ratio 1 */
  linePitchMm: number | null;
  /** null: not chosen yet */
  treatment: Treatment | null;
  dividingLstar: number;
  blank: Settings['blank'];
  machine: Settings['machine'];
}

/** What a check gives. */
export interface Checked {
  report: CheckReport;
  /** PNG of the artwork in its own colours, as it is placed, longest side at most 1600 */
  picture: Uint8Array;
  /** milliseconds by stage */
  timings: Record<string, number>;
}

export interface PreparedFile {
  name: string;
  mediaType: string;
  bytes: Uint8Array;
}

/** What a preparation gives. */
export interface Prepared {
  report: Report;
  manifest: Manifest;
  manifestSha256: string;
  key: string;
  files: PreparedFile[];
  pictures: Record<PassagePicture, Uint8Array>;
  /** milliseconds by stage */
  timings: Record<string, number>;
}

/** One pass: its pixels, and what they mark. */
export interface MarkedPass {
  pass: 1 | 2;
  frame: ScanFrame;
  marks: MarkRaster;
}

/** What every run starts from. */
export interface Given {
  readonly bytes: Uint8Array;
  readonly tools: PipelineTools;
  readonly stopwatch: Stopwatch;
  /** told how far the stage is that runs, 0–1 */
  onProgress: (share: number) => void;
}

type Asked = Omit<MeasureSettings, 'widthMm' | 'heightMm'> & {
  widthMm: number | null;
  heightMm: number | null;
};

/** What the stages of a check hand on: each field is filled by one stage and read by later ones. */
export interface CheckWork extends Given {
  readonly asked: Asked;
  /** ingest: what was sent, not yet turned */
  artwork: Artwork;
  /** ingest: what is asked for, with the size settled */
  placed: MeasureSettings;
  /** measure */
  facts: Facts;
  suggestion: Suggestion;
  /** preflight */
  findings: Finding[];
  smallestSoundWidthMm: number | null;
  /** picture */
  picture: Uint8Array;
}

/** What the stages of a preparation hand on, on top of a check's. */
export interface PrepareWork extends CheckWork {
  readonly settings: Settings;
  readonly preparationKey: string;
  /** pixels of every pass */
  readonly frames: readonly ScanFrame[];
  /** mark: the artwork as it is placed, laid over what the stock leaves untouched */
  turned: Artwork;
  /** mark */
  passes: MarkedPass[];
  /** trace: for linework, else null */
  linework: Linework | null;
  /** package: whether the drawing could be written shorter without looking different */
  lineworkOptimised: boolean;
  /** package: files with what the manifest says of each */
  files: (PreparedFile & { entry: ManifestFile })[];
  /** forecast */
  pictures: Record<PassagePicture, Uint8Array>;
}

/** One stage: reads what earlier ones left in the work and leaves its own. */
export interface Stage<W> {
  name: string;
  /** whether it puts its own times on the stopwatch */
  timesItself?: true;
  run(work: W): Promise<void>;
}
