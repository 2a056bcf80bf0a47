import { readFile } from 'node:fs/promises';
import path from 'node:path';
import { CHECKLIST } from '../../orders/checklist';
import type { Blank } from '../../orders/order';
import { firstDesign } from '../../orders/settings';
import type { OrderState } from '../../orders/state';
import type { EventBody, MachineView, OrderView, StockView } from '../../orders/views';
import { log } from '../log';
import type { Person } from '../person';
import { storage } from '../storage/store';
import { causeEvent } from '../usecases/cause-event';
import { changeOrderFields } from '../usecases/change-order';
import { keepDesign } from '../usecases/keep-design';
import { openOrder } from '../usecases/open-order';
import { prepareOrder } from '../usecases/prepare-order';
import { readOrder } from '../usecases/read-order';
import { submitArtwork } from '../usecases/submit-artwork';
import type { DemoOrder } from './demo-orders';

/** The people and things of the demo shop. */
export interface DemoShop {
  registered: Person;
  walkIn: Person;
  designer: Person;
  operator: Person;
  machines: MachineView[];
  stocks: StockView[];
}

const LOOK_MS = 100;
/** Edge of the blank around the artwork, mm. */
const MARGIN_MM = 18;
const DAY_MS = 86_400_000;

/** Waits until nothing of an order is being worked on. */
async function settled(person: Person, number: string): Promise<OrderView> {
  for (;;) {
    const order = await readOrder(person, number);
    const tasks = [...order.artworks, ...order.preparations].map(({ task }) => task.state);
    if (!tasks.some((state) => state === 'waiting' || state === 'running')) return order;
    await new Promise((done) => setTimeout(done, LOOK_MS));
  }
}

function blankFor(demo: DemoOrder, stock: StockView | null, widthMm: number, heightMm: number): Blank {
  const tight = demo.artwork === 'banner.svg';
  return {
    outline: 'rectangle',
    widthMm: Math.ceil(tight ? widthMm / 2 : widthMm + 2 * MARGIN_MM),
    heightMm: Math.ceil(heightMm + 2 * MARGIN_MM),
    thicknessMm: stock?.thicknessMm ?? 10,
    stockId: stock?.id ?? null,
    side: 'front',
    grainDeg: stock && /board|plywood/.test(stock.name) ? 0 : null,
    source: stock ? 'shop' : 'customer',
    condition: stock ? '' : 'An old tray, waxed, a little uneven.',
    spare: false,
  };
}

/** Opens the draft with its artwork, at a size in the artwork's own proportions. */
async function open(shop: DemoShop, demo: DemoOrder): Promise<OrderView> {
  const walkIn = demo.customer === 'walk-in';
  const opener = walkIn ? shop.designer : shop.registered;
  const { number } = await openOrder(opener, { title: demo.title }, walkIn ? shop.walkIn.id : undefined);
  // Samples are part of the project, not of what the shop stores.
  const bytes = await readFile(path.resolve('samples', demo.artwork));
  const incoming = await (
    await storage()
  ).receive(
    (async function* () {
      yield bytes;
    })(),
  );
  await submitArtwork(opener, number, demo.artwork, incoming);
  const checked = await settled(opener, number);
  const check = checked.artworks.at(-1)?.check;
  if (!check)
    throw new Error(`expected ${demo.artwork} to be checked, got ${checked.artworks.at(-1)?.task.problem}`);
  const heightMm = Math.round((demo.widthMm * check.heightMm * 100) / check.widthMm) / 100;
  const stock = shop.stocks.find(({ name }) => name === demo.stock) ?? null;
  const dueOn =
    demo.dueInDays === null
      ? null
      : new Date(Date.now() + demo.dueInDays * DAY_MS).toISOString().slice(0, 10);
  const fields = {
    widthMm: demo.widthMm,
    heightMm,
    treatment: demo.treatment,
    shadeLstar: 38,
    dueOn,
    ...demo.fields,
  };
  await changeOrderFields(opener, number, checked.version, {
    ...fields,
    blank: blankFor(demo, stock, demo.widthMm, heightMm),
  });
  return settled(opener, number);
}

async function prepare(shop: DemoShop, demo: DemoOrder, number: string): Promise<OrderView> {
  const machine = shop.machines.find(({ name }) => name === demo.machine);
  const spot = machine?.spotPresets[0];
  if (!machine || !spot) throw new Error(`expected the machine ${demo.machine} with a spot preset`);
  const [powerPercent, speedMmPerS] = demo.recipe;
  const design = {
    ...firstDesign({ machineId: machine.id, spotPresetId: spot.id }, spot, demo.treatment),
    recipe: { powerPercent, speedMmPerS, perpendicular: null, focusOffsetMm: 0 },
  };
  const { version } = await readOrder(shop.designer, number);
  await keepDesign(shop.designer, number, version, design);
  const kept = await settled(shop.designer, number);
  await prepareOrder(shop.designer, number, kept.version);
  const order = await settled(shop.designer, number);
  const [{ task }] = order.preparations;
  if (task.state === 'failed') throw new Error(`expected ${demo.title} to be prepared, got: ${task.problem}`);
  return order;
}

type Said = EventBody extends infer Body ? (Body extends EventBody ? Omit<Body, 'version'> : never) : never;

/** The events that lead to a state from the one before it, and who causes them. */
function stepTo(
  shop: DemoShop,
  demo: DemoOrder,
  state: OrderState,
  order: OrderView,
): { who: Person; said: Said } | null {
  const owner = demo.customer === 'walk-in' ? shop.designer : shop.registered;
  const manifestSha256 = order.passed?.manifestSha256 ?? '';
  switch (state) {
    case 'submitted':
      return { who: owner, said: { event: 'submit', rightsConfirmed: true } };
    case 'in-preparation':
      return { who: shop.designer, said: { event: 'take' } };
    case 'passed':
      return { who: shop.designer, said: { event: 'pass', preparationId: order.preparations[0]?.id ?? 0 } };
    case 'proof-sent':
      return demo.fields?.withoutProof
        ? null
        : { who: shop.designer, said: { event: 'send-proof', words: '' } };
    case 'approved':
      if (demo.fields?.withoutProof)
        return {
          who: shop.designer,
          said: {
            event: 'approve-without-proof',
            reason: 'Agreed at the counter: as it looks in the forecast.',
          },
        };
      return { who: owner, said: { event: 'approve', manifestSha256, inPerson: null } };
    case 'released':
      return { who: shop.designer, said: { event: 'release' } };
    case 'running':
      return {
        who: shop.operator,
        said: { event: 'on-the-machine', checklist: CHECKLIST.map(({ id }) => id) },
      };
    case 'finished':
      return {
        who: shop.operator,
        said: { event: 'done', words: 'Even, as on the proof.', measuredLstar: null },
      };
    case 'handed-over':
      return {
        who: shop.operator,
        said: { event: 'hand-over', how: 'collected', byWhom: shop.registered.name },
      };
    default:
      return null;
  }
}

const LIFE: readonly OrderState[] = [
  'submitted',
  'in-preparation',
  'passed',
  'proof-sent',
  'approved',
  'released',
  'running',
  'finished',
  'handed-over',
];

/** Brings one order of the demo shop as far as it is to come, through the same use cases as everybody's. */
export async function carryDemoOrder(shop: DemoShop, demo: DemoOrder): Promise<void> {
  let order = await open(shop, demo);
  if (demo.state === 'cancelled') {
    await causeEvent(shop.registered, order.number, {
      event: 'cancel',
      version: order.version,
      reason: 'Too long for the board; we order a smaller one.',
    });
    return;
  }
  // A customer's own blank that nobody has identified goes on hold by itself when it is submitted.
  const last = demo.state === 'on-hold' ? 'submitted' : demo.state;
  for (const state of LIFE.slice(0, LIFE.indexOf(last) + 1)) {
    const step = stepTo(shop, demo, state, order);
    if (!step) continue;
    const { version } = await readOrder(step.who, order.number);
    order = await causeEvent(step.who, order.number, { ...step.said, version } as EventBody);
    if (state === 'in-preparation') order = await prepare(shop, demo, order.number);
  }
  log.info({ order: order.number, state: order.state }, 'the demo shop has an order more');
}
