import { PASSAGE_MAX_PX } from '../report';
import type { PictureSize } from './marked-share';

// Finer than this a spot's outline shows no more than the sampling that it is drawn with.
const MOST_PX_PER_PITCH = 8;

/**
 * Pixels of the passage's pictures: the placed size with square pixels, longest side at most 2400, at most eight to a pitch.
 * @param widthMm placed width, above 0
 * @param heightMm placed height, above 0
 * @param pitchMm the finest pitch of all passes, above 0
 * @example pictureSize(300, 200, 0.06) // 2400 × 1600
 */
export function pictureSize(widthMm: number, heightMm: number, pitchMm: number): PictureSize {
  const perMm = Math.min(PASSAGE_MAX_PX / Math.max(widthMm, heightMm), MOST_PX_PER_PITCH / pitchMm);
  return {
    columns: Math.max(1, Math.round(widthMm * perMm)),
    rows: Math.max(1, Math.round(heightMm * perMm)),
    widthMm,
    heightMm,
  };
}
