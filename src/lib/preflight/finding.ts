import { z } from 'zod';

/** Permanent ids: stored with orders, never renamed, never given a second meaning. */
export const FINDING_IDS = [
  'empty',
  'outside',
  'hairline',
  'fill-in',
  'speck',
  'pinhole',
  'sharp-tip',
  'resolution',
  'tonal-range',
  'background',
  'missing-font',
  'first-frame',
  'unsafe-content',
] as const;
export const findingIdSchema = z.enum(FINDING_IDS);
export type FindingId = z.infer<typeof findingIdSchema>;

export const severitySchema = z.enum(['blocker', 'warning', 'note']);
export type Severity = z.infer<typeof severitySchema>;

export const placeSchema = z.object({
  /** centre of the place, mm from the left and top edges of the placed artwork */
  xMm: z.number(),
  yMm: z.number(),
  /** extent of the place, mm; 0 for a point */
  widthMm: z.number().min(0),
  heightMm: z.number().min(0),
  /** smallest width measured here, mm; null where the finding has no width */
  minMm: z.number().nullable(),
});
export type Place = z.infer<typeof placeSchema>;

export const findingSchema = z.object({
  id: findingIdSchema,
  severity: severitySchema,
  title: z.string(),
  /** number of places found, also those beyond the listed ones */
  count: z.number().int().min(0),
  /** at most 200, smallest width first */
  places: z.array(placeSchema).max(200),
  /** smallest width measured, mm */
  minMm: z.number().nullable(),
  /** limit that it was held against, mm, at the place of the smallest width */
  limitMm: z.number().nullable(),
  /** other measured figure with its unit, where the finding is not a width */
  measured: z.object({ value: z.number(), limit: z.number().nullable(), unit: z.string() }).nullable(),
  /** what happened and what to do, in the customer's words */
  advice: z.string(),
  /** whether a designer may waive it with a reason */
  waivable: z.boolean(),
});
/** One result of preflight. */
export type Finding = z.infer<typeof findingSchema>;
