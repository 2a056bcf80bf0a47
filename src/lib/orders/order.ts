import { z } from 'zod';
import { routeSchema } from '../stock/stock';

/** Order numbers as people say them: U-1001. */
export const orderNumberSchema = z.string().regex(/^U-\d{4,8}$/);

export const blankSchema = z.object({
  outline: z.enum(['rectangle', 'round', 'own']),
  widthMm: z.number().min(5).max(3000),
  heightMm: z.number().min(5).max(3000),
  thicknessMm: z.number().min(0.1).max(200),
  /** null: not identified */
  stockId: z.number().int().positive().nullable(),
  side: z.enum(['front', 'back']),
  /** direction of the grain to X, degrees; null where there is none */
  grainDeg: z.number().min(0).max(180).nullable(),
  source: z.enum(['shop', 'customer']),
  /** for a customer's own blank: its condition, and whether there is a spare */
  condition: z.string().trim().max(500),
  spare: z.boolean(),
});
export type Blank = z.infer<typeof blankSchema>;

export const DATUMS = ['top-left', 'top-right', 'bottom-left', 'bottom-right', 'centre'] as const;
export const placementSchema = z.object({
  datum: z.enum(DATUMS),
  /** from the datum of the blank to the same point of the artwork, mm, right and down positive */
  xMm: z.number().min(-3000).max(3000),
  yMm: z.number().min(-3000).max(3000),
  quarterTurns: z.union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)]),
  fixture: z.string().trim().max(200),
});
export type Placement = z.infer<typeof placementSchema>;

export const useSchema = z.enum(['decoration', 'touches-food', 'for-a-child', 'outdoors']);
export type Use = z.infer<typeof useSchema>;

/** What the customer says of an order; every field may still be missing in a draft. */
export const orderFieldsSchema = z.object({
  title: z.string().trim().max(120),
  quantity: z.number().int().min(1).max(10_000),
  /** ISO date, or null */
  dueOn: z.iso.date().nullable(),
  /** placed size of the artwork before quarter turns, mm */
  widthMm: z.number().min(1).max(3000).nullable(),
  heightMm: z.number().min(1).max(3000).nullable(),
  blank: blankSchema.nullable(),
  placement: placementSchema,
  treatment: z.enum(['linework', 'solid', 'halftone', 'continuous']).nullable(),
  /** target lightness L*, 5–95 */
  shadeLstar: z.number().min(5).max(95).nullable(),
  route: routeSchema,
  use: useSchema,
  notes: z.string().trim().max(2000),
  /** the customer goes without a proof */
  withoutProof: z.boolean(),
});
export type OrderFields = z.infer<typeof orderFieldsSchema>;
export const orderPatchSchema = orderFieldsSchema.partial();
export type OrderPatch = z.infer<typeof orderPatchSchema>;

/**
 * Left and top edge of the artwork from the blank's left and top edges, mm.
 * @param blank outline's own width and height, mm
 * @param placement datum and distances, mm
 * @param widthMm @param heightMm size of the artwork as placed, after its quarter turns, mm
 * @example on a 100 × 60 blank, datum centre, 0/0, artwork 40 × 20: left 30, top 20
 */
export function placeOnBlank(
  blank: Pick<Blank, 'widthMm' | 'heightMm'>,
  placement: Placement,
  widthMm: number,
  heightMm: number,
): { leftMm: number; topMm: number } {
  const spareX = blank.widthMm - widthMm;
  const spareY = blank.heightMm - heightMm;
  const fractionX = placement.datum === 'centre' ? 0.5 : placement.datum.endsWith('right') ? 1 : 0;
  const fractionY = placement.datum === 'centre' ? 0.5 : placement.datum.startsWith('bottom') ? 1 : 0;
  return { leftMm: spareX * fractionX + placement.xMm, topMm: spareY * fractionY + placement.yMm };
}
