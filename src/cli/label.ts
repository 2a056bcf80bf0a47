import path from 'node:path';
import { UsageError } from './usage-error';

const LABEL = /^[A-Za-z0-9_-]{1,60}$/;

/** First part of the file names: as asked, or the artwork's own name in plain letters. */
export function readLabel(asked: string | undefined, artworkPath: string): string {
  if (asked !== undefined) {
    if (LABEL.test(asked)) return asked;
    throw new UsageError(`--label takes 1 to 60 letters, digits, - and _, got "${asked}".`);
  }
  const stem = path.parse(artworkPath).name.normalize('NFKD').replace(/\p{M}/gu, '');
  const plain = stem
    .replace(/[^A-Za-z0-9_-]+/g, '-')
    .replace(/^-+|-+$/g, '')
    .slice(0, 60);
  return plain || 'artwork';
}
