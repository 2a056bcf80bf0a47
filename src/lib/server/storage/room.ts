import { AppError } from '../errors';
import type { Storage } from './storage';

/** Kept free so that the database can still be written to and results in progress still be stored. */
export const RESERVE_BYTES = 512 * 1024 * 1024;

/** Refuses an upload before a full disk would fail everything else as well. */
export async function requireRoom(storage: Storage, bytes: number): Promise<void> {
  if ((await storage.freeBytes()) - bytes < RESERVE_BYTES) throw new AppError('no-room');
}
