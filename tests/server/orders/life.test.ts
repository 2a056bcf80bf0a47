import '../../setup/database';
import { afterAll, afterEach, beforeAll, describe, expect, it } from 'vitest';
import {
  bench,
  blankOf,
  cause,
  change,
  design,
  finding,
  open,
  openShop,
  orderAt,
  prepare,
  read,
  settled,
  startShopQueue,
  stopShopQueue,
  upload,
  type Shop,
} from './shop';
import { database } from '@/lib/server/db';

let shop: Shop;
beforeAll(async () => {
  shop = await openShop();
  startShopQueue();
});
afterAll(stopShopQueue);
afterEach(() => {
  bench.findings = [];
});

const mailsAbout = async (number: string): Promise<{ kind: string; recipient: string }[]> =>
  (await database()('mails').select('kind', 'recipient', 'subject').orderBy('id')).filter((mail) =>
    mail.subject.includes(number),
  );

describe('an order’s life', () => {
  it('goes from upload to handed over through the four roles', async () => {
    const { number } = await orderAt(shop, 'finished');
    const order = await cause(shop.operator, number, { event: 'hand-over', how: 'collected', byWhom: 'Ina' });
    expect(order.state).toBe('handed-over');
    expect(order.history.map(({ event, from, to }) => `${event}: ${from} → ${to}`)).toEqual([
      'open: null → draft',
      'new-artwork: draft → draft',
      'submit: draft → submitted',
      'take: submitted → in-preparation',
      'design: null → null',
      'prepare: in-preparation → in-preparation',
      'pass: in-preparation → passed',
      'send-proof: passed → proof-sent',
      'approve: proof-sent → approved',
      'release: approved → released',
      'on-the-machine: released → running',
      'done: running → finished',
      'hand-over: finished → handed-over',
    ]);
    expect(order.approved).toMatchObject({
      by: 'Ina',
      how: 'on the order page',
      manifestSha256: order.passed?.manifestSha256,
    });
    expect(order.outcomes).toMatchObject([{ kind: 'done', by: 'Otto', words: 'even' }]);
    expect(await mailsAbout(number)).toMatchObject([
      { kind: 'proof-ready', recipient: shop.customer.email },
      { kind: 'approved', recipient: shop.customer.email },
      { kind: 'finished', recipient: shop.customer.email },
    ]);
  });

  it('numbers orders from U-1001 upward', async () => {
    const [first, second] = [await open(shop.customer), await open(shop.customer)];
    expect(first.number).toMatch(/^U-1\d{3}$/);
    expect(Number(second.number.slice(2))).toBe(Number(first.number.slice(2)) + 1);
  });

  it.each([
    ['artwork', async (number: string) => void number, /no artwork/],
    ['size', async (number: string) => void (await upload(shop.customer, number)), /size is missing/],
    [
      'blank',
      async (number: string) =>
        void (
          await upload(shop.customer, number),
          await change(shop.customer, number, { widthMm: 60, heightMm: 40 })
        ),
      /blank is missing/,
    ],
    [
      'stock',
      async (number: string) =>
        void (
          await upload(shop.customer, number),
          await change(shop.customer, number, { widthMm: 60, heightMm: 40, blank: blankOf(null) })
        ),
      /stock is missing/,
    ],
    [
      'a stock that is allowed',
      async (number: string) =>
        void (
          await upload(shop.customer, number),
          await change(shop.customer, number, { widthMm: 60, heightMm: 40, blank: blankOf(shop.vinyl) })
        ),
      /never engraved/,
    ],
  ])('is not submitted without %s', async (_, fill, words) => {
    const { number } = await open(shop.customer);
    await fill(number);
    await settled(shop.customer, number);
    const refused = (await cause(
      shop.customer,
      number,
      { event: 'submit', rightsConfirmed: true },
      409,
    )) as unknown;
    expect(refused).toBeUndefined();
    const order = await read(shop.customer, number);
    expect(order).toMatchObject({ state: 'draft', rightsConfirmedAt: null });
    expect(order.waitsFor.submit).toMatch(words);
  });

  it('is not submitted without the rights statement', async () => {
    const { number } = await orderAt(shop, 'draft');
    for (const rightsConfirmed of [false, undefined]) {
      await cause(shop.customer, number, { event: 'submit', rightsConfirmed }, 422);
    }
    expect((await read(shop.customer, number)).state).toBe('draft');
  });

  it('is not submitted from an address that is not confirmed, while staff may submit for a walk-in', async () => {
    const mine = await open(shop.unconfirmed, { widthMm: 60, heightMm: 40, blank: blankOf(shop.birch) });
    await upload(shop.unconfirmed, mine.number);
    await settled(shop.unconfirmed, mine.number);
    await cause(shop.unconfirmed, mine.number, { event: 'submit', rightsConfirmed: true }, 403);
    expect((await read(shop.unconfirmed, mine.number)).waitsFor.submit).toMatch(/not confirmed/);
    expect((await cause(shop.designer, mine.number, { event: 'submit', rightsConfirmed: true })).state).toBe(
      'submitted',
    );
  });

  it('puts a customer’s own unidentified blank on hold until the shop says what it is', async () => {
    const { number } = await orderAt(shop, 'submitted', { blank: blankOf(null, { source: 'customer' }) });
    const held = await read(shop.customer, number);
    expect(held.state).toBe('on-hold');
    expect(held.heldBecause).toMatch(/not identified/);
    expect(await mailsAbout(number)).toMatchObject([{ kind: 'on-hold' }]);
    await cause(shop.designer, number, { event: 'resume' }, 409);
    await change(shop.designer, number, { blank: blankOf(shop.birch, { source: 'customer' }) });
    expect(await cause(shop.designer, number, { event: 'resume' })).toMatchObject({
      state: 'submitted',
      heldBecause: '',
    });
  });

  it('is not passed with open blockers, and is when each is waived with a reason', async () => {
    bench.findings = [finding(), finding({ id: 'fill-in', title: 'Fill-ins' })];
    const { number, preparations } = await orderAt(shop, 'prepared');
    const pass = { event: 'pass', preparationId: preparations[0].id };
    await cause(shop.designer, number, pass, 409);
    expect((await read(shop.designer, number)).waitsFor.pass).toBe(
      'Blockers are open: hairlines and one more. Mend the artwork or change the size, or waive with a reason.',
    );
    const { POST } = await import('@/pages/api/orders/[number]/waivers/index');
    const { at } = await import('./shop');
    for (const findingId of ['hairline', 'fill-in']) {
      const { version } = await read(shop.designer, number);
      await at(POST, shop.designer, number, { body: { version, findingId, reason: 'agreed by telephone' } });
    }
    expect((await cause(shop.designer, number, pass)).state).toBe('passed');
  });

  it('never waives what cannot be waived', async () => {
    bench.findings = [finding({ id: 'outside', title: 'Outside the bed', waivable: false })];
    const { number } = await orderAt(shop, 'prepared');
    const { POST } = await import('@/pages/api/orders/[number]/waivers/index');
    const { at } = await import('./shop');
    const { version } = await read(shop.designer, number);
    const refused = await at<{ detail: string }>(POST, shop.designer, number, {
      body: { version, findingId: 'outside', reason: 'let it be' },
      status: 409,
    });
    expect(refused.detail).toMatch(/cannot be waived/);
  });

  it('asks for a waiver anew with new artwork', async () => {
    bench.findings = [finding()];
    const { number } = await orderAt(shop, 'prepared');
    const { POST } = await import('@/pages/api/orders/[number]/waivers/index');
    const { at } = await import('./shop');
    await at(POST, shop.designer, number, {
      body: { version: (await read(shop.designer, number)).version, findingId: 'hairline', reason: 'agreed' },
    });
    await upload(shop.customer, number, 'another picture');
    await settled(shop.customer, number);
    const order = await prepare(shop, number);
    await cause(shop.designer, number, { event: 'pass', preparationId: order.preparations[0].id }, 409);
  });

  it('is not passed without power and speed, with stale choices, or with older artwork', async () => {
    const { number } = await orderAt(shop, 'in-preparation');
    await design(shop, number, { recipe: null });
    let order = await prepare(shop, number);
    expect(order.waitsFor.pass).toMatch(/Power and speed are missing/);
    await design(shop, number);
    expect((await read(shop.designer, number)).waitsFor.pass).toMatch(/have changed since/);
    order = await prepare(shop, number);
    expect(order.waitsFor.pass).toBeUndefined();
    await upload(shop.customer, number, 'newer');
    await settled(shop.customer, number);
    expect((await read(shop.designer, number)).waitsFor.pass).toMatch(/newer artwork/);
  });

  it('binds the approval to the manifest that was looked at', async () => {
    const { number } = await orderAt(shop, 'proof-sent');
    await cause(shop.customer, number, { event: 'approve', manifestSha256: 'f'.repeat(64) }, 409);
    expect((await read(shop.customer, number)).state).toBe('proof-sent');
  });

  it('records an approval given in person with who and how', async () => {
    const { number, passed } = await orderAt(shop, 'proof-sent');
    const approve = { event: 'approve', manifestSha256: passed?.manifestSha256 };
    await cause(shop.designer, number, approve, 422);
    const order = await cause(shop.designer, number, {
      ...approve,
      inPerson: { who: 'Ina’s sister', how: 'at the counter' },
    });
    expect(order.approved).toMatchObject({ by: 'Ina’s sister', how: 'at the counter, recorded by Dora' });
  });

  it('is opened and submitted by an operator for a walk-in, who then changes it no more but records the approval', async () => {
    const { number } = await open(shop.operator, {
      customerId: shop.unconfirmed.id,
      widthMm: 50,
      heightMm: 40,
      blank: blankOf(shop.birch),
    });
    await upload(shop.operator, number);
    await settled(shop.operator, number);
    await change(shop.operator, number, { widthMm: 60 });
    await settled(shop.operator, number);
    await cause(shop.operator, number, { event: 'submit', rightsConfirmed: true });
    await expect(change(shop.operator, number, { widthMm: 70 })).rejects.toThrow('409');
    await expect(upload(shop.operator, number, 'swapped')).rejects.toThrow('409');
    await cause(shop.designer, number, { event: 'take' });
    await design(shop, number);
    const { preparations } = await prepare(shop, number);
    await cause(shop.designer, number, { event: 'pass', preparationId: preparations[0].id });
    const { passed } = await cause(shop.designer, number, { event: 'send-proof', words: '' });
    await expect(change(shop.operator, number, { notes: 'x' })).rejects.toThrow('409');
    await expect(upload(shop.operator, number, 'swapped')).rejects.toThrow('409');
    const approve = { event: 'approve', manifestSha256: passed?.manifestSha256 };
    await cause(shop.operator, number, approve, 422);
    const order = await cause(shop.operator, number, {
      ...approve,
      inPerson: { who: 'Nils', how: 'at the counter' },
    });
    expect(order).toMatchObject({
      state: 'approved',
      approved: { by: 'Nils', how: 'at the counter, recorded by Otto' },
    });
  });

  it('goes without a proof only where the customer agreed', async () => {
    const { number } = await orderAt(shop, 'passed');
    const without = { event: 'approve-without-proof', reason: 'as last time' };
    await cause(shop.designer, number, without, 409);
    const agreed = await orderAt(shop, 'passed', { withoutProof: true });
    expect((await cause(shop.designer, agreed.number, without)).approved?.manifestSha256).toBe(
      agreed.passed?.manifestSha256,
    );
  });

  it('voids the pass when the customer asks for changes, and tells whoever passed it', async () => {
    const { number } = await orderAt(shop, 'proof-sent');
    const order = await cause(shop.customer, number, {
      event: 'ask-for-changes',
      words: 'A little larger, please.',
    });
    expect(order).toMatchObject({ state: 'in-preparation', passed: null, approved: null, preparations: [] });
    expect((await mailsAbout(number)).at(-1)).toMatchObject({
      kind: 'changes-requested',
      recipient: shop.designer.email,
    });
  });

  it.each(['passed', 'proof-sent', 'approved', 'released'] as const)(
    'voids pass and approval when it is prepared again or gets new artwork once %s',
    async (state) => {
      for (const again of [
        (number: string) => prepare(shop, number),
        (number: string) => upload(shop.customer, number, 'changed'),
      ]) {
        const { number } = await orderAt(shop, state);
        await again(number);
        expect(await settled(shop.designer, number)).toMatchObject({
          state: 'in-preparation',
          passed: null,
          approved: null,
        });
      }
    },
  );

  it('takes no new artwork on the machine', async () => {
    const { number } = await orderAt(shop, 'running');
    await expect(upload(shop.customer, number, 'too late')).rejects.toThrow('409');
  });

  it('asks for the whole checklist before the machine, and takes a spoiled piece back to released', async () => {
    const { number } = await orderAt(shop, 'released');
    await cause(shop.operator, number, { event: 'on-the-machine', checklist: ['material'] }, 409);
    await cause(shop.operator, number, {
      event: 'on-the-machine',
      checklist: ['material', 'focus', 'extraction', 'attended'],
    });
    const order = await cause(shop.operator, number, {
      event: 'spoiled',
      reason: 'The board had a knot.',
      newBlank: 'second board',
      cost: '4 €',
    });
    expect(order).toMatchObject({ state: 'released', outcomes: [{ kind: 'spoiled', cost: '4 €' }] });
  });

  it.each([
    ['pass', 'prepared'],
    ['send-proof', 'passed'],
  ] as const)('looks at the stock again at %s', async (event, state) => {
    const { number, preparations } = await orderAt(shop, state);
    const said = event === 'pass' ? { event, preparationId: preparations[0].id } : { event, words: '' };
    const { allStocks, updateStock } = await import('@/lib/server/tables/stocks');
    const stock = (await allStocks(database())).find(({ id }) => id === shop.birch);
    if (!stock) throw new Error('no stock');
    await updateStock(database(), shop.birch, { ...stock, forbidden: true }, null);
    expect((await read(shop.designer, number)).waitsFor[event]).toMatch(/cannot be waived/);
    await cause(shop.designer, number, said, 409);
    await updateStock(database(), shop.birch, stock, null);
    await cause(shop.designer, number, said);
  });

  it('looks at the stock again at release', async () => {
    const { number } = await orderAt(shop, 'approved');
    const { allStocks, updateStock } = await import('@/lib/server/tables/stocks');
    const stock = (await allStocks(database())).find(({ id }) => id === shop.birch);
    if (!stock) throw new Error('no stock');
    await updateStock(database(), shop.birch, { ...stock, forbidden: true }, null);
    await cause(shop.designer, number, { event: 'release' }, 409);
    await updateStock(database(), shop.birch, stock, null);
    expect((await cause(shop.designer, number, { event: 'release' })).state).toBe('released');
  });

  it('returns from hold to where it stood, and is cancelled with a reason', async () => {
    const { number } = await orderAt(shop, 'approved');
    const held = await cause(shop.operator, number, {
      event: 'hold',
      reason: 'The machine is being cleaned.',
    });
    expect(held).toMatchObject({ state: 'on-hold', heldBecause: 'The machine is being cleaned.' });
    expect((await cause(shop.operator, number, { event: 'resume' })).state).toBe('approved');
    const other = await orderAt(shop, 'submitted');
    await cause(shop.designer, other.number, { event: 'hold', reason: 'No cork in the shop.' });
    expect(await cause(shop.designer, other.number, { event: 'cancel', reason: 'agreed' })).toMatchObject({
      state: 'cancelled',
      heldBecause: '',
    });
    await cause(shop.customer, number, { event: 'cancel', reason: 'changed my mind' }, 409);
    expect((await cause(shop.designer, number, { event: 'cancel', reason: 'agreed with Ina' })).state).toBe(
      'cancelled',
    );
  });

  it('is cancelled by its customer while on hold, as long as it was held before the approval', async () => {
    const early = await orderAt(shop, 'proof-sent');
    await cause(shop.designer, early.number, { event: 'hold', reason: 'No cork in the shop.' });
    expect((await read(shop.customer, early.number)).events).toEqual(['cancel']);
    expect(
      await cause(shop.customer, early.number, { event: 'cancel', reason: 'changed my mind' }),
    ).toMatchObject({ state: 'cancelled', events: [] });
    const late = await orderAt(shop, 'approved');
    await cause(shop.designer, late.number, { event: 'hold', reason: 'No cork in the shop.' });
    expect((await read(shop.customer, late.number)).events).toEqual([]);
    await cause(shop.customer, late.number, { event: 'cancel', reason: 'changed my mind' }, 409);
  });

  it('lets exactly one of two people who press at once through', async () => {
    const { number, version } = await orderAt(shop, 'submitted');
    const { at } = await import('./shop');
    const { POST } = await import('@/pages/api/orders/[number]/events');
    const { call } = await import('../../setup/call');
    void at;
    const press = () =>
      call(POST, { person: shop.designer, params: { number }, body: { event: 'take', version } });
    const statuses = (await Promise.all([press(), press(), press()])).map(({ status }) => status).sort();
    expect(statuses).toEqual([200, 409, 409]);
    expect((await read(shop.designer, number)).history.filter(({ event }) => event === 'take')).toHaveLength(
      1,
    );
  });
});
