import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import type { Storage } from '@/lib/server/storage/storage';

const sha256 = (bytes: Uint8Array): string => createHash('sha256').update(bytes).digest('hex');
const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);
async function* stream(...chunks: string[]): AsyncGenerator<Uint8Array> {
  for (const chunk of chunks) yield bytesOf(chunk);
}

/** What every storage driver must do. */
export function storageConformance(name: string, open: () => Promise<Storage>): void {
  describe(`storage: ${name}`, () => {
    it('gives back what was put, under the hash of the bytes', async () => {
      const storage = await open();
      const bytes = bytesOf('birch');
      const key = await storage.put(bytes);
      expect(key).toBe(sha256(bytes));
      expect(Buffer.from(await storage.get(key))).toEqual(Buffer.from(bytes));
    });

    it('stores no bytes at all as well as many', async () => {
      const storage = await open();
      for (const size of [0, 1, 65_536, 3_000_001]) {
        const bytes = new Uint8Array(size).fill(7);
        const key = await storage.put(bytes);
        expect((await storage.get(key)).byteLength).toBe(size);
        const { bytes: length, body } = await storage.stream(key);
        expect(length).toBe(size);
        expect((await new Response(body).arrayBuffer()).byteLength).toBe(size);
      }
    });

    it('takes the same bytes twice, also at once, and keeps one', async () => {
      const storage = await open();
      const keys = await Promise.all([
        storage.put(bytesOf('same')),
        storage.put(bytesOf('same')),
        storage.put(bytesOf('same')),
      ]);
      expect(new Set(keys).size).toBe(1);
      expect(await storage.has(keys[0])).toBe(true);
      await storage.delete(keys[0]);
      expect(await storage.has(keys[0])).toBe(false);
    });

    it('is not changed by a caller that changes its bytes later', async () => {
      const storage = await open();
      const bytes = bytesOf('original');
      const key = await storage.put(bytes);
      bytes.fill(0);
      (await storage.get(key)).fill(1);
      expect(Buffer.from(await storage.get(key)).toString()).toBe('original');
    });

    it('says that a key is missing', async () => {
      const storage = await open();
      const key = sha256(bytesOf('never stored'));
      expect(await storage.has(key)).toBe(false);
      await expect(storage.get(key)).rejects.toMatchObject({ name: 'StorageError', code: 'missing' });
      await expect(storage.stream(key)).rejects.toMatchObject({ name: 'StorageError', code: 'missing' });
      await expect(storage.delete(key)).resolves.toBeUndefined();
    });

    it.each(['', '../../etc/passwd', 'A'.repeat(64), `${'a'.repeat(63)}/`, 'a'.repeat(65)])(
      'refuses the key %j',
      async (key) => {
        const storage = await open();
        for (const call of [storage.get(key), storage.has(key), storage.delete(key), storage.stream(key)]) {
          await expect(call).rejects.toMatchObject({ code: 'bad-key' });
        }
      },
    );

    it('holds received bytes back until they are kept', async () => {
      const storage = await open();
      const incoming = await storage.receive(stream('a', '', 'bc'));
      expect(incoming).toMatchObject({ key: sha256(bytesOf('abc')), bytes: 3 });
      expect(Buffer.from(await incoming.read()).toString()).toBe('abc');
      expect(await storage.has(incoming.key)).toBe(false);
      expect(await incoming.keep()).toBe(incoming.key);
      await incoming.discard();
      expect(Buffer.from(await storage.get(incoming.key)).toString()).toBe('abc');
    });

    it('forgets received bytes that are discarded', async () => {
      const storage = await open();
      const incoming = await storage.receive(stream('not wanted'));
      await incoming.discard();
      await incoming.discard();
      expect(await storage.has(incoming.key)).toBe(false);
    });

    it('discarding one of two equal arrivals leaves the kept one', async () => {
      const storage = await open();
      const [first, second] = [
        await storage.receive(stream('twice')),
        await storage.receive(stream('twice')),
      ];
      await first.keep();
      await second.discard();
      expect(await storage.has(first.key)).toBe(true);
    });

    it('passes on the error of a stream that breaks off', async () => {
      const storage = await open();
      async function* broken(): AsyncGenerator<Uint8Array> {
        yield bytesOf('half');
        throw new Error('connection lost');
      }
      await expect(storage.receive(broken())).rejects.toThrow('connection lost');
    });

    it('knows how much room there is', async () => {
      expect(await (await open()).freeBytes()).toBeGreaterThan(0);
    });
  });
}
