import { waitsFor } from '../../orders/rules';
import { possibleEvents, type OrderEvent, type OrderState, type Role } from '../../orders/state';
import { designSchema, type ArtworkView, type OrderView, type PreparationView } from '../../orders/views';
import { cautionsFor } from '../../stock/cautions';
import { checkOf } from '../tables/artworks';
import type { RecordRow } from '../tables/record';
import type { ListedPreparation } from '../tables/preparations';
import type { LoadedOrder } from './load-order';
import { reportOf, ruleFacts, taskView } from './rule-facts';
import { artworkSubject, preparationSubject } from './subjects';

const addressOf = (number: string): string => `/api/orders/${number}`;

function artworkView(order: LoadedOrder, artwork: LoadedOrder['artworks'][number]): ArtworkView {
  const address = `${addressOf(order.number)}/artwork/${artwork.version}`;
  return {
    version: artwork.version,
    fileName: artwork.file_name,
    mediaType: artwork.media_type,
    bytes: artwork.bytes,
    sha256: artwork.sha256,
    uploadedAt: artwork.uploaded_at,
    uploadedBy: artwork.uploader,
    task: taskView(order.tasks, artworkSubject(artwork.id)),
    check: checkOf(artwork),
    pictureUrl: artwork.picture_sha256 && `${address}/picture`,
    originalUrl: `${address}/original`,
  };
}

export function preparationView(order: LoadedOrder, row: ListedPreparation): PreparationView {
  const address = `${addressOf(order.number)}/preparations/${row.id}`;
  const pictures = Object.keys(JSON.parse(row.pictures) as Record<string, string>);
  return {
    id: row.id,
    key: row.key,
    manifestSha256: row.manifest_sha256,
    artworkVersion: row.artwork_version,
    startedBy: row.starter,
    startedAt: row.started_at,
    task: taskView(order.tasks, preparationSubject(row.id)),
    design: designSchema.parse(JSON.parse(row.design)),
    report: reportOf(row),
    files: order.files
      .filter((file) => file.preparation_id === row.id)
      .map((file) => ({
        name: file.name,
        role: file.role,
        mediaType: file.media_type,
        bytes: file.bytes,
        sha256: file.sha256,
        url: `${address}/files/${encodeURIComponent(file.name)}`,
      })),
    pictures: Object.fromEntries(pictures.map((name) => [name, `${address}/pictures/${name}`])),
    timings: JSON.parse(row.timings),
  };
}

/** States in which the customer looks at what was passed. */
const PROOF_STATES: readonly OrderState[] = [
  'proof-sent',
  'approved',
  'released',
  'running',
  'finished',
  'handed-over',
];

/** Whether a customer may look at a preparation: only at the one that was passed, and only once its proof is sent. */
export function customerSeesPreparation(order: Pick<LoadedOrder, 'row'>, preparationId: number): boolean {
  const { state, former_state, passed_preparation_id } = order.row;
  return PROOF_STATES.includes(former_state ?? state) && passed_preparation_id === preparationId;
}

/** What a customer sees of a preparation: the picture of the piece and its findings, none of the shop's settings. */
export function preparationForCustomer(view: PreparationView): PreparationView {
  const { report } = view;
  const passes =
    report?.passes.map((pass) => ({ ...pass, doseJPerMm2: null, scanSeconds: null, runOffMm: null })) ?? [];
  return {
    ...view,
    design: { ...view.design, recipe: null },
    report: report && {
      ...report,
      settings: { ...report.settings, recipe: null, machine: null },
      passes,
      totalDoseJPerMm2: null,
      totalSeconds: null,
    },
    files: [],
    timings: {},
  };
}

const historyEntry = (row: RecordRow): OrderView['history'][number] => ({
  at: row.at,
  by: row.by,
  event: row.event,
  from: row.from_state,
  to: row.to_state,
  words: row.words,
});

/** Happenings in the shop that a customer need not follow. */
const SHOP_ONLY: readonly string[] = [
  'take',
  'pass',
  'release',
  'recall',
  'on-the-machine',
  'spoiled',
  'waive',
  'unwaive',
  'design',
  'prepare',
  'check-again',
];

function waits(order: LoadedOrder, role: Role, events: readonly OrderEvent[]): Record<string, string> {
  const facts = ruleFacts(order, role);
  return Object.fromEntries(
    events.flatMap((event) => {
      const words = waitsFor(event, facts);
      return words === null ? [] : [[event, words]];
    }),
  );
}

function signatures(
  { row }: LoadedOrder,
  namesById: ReadonlyMap<number, string>,
): Pick<OrderView, 'passed' | 'approved'> {
  return {
    passed:
      row.passed_at && row.passed_manifest_sha256
        ? {
            by: namesById.get(row.passed_by ?? 0) ?? '',
            at: row.passed_at,
            manifestSha256: row.passed_manifest_sha256,
          }
        : null,
    approved:
      row.approved_at && row.approved_manifest_sha256
        ? {
            by: row.approved_by ?? '',
            at: row.approved_at,
            manifestSha256: row.approved_manifest_sha256,
            how: row.approved_how ?? '',
          }
        : null,
  };
}

function forCustomer(order: LoadedOrder, view: OrderView): OrderView {
  return {
    ...view,
    design: null,
    preparations: view.preparations
      .filter(({ id }) => customerSeesPreparation(order, id))
      .map(preparationForCustomer),
    waivers: [],
    outcomes: [],
    history: view.history.filter(({ event }) => !SHOP_ONLY.includes(event)),
  };
}

/** An order as a role sees it. */
export function orderView(order: LoadedOrder, role: Role): OrderView {
  const { row, customer } = order;
  const events = possibleEvents(row.state, role, row.former_state);
  const passer = new Map(
    order.record.flatMap(({ person_id, by }) => (person_id === null ? [] : [[person_id, by] as const])),
  );
  const view: OrderView = {
    number: order.number,
    state: row.state,
    version: row.version,
    customer: { id: customer.id, name: customer.name, email: customer.email },
    createdAt: row.created_at,
    submittedAt: row.submitted_at,
    fields: order.fields,
    stock: order.stock,
    rightsConfirmedAt: row.rights_confirmed_at,
    artworks: order.artworks.map((artwork) => artworkView(order, artwork)),
    design: order.design,
    preparations: order.preparations.map((preparation) => preparationView(order, preparation)),
    ...signatures(order, passer),
    waivers: order.waivers.map((w) => ({
      findingId: w.finding_id,
      artworkVersion: w.artwork_version,
      reason: w.reason,
      by: w.waiver,
      at: w.waived_at,
    })),
    heldBecause: row.held_because,
    outcomes: order.outcomes.map((o) => ({
      at: o.at,
      by: o.recorder,
      kind: o.kind,
      words: o.words,
      measuredLstar: o.measured_lstar,
      cost: o.cost,
    })),
    history: order.record.map(historyEntry),
    events,
    waitsFor: waits(order, role, events),
    cautions: cautionsFor(order.stock, order.fields.route, order.fields.use, role !== 'customer'),
  };
  return role === 'customer' ? forCustomer(order, view) : view;
}
