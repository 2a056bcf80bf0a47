import { ArtworkError } from '../tools';
import type { ReadableType } from './file-type';

const ENDS_EARLY =
  /premature|truncat|unexpected end|end of (file|stream|gif)|read error|bad seek|unable to parse|eof/i;

/**
 * The error that tells a person that a picture breaks off or is damaged.
 * @param type what the bytes are
 * @param cause what the decoder threw; an ArtworkError is given back as it is
 * @example brokenPicture('jpeg', new Error('premature end of JPEG image')).code // 'truncated'
 */
export function brokenPicture(type: ReadableType, cause: unknown): ArtworkError {
  if (cause instanceof ArtworkError) return cause;
  const name = type.toUpperCase();
  if (cause instanceof Error && ENDS_EARLY.test(cause.message)) {
    return new ArtworkError(
      'truncated',
      `The ${name} file breaks off before its end, probably because it was not copied whole. Export it again and send that.`,
      { cause },
    );
  }
  return new ArtworkError(
    'unreadable',
    `The file begins like ${name} but cannot be read: it is damaged. Open it, export it again as PNG, and send that.`,
    { cause },
  );
}
