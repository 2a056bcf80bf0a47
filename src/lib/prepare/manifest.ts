import { z } from 'zod';
import { settingsSchema } from './settings';

export const MANIFEST_VERSION = 1;
const sha256Schema = z.string().regex(/^[0-9a-f]{64}$/);

export const manifestFileSchema = z.object({
  name: z.string(),
  role: z.enum(['raster', 'linework']),
  mediaType: z.string(),
  bytes: z.number().int().min(1),
  sha256: sha256Schema,
  /** 1 the first pass, 2 the perpendicular one */
  pass: z.union([z.literal(1), z.literal(2)]),
  directionDeg: z.number(),
  linePitchMm: z.number(),
  alongPitchMm: z.number(),
  /** columns and rows; null for linework */
  widthPx: z.number().int().nullable(),
  heightPx: z.number().int().nullable(),
  /** physical size of what the file holds, mm */
  widthMm: z.number(),
  heightMm: z.number(),
});
export type ManifestFile = z.infer<typeof manifestFileSchema>;

/** What is asked for: the part of the manifest that is known before any work is done. */
export const requestSchema = z.object({
  manifestVersion: z.literal(MANIFEST_VERSION),
  artworkSha256: sha256Schema,
  /** version number of the artwork in its order; 1 from the command line */
  artworkVersion: z.number().int().min(1),
  settings: settingsSchema,
  /** points of the stock's response (dose in J/mm², L*); empty until it is measured */
  responsePoints: z.array(z.object({ doseJPerMm2: z.number(), lstar: z.number() })),
  /** version of the recipe; null while it is typed */
  recipeVersion: z.string().nullable(),
  /** mends in the order in which they are applied */
  mends: z.array(
    z.object({
      id: z.string(),
      parameters: z.record(z.string(), z.union([z.string(), z.number(), z.boolean()])),
    }),
  ),
  /** name → version of the pipeline and of every library whose code decides bytes */
  versions: z.record(z.string(), z.string()),
});
export type PrepareRequest = z.infer<typeof requestSchema>;

/** The canonical list that identifies a preparation; no timings, no dates. */
export const manifestSchema = requestSchema.extend({ files: z.array(manifestFileSchema) });
export type Manifest = z.infer<typeof manifestSchema>;

/**
 * JSON text of a value in canonical form: object keys sorted by code unit, no white space, numbers as ECMAScript prints
 * them (RFC 8785, JSON Canonicalization Scheme). Hash its UTF-8 bytes.
 * @param value plain data without undefined, functions, NaN or infinities; unchanged
 * @throws TypeError on anything that JSON cannot carry
 * @example canonicalJson({ b: 1, a: [true, null] }) === '{"a":[true,null],"b":1}'
 */
export function canonicalJson(value: unknown): string {
  if (value === null || typeof value === 'boolean' || typeof value === 'string') return JSON.stringify(value);
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new TypeError(`expected a finite number, got ${value}`);
    return JSON.stringify(value);
  }
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`;
  if (typeof value === 'object' && Object.getPrototypeOf(value) === Object.prototype) {
    const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
    return `{${entries.map(([key, item]) => `${JSON.stringify(key)}:${canonicalJson(item)}`).join(',')}}`;
  }
  throw new TypeError(`expected plain JSON data, got ${typeof value}`);
}
