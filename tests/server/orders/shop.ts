import { dataDir } from '../../setup/database';
import { createHash } from 'node:crypto';
import path from 'node:path';
import type { APIRoute } from 'astro';
import { canonicalJson, type Manifest } from '@/lib/prepare/manifest';
import type { Checked, CheckSettings, Prepared } from '@/lib/prepare/pipeline';
import { PASSAGE, type CheckReport, type PassagePicture } from '@/lib/prepare/report';
import type { Settings } from '@/lib/prepare/settings';
import { ArtworkError } from '@/lib/prepare/tools';
import type { Finding } from '@/lib/preflight/finding';
import type { OrderPatch } from '@/lib/orders/order';
import type { Role } from '@/lib/orders/state';
import type { Design, OrderView } from '@/lib/orders/views';
import { database, withWrite } from '@/lib/server/db';
import type { Person } from '@/lib/server/person';
import { usePipeline, type Pipeline } from '@/lib/server/queue/pipeline';
import { startQueue, stopQueue } from '@/lib/server/queue/queue';
import type { TaskContext } from '@/lib/server/queue/handler';
import { useStorage } from '@/lib/server/storage/store';
import { openDiskStorage } from '@/lib/server/storage/disk';
import type { Storage } from '@/lib/server/storage/storage';
import { insertMachine, insertSpotPreset } from '@/lib/server/tables/machines';
import { insertPerson, personById } from '@/lib/server/tables/people';
import { insertStock } from '@/lib/server/tables/stocks';
import { checkArtworkTask } from '@/lib/server/tasks/check-artwork';
import { prepareOrderTask } from '@/lib/server/tasks/prepare-order';
import { call, jsonOf } from '../../setup/call';
import { POST as postEvent } from '@/pages/api/orders/[number]/events';
import { GET as getOrder, PATCH as patchOrder } from '@/pages/api/orders/[number]/index';
import { PUT as putDesign } from '@/pages/api/orders/[number]/design';
import { POST as postArtwork } from '@/pages/api/orders/[number]/artwork/index';
import { POST as postPreparation } from '@/pages/api/orders/[number]/preparations/index';
import { POST as postOrder } from '@/pages/api/orders/index';

export const sha256 = (bytes: Uint8Array | string): string =>
  createHash('sha256').update(bytes).digest('hex');
const bytesOf = (text: string): Uint8Array => new TextEncoder().encode(text);

/** What the stand-in for the pipeline finds and does; changed by tests. */
export const bench = {
  findings: [] as Finding[],
  checks: [] as CheckSettings[],
  preparations: 0,
  /** awaited by every check and preparation */
  wait: async (_context: TaskContext): Promise<void> => undefined,
};

export const finding = (over: Partial<Finding> = {}): Finding => ({
  id: 'hairline',
  severity: 'blocker',
  title: 'Hairlines',
  count: 1,
  places: [],
  minMm: 0.03,
  limitMm: 0.07,
  measured: null,
  advice: 'Make it larger.',
  waivable: true,
  ...over,
});

function checkReport(bytes: Uint8Array, widthMm: number, heightMm: number): CheckReport {
  return {
    reportVersion: 1,
    artwork: {
      sha256: sha256(bytes),
      bytes: bytes.byteLength,
      format: 'png',
      kind: 'raster',
      widthPx: 300,
      heightPx: 200,
      ownWidthMm: null,
      ownHeightMm: null,
      remarks: [],
      suggestedTreatment: 'solid',
      suggestionReason: 'two levels',
      tonalShare: 0,
    },
    widthMm,
    heightMm,
    directionDeg: 0,
    sizeAcrossMm: 0.11,
    findings: bench.findings,
    smallestSoundWidthMm: 20,
    measuredPxPerMm: 60,
  };
}

const keyOf = (artworkSha256: string, settings: Settings, artworkVersion: number): string =>
  sha256(canonicalJson({ artworkSha256, settings: JSON.parse(JSON.stringify(settings)), artworkVersion }));

function prepared(bytes: Uint8Array, settings: Settings, artworkVersion: number): Prepared {
  const artworkSha256 = sha256(bytes);
  const key = keyOf(artworkSha256, settings, artworkVersion);
  const body = bytesOf(`prepared ${key}`);
  const file = {
    name: `${settings.label}-pass1-0.110mm-0deg-${key.slice(0, 8)}.png`,
    role: 'raster' as const,
    mediaType: 'image/png',
    bytes: body.byteLength,
    sha256: sha256(body),
    pass: 1 as const,
    directionDeg: 0,
    linePitchMm: 0.11,
    alongPitchMm: 0.11,
    widthPx: 10,
    heightPx: 10,
    widthMm: settings.widthMm,
    heightMm: settings.heightMm,
  };
  const manifest: Manifest = {
    manifestVersion: 1,
    artworkSha256,
    artworkVersion,
    settings,
    responsePoints: [],
    recipeVersion: null,
    mends: [],
    versions: { pipeline: '1' },
    files: [file],
  };
  const manifestSha256 = sha256(canonicalJson(JSON.parse(JSON.stringify(manifest))));
  const report = {
    ...checkReport(bytes, settings.widthMm, settings.heightMm),
    settings,
    trace: null,
    totalDoseJPerMm2: 0.5,
    totalSeconds: 90,
    files: [file],
    preparationKey: key,
    manifestSha256,
    passes: [
      {
        pass: 1 as const,
        directionDeg: 0,
        linePitchMm: 0.11,
        alongPitchMm: 0.11,
        sizeAcrossMm: 0.11,
        pitchRatio: 1,
        lines: 10,
        pixelsAlong: 10,
        scanFrame: null,
        doseJPerMm2: 0.5,
        assumesLinearPower: true,
        scanSeconds: 90,
        runOffMm: 2,
        meanBurn: 0.4,
      },
    ],
  };
  const pictures = Object.fromEntries(
    PASSAGE.map((name) => [name, bytesOf(`picture ${name} ${key}`)]),
  ) as Record<PassagePicture, Uint8Array>;
  return {
    report,
    manifest,
    manifestSha256,
    key,
    files: [{ name: file.name, mediaType: file.mediaType, bytes: body }],
    pictures,
    timings: { screen: 5 },
  } as Prepared;
}

export const standIn: Pipeline = {
  read: async (bytes) => {
    const text = Buffer.from(bytes).toString('latin1');
    if (text.startsWith('bad'))
      throw new ArtworkError('unreadable', 'This file cannot be read as a picture. Export it again as PNG.');
    return { format: text.startsWith('<svg') ? 'svg' : 'png' };
  },
  check: async (bytes, settings, context) => {
    bench.checks.push(settings);
    context.progress('Measuring', 0.5);
    await bench.wait(context);
    const widthMm = settings.widthMm ?? 100;
    return {
      report: checkReport(bytes, widthMm, settings.heightMm ?? (widthMm * 2) / 3),
      picture: bytesOf('a picture'),
      timings: {},
    } as Checked;
  },
  prepare: async (bytes, { settings, artworkVersion }, context) => {
    bench.preparations += 1;
    await bench.wait(context);
    return prepared(bytes, settings, artworkVersion);
  },
  keyOf: async (artworkSha256, { settings, artworkVersion }) =>
    keyOf(artworkSha256, settings, artworkVersion),
};

export interface Shop {
  customer: Person;
  stranger: Person;
  unconfirmed: Person;
  designer: Person;
  operator: Person;
  admin: Person;
  machineId: number;
  spotPresetId: number;
  birch: number;
  vinyl: number;
  storage: Storage;
}

const MACHINE = {
  name: 'Kiln',
  bedWidthMm: 600,
  bedHeightMm: 400,
  maxSpeedMmPerS: 500,
  accelerationMmPerS2: 3000,
  wattsAtFull: 40,
  powerCurve: [],
  lasingThresholdPercent: 5,
  powerLevels: 256,
  speedUnit: 'mm/s',
  firing: 'swept',
  scanning: 'two-way',
} as const;
const STOCK = {
  name: 'Birch plywood 4 mm',
  species: 'birch',
  thicknessMm: 4,
  finish: 'raw',
  direction: 'darkens',
  groundColour: '#e3c9a0',
  groundLstar: 82,
  markColour: '#3b2414',
  markLstar: 20,
  cautions: ['glued-board'],
  forbidden: false,
  routes: ['bare-burn', 'paint-fill', 'darkening-wash'],
  notes: '',
} as const;

async function person(name: string, role: Role, confirmed = true): Promise<Person> {
  const email = `${name.toLowerCase()}@quill.test`;
  const at = new Date().toISOString();
  const id = await withWrite((trx) =>
    insertPerson(trx, {
      email,
      name,
      role,
      password_hash: 'x',
      confirmed_at: confirmed ? at : null,
      created_at: at,
    }),
  );
  const row = await personById(database(), id);
  if (!row) throw new Error('no person');
  return { id, name, email, role, confirmed };
}

/** A shop with a person per role, one machine and two stocks; the queue runs with the stand-in. */
export async function openShop(): Promise<Shop> {
  const storage = await openDiskStorage(path.join(dataDir, 'storage'));
  useStorage(storage);
  usePipeline(standIn);
  const shop = {
    customer: await person('Ina', 'customer'),
    stranger: await person('Olaf', 'customer'),
    unconfirmed: await person('Nils', 'customer', false),
    designer: await person('Dora', 'designer'),
    operator: await person('Otto', 'operator'),
    admin: await person('Ada', 'admin'),
    storage,
  };
  const ids = await withWrite(async (trx) => {
    const machineId = await insertMachine(trx, { ...MACHINE, powerCurve: [] });
    const spotPresetId = await insertSpotPreset(trx, machineId, {
      name: 'fine',
      widthMm: 0.07,
      heightMm: 0.11,
      shape: 'ellipse',
      measuredBy: 'burned-line',
      measuredAtDoseJPerMm2: null,
    });
    const birch = await insertStock(trx, { ...STOCK, cautions: ['glued-board'], routes: [...STOCK.routes] });
    const vinyl = await insertStock(trx, {
      ...STOCK,
      name: 'Vinyl',
      forbidden: true,
      cautions: ['chlorinated'],
      routes: ['bare-burn'],
    });
    return { machineId, spotPresetId, birch, vinyl };
  });
  return { ...shop, ...ids };
}

export const QUICK = { pollMs: 20, leaseMs: 2_000, retryMs: 5, progressMs: 10 };
export const startShopQueue = (): void => startQueue([checkArtworkTask, prepareOrderTask], QUICK);
export const stopShopQueue = (): Promise<void> => stopQueue();

/** Calls an endpoint of one order. */
export async function at<T = { order: OrderView }>(
  route: APIRoute,
  who: Person,
  number: string,
  options: {
    method?: string;
    body?: unknown;
    raw?: BodyInit;
    params?: Record<string, string>;
    status?: number;
    headers?: Record<string, string>;
  } = {},
): Promise<T> {
  const { status = 200, params = {}, ...rest } = options;
  return jsonOf<T>(await call(route, { ...rest, person: who, params: { number, ...params } }), status);
}

export const read = async (who: Person, number: string): Promise<OrderView> =>
  (await at(getOrder, who, number)).order;

export async function open(
  who: Person,
  fields: OrderPatch & { customerId?: number } = {},
): Promise<OrderView> {
  return (await jsonOf<{ order: OrderView }>(await call(postOrder, { body: fields, person: who }))).order;
}

export async function change(who: Person, number: string, fields: OrderPatch): Promise<OrderView> {
  const { version } = await read(who, number);
  return (await at(patchOrder, who, number, { method: 'PATCH', body: { version, fields } })).order;
}

export function fileForm(content: string | Uint8Array, name = 'mark.png'): FormData {
  const form = new FormData();
  form.set('artwork', new File([content as BlobPart], name, { type: 'image/png' }));
  return form;
}

export async function upload(
  who: Person,
  number: string,
  content = 'picture',
  name = 'mark.png',
): Promise<OrderView> {
  return (await at(postArtwork, who, number, { method: 'POST', raw: fileForm(content, name) })).order;
}

export async function settled(who: Person, number: string): Promise<OrderView> {
  for (const until = Date.now() + 30_000; Date.now() < until;) {
    const order = await read(who, number);
    const tasks = [...order.artworks, ...order.preparations].map(({ task }) => task.state);
    if (!tasks.some((state) => state === 'waiting' || state === 'running')) return order;
    await new Promise((done) => setTimeout(done, 10));
  }
  throw new Error('the work did not settle');
}

export async function cause(
  who: Person,
  number: string,
  event: Record<string, unknown>,
  status = 200,
): Promise<OrderView> {
  const { version } = await read(who, number);
  return (await at(postEvent, who, number, { body: { version, ...event }, status })).order;
}

export const blankOf = (stockId: number | null, over = {}) => ({
  outline: 'rectangle' as const,
  widthMm: 100,
  heightMm: 80,
  thicknessMm: 4,
  stockId,
  side: 'front' as const,
  grainDeg: 0,
  source: 'shop' as const,
  condition: '',
  spare: false,
  ...over,
});

export const designOn = (
  shop: Pick<Shop, 'machineId' | 'spotPresetId'>,
  over: Partial<Design> = {},
): Design => ({
  machineId: shop.machineId,
  spotPresetId: shop.spotPresetId,
  treatment: 'halftone',
  screen: 'even-grain',
  scan: { directionDeg: 0, linePitchMm: 0.11, alongPitchMm: 0.11 },
  perpendicular: null,
  tone: { mode: 'absolute', blackPoint: 0, whitePoint: 1, gamma: 1 },
  dividingLstar: 53.4,
  corners: 'kept',
  mirror: false,
  recipe: { powerPercent: 30, speedMmPerS: 100, perpendicular: null, focusOffsetMm: 0 },
  ...over,
});

export async function design(
  shop: Shop,
  number: string,
  over: Partial<Design> = {},
  status = 200,
): Promise<OrderView> {
  const { version } = await read(shop.designer, number);
  return (
    await at(putDesign, shop.designer, number, {
      method: 'PUT',
      body: { version, design: designOn(shop, over) },
      status,
    })
  ).order;
}

export async function prepare(shop: Shop, number: string, status = 200): Promise<OrderView> {
  const { version } = await read(shop.designer, number);
  await at(postPreparation, shop.designer, number, { body: { version }, status });
  return settled(shop.designer, number);
}

/** Brings a new order as far along its life as asked, by the people whose work it is. */
export async function orderAt(
  shop: Shop,
  state:
    | 'draft'
    | 'submitted'
    | 'in-preparation'
    | 'prepared'
    | 'passed'
    | 'proof-sent'
    | 'approved'
    | 'released'
    | 'running'
    | 'finished',
  fields: OrderPatch = {},
): Promise<OrderView> {
  const blank = blankOf(shop.birch);
  const { number } = await open(shop.customer, {
    title: 'Bakery sign',
    widthMm: 60,
    heightMm: 40,
    blank,
    ...fields,
  });
  await upload(shop.customer, number, `picture for ${number}`);
  let order = await settled(shop.customer, number);
  const steps: [string, () => Promise<OrderView>][] = [
    ['submitted', () => cause(shop.customer, number, { event: 'submit', rightsConfirmed: true })],
    ['in-preparation', () => cause(shop.designer, number, { event: 'take' })],
    ['prepared', async () => (await design(shop, number), prepare(shop, number))],
    [
      'passed',
      () => cause(shop.designer, number, { event: 'pass', preparationId: order.preparations[0].id }),
    ],
    ['proof-sent', () => cause(shop.designer, number, { event: 'send-proof' })],
    [
      'approved',
      () => cause(shop.customer, number, { event: 'approve', manifestSha256: order.passed?.manifestSha256 }),
    ],
    ['released', () => cause(shop.designer, number, { event: 'release' })],
    [
      'running',
      () =>
        cause(shop.operator, number, {
          event: 'on-the-machine',
          checklist: ['material', 'focus', 'extraction', 'attended'],
        }),
    ],
    ['finished', () => cause(shop.operator, number, { event: 'done', words: 'even' })],
  ];
  for (const [name, step] of steps) {
    if (state === 'draft') break;
    order = await step();
    if (name === state) break;
  }
  return order;
}
