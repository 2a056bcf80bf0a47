import '../setup/database';
import { afterEach, describe, expect, it, vi } from 'vitest';
import * as db from '@/lib/server/db';
import * as queue from '@/lib/server/queue/queue';
import { memoryStorage } from '@/lib/server/storage/memory';
import { useStorage } from '@/lib/server/storage/store';
import { GET } from '@/pages/health';
import { call, jsonOf } from '../setup/call';

afterEach(() => {
  vi.restoreAllMocks();
  useStorage(null);
});

describe('health', () => {
  it('is well when every part answers, and says how much room is left', async () => {
    vi.spyOn(queue, 'queueRuns').mockReturnValue(true);
    const health = await jsonOf<{ freeBytes: number }>(await call(GET));
    expect(health).toMatchObject({ ok: true, database: true, storage: true, queue: true });
    expect(health.freeBytes).toBeGreaterThan(0);
  });

  it('is 503 without a queue, naming the part', async () => {
    expect(await jsonOf(await call(GET), 503)).toMatchObject({
      ok: false,
      database: true,
      storage: true,
      queue: false,
    });
  });

  it('is 503 without a database or a storage, and tells nothing of the reason', async () => {
    vi.spyOn(queue, 'queueRuns').mockReturnValue(true);
    vi.spyOn(db, 'database').mockImplementation(() => {
      throw new Error('SQLITE_CORRUPT');
    });
    useStorage({ ...memoryStorage(), freeBytes: () => Promise.reject(new Error('EIO /var/lib')) });
    const response = await call(GET);
    expect(response.status).toBe(503);
    const text = await response.text();
    expect(JSON.parse(text)).toEqual({
      ok: false,
      database: false,
      storage: false,
      queue: true,
      freeBytes: 0,
    });
  });
});
