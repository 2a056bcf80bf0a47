/** SHA-256 of the stored bytes, 64 hexadecimal digits: what things are stored and found under. */
export type StorageKey = string;

/** Bytes that have arrived and wait for a decision; nothing of them stays unless they are kept. */
export interface Incoming {
  key: StorageKey;
  bytes: number;
  read(): Promise<Uint8Array>;
  /** Puts them in store under their key and ends the wait. */
  keep(): Promise<StorageKey>;
  /** Throws them away; harmless after `keep`. */
  discard(): Promise<void>;
}

/** Where originals, pictures and prepared files lie. The same bytes have the same key and are stored once. */
export interface Storage {
  /** Takes a stream in without storing it yet. Leaves nothing behind when the stream breaks off. */
  receive(source: AsyncIterable<Uint8Array>): Promise<Incoming>;
  put(bytes: Uint8Array): Promise<StorageKey>;
  /** @throws StorageError `missing` when nothing is stored under the key, `damaged` when the bytes no longer fit it */
  get(key: StorageKey): Promise<Uint8Array>;
  has(key: StorageKey): Promise<boolean>;
  delete(key: StorageKey): Promise<void>;
  /** @throws StorageError `missing` */
  stream(key: StorageKey): Promise<{ bytes: number; body: ReadableStream<Uint8Array> }>;
  /** Bytes that may still be stored. */
  freeBytes(): Promise<number>;
}

export class StorageError extends Error {
  override readonly name = 'StorageError';
  constructor(
    readonly code: 'missing' | 'damaged' | 'bad-key',
    message: string,
  ) {
    super(message);
  }
}

const KEY = /^[0-9a-f]{64}$/;

/** A key is checked before it becomes part of a path. */
export function assertKey(key: StorageKey): void {
  if (!KEY.test(key))
    throw new StorageError('bad-key', `expected 64 hexadecimal digits, got ${JSON.stringify(key)}`);
}

export const missing = (key: StorageKey): StorageError =>
  new StorageError('missing', `nothing is stored under ${key}`);
