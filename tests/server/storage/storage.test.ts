import { mkdtemp, readdir, rm, writeFile } from 'node:fs/promises';
import os from 'node:os';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { openDiskStorage } from '@/lib/server/storage/disk';
import { memoryStorage } from '@/lib/server/storage/memory';
import { storageConformance } from '../storage-conformance';

let folder: string;
beforeAll(async () => {
  folder = await mkdtemp(path.join(os.tmpdir(), 'umberline-storage-'));
});
afterAll(() => rm(folder, { recursive: true, force: true }));

let count = 0;
storageConformance('disk', () => openDiskStorage(path.join(folder, String(count++))));
storageConformance('memory', async () => memoryStorage());

describe('storage on disk', () => {
  const arriving = async (root: string): Promise<string[]> => readdir(path.join(root, 'arriving'));
  async function* broken(): AsyncGenerator<Uint8Array> {
    yield new Uint8Array(100_000);
    throw new Error('connection lost');
  }

  it('leaves no temporary file after put, discard and a broken stream', async () => {
    const root = path.join(folder, 'clean');
    const storage = await openDiskStorage(root);
    await storage.put(new Uint8Array([1, 2, 3]));
    await (await storage.receive([new Uint8Array([4])] as unknown as AsyncIterable<Uint8Array>)).discard();
    await expect(storage.receive(broken())).rejects.toThrow();
    expect(await arriving(root)).toEqual([]);
  });

  it('removes what a killed process left, and nothing that is stored', async () => {
    const root = path.join(folder, 'swept');
    const key = await (await openDiskStorage(root)).put(new Uint8Array([9]));
    await writeFile(path.join(root, 'arriving', 'half'), 'half an upload');
    const again = await openDiskStorage(root);
    expect(await arriving(root)).toEqual([]);
    expect(await again.has(key)).toBe(true);
  });

  it('notices that stored bytes were changed behind its back', async () => {
    const root = path.join(folder, 'damaged');
    const storage = await openDiskStorage(root);
    const key = await storage.put(new Uint8Array([5, 5]));
    await writeFile(path.join(root, 'stored', key.slice(0, 2), key), 'changed');
    await expect(storage.get(key)).rejects.toMatchObject({ code: 'damaged' });
  });

  it('writes again rather than trusting what is there', async () => {
    const root = path.join(folder, 'mended');
    const storage = await openDiskStorage(root);
    const key = await storage.put(new Uint8Array([6, 6]));
    await writeFile(path.join(root, 'stored', key.slice(0, 2), key), 'changed');
    await storage.put(new Uint8Array([6, 6]));
    expect([...(await storage.get(key))]).toEqual([6, 6]);
  });
});
