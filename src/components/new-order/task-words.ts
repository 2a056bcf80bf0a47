import type { TaskView } from '@/lib/orders/views';

/** Stages of the pipeline as a person reads them. */
const STAGES: Readonly<Record<string, string>> = {
  ingest: 'Reading the file',
  measure: 'Measuring lines and gaps',
  preflight: 'Judging what was measured',
  picture: 'Drawing its picture',
  resample: 'Sizing it to the scan lines',
  tone: 'Turning lightness into burn',
  screen: 'Screening',
  trace: 'Tracing',
  package: 'Writing the files',
  forecast: 'Forecasting the burn',
};

/** What a task is doing. */
export function taskWords({ state, stage }: Pick<TaskView, 'state' | 'stage'>): string {
  if (state === 'waiting') return 'Waiting for its turn';
  return STAGES[stage] ?? (stage || 'Looking at the artwork');
}

export function isWorking({ state }: Pick<TaskView, 'state'>): boolean {
  return state === 'waiting' || state === 'running';
}
