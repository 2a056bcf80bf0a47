/** A stage of the pipeline in words, and which part of the whole work it is, 0–1. */
interface StageShare {
  words: string;
  from: number;
  to: number;
}

const CHECK: Record<string, StageShare> = {
  ingest: { words: 'Reading', from: 0, to: 0.15 },
  measure: { words: 'Measuring', from: 0.15, to: 0.9 },
  preflight: { words: 'Judging', from: 0.9, to: 0.92 },
  picture: { words: 'Drawing the picture', from: 0.92, to: 1 },
};

const PREPARE: Record<string, StageShare> = {
  ingest: { words: 'Reading', from: 0, to: 0.05 },
  measure: { words: 'Measuring', from: 0.05, to: 0.35 },
  preflight: { words: 'Judging', from: 0.35, to: 0.36 },
  mark: { words: 'Laying out the lines', from: 0.36, to: 0.65 },
  package: { words: 'Writing the files', from: 0.65, to: 0.85 },
  forecast: { words: 'Forecasting the burn', from: 0.85, to: 1 },
};

/**
 * How far a whole piece of work is when one of its stages is.
 * @param progress of the stage, 0–1
 */
export function workProgress(work: 'check' | 'prepare', stage: string, progress: number): { words: string; progress: number } {
  const share = (work === 'check' ? CHECK : PREPARE)[stage] ?? { words: stage, from: 0, to: 0 };
  return { words: share.words, progress: share.from + (share.to - share.from) * progress };
}
