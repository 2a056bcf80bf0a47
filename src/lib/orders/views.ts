import { z } from 'zod';
import { machineSchema, spotPresetSchema } from '../machines/machine';
import { checkReportSchema, reportSchema } from '../prepare/report';
import { scanSchema, screenNameSchema, toneSchema, treatmentSchema } from '../prepare/settings';
import { stockSchema } from '../stock/stock';
import { orderFieldsSchema, orderNumberSchema } from './order';
import { orderEventSchema, orderStateSchema, roleSchema } from './state';

/** Shapes of what the JSON endpoints answer and take. Times are ISO 8601 in UTC. */
export const timeSchema = z.iso.datetime();

export const personViewSchema = z.object({
  id: z.number().int(),
  name: z.string(),
  email: z.string(),
  role: roleSchema,
  confirmed: z.boolean(),
  disabled: z.boolean(),
});
export type PersonView = z.infer<typeof personViewSchema>;

export const machineViewSchema = machineSchema.extend({
  id: z.number().int(),
  retired: z.boolean(),
  spotPresets: z.array(spotPresetSchema.extend({ id: z.number().int() })),
});
export type MachineView = z.infer<typeof machineViewSchema>;

export const stockViewSchema = stockSchema.extend({ id: z.number().int(), retired: z.boolean() });
export type StockView = z.infer<typeof stockViewSchema>;

export const taskViewSchema = z.object({
  state: z.enum(['waiting', 'running', 'done', 'failed']),
  /** what is being done, in words, such as "Screening" */
  stage: z.string(),
  /** 0–1 */
  progress: z.number().min(0).max(1),
  /** what happened, why and what to do; empty while it has not failed */
  problem: z.string(),
});
export type TaskView = z.infer<typeof taskViewSchema>;

export const artworkViewSchema = z.object({
  version: z.number().int(),
  fileName: z.string(),
  mediaType: z.string(),
  bytes: z.number().int(),
  sha256: z.string(),
  uploadedAt: timeSchema,
  uploadedBy: z.string(),
  /** task that checks this version at the order's size */
  task: taskViewSchema,
  check: checkReportSchema.nullable(),
  /** address of a PNG of the artwork, or null until it is drawn */
  pictureUrl: z.string().nullable(),
  originalUrl: z.string(),
});
export type ArtworkView = z.infer<typeof artworkViewSchema>;

/** What a designer chooses; machine data, stock and size are added by the server when a preparation starts. */
export const designSchema = z.object({
  machineId: z.number().int().positive(),
  spotPresetId: z.number().int().positive(),
  treatment: treatmentSchema,
  screen: screenNameSchema,
  scan: scanSchema,
  perpendicular: z.object({ linePitchMm: z.number(), alongPitchMm: z.number() }).nullable(),
  tone: toneSchema,
  dividingLstar: z.number().min(1).max(99),
  corners: z.enum(['kept', 'eased']),
  mirror: z.boolean(),
  recipe: z
    .object({
      powerPercent: z.number().min(1).max(100),
      speedMmPerS: z.number().min(0.1).max(20_000),
      perpendicular: z
        .object({ powerPercent: z.number().min(1).max(100), speedMmPerS: z.number().min(0.1).max(20_000) })
        .nullable(),
      focusOffsetMm: z.number().min(-20).max(50),
    })
    .nullable(),
});
export type Design = z.infer<typeof designSchema>;

export const preparedFileViewSchema = z.object({
  name: z.string(),
  role: z.enum(['raster', 'linework']),
  mediaType: z.string(),
  bytes: z.number().int(),
  sha256: z.string(),
  url: z.string(),
});
export const preparationViewSchema = z.object({
  id: z.number().int(),
  key: z.string(),
  manifestSha256: z.string().nullable(),
  artworkVersion: z.number().int(),
  startedBy: z.string(),
  startedAt: timeSchema,
  task: taskViewSchema,
  design: designSchema,
  report: reportSchema.nullable(),
  files: z.array(preparedFileViewSchema),
  /** addresses of the passage's five pictures */
  pictures: z.record(z.string(), z.string()),
  /** milliseconds per stage, outside the manifest */
  timings: z.record(z.string(), z.number()),
});
export type PreparationView = z.infer<typeof preparationViewSchema>;

export const waiverViewSchema = z.object({
  findingId: z.string(),
  artworkVersion: z.number().int(),
  reason: z.string(),
  by: z.string(),
  at: timeSchema,
});
export type WaiverView = z.infer<typeof waiverViewSchema>;

export const historyEntrySchema = z.object({
  at: timeSchema,
  by: z.string(),
  event: z.string(),
  from: orderStateSchema.nullable(),
  to: orderStateSchema.nullable(),
  words: z.string(),
});

export const orderViewSchema = z.object({
  number: orderNumberSchema,
  state: orderStateSchema,
  /** grows with every change; sent back with a change as `version` */
  version: z.number().int(),
  customer: z.object({ id: z.number().int(), name: z.string(), email: z.string() }),
  createdAt: timeSchema,
  submittedAt: timeSchema.nullable(),
  fields: orderFieldsSchema,
  stock: stockViewSchema.nullable(),
  rightsConfirmedAt: timeSchema.nullable(),
  artworks: z.array(artworkViewSchema),
  design: designSchema.nullable(),
  /** newest first */
  preparations: z.array(preparationViewSchema),
  passed: z.object({ by: z.string(), at: timeSchema, manifestSha256: z.string() }).nullable(),
  approved: z
    .object({ by: z.string(), at: timeSchema, manifestSha256: z.string(), how: z.string() })
    .nullable(),
  waivers: z.array(waiverViewSchema),
  /** why it is on hold, or empty */
  heldBecause: z.string(),
  outcomes: z.array(
    z.object({
      at: timeSchema,
      by: z.string(),
      kind: z.enum(['done', 'spoiled']),
      words: z.string(),
      measuredLstar: z.number().nullable(),
      cost: z.string(),
    }),
  ),
  history: z.array(historyEntrySchema),
  /** events that the person asking may cause now */
  events: z.array(orderEventSchema),
  /** reasons in words why an otherwise possible event must wait, by event */
  waitsFor: z.record(z.string(), z.string()),
  /** cautions that apply, as sentences */
  cautions: z.array(z.object({ id: z.string(), title: z.string(), text: z.string() })),
});
export type OrderView = z.infer<typeof orderViewSchema>;

export const orderRowSchema = z.object({
  number: orderNumberSchema,
  title: z.string(),
  state: orderStateSchema,
  customerName: z.string(),
  machineName: z.string(),
  stockName: z.string(),
  quantity: z.number().int(),
  dueOn: z.string().nullable(),
  updatedAt: timeSchema,
  blockers: z.number().int(),
  warnings: z.number().int(),
  pictureUrl: z.string().nullable(),
  scanSeconds: z.number().nullable(),
});
export type OrderRow = z.infer<typeof orderRowSchema>;

export const orderQuerySchema = z.object({
  q: z.string().trim().max(100).default(''),
  state: z.string().max(200).default(''),
  machineId: z.coerce.number().int().positive().optional(),
  sort: z.enum(['due', 'updated', 'number', 'customer', 'state']).default('due'),
  order: z.enum(['up', 'down']).default('up'),
  page: z.coerce.number().int().min(1).default(1),
  perPage: z.coerce.number().int().min(1).max(100).default(25),
});
export const orderListSchema = z.object({
  rows: z.array(orderRowSchema),
  total: z.number().int(),
  page: z.number().int(),
  perPage: z.number().int(),
});
export type OrderList = z.infer<typeof orderListSchema>;

/** Body of POST /api/orders/:number/events: one event with what it needs; `version` guards against two tabs. */
export const eventBodySchema = z.discriminatedUnion('event', [
  z.object({ event: z.literal('submit'), version: z.number().int(), rightsConfirmed: z.literal(true) }),
  z.object({ event: z.literal('take'), version: z.number().int() }),
  z.object({ event: z.literal('pass'), version: z.number().int(), preparationId: z.number().int() }),
  z.object({
    event: z.literal('send-proof'),
    version: z.number().int(),
    words: z.string().trim().max(1000).default(''),
  }),
  z.object({
    event: z.literal('approve'),
    version: z.number().int(),
    manifestSha256: z.string(),
    /** staff recording an approval given in person: who gave it and how */
    inPerson: z
      .object({ who: z.string().trim().min(1).max(120), how: z.string().trim().min(1).max(200) })
      .nullable()
      .default(null),
  }),
  z.object({
    event: z.literal('approve-without-proof'),
    version: z.number().int(),
    reason: z.string().trim().min(3).max(1000),
  }),
  z.object({
    event: z.literal('ask-for-changes'),
    version: z.number().int(),
    words: z.string().trim().min(3).max(2000),
  }),
  z.object({ event: z.literal('release'), version: z.number().int() }),
  z.object({
    event: z.literal('recall'),
    version: z.number().int(),
    reason: z.string().trim().min(3).max(1000),
  }),
  z.object({
    event: z.literal('on-the-machine'),
    version: z.number().int(),
    checklist: z.array(z.string()).min(1),
  }),
  z.object({
    event: z.literal('done'),
    version: z.number().int(),
    words: z.string().trim().max(2000).default(''),
    measuredLstar: z.number().min(0).max(100).nullable().default(null),
  }),
  z.object({
    event: z.literal('spoiled'),
    version: z.number().int(),
    reason: z.string().trim().min(3).max(2000),
    newBlank: z.string().trim().min(1).max(200),
    cost: z.string().trim().max(60).default(''),
  }),
  z.object({
    event: z.literal('hand-over'),
    version: z.number().int(),
    how: z.enum(['collected', 'sent']),
    byWhom: z.string().trim().min(1).max(120),
  }),
  z.object({
    event: z.literal('hold'),
    version: z.number().int(),
    reason: z.string().trim().min(3).max(1000),
  }),
  z.object({ event: z.literal('resume'), version: z.number().int() }),
  z.object({
    event: z.literal('cancel'),
    version: z.number().int(),
    reason: z.string().trim().min(3).max(1000),
  }),
]);
export type EventBody = z.infer<typeof eventBodySchema>;

/** What every refusal looks like: what happened, why, what to do. */
export const problemSchema = z.object({
  code: z.string(),
  title: z.string(),
  detail: z.string(),
  action: z.string(),
  fields: z.record(z.string(), z.string()).optional(),
});
export type Problem = z.infer<typeof problemSchema>;

/** Events of GET /api/orders/:number/progress. */
export const progressEventSchema = z.object({
  /** what changed: the client fetches the order again when `version` grew or a task ended */
  version: z.number().int(),
  tasks: z.array(taskViewSchema.extend({ kind: z.enum(['check', 'prepare']), subject: z.string() })),
});
export type ProgressEvent = z.infer<typeof progressEventSchema>;
