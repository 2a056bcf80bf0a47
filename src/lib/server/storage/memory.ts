import { createHash } from 'node:crypto';
import { assertKey, missing, type Incoming, type Storage, type StorageKey } from './storage';

/** Storage that is gone with its process: for tests. */
export function memoryStorage(freeBytes = 1e12): Storage {
  const stored = new Map<StorageKey, Uint8Array>();

  function arrived(bytes: Uint8Array): Incoming {
    const key = createHash('sha256').update(bytes).digest('hex');
    const keep = async (): Promise<StorageKey> => {
      stored.set(key, bytes);
      return key;
    };
    return {
      key,
      bytes: bytes.byteLength,
      read: async () => bytes.slice(),
      keep,
      discard: async () => undefined,
    };
  }
  function found(key: StorageKey): Uint8Array {
    assertKey(key);
    const bytes = stored.get(key);
    if (!bytes) throw missing(key);
    return bytes;
  }

  return {
    async receive(source) {
      const chunks: Uint8Array[] = [];
      for await (const chunk of source) chunks.push(chunk);
      return arrived(new Uint8Array(Buffer.concat(chunks)));
    },
    put: (bytes) => arrived(bytes.slice()).keep(),
    get: async (key) => found(key).slice(),
    async has(key) {
      assertKey(key);
      return stored.has(key);
    },
    async delete(key) {
      assertKey(key);
      stored.delete(key);
    },
    async stream(key) {
      const bytes = found(key);
      return { bytes: bytes.byteLength, body: new Blob([bytes.slice()]).stream() };
    },
    freeBytes: async () => freeBytes,
  };
}
