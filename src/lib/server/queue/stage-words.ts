/** A stage of the pipeline in words, and which part of the whole work it is, 0–1. */
interface StageShare {
  words: string;
  from: number;
  to: number;
}

const CHECK: Record<string, StageShare> = {
  ingest: { words: 'Reading', from: 0, to: 0.1 },
  measure: { words: 'Measuring', from: 0.1, to: 0.5 },
  'sound-width': { words: 'Looking for the smallest sound width', from: 0.5, to: 0.93 },
  preflight: { words: 'Judging', from: 0.93, to: 0.95 },
  picture: { words: 'Drawing the picture', from: 0.95, to: 1 },
};

const PREPARE: Record<string, StageShare> = {
  ingest: { words: 'Reading', from: 0, to: 0.05 },
  measure: { words: 'Measuring', from: 0.05, to: 0.25 },
  'sound-width': { words: 'Looking for the smallest sound width', from: 0.25, to: 0.39 },
  preflight: { words: 'Judging', from: 0.39, to: 0.4 },
  mark: { words: 'Laying out the lines', from: 0.4, to: 0.55 },
  trace: { words: 'Following the outlines', from: 0.55, to: 0.65 },
  package: { words: 'Writing the files', from: 0.65, to: 0.8 },
  forecast: { words: 'Forecasting the burn', from: 0.8, to: 1 },
};

/**
 * How far a whole piece of work is when one of its stages is.
 * @param progress of the stage, 0–1
 */
export function workProgress(
  work: 'check' | 'prepare',
  stage: string,
  progress: number,
): { words: string; progress: number } {
  const share = (work === 'check' ? CHECK : PREPARE)[stage] ?? { words: stage, from: 0, to: 0 };
  return { words: share.words, progress: share.from + (share.to - share.from) * progress };
}
