import { z } from 'zod';
import { machineSchema, spotPresetSchema } from '../machines/machine';
import { blankSchema, orderFieldsSchema, orderPatchSchema } from '../orders/order';
import { roleSchema, type Role } from '../orders/state';
import {
  designSchema,
  eventBodySchema,
  machineViewSchema,
  orderListSchema,
  orderQuerySchema,
  orderViewSchema,
  personViewSchema,
  preparationViewSchema,
  problemSchema,
  stockViewSchema,
  timeSchema,
} from '../orders/views';
import { reportSchema } from '../prepare/report';
import { manifestSchema } from '../prepare/manifest';
import { stockSchema } from '../stock/stock';
import { washSchema } from '../stock/wash';

/** Who may call a route at all; whose object it is, is decided by the use case (another's answers 404). */
export type Access = 'anyone' | 'signed-in' | readonly Role[];

export interface Route {
  method: 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
  /** path with :parameters */
  path: string;
  access: Access;
  summary: string;
  query?: z.ZodType;
  body?: z.ZodType;
  /** request body that is not JSON */
  upload?: true;
  response?: z.ZodType;
  /** response that is not JSON */
  media?: string;
}

const CUSTOMER_AND_STAFF: readonly Role[] = ['customer', 'designer', 'operator', 'admin'];
const STAFF: readonly Role[] = ['designer', 'operator', 'admin'];
const DESIGN: readonly Role[] = ['designer', 'admin'];
const ADMIN: readonly Role[] = ['admin'];

const nothing = z.object({ ok: z.literal(true) });
const email = z.email().max(254);
const password = z.string().min(10).max(200);
const name = z.string().trim().min(1).max(120);
const token = z.string().min(20).max(200);

/** Every JSON endpoint of the product: the authorisation table, the OpenAPI document and the tests read this one list. */
export const ROUTES = [
  {
    method: 'GET',
    path: '/health',
    access: 'anyone',
    summary: 'Whether database, storage and queue answer',
    response: z.object({
      ok: z.boolean(),
      database: z.boolean(),
      storage: z.boolean(),
      queue: z.boolean(),
      freeBytes: z.number(),
    }),
  },
  {
    method: 'GET',
    path: '/api/openapi.json',
    access: 'anyone',
    summary: 'This description',
    media: 'application/json',
  },

  {
    method: 'GET',
    path: '/api/account',
    access: 'anyone',
    summary: 'The signed-in person, or null',
    response: z.object({ person: personViewSchema.nullable() }),
  },
  {
    method: 'POST',
    path: '/api/account/register',
    access: 'anyone',
    summary: 'Register a customer; a mail asks to confirm the address',
    body: z.object({ name, email, password }),
    response: nothing,
  },
  {
    method: 'POST',
    path: '/api/account/confirm',
    access: 'anyone',
    summary: 'Confirm an address with the mailed token',
    body: z.object({ token }),
    response: nothing,
  },
  {
    method: 'POST',
    path: '/api/account/confirmation',
    access: 'signed-in',
    summary: 'Send the confirming mail again',
    body: z.object({}),
    response: nothing,
  },
  {
    method: 'POST',
    path: '/api/account/forgotten',
    access: 'anyone',
    summary: 'Mail a link that sets a new password',
    body: z.object({ email }),
    response: nothing,
  },
  {
    method: 'POST',
    path: '/api/account/reset',
    access: 'anyone',
    summary: 'Set a new password with the mailed token',
    body: z.object({ token, password }),
    response: nothing,
  },
  {
    method: 'POST',
    path: '/api/account/invitation',
    access: 'anyone',
    summary: 'Accept an invitation',
    body: z.object({ token, name, password }),
    response: nothing,
  },
  {
    method: 'PATCH',
    path: '/api/account',
    access: 'signed-in',
    summary: 'Change own name or password',
    body: z.object({
      name: name.optional(),
      currentPassword: z.string().max(200).optional(),
      newPassword: password.optional(),
    }),
    response: nothing,
  },
  {
    method: 'POST',
    path: '/api/account/sign-out-everywhere',
    access: 'signed-in',
    summary: 'End all sessions of the signed-in person',
    body: z.object({}),
    response: nothing,
  },

  {
    method: 'GET',
    path: '/api/people',
    access: STAFF,
    summary: 'People, customers and staff',
    query: z.object({ q: z.string().max(100).default(''), role: roleSchema.optional() }),
    response: z.object({ people: z.array(personViewSchema) }),
  },
  {
    method: 'POST',
    path: '/api/people/invitations',
    access: ADMIN,
    summary: 'Invite staff by mail',
    body: z.object({ email, role: roleSchema }),
    response: nothing,
  },
  {
    method: 'POST',
    path: '/api/people/walk-ins',
    access: STAFF,
    summary: 'Enter a walk-in customer, who may set a password later',
    body: z.object({ name, email }),
    response: z.object({ person: personViewSchema }),
  },
  {
    method: 'PATCH',
    path: '/api/people/:id',
    access: ADMIN,
    summary: 'Change role or disable; never the last admin',
    body: z.object({ role: roleSchema.optional(), disabled: z.boolean().optional() }),
    response: z.object({ person: personViewSchema }),
  },

  {
    method: 'GET',
    path: '/api/machines',
    access: STAFF,
    summary: 'Machines with their spot presets',
    response: z.object({ machines: z.array(machineViewSchema) }),
  },
  {
    method: 'POST',
    path: '/api/machines',
    access: ADMIN,
    summary: 'Add a machine',
    body: machineSchema,
    response: z.object({ machine: machineViewSchema }),
  },
  {
    method: 'PATCH',
    path: '/api/machines/:id',
    access: ADMIN,
    summary: 'Change or retire a machine',
    body: machineSchema.partial().extend({ retired: z.boolean().optional() }),
    response: z.object({ machine: machineViewSchema }),
  },
  {
    method: 'POST',
    path: '/api/machines/:id/spot-presets',
    access: ADMIN,
    summary: 'Add a spot preset',
    body: spotPresetSchema,
    response: z.object({ machine: machineViewSchema }),
  },
  {
    method: 'PATCH',
    path: '/api/machines/:id/spot-presets/:presetId',
    access: ADMIN,
    summary: 'Change a spot preset',
    body: spotPresetSchema,
    response: z.object({ machine: machineViewSchema }),
  },
  {
    method: 'DELETE',
    path: '/api/machines/:id/spot-presets/:presetId',
    access: ADMIN,
    summary: 'Remove a spot preset that no order uses',
    response: z.object({ machine: machineViewSchema }),
  },

  {
    method: 'GET',
    path: '/api/stocks',
    access: 'signed-in',
    summary: 'Stocks with their cautions',
    response: z.object({ stocks: z.array(stockViewSchema) }),
  },
  {
    method: 'POST',
    path: '/api/stocks',
    access: ADMIN,
    summary: 'Add a stock',
    body: stockSchema,
    response: z.object({ stock: stockViewSchema }),
  },
  {
    method: 'PATCH',
    path: '/api/stocks/:id',
    access: ADMIN,
    summary: 'Change or retire a stock',
    body: stockSchema.partial().extend({ retired: z.boolean().optional() }),
    response: z.object({ stock: stockViewSchema }),
  },

  {
    method: 'GET',
    path: '/api/wash',
    access: STAFF,
    summary: 'The shop’s darkening wash, or null',
    response: z.object({ wash: washSchema.nullable() }),
  },
  {
    method: 'PUT',
    path: '/api/wash',
    access: ADMIN,
    summary: 'Enter the shop’s darkening wash with its safety data sheet',
    body: washSchema,
    response: z.object({ wash: washSchema }),
  },

  {
    method: 'GET',
    path: '/api/outbox',
    access: 'anyone',
    summary: 'Mails that the in-process mail server kept; not in production',
    response: z.object({
      mails: z.array(
        z.object({
          id: z.number().int(),
          at: timeSchema,
          to: z.string(),
          subject: z.string(),
          text: z.string(),
          html: z.string(),
        }),
      ),
    }),
  },

  {
    method: 'GET',
    path: '/api/record',
    access: ADMIN,
    summary: 'The record: who did what, newest first',
    query: z.object({ q: z.string().max(100).default(''), page: z.coerce.number().int().min(1).default(1) }),
    response: z.object({
      entries: z.array(
        z.object({
          id: z.number(),
          at: timeSchema,
          by: z.string(),
          event: z.string(),
          subject: z.string(),
          words: z.string(),
        }),
      ),
      total: z.number(),
      page: z.number(),
      perPage: z.number(),
    }),
  },

  {
    method: 'GET',
    path: '/api/orders',
    access: CUSTOMER_AND_STAFF,
    summary: 'Own orders; for staff all of them',
    query: orderQuerySchema,
    response: orderListSchema,
  },
  {
    method: 'POST',
    path: '/api/orders',
    access: CUSTOMER_AND_STAFF,
    summary: 'Open a draft; staff name the customer',
    body: orderPatchSchema.extend({ customerId: z.number().int().positive().optional() }),
    response: z.object({ order: orderViewSchema }),
  },
  {
    method: 'GET',
    path: '/api/orders/:number',
    access: CUSTOMER_AND_STAFF,
    summary: 'One order',
    response: z.object({ order: orderViewSchema }),
  },
  {
    method: 'PATCH',
    path: '/api/orders/:number',
    access: CUSTOMER_AND_STAFF,
    summary:
      'Change a draft or, as designer, an order that is not passed yet; a new size checks the artwork again',
    body: z.object({ version: z.number().int(), fields: orderPatchSchema }),
    response: z.object({ order: orderViewSchema }),
  },
  {
    method: 'POST',
    path: '/api/orders/:number/artwork',
    access: CUSTOMER_AND_STAFF,
    summary: 'Upload artwork as a new version (multipart, field "artwork")',
    upload: true,
    response: z.object({ order: orderViewSchema }),
  },
  {
    method: 'GET',
    path: '/api/orders/:number/artwork/:artworkVersion/original',
    access: CUSTOMER_AND_STAFF,
    summary: 'The artwork as it was sent, as a download',
    media: 'application/octet-stream',
  },
  {
    method: 'GET',
    path: '/api/orders/:number/artwork/:artworkVersion/picture',
    access: CUSTOMER_AND_STAFF,
    summary: 'A picture of the artwork',
    media: 'image/png',
  },
  {
    method: 'POST',
    path: '/api/orders/:number/artwork/:artworkVersion/check',
    access: CUSTOMER_AND_STAFF,
    summary: 'Check the artwork again after a failure',
    body: z.object({}),
    response: z.object({ order: orderViewSchema }),
  },
  {
    method: 'PUT',
    path: '/api/orders/:number/design',
    access: DESIGN,
    summary: 'Keep the designer’s choices',
    body: z.object({ version: z.number().int(), design: designSchema }),
    response: z.object({ order: orderViewSchema }),
  },
  {
    method: 'POST',
    path: '/api/orders/:number/preparations',
    access: DESIGN,
    summary: 'Prepare with the kept choices; the same request gives the same preparation',
    body: z.object({ version: z.number().int() }),
    response: z.object({ order: orderViewSchema, preparation: preparationViewSchema }),
  },
  {
    method: 'GET',
    path: '/api/orders/:number/preparations/:id',
    access: CUSTOMER_AND_STAFF,
    summary: 'One preparation',
    response: z.object({ preparation: preparationViewSchema }),
  },
  {
    method: 'GET',
    path: '/api/orders/:number/preparations/:id/report',
    access: STAFF,
    summary: 'Its report',
    response: reportSchema,
  },
  {
    method: 'GET',
    path: '/api/orders/:number/preparations/:id/manifest',
    access: STAFF,
    summary: 'Its manifest',
    response: manifestSchema,
  },
  {
    method: 'GET',
    path: '/api/orders/:number/preparations/:id/files/:name',
    access: STAFF,
    summary: 'A prepared file, as a download',
    media: 'application/octet-stream',
  },
  {
    method: 'GET',
    path: '/api/orders/:number/preparations/:id/pictures/:name',
    access: CUSTOMER_AND_STAFF,
    summary: 'A picture of the passage',
    media: 'image/png',
  },
  {
    method: 'POST',
    path: '/api/orders/:number/waivers',
    access: DESIGN,
    summary: 'Waive a finding with a reason',
    body: z.object({
      version: z.number().int(),
      findingId: z.string(),
      reason: z.string().trim().min(3).max(1000),
    }),
    response: z.object({ order: orderViewSchema }),
  },
  {
    method: 'DELETE',
    path: '/api/orders/:number/waivers/:findingId',
    access: DESIGN,
    summary: 'Take a waiver back',
    response: z.object({ order: orderViewSchema }),
  },
  {
    method: 'POST',
    path: '/api/orders/:number/events',
    access: CUSTOMER_AND_STAFF,
    summary: 'Move an order along its life',
    body: eventBodySchema,
    response: z.object({ order: orderViewSchema }),
  },
  {
    method: 'GET',
    path: '/api/orders/:number/progress',
    access: CUSTOMER_AND_STAFF,
    summary: 'Server-sent events: what is being worked on',
    media: 'text/event-stream',
  },
  {
    method: 'GET',
    path: '/api/orders/:number/ticket',
    access: STAFF,
    summary: 'What the job ticket says',
    response: z.object({
      order: orderViewSchema,
      preparation: preparationViewSchema,
      sentence: z.string(),
      placementWords: z.string(),
      blank: blankSchema.nullable(),
      fields: orderFieldsSchema,
    }),
  },
] as const satisfies readonly Route[];

type KeyOf<R> = R extends { method: infer M extends string; path: infer P extends string }
  ? `${M} ${P}`
  : never;
/** Method and path of a listed route, such as `GET /api/orders`. */
export type RouteKey = KeyOf<(typeof ROUTES)[number]>;

/** The refusal that every route may answer with. */
export const refusalSchema = problemSchema;
