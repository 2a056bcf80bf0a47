import { z } from 'zod';
import { ArtworkError } from '../../prepare/tools';
import { AppError } from '../errors';
import { isDiskFull } from '../storage/disk-full';
import { StorageError } from '../storage/storage';

/** The task took longer than it may. */
export class TimeLimitError extends Error {
  override readonly name = 'TimeLimitError';
  constructor(readonly limitMs: number) {
    super(`the task took longer than ${limitMs} ms`);
  }
}

/** The claim is no longer good: the task was superseded, taken up by another worker, or is let go of. */
export class LetGoError extends Error {
  override readonly name = 'LetGoError';
}

export interface Failure {
  /** what happened, why and what to do, for a person to read */
  words: string;
  /** whether another attempt could end differently */
  again: boolean;
}

export const LOST_WORDS =
  'The work broke off three times without an answer, as it does when the machine is switched off or runs out of memory. Start it again; if it breaks off again, try a smaller size or a wider line pitch.';

const minutes = (ms: number): string =>
  ms < 120_000 ? `${Math.max(1, Math.round(ms / 1000))} seconds` : `${Math.round(ms / 60_000)} minutes`;

/** What a person is told of an error that ended an attempt. */
export function failureOf(error: unknown): Failure {
  if (error instanceof ArtworkError) return { words: error.message, again: false };
  if (error instanceof AppError) {
    const { title, detail, action } = error.problem;
    return { words: `${title} ${detail} ${action}`, again: false };
  }
  if (error instanceof TimeLimitError) {
    return {
      words: `It took longer than ${minutes(error.limitMs)} and was stopped. Try a smaller size or a wider line pitch, or start it again when the shop is quieter.`,
      again: false,
    };
  }
  if (isDiskFull(error)) {
    return {
      words:
        'The disk is full, so the result could not be kept. Make room on the shop’s machine, then start it again.',
      again: true,
    };
  }
  if (error instanceof StorageError) {
    return {
      words: 'A stored file is missing or damaged, so there is nothing to work from. Send the artwork again.',
      again: false,
    };
  }
  return {
    words:
      'Something broke on our side while it was worked on; it has been written down. Start it again; if it fails again, tell the shop’s admin.',
    // Data that does not fit its schema will not fit it the next time either.
    again: !(error instanceof z.ZodError),
  };
}
