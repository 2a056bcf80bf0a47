import { open } from 'node:fs/promises';
import { ArtworkError, LIMITS } from '../lib/prepare/tools';

const REASONS: Record<string, string> = {
  ENOENT: 'There is no file at this path.',
  EACCES: 'This file may not be read by you.',
  EISDIR: 'This is a folder, not an artwork.',
};

/** Bytes of an artwork, read only after its length was found to be within the limit. */
export async function readArtwork(file: string): Promise<Uint8Array> {
  try {
    const handle = await open(file, 'r');
    try {
      const stats = await handle.stat();
      if (stats.isDirectory()) throw new ArtworkError('unreadable', REASONS.EISDIR);
      if (stats.size > LIMITS.maxBytes) {
        const mib = LIMITS.maxBytes / 1024 / 1024;
        throw new ArtworkError(
          'too-large',
          `This file is larger than ${mib} MiB. Export it at the size at which it will be engraved.`,
        );
      }
      return await handle.readFile();
    } finally {
      await handle.close();
    }
  } catch (error) {
    if (error instanceof ArtworkError) throw error;
    const code = error instanceof Error && 'code' in error ? String(error.code) : '';
    throw new ArtworkError(
      'unreadable',
      REASONS[code] ?? `This file cannot be read (${code || 'unknown reason'}).`,
      { cause: error },
    );
  }
}
