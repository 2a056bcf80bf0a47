import '../../setup/database';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import { database } from '@/lib/server/db';
import { startQueue } from '@/lib/server/queue/queue';
import type { Storage } from '@/lib/server/storage/storage';
import { useStorage } from '@/lib/server/storage/store';
import type { OrderView, PreparationView } from '@/lib/orders/views';
import { checkArtworkTask } from '@/lib/server/tasks/check-artwork';
import { prepareOrderTask } from '@/lib/server/tasks/prepare-order';
import { GET as getPreparation } from '@/pages/api/orders/[number]/preparations/[id]/index';
import { GET as file } from '@/pages/api/orders/[number]/preparations/[id]/files/[name]';
import { GET as manifest } from '@/pages/api/orders/[number]/preparations/[id]/manifest';
import { GET as passage } from '@/pages/api/orders/[number]/preparations/[id]/pictures/[name]';
import { GET as report } from '@/pages/api/orders/[number]/preparations/[id]/report';
import { GET as ticket } from '@/pages/api/orders/[number]/ticket';
import { POST } from '@/pages/api/orders/[number]/preparations/index';
import { call, jsonOf } from '../../setup/call';
import {
  at,
  bench,
  change,
  design,
  openShop,
  orderAt,
  prepare,
  QUICK,
  read,
  settled,
  sha256,
  startShopQueue,
  stopShopQueue,
  type Shop,
} from './shop';

let shop: Shop;
beforeAll(async () => {
  shop = await openShop();
  startShopQueue();
});
afterAll(stopShopQueue);
afterEach(() => {
  bench.wait = async () => undefined;
  useStorage(shop.storage);
});

const ask = async (number: string, version: number): Promise<Response> =>
  call(POST, { person: shop.designer, params: { number }, body: { version } });
const chosen = async (): Promise<OrderView> => {
  const { number } = await orderAt(shop, 'in-preparation');
  await design(shop, number);
  return settled(shop.designer, number);
};
const tasksAbout = (id: number): Promise<{ state: string }[]> =>
  database()('tasks')
    .where({ subject: `preparation ${id}` })
    .orderBy('id');

describe('a preparation', () => {
  it('is one, and computed once, when it is asked for twice at once', async () => {
    const { number, version } = await chosen();
    const before = bench.preparations;
    const answers = await Promise.all([ask(number, version), ask(number, version), ask(number, version)]);
    const ids = await Promise.all(
      answers.map(async (answer) => (await jsonOf<{ preparation: PreparationView }>(answer)).preparation.id),
    );
    expect(new Set(ids).size).toBe(1);
    const order = await settled(shop.designer, number);
    expect(order.preparations).toHaveLength(1);
    await jsonOf(await ask(number, order.version));
    await settled(shop.designer, number);
    expect(bench.preparations - before).toBe(1);
    expect(await tasksAbout(ids[0])).toHaveLength(1);
  });

  it('is another one with other choices, and the former again with the former choices', async () => {
    const { number } = await chosen();
    const [first] = (await prepare(shop, number)).preparations;
    await design(shop, number, { mirror: true });
    const [second] = (await prepare(shop, number)).preparations;
    expect(second.key).not.toBe(first.key);
    await design(shop, number);
    const { version } = await read(shop.designer, number);
    const again = await jsonOf<{ preparation: PreparationView }>(await ask(number, version));
    expect(again.preparation).toMatchObject({
      id: first.id,
      key: first.key,
      manifestSha256: first.manifestSha256,
    });
  });

  it('is refused from a page that has not seen the newest choices', async () => {
    const { number, version } = await chosen();
    await change(shop.designer, number, { notes: 'changed in another tab', widthMm: 50, heightMm: 40 });
    expect((await ask(number, version)).status).toBe(409);
  });

  it('waits for choices', async () => {
    const { number, version } = await orderAt(shop, 'in-preparation');
    expect(await jsonOf<{ detail: string }>(await ask(number, version), 409)).toMatchObject({
      detail: expect.stringMatching(/Nothing is chosen yet/),
    });
  });

  it('hands out exactly the bytes that its manifest lists, as downloads', async () => {
    const { number } = await chosen();
    const [made] = (await prepare(shop, number)).preparations;
    const params = { number, id: String(made.id) };
    const response = await call(file, {
      person: shop.operator,
      params: { ...params, name: made.files[0].name },
    });
    expect(response.headers.get('content-type')).toBe('application/octet-stream');
    expect(response.headers.get('content-security-policy')).toBe("sandbox; default-src 'none'");
    expect(response.headers.get('content-disposition')).toContain(made.files[0].name);
    expect(sha256(new Uint8Array(await response.arrayBuffer()))).toBe(made.files[0].sha256);
    expect(await at(manifest, shop.operator, number, { params: { id: params.id } })).toMatchObject({
      files: [{ sha256: made.files[0].sha256 }],
    });
    expect(await at(report, shop.operator, number, { params: { id: params.id } })).toMatchObject({
      preparationKey: made.key,
    });
    for (const name of ['sent', 'burned']) {
      expect(
        (await call(passage, { person: shop.operator, params: { ...params, name } })).headers.get(
          'content-type',
        ),
      ).toBe('image/png');
    }
    for (const name of ['', 'x', '__proto__', 'constructor', '../sent']) {
      expect((await call(passage, { person: shop.operator, params: { ...params, name } })).status).toBe(404);
      expect((await call(file, { person: shop.operator, params: { ...params, name } })).status).toBe(404);
    }
  });

  it('that failed for want of room says so, and comes out when it is started again', async () => {
    const { number } = await chosen();
    const full: Storage = {
      ...shop.storage,
      get: (key) => shop.storage.get(key),
      put: async () => {
        throw Object.assign(new Error('no space left on device'), { code: 'ENOSPC' });
      },
    };
    useStorage(full);
    const failed = await prepare(shop, number);
    expect(failed.preparations[0].task).toMatchObject({
      state: 'failed',
      problem: expect.stringMatching(/disk is full/),
    });
    expect(failed.preparations[0].manifestSha256).toBeNull();
    expect(failed.waitsFor.pass).toMatch(/failed. Start it again/);
    useStorage(shop.storage);
    const [again] = (await prepare(shop, number)).preparations;
    expect(again).toMatchObject({ id: failed.preparations[0].id, task: { state: 'done' } });
    expect(again.files).toHaveLength(1);
  });

  it('is never published by a worker that lost its claim', async () => {
    const { number } = await chosen();
    let release: () => void = () => undefined;
    const held = new Promise<void>((done) => (release = done));
    bench.wait = () => held;
    const { version } = await read(shop.designer, number);
    const { preparation } = await jsonOf<{ preparation: PreparationView }>(await ask(number, version));
    await expect.poll(async () => (await tasksAbout(preparation.id))[0].state).toBe('running');
    // Another worker takes it up, as after a pause that outlived the lease.
    await database()('tasks')
      .where({ subject: `preparation ${preparation.id}` })
      .increment('attempt', 1);
    release();
    await new Promise((next) => setTimeout(next, 100));
    expect((await read(shop.designer, number)).preparations[0].manifestSha256).toBeNull();
    bench.wait = async () => undefined;
    await database()('tasks')
      .where({ subject: `preparation ${preparation.id}` })
      .update({ lease_until_ms: 0 });
    expect((await settled(shop.designer, number)).preparations[0].task.state).toBe('done');
  });

  it('is taken up again when the site was stopped half-way', async () => {
    const { number } = await chosen();
    bench.wait = () => new Promise(() => undefined);
    const { version } = await read(shop.designer, number);
    const { preparation } = await jsonOf<{ preparation: PreparationView }>(await ask(number, version));
    await expect.poll(async () => (await tasksAbout(preparation.id))[0].state).toBe('running');
    await stopShopQueue();
    bench.wait = async () => undefined;
    startQueue([checkArtworkTask, prepareOrderTask], QUICK);
    expect((await settled(shop.designer, number)).preparations[0]).toMatchObject({
      id: preparation.id,
      task: { state: 'done' },
    });
  });

  it('is seen by the customer only once its proof is sent, without the shop’s settings', async () => {
    const { number, preparations } = await orderAt(shop, 'passed');
    const params = { id: String(preparations[0].id) };
    expect((await read(shop.customer, number)).preparations).toEqual([]);
    await at(getPreparation, shop.customer, number, { params, status: 404 });
    expect(
      (await call(passage, { person: shop.customer, params: { number, ...params, name: 'burned' } })).status,
    ).toBe(404);

    const sent = await orderAt(shop, 'proof-sent');
    const shown = { id: String(sent.preparations[0].id) };
    const mine = await read(shop.customer, sent.number);
    expect(mine).toMatchObject({ design: null, waivers: [], outcomes: [] });
    expect(mine.preparations).toMatchObject([
      {
        manifestSha256: sent.passed?.manifestSha256,
        files: [],
        timings: {},
        design: { recipe: null },
        report: { totalSeconds: null, settings: { recipe: null, machine: null } },
      },
    ]);
    expect(JSON.stringify(mine)).not.toMatch(/powerPercent|wattsAtFull/);
    await at(getPreparation, shop.customer, sent.number, { params: shown });
    expect(
      (
        await call(passage, {
          person: shop.customer,
          params: { number: sent.number, ...shown, name: 'burned' },
        })
      ).status,
    ).toBe(200);
    for (const route of [file, manifest, report, ticket]) {
      expect(
        (
          await call(route, {
            person: shop.customer,
            params: { number: sent.number, ...shown, name: sent.preparations[0].files[0].name },
          })
        ).status,
      ).toBe(403);
    }
  });

  it('of one order is not found under another', async () => {
    const [one, other] = [await orderAt(shop, 'prepared'), await orderAt(shop, 'submitted')];
    const params = { id: String(one.preparations[0].id), name: one.preparations[0].files[0].name };
    for (const route of [getPreparation, manifest, report, file]) {
      expect(
        (await call(route, { person: shop.designer, params: { number: other.number, ...params } })).status,
      ).toBe(404);
    }
  });

  it('is what the ticket speaks of', async () => {
    const { number, passed } = await orderAt(shop, 'released');
    const said = await at<{ sentence: string; placementWords: string; preparation: PreparationView }>(
      ticket,
      shop.operator,
      number,
    );
    expect(said.sentence).toMatch(/^Screen as halftone .* 0\.110 mm .* Kiln .*Birch plywood 4 mm/);
    expect(said.placementWords).toMatch(/^60 × 40 mm/);
    expect(said.preparation.manifestSha256).toBe(passed?.manifestSha256);
  });

  it.each<[string, object, string]>([
    ['a preset of no machine', { spotPresetId: 999 }, 'spotPresetId'],
    ['no machine', { machineId: 999 }, 'machineId'],
    [
      'a speed that the machine does not reach',
      { recipe: { powerPercent: 10, speedMmPerS: 501, perpendicular: null, focusOffsetMm: 0 } },
      'recipe.speedMmPerS',
    ],
    [
      'a perpendicular pass without power',
      { perpendicular: { linePitchMm: 0.1, alongPitchMm: 0.1 } },
      'recipe.perpendicular',
    ],
    [
      'a black point above the white point',
      { tone: { mode: 'absolute', blackPoint: 0.6, whitePoint: 0.5, gamma: 1 } },
      'tone.blackPoint',
    ],
  ])('is not chosen with %s', async (_, over, field) => {
    const { number } = await orderAt(shop, 'in-preparation');
    await expect(design(shop, number, over)).rejects.toThrow(field);
  });
});
