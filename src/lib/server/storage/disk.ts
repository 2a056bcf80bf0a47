import { createHash, randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { mkdir, open, readFile, readdir, rename, rm, stat, statfs } from 'node:fs/promises';
import path from 'node:path';
import { Readable } from 'node:stream';
import type { ReadableStream as NodeReadableStream } from 'node:stream/web';
import { assertKey, missing, StorageError, type Incoming, type Storage, type StorageKey } from './storage';

const isNotFound = (error: unknown): boolean => (error as NodeJS.ErrnoException)?.code === 'ENOENT';

/** A rename is only safe from a power cut once the folder that names the file is written too. */
async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

class DiskStorage implements Storage {
  readonly #stored: string;
  readonly #arriving: string;

  constructor(folder: string) {
    this.#stored = path.join(folder, 'stored');
    this.#arriving = path.join(folder, 'arriving');
  }

  /** Makes the folders and removes what a killed process left half written. */
  async open(): Promise<this> {
    await mkdir(this.#stored, { recursive: true });
    await mkdir(this.#arriving, { recursive: true });
    for (const name of await readdir(this.#arriving))
      await rm(path.join(this.#arriving, name), { force: true });
    return this;
  }

  async receive(source: AsyncIterable<Uint8Array>): Promise<Incoming> {
    const temporary = path.join(this.#arriving, randomUUID());
    const hash = createHash('sha256');
    let bytes = 0;
    try {
      const handle = await open(temporary, 'wx', 0o600);
      try {
        for await (const chunk of source) {
          hash.update(chunk);
          bytes += chunk.byteLength;
          await handle.writeFile(chunk);
        }
        await handle.sync();
      } finally {
        await handle.close();
      }
    } catch (error) {
      await rm(temporary, { force: true });
      throw error;
    }
    const key = hash.digest('hex');
    return {
      key,
      bytes,
      read: () => readFile(temporary),
      keep: () => this.#moveIn(temporary, key),
      discard: () => rm(temporary, { force: true }),
    };
  }

  async put(bytes: Uint8Array): Promise<StorageKey> {
    const incoming = await this.receive(Readable.from([bytes]));
    return incoming.keep();
  }

  async get(key: StorageKey): Promise<Uint8Array> {
    const bytes = await readFile(this.#file(key)).catch((error: unknown) => {
      throw isNotFound(error) ? missing(key) : error;
    });
    if (createHash('sha256').update(bytes).digest('hex') !== key) {
      throw new StorageError('damaged', `what is stored under ${key} has changed`);
    }
    return bytes;
  }

  async has(key: StorageKey): Promise<boolean> {
    return (await this.#size(key)) !== null;
  }

  async delete(key: StorageKey): Promise<void> {
    await rm(this.#file(key), { force: true });
  }

  async stream(key: StorageKey): Promise<{ bytes: number; body: ReadableStream<Uint8Array> }> {
    const bytes = await this.#size(key);
    if (bytes === null) throw missing(key);
    const node: NodeReadableStream = Readable.toWeb(createReadStream(this.#file(key)));
    return { bytes, body: node as unknown as ReadableStream<Uint8Array> };
  }

  async freeBytes(): Promise<number> {
    const { bavail, bsize } = await statfs(this.#stored);
    return bavail * bsize;
  }

  async #moveIn(temporary: string, key: StorageKey): Promise<StorageKey> {
    const file = this.#file(key);
    try {
      await mkdir(path.dirname(file), { recursive: true });
      await rename(temporary, file);
    } catch (error) {
      await rm(temporary, { force: true });
      throw error;
    }
    await syncFolder(path.dirname(file));
    return key;
  }

  async #size(key: StorageKey): Promise<number | null> {
    try {
      return (await stat(this.#file(key))).size;
    } catch (error) {
      if (isNotFound(error)) return null;
      throw error;
    }
  }

  #file(key: StorageKey): string {
    assertKey(key);
    return path.join(this.#stored, key.slice(0, 2), key);
  }
}

/** Storage in a folder of its own on disk. */
export function openDiskStorage(folder: string): Promise<Storage> {
  return new DiskStorage(folder).open();
}
