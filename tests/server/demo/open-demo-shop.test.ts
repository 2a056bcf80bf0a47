import '../../setup/database';
import { existsSync } from 'node:fs';
import path from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { seed } from '../../../db/seeds/01-demo-shop.mjs';
import { ORDER_STATES } from '@/lib/orders/state';
import { database } from '@/lib/server/db';
import { DEMO_ORDERS } from '@/lib/server/demo/demo-orders';
import { openDemoShop } from '@/lib/server/demo/open-demo-shop';
import { usePipeline } from '@/lib/server/queue/pipeline';
import { memoryStorage } from '@/lib/server/storage/memory';
import { useStorage } from '@/lib/server/storage/store';
import { standIn, startShopQueue, stopShopQueue } from '../orders/shop';

const orders = (): Promise<{ title: string; state: string; due_on: string | null }[]> =>
  database()('orders').select('title', 'state', 'due_on').orderBy('id');

beforeAll(() => {
  useStorage(memoryStorage());
  usePipeline(standIn);
  startShopQueue();
});
afterAll(async () => {
  await stopShopQueue();
  useStorage(null);
});

describe('the demo shop', () => {
  it('stays empty where it is no demo shop', async () => {
    await openDemoShop();
    expect(await orders()).toEqual([]);
  });

  it('has a sample for every order', () => {
    for (const { artwork } of DEMO_ORDERS)
      expect(existsSync(path.resolve('samples', artwork)), artwork).toBe(true);
  });

  it('gets one order in every state, each as far as it should come, and not a second time', async () => {
    await seed(database());
    await openDemoShop();
    const made = await orders();
    expect(made.map(({ title, state }) => ({ title, state }))).toEqual(
      DEMO_ORDERS.map(({ title, state }) => ({ title, state })),
    );
    expect([...new Set(made.map(({ state }) => state))].sort()).toEqual([...ORDER_STATES].sort());
    await openDemoShop();
    expect(await orders()).toHaveLength(DEMO_ORDERS.length);
  });

  it('goes on with what is missing when it was stopped half-way', async () => {
    const last = DEMO_ORDERS[DEMO_ORDERS.length - 1].title;
    await database().raw('drop trigger record_no_delete');
    await database()('record').where({ event: 'fill-demo-shop' }).delete();
    await database()('orders').where({ title: last }).update({ title: 'something else' });
    await openDemoShop();
    expect((await orders()).map(({ title }) => title).filter((title) => title === last)).toHaveLength(1);
    expect(await orders()).toHaveLength(DEMO_ORDERS.length + 1);
  });

  it('has done so by people, each of whom is in the record', async () => {
    const names = (await database()('record').distinct('by')).map(({ by }) => by).sort();
    expect(names).toEqual(['Ines Farrow', 'Runa Vester', 'Teo Lindgren', 'Umberline']);
  });
});
