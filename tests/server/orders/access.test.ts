import '../../setup/database';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { APIRoute } from 'astro';
import { orderListSchema, orderViewSchema } from '@/lib/orders/views';
import { ROUTES } from '@/lib/server/routes';
import { GET as list } from '@/pages/api/orders/index';
import { call, jsonOf } from '../../setup/call';
import { change, open, openShop, orderAt, read, startShopQueue, stopShopQueue, type Shop } from './shop';

const MODULES = import.meta.glob<Record<string, APIRoute>>('/src/pages/api/orders/**/*.ts');
const ORDER_ROUTES = ROUTES.filter(({ path }) => path.startsWith('/api/orders/:number'));

/** The endpoint of a listed route. */
async function endpointOf({ method, path }: { method: string; path: string }): Promise<APIRoute> {
  const file = `/src/pages${path.replace(/:(\w+)/g, '[$1]')}`;
  const load = MODULES[`${file}.ts`] ?? MODULES[`${file}/index.ts`];
  if (!load) throw new Error(`no page for ${path}`);
  return (await load())[method];
}

let shop: Shop;
let number: string;
let params: Record<string, string>;
beforeAll(async () => {
  shop = await openShop();
  startShopQueue();
  const order = await orderAt(shop, 'proof-sent');
  ({ number } = order);
  params = {
    number,
    artworkVersion: '1',
    id: String(order.preparations[0].id),
    name: 'burned',
    findingId: 'hairline',
  };
});
afterAll(stopShopQueue);

/** A body that would be taken from whoever may send it. */
const BODIES: Record<string, unknown> = {
  'PATCH /api/orders/:number': { version: 1, fields: { notes: 'x' } },
  'POST /api/orders/:number/events': { event: 'cancel', version: 1, reason: 'because' },
};

describe('another customer’s order', () => {
  const reachable = ORDER_ROUTES.filter(({ access }) => (access as readonly string[]).includes('customer'));

  it.each(reachable.map((route) => [`${route.method} ${route.path}`, route] as const))(
    '%s is not found',
    async (key, route) => {
      const endpoint = await endpointOf(route);
      const upload = 'upload' in route;
      const form = new FormData();
      form.set('artwork', new File(['x'], 'x.png'));
      const sent = upload
        ? { raw: form }
        : { body: route.method === 'GET' ? undefined : (BODIES[key] ?? {}) };
      const response = await call(endpoint, { person: shop.stranger, params, method: route.method, ...sent });
      expect(response.status).toBe(404);
      expect(await response.text()).not.toContain('Ina');
    },
  );

  it.each(['U-9999', 'u-1001', 'U-01001', 'U-1001%00', 'U-1001/', '../U-1001', '1', ''])(
    '%j is not found by anybody',
    async (odd) => {
      const endpoint = await endpointOf({ method: 'GET', path: '/api/orders/:number' });
      for (const person of [shop.customer, shop.admin])
        expect((await call(endpoint, { person, params: { number: odd } })).status).toBe(404);
    },
  );

  it('is unchanged by all that', async () => {
    expect(await read(shop.customer, number)).toMatchObject({
      state: 'proof-sent',
      artworks: [{ version: 1 }],
    });
  });
});

describe('an order as each role sees it', () => {
  it('fits its schema, and offers what that role may do', async () => {
    const events = Object.fromEntries(
      await Promise.all(
        [shop.customer, shop.designer, shop.operator, shop.admin].map(
          async (who) => [who.role, orderViewSchema.parse(await read(who, number)).events] as const,
        ),
      ),
    );
    expect(events).toEqual({
      customer: ['approve', 'ask-for-changes', 'new-artwork', 'cancel'],
      designer: ['approve', 'ask-for-changes', 'prepare-again', 'new-artwork', 'hold', 'cancel'],
      operator: ['approve', 'ask-for-changes', 'hold', 'cancel'],
      admin: ['approve', 'ask-for-changes', 'prepare-again', 'new-artwork', 'hold', 'cancel'],
    });
  });

  it('keeps the shop’s own happenings from the customer', async () => {
    const seen = (await read(shop.customer, number)).history.map(({ event }) => event);
    expect(seen).toEqual(['open', 'new-artwork', 'submit', 'send-proof', 'approve'].slice(0, 4));
  });

  it('shows the machine’s caution to staff alone', async () => {
    expect((await read(shop.customer, number)).cautions.map(({ id }) => id)).toEqual(['glued-board']);
    expect((await read(shop.operator, number)).cautions.map(({ id }) => id)).toEqual([
      'machine-class',
      'glued-board',
    ]);
  });
});

describe('the list', () => {
  const rows = async (who = shop.designer, query = ''): Promise<ReturnType<typeof orderListSchema.parse>> =>
    orderListSchema.parse(await jsonOf(await call(list, { person: who, path: `/api/orders?${query}` })));

  beforeAll(async () => {
    for (const [title, dueOn] of [
      ['Alder box', '2027-03-01'],
      ['100% cork', '2027-01-05'],
      ['Zebrano_lid', null],
    ] as const) {
      const order = await open(shop.stranger, { title });
      await change(shop.stranger, order.number, { dueOn });
    }
  });

  it('holds one’s own orders, and for staff all of them', async () => {
    expect((await rows(shop.customer)).rows.map((row) => row.number)).toEqual([number]);
    expect((await rows(shop.stranger)).total).toBe(3);
    expect((await rows(shop.unconfirmed)).rows).toEqual([]);
    expect((await rows()).total).toBe(4);
  });

  it('tells of findings, picture and scanning time, the latter to staff only', async () => {
    expect((await rows(shop.designer, 'q=Bakery')).rows).toMatchObject([
      {
        number,
        title: 'Bakery sign',
        state: 'proof-sent',
        customerName: 'Ina',
        machineName: 'Kiln',
        stockName: 'Birch plywood 4 mm',
        scanSeconds: 90,
        blockers: 0,
        pictureUrl: `/api/orders/${number}/artwork/1/picture`,
      },
    ]);
    expect((await rows(shop.customer)).rows[0]).toMatchObject({ machineName: '', scanSeconds: null });
  });

  it.each([
    ['q=alder', ['Alder box']],
    ['q=100%25', ['100% cork']],
    ['q=o_l', ['Zebrano_lid']],
    ['q=OLAF&sort=number', ['Alder box', '100% cork', 'Zebrano_lid']],
    ['state=proof-sent', ['Bakery sign']],
    [
      'state=draft,proof-sent&sort=state&order=down',
      ['Bakery sign', 'Zebrano_lid', '100% cork', 'Alder box'],
    ],
    ['state=nonsense&sort=number&perPage=1', ['Bakery sign']],
    ['sort=due', ['100% cork', 'Alder box', 'Bakery sign', 'Zebrano_lid']],
    ['sort=due&order=down', ['Alder box', '100% cork', 'Zebrano_lid', 'Bakery sign']],
    ['sort=customer', ['Bakery sign', 'Alder box', '100% cork', 'Zebrano_lid']],
    ['sort=number&perPage=2&page=2', ['100% cork', 'Zebrano_lid']],
    ['sort=number&page=9', []],
  ])('answers %s', async (query, titles) => {
    expect((await rows(shop.designer, query)).rows.map(({ title }) => title)).toEqual(titles);
  });

  it('finds an order by its number, however it is written', async () => {
    for (const q of [number, number.toLowerCase(), number.slice(2)])
      expect((await rows(shop.designer, `q=${q}`)).rows).toHaveLength(1);
    expect((await rows(shop.stranger, `q=${number}`)).rows).toEqual([]);
  });

  it('finds by machine', async () => {
    expect((await rows(shop.operator, `machineId=${shop.machineId}`)).rows).toHaveLength(1);
    expect((await rows(shop.operator, 'machineId=999')).rows).toEqual([]);
  });

  it.each(['sort=colour', 'page=0', 'perPage=1000', 'machineId=x'])('refuses %s', async (query) => {
    expect((await call(list, { person: shop.designer, path: `/api/orders?${query}` })).status).toBe(422);
  });
});

describe('opening an order', () => {
  it('is done by staff for a customer they name', async () => {
    for (const who of [shop.designer, shop.operator]) {
      const order = await open(who, { customerId: shop.stranger.id, title: 'Walk-in' });
      expect(order.customer.name).toBe('Olaf');
    }
    for (const customerId of [undefined, 9999, shop.operator.id]) {
      await expect(open(shop.designer, { customerId })).rejects.toThrow('422');
    }
  });

  it('is always for themselves when a customer does it', async () => {
    expect((await open(shop.customer, { customerId: shop.stranger.id })).customer.name).toBe('Ina');
  });

  it('refuses a stock that the shop does not have', async () => {
    const { blankOf } = await import('./shop');
    await expect(open(shop.customer, { blank: blankOf(4711) })).rejects.toThrow('no such stock');
  });
});
