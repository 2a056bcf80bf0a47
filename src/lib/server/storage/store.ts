import path from 'node:path';
import { config } from '../config';
import { openDiskStorage } from './disk';
import type { Storage } from './storage';

// On globalThis, so that a reload of modules in development does not sweep what a request is writing.
const slot = globalThis as typeof globalThis & { umberlineStorage?: Promise<Storage> };

/** The shop's storage, opened once: in the data folder. */
export function storage(): Promise<Storage> {
  return (slot.umberlineStorage ??= openDiskStorage(path.join(config().dataDir, 'storage')));
}

/** Puts another storage in its place; for tests. */
export function useStorage(other: Storage | null): void {
  slot.umberlineStorage = other ? Promise.resolve(other) : undefined;
}
