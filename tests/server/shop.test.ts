import '../setup/database';
import { beforeAll, beforeEach, describe, expect, it } from 'vitest';
import type { Machine, SpotPreset } from '@/lib/machines/machine';
import { database } from '@/lib/server/db';
import type { MachineView, StockView } from '@/lib/orders/views';
import type { Person } from '@/lib/server/person';
import { recordOf } from '@/lib/server/tables/record';
import type { Stock } from '@/lib/stock/stock';
import { GET as listMachines, POST as addMachine } from '@/pages/api/machines';
import { PATCH as changeMachine } from '@/pages/api/machines/[id]';
import { POST as addPreset } from '@/pages/api/machines/[id]/spot-presets';
import {
  DELETE as removePreset,
  PATCH as changePreset,
} from '@/pages/api/machines/[id]/spot-presets/[presetId]';
import { GET as listStocks, POST as addStock } from '@/pages/api/stocks';
import { PATCH as changeStock } from '@/pages/api/stocks/[id]';
import { GET as readWash, PUT as enterWash } from '@/pages/api/wash';
import { call, jsonOf, type CallOptions } from '../setup/call';
import { addPerson } from '../setup/people';

const MACHINE: Machine = {
  name: 'South bench',
  bedWidthMm: 310,
  bedHeightMm: 290,
  maxSpeedMmPerS: 210,
  accelerationMmPerS2: 1900,
  wattsAtFull: 7.6,
  powerCurve: [{ settingPercent: 50, watts: 3.1 }],
  lasingThresholdPercent: 4,
  powerLevels: 1000,
  speedUnit: 'mm/min',
  firing: 'swept',
  scanning: 'two-way',
};
const PRESET: SpotPreset = {
  name: 'Fine',
  widthMm: 0.07,
  heightMm: 0.11,
  shape: 'rectangle',
  measuredBy: 'burned-line',
  measuredAtDoseJPerMm2: null,
};
const STOCK: Stock = {
  name: 'Maple 5 mm',
  species: 'maple',
  thicknessMm: 5,
  finish: 'raw',
  direction: 'darkens',
  groundColour: '#e0c9a8',
  groundLstar: 82,
  markColour: '#553a24',
  markLstar: 27,
  cautions: [],
  forbidden: false,
  routes: ['bare-burn'],
  notes: '',
};
const WASH = {
  product: 'Own wash',
  ratio: '1 part to 10 parts warm water',
  dryingMinutes: 30,
  sheetUrl: 'https://shop.example/sheet.pdf',
};

let odile: Person;
beforeAll(async () => {
  odile = await addPerson('admin', { name: 'Odile' });
});
beforeEach(async () => {
  for (const table of ['spot_presets', 'machines', 'stocks', 'shop_washes']) await database()(table).delete();
});

const send = <T>(route: Parameters<typeof call>[0], options: CallOptions, status = 200) =>
  call(route, { person: odile, ...options }).then((response) => jsonOf<T>(response, status));
const newMachine = async (fields: Partial<Machine> = {}) =>
  (await send<{ machine: MachineView }>(addMachine, { body: { ...MACHINE, ...fields } })).machine;
const newStock = async (fields: Partial<Stock> = {}) =>
  (await send<{ stock: StockView }>(addStock, { body: { ...STOCK, ...fields } })).stock;

describe('machines', () => {
  const patch = (id: number, body: object, status = 200) =>
    send<{ machine: MachineView; code: string }>(
      changeMachine,
      { method: 'PATCH', body, params: { id: String(id) } },
      status,
    );

  it('come back as they were entered', async () => {
    const machine = await newMachine();
    expect(machine).toEqual({ ...MACHINE, id: machine.id, retired: false, spotPresets: [] });
    expect(await send(listMachines, {})).toEqual({ machines: [machine] });
  });

  it('change only what is sent, and write it down', async () => {
    const { id } = await newMachine();
    const { machine } = await patch(id, { wattsAtFull: 7.1, powerCurve: [] });
    expect(machine).toMatchObject({ ...MACHINE, wattsAtFull: 7.1, powerCurve: [] });
    expect(
      (await recordOf(database(), `machine ${id}`)).slice(-2).map(({ event, words }) => [event, words]),
    ).toEqual([
      ['add-machine', 'South bench'],
      ['change-machine', 'South bench: wattsAtFull, powerCurve'],
    ]);
  });

  it('are taken out of service, listed last, and come back', async () => {
    const first = await newMachine({ name: 'A bench' });
    await newMachine({ name: 'B bench' });
    expect((await patch(first.id, { retired: true })).machine.retired).toBe(true);
    expect(
      (await send<{ machines: MachineView[] }>(listMachines, {})).machines.map(({ name }) => name),
    ).toEqual(['B bench', 'A bench']);
    expect((await patch(first.id, { retired: false })).machine.retired).toBe(false);
    const events = (await recordOf(database(), `machine ${first.id}`)).map(({ event }) => event);
    expect(events.slice(-2)).toEqual(['retire-machine', 'bring-machine-back']);
  });

  it('have names of their own', async () => {
    await newMachine();
    expect(await send(addMachine, { body: { ...MACHINE, name: 'SOUTH BENCH' } }, 409)).toMatchObject({
      code: 'name-taken',
    });
    const other = await newMachine({ name: 'West bench' });
    expect((await patch(other.id, { name: 'South bench' }, 409)).code).toBe('name-taken');
  });

  it.each([
    ['bedWidthMm', 0],
    ['wattsAtFull', -1],
    ['powerLevels', 1],
    ['firing', 'burst'],
    ['lasingThresholdPercent', 99],
  ])('refuse %s of %s', async (field, value) => {
    const problem = await send<{ fields: object }>(addMachine, { body: { ...MACHINE, [field]: value } }, 422);
    expect(Object.keys(problem.fields)).toEqual([field]);
  });

  it('answer 404 where there is none', async () => {
    await patch(4711, { wattsAtFull: 5 }, 404);
  });
});

describe('spot presets', () => {
  const at = (id: number, presetId?: number) => ({
    params: { id: String(id), ...(presetId ? { presetId: String(presetId) } : {}) },
  });

  it('are added, changed and removed', async () => {
    const { id } = await newMachine();
    const added = (await send<{ machine: MachineView }>(addPreset, { body: PRESET, ...at(id) })).machine
      .spotPresets;
    expect(added).toEqual([{ ...PRESET, id: added[0].id }]);
    const broad = { ...PRESET, name: 'Broad', widthMm: 0.13, measuredAtDoseJPerMm2: 0.6 };
    const changed = (
      await send<{ machine: MachineView }>(changePreset, {
        method: 'PATCH',
        body: broad,
        ...at(id, added[0].id),
      })
    ).machine.spotPresets;
    expect(changed).toEqual([{ ...broad, id: added[0].id }]);
    expect(
      (await send<{ machine: MachineView }>(removePreset, { method: 'DELETE', ...at(id, added[0].id) }))
        .machine.spotPresets,
    ).toEqual([]);
    expect((await recordOf(database(), `machine ${id}`)).at(-1)).toMatchObject({
      event: 'remove-spot-preset',
      words: 'Broad: 0.13 x 0.11 mm, rectangle',
    });
  });

  it('belong to their machine alone', async () => {
    const one = await newMachine();
    const two = await newMachine({ name: 'Other' });
    const [{ id }] = (await send<{ machine: MachineView }>(addPreset, { body: PRESET, ...at(one.id) }))
      .machine.spotPresets;
    await send(changePreset, { method: 'PATCH', body: PRESET, ...at(two.id, id) }, 404);
    await send(removePreset, { method: 'DELETE', ...at(two.id, id) }, 404);
    await send(addPreset, { body: PRESET, ...at(two.id) });
    expect(await send(addPreset, { body: PRESET, ...at(two.id) }, 409)).toMatchObject({ code: 'name-taken' });
    await send(addPreset, { body: PRESET, ...at(4711) }, 404);
  });

  it('stay while an order refers to them', async () => {
    const machine = await newMachine();
    const [{ id }] = (await send<{ machine: MachineView }>(addPreset, { body: PRESET, ...at(machine.id) }))
      .machine.spotPresets;
    const at_ = new Date().toISOString();
    const order = {
      customer_id: odile.id,
      opened_by: odile.id,
      state: 'draft',
      created_at: at_,
      updated_at: at_,
      title: '',
      quantity: 1,
      placement: '{}',
      route: 'bare-burn',
      use: 'decoration',
      notes: '',
      without_proof: 0,
    };
    const [orderId] = await database()('orders').insert({
      ...order,
      machine_id: machine.id,
      spot_preset_id: id,
    });
    expect(await send(removePreset, { method: 'DELETE', ...at(machine.id, id) }, 409)).toMatchObject({
      code: 'preset-in-use',
    });
    await database()('orders').where({ id: orderId }).delete();
    await send(removePreset, { method: 'DELETE', ...at(machine.id, id) });
  });
});

describe('stocks', () => {
  const patch = (id: number, body: object, status = 200) =>
    send<{ stock: StockView; code: string }>(
      changeStock,
      { method: 'PATCH', body, params: { id: String(id) } },
      status,
    );

  it('come back as they were entered, and change only what is sent', async () => {
    const stock = await newStock();
    expect(stock).toEqual({ ...STOCK, id: stock.id, retired: false });
    expect((await patch(stock.id, { cautions: ['treated-wood'], forbidden: true })).stock).toEqual({
      ...stock,
      cautions: ['treated-wood'],
      forbidden: true,
    });
    expect((await recordOf(database(), `stock ${stock.id}`)).slice(-2).map(({ event }) => event)).toEqual([
      'add-stock',
      'change-stock',
    ]);
  });

  it('are seen by customers, forbidden ones too', async () => {
    await newStock({ name: 'Vinyl', forbidden: true, routes: [] });
    const ines = await addPerson('customer');
    const { stocks } = await send<{ stocks: StockView[] }>(listStocks, { person: ines });
    expect(stocks.map(({ name, forbidden }) => [name, forbidden])).toEqual([['Vinyl', true]]);
  });

  it('are retired and have names of their own', async () => {
    const stock = await newStock();
    expect((await patch(stock.id, { retired: true })).stock.retired).toBe(true);
    expect(await send(addStock, { body: STOCK }, 409)).toMatchObject({ code: 'name-taken' });
    await patch(4711, { notes: 'x' }, 404);
  });

  it.each([
    ['groundColour', 'brown'],
    ['markLstar', 101],
    ['cautions', ['boredom']],
    ['routes', ['magic']],
  ])('refuse %s of %s', async (field, value) => {
    const problem = await send<{ fields: Record<string, string> }>(
      addStock,
      { body: { ...STOCK, [field]: value } },
      422,
    );
    expect(Object.keys(problem.fields)[0]).toMatch(new RegExp(`^${field}`));
  });

  it('offer the darkening wash only once the shop has entered its own with the sheet', async () => {
    const routes = ['bare-burn', 'darkening-wash'];
    expect(await send(addStock, { body: { ...STOCK, routes } }, 422)).toMatchObject({
      code: 'wash-without-sheet',
    });
    const stock = await newStock();
    expect((await patch(stock.id, { routes }, 422)).code).toBe('wash-without-sheet');
    await send(enterWash, { method: 'PUT', body: WASH });
    expect((await patch(stock.id, { routes })).stock.routes).toEqual(routes);
  });
});

describe('the wash', () => {
  it('is null until it is entered, and there is one', async () => {
    expect(await send(readWash, {})).toEqual({ wash: null });
    await send(enterWash, { method: 'PUT', body: WASH });
    const second = { ...WASH, product: 'Another wash', dryingMinutes: 45 };
    await send(enterWash, { method: 'PUT', body: second });
    expect(await send(readWash, {})).toEqual({ wash: second });
  });

  it.each([
    ['an empty address', ''],
    ['no address', undefined],
    ['a script', 'javascript:alert(1)'],
  ])('needs its sheet: %s', async (_, sheetUrl) => {
    const problem = await send<{ fields: object }>(
      enterWash,
      { method: 'PUT', body: { ...WASH, sheetUrl } },
      422,
    );
    expect(Object.keys(problem.fields)).toEqual(['sheetUrl']);
  });
});
