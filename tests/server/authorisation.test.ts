import { closeShop, openAuthorisationShop } from './authorisation-shop';
import type { APIRoute } from 'astro';
import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';
import { forgetAttempts } from '@/lib/server/limits';
import type { Person } from '@/lib/server/person';
import { ROUTES, type RouteKey } from '@/lib/server/routes';
import { call, type CallOptions } from '../setup/call';
import { fileForm, type Shop } from './orders/shop';

type Who = 'stranger' | 'customer' | 'designer' | 'operator' | 'admin';
const WHO: Who[] = ['stranger', 'customer', 'designer', 'operator', 'admin'];
const ANYONE = WHO;
const SIGNED_IN: Who[] = ['customer', 'designer', 'operator', 'admin'];
const STAFF: Who[] = ['designer', 'operator', 'admin'];
const DESIGN: Who[] = ['designer', 'admin'];
const ADMIN: Who[] = ['admin'];

/** Who may call what, written down a second time on purpose: a route that is new or opened wider fails here. */
const TABLE: Record<RouteKey, Who[]> = {
  'GET /health': ANYONE,
  'GET /api/openapi.json': ANYONE,
  'GET /api/account': ANYONE,
  'POST /api/account/register': ANYONE,
  'POST /api/account/confirm': ANYONE,
  'POST /api/account/confirmation': SIGNED_IN,
  'POST /api/account/forgotten': ANYONE,
  'POST /api/account/reset': ANYONE,
  'POST /api/account/invitation': ANYONE,
  'PATCH /api/account': SIGNED_IN,
  'POST /api/account/sign-out-everywhere': SIGNED_IN,
  'GET /api/people': STAFF,
  'POST /api/people/invitations': ADMIN,
  'POST /api/people/walk-ins': STAFF,
  'PATCH /api/people/:id': ADMIN,
  'GET /api/machines': STAFF,
  'POST /api/machines': ADMIN,
  'PATCH /api/machines/:id': ADMIN,
  'POST /api/machines/:id/spot-presets': ADMIN,
  'PATCH /api/machines/:id/spot-presets/:presetId': ADMIN,
  'DELETE /api/machines/:id/spot-presets/:presetId': ADMIN,
  'GET /api/stocks': SIGNED_IN,
  'POST /api/stocks': ADMIN,
  'PATCH /api/stocks/:id': ADMIN,
  'GET /api/wash': STAFF,
  'PUT /api/wash': ADMIN,
  'GET /api/outbox': ANYONE,
  'GET /api/record': ADMIN,
  'GET /api/orders': SIGNED_IN,
  'POST /api/orders': SIGNED_IN,
  'GET /api/orders/:number': SIGNED_IN,
  'PATCH /api/orders/:number': SIGNED_IN,
  'POST /api/orders/:number/artwork': SIGNED_IN,
  'GET /api/orders/:number/artwork/:artworkVersion/original': SIGNED_IN,
  'GET /api/orders/:number/artwork/:artworkVersion/picture': SIGNED_IN,
  'POST /api/orders/:number/artwork/:artworkVersion/check': SIGNED_IN,
  'PUT /api/orders/:number/design': DESIGN,
  'POST /api/orders/:number/preparations': DESIGN,
  'GET /api/orders/:number/preparations/:id': SIGNED_IN,
  'GET /api/orders/:number/preparations/:id/report': STAFF,
  'GET /api/orders/:number/preparations/:id/manifest': STAFF,
  'GET /api/orders/:number/preparations/:id/files/:name': STAFF,
  'GET /api/orders/:number/preparations/:id/pictures/:name': SIGNED_IN,
  'POST /api/orders/:number/waivers': DESIGN,
  'DELETE /api/orders/:number/waivers/:findingId': DESIGN,
  'POST /api/orders/:number/events': SIGNED_IN,
  'GET /api/orders/:number/progress': SIGNED_IN,
  'GET /api/orders/:number/ticket': STAFF,
};
const KEYS = Object.keys(TABLE) as RouteKey[];
const METHODS = ['GET', 'POST', 'PUT', 'PATCH', 'DELETE', 'HEAD', 'OPTIONS', 'ALL'];

const files = import.meta.glob<Record<string, APIRoute>>(['/src/pages/api/**/*.ts', '/src/pages/health.ts']);
const pathOf = (file: string): string =>
  file
    .replace('/src/pages', '')
    .replace(/\.ts$/, '')
    .replace(/\/index$/, '')
    .replace(/\[(\w+)\]/g, ':$1');
const handlers = new Map<string, APIRoute>();
for (const [file, load] of Object.entries(files)) {
  for (const [name, handler] of Object.entries(await load()))
    if (METHODS.includes(name)) handlers.set(`${name} ${pathOf(file)}`, handler);
}

let shop: Shop;
let real: Record<string, string>;
let people: Record<Who, Person | null>;
beforeAll(async () => {
  ({ shop, real } = await openAuthorisationShop());
  people = {
    stranger: null,
    customer: shop.customer,
    designer: shop.designer,
    operator: shop.operator,
    admin: shop.admin,
  };
});
afterAll(closeShop);
beforeEach(forgetAttempts);

function ask(
  key: RouteKey,
  person: Person | null,
  params: Record<string, string>,
  options: CallOptions = {},
): Promise<Response> {
  const [method, path] = key.split(' ');
  const handler = handlers.get(key);
  if (!handler) throw new Error(`no file answers ${key}`);
  const names = [...path.matchAll(/:(\w+)/g)].map(([, name]) => name);
  const own = Object.fromEntries(names.map((name) => [name, params[name] ?? '999999']));
  const upload =
    key === 'POST /api/orders/:number/artwork'
      ? { raw: fileForm('x') }
      : method === 'GET'
        ? {}
        : { body: {} };
  return call(handler, {
    method,
    path: path.replace(/:(\w+)/g, (_, name: string) => own[name]),
    params: own,
    person,
    ...upload,
    ...options,
  });
}
/** Nothing of this number exists, so that a call that is let through changes nothing. */
const NOWHERE = { number: 'U-99999999' };

describe('the list', () => {
  it('has every route of the table and no other', () => {
    expect(ROUTES.map(({ method, path }) => `${method} ${path}`).sort()).toEqual([...KEYS].sort());
  });

  it('has a file for every route, and no file answers what is not listed', () => {
    expect([...handlers.keys()].sort()).toEqual([...KEYS].sort());
  });
});

describe.each(KEYS)('%s', (key) => {
  it.each(WHO)('asked by a %s', async (who) => {
    const response = await ask(key, people[who], NOWHERE);
    const { code } = response.headers.get('content-type')?.includes('json')
      ? await response.json()
      : { code: undefined };
    await response.body?.cancel().catch(() => undefined);
    if (TABLE[key].includes(who)) {
      expect(['not-signed-in', 'not-allowed']).not.toContain(code);
      expect(response.status).not.toBe(500);
    } else {
      expect([response.status, code]).toEqual(
        who === 'stranger' ? [401, 'not-signed-in'] : [403, 'not-allowed'],
      );
    }
  });
});

/** A body that the schema takes, so that what answers is the question whose order it is. */
const BODIES: Partial<Record<RouteKey, CallOptions>> = {
  'PATCH /api/orders/:number': { body: { version: 1, fields: { title: 'Mine' } } },
  'POST /api/orders/:number/events': { body: { event: 'cancel', version: 1, reason: 'not mine' } },
};
const OF_ORDERS = KEYS.filter((key) => key.includes('/:number') && TABLE[key].includes('customer'));

describe('another customer’s order', () => {
  it('is real: its own customer sees every part of it', async () => {
    for (const key of OF_ORDERS.filter((key) => key.startsWith('GET'))) {
      const response = await ask(key, shop.customer, real);
      expect(response.status, key).toBe(200);
      await response.body?.cancel();
    }
  });

  it.each(OF_ORDERS)('answers 404 to %s, exactly as an order that does not exist', async (key) => {
    const theirs = await ask(key, shop.stranger, real, BODIES[key]);
    const none = await ask(key, shop.stranger, { ...real, ...NOWHERE }, BODIES[key]);
    expect([theirs.status, await theirs.text()]).toEqual([404, await none.text()]);
  });

  it('is in no list and found by no search', async () => {
    const handler = handlers.get('GET /api/orders');
    for (const query of [
      '',
      `q=${real.number}`,
      'q=Bakery',
      'state=proof-sent',
      `machineId=${shop.machineId}`,
    ]) {
      const response = await call(handler as APIRoute, {
        path: `/api/orders?${query}`,
        person: shop.stranger,
      });
      const { rows } = (await response.json()) as { rows: { number: string }[] };
      expect(rows.map(({ number }) => number).filter((number) => number !== real.ownNumber)).toEqual([]);
    }
  });

  it.each([
    ['doubled slashes', '//api//orders//NUMBER'],
    ['an encoded letter', '/%61pi/orders/NUMBER'],
    ['a doubly encoded letter', '/%2561pi/orders/NUMBER'],
    ['capitals', '/API/Orders/NUMBER'],
    ['a slash at the end', '/api/orders/NUMBER/'],
    ['steps up and down', '/api/orders/../orders/./NUMBER'],
    ['a query that names somebody else', '/api/orders/NUMBER?customerId=1&role=admin'],
  ])('stays hidden behind %s: the address decides nothing', async (_, form) => {
    const path = form.replace('NUMBER', real.number);
    const handler = handlers.get('GET /api/orders/:number') as APIRoute;
    expect(
      (await call(handler, { path, params: { number: real.number }, person: shop.stranger })).status,
    ).toBe(404);
    expect((await call(handler, { path, params: { number: real.number }, person: null })).status).toBe(401);
  });

  it.each([
    'u-1001',
    ' U-1001',
    'U-1001 ',
    'U-1001%20',
    'U-01001',
    'U-1001/',
    '..%2FU-1001',
    "U-1001' or 1=1 --",
  ])('has no second number: %s', async (written) => {
    const number = written.replace('1001', real.number.slice(2));
    expect((await ask('GET /api/orders/:number', shop.customer, { number })).status).toBe(404);
  });

  it('lends its parts to no other order of the one who asks', async () => {
    for (const key of OF_ORDERS.filter(
      (key) => /artwork\/|preparations\//.test(key) && key.startsWith('GET'),
    )) {
      expect((await ask(key, shop.stranger, { ...real, number: real.ownNumber })).status, key).toBe(404);
    }
  });
});
