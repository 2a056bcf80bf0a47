import { dataDir } from '../../setup/database';
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { writeFileSync, readdirSync } from 'node:fs';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/server/db';
import { openDiskStorage } from '@/lib/server/storage/disk';
import type { TaskRow } from '@/lib/server/tables/tasks';
import { POST } from '@/pages/api/orders/[number]/preparations/index';
import {
  at,
  design,
  openShop,
  orderAt,
  prepare,
  read,
  settled,
  sha256,
  startShopQueue,
  stopShopQueue,
  type Shop,
} from '../orders/shop';

let shop: Shop;
beforeAll(async () => {
  shop = await openShop();
  startShopQueue();
});
afterAll(stopShopQueue);

const taskOf = async (id: number): Promise<TaskRow> =>
  database()('tasks')
    .where({ subject: `preparation ${id}` })
    .first();

describe('a worker killed half-way', () => {
  it('is followed by another that makes the same bytes under the same key', async () => {
    const { number } = await orderAt(shop, 'in-preparation');
    await design(shop, number);
    await settled(shop.designer, number);
    await stopShopQueue();

    const child = spawn(process.execPath, ['--import', 'tsx', 'tests/server/queue/worker-to-kill.ts'], {
      env: { ...process.env, DATA_DIR: dataDir, NODE_ENV: 'test', VITEST: '' },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    let said = '';
    child.stderr.on('data', (chunk) => (said += chunk));
    const { version } = await read(shop.designer, number);
    await at(POST, shop.designer, number, { body: { version } });
    const [asked] = (await read(shop.designer, number)).preparations;
    const first = await Promise.race([once(child.stdout, 'data'), once(child, 'exit').then(() => null)]);
    expect(String(first?.[0]), said).toBe('working\n');
    expect(await taskOf(asked.id)).toMatchObject({ state: 'running', attempt: 1 });

    child.kill('SIGKILL');
    await once(child, 'exit');
    writeFileSync(path.join(dataDir, 'storage/arriving/left-by-the-dead'), 'half');
    expect((await read(shop.designer, number)).preparations[0]).toMatchObject({
      manifestSha256: null,
      task: { state: 'running' },
    });

    await openDiskStorage(path.join(dataDir, 'storage'));
    expect(readdirSync(path.join(dataDir, 'storage/arriving'))).toEqual([]);
    startShopQueue();
    const [made] = (await settled(shop.designer, number)).preparations;
    expect(made).toMatchObject({ id: asked.id, key: asked.key, task: { state: 'done' } });
    expect(await taskOf(asked.id)).toMatchObject({ attempt: 2, failures: 1 });
    expect(made.files.map((file) => file.sha256)).toEqual([sha256(`prepared ${made.key}`)]);
    expect((await prepare(shop, number)).preparations).toMatchObject([{ id: made.id, files: made.files }]);
  });
});
