import { z } from 'zod';

export const routeSchema = z.enum(['bare-burn', 'darkening-wash', 'paint-fill']);
export type Route = z.infer<typeof routeSchema>;

/** Whether a stock's L* falls (darkens) or rises (lightens) with dose. */
export const stockDirectionSchema = z.enum(['darkens', 'lightens']);
export type StockDirection = z.infer<typeof stockDirectionSchema>;

/** Named steps of shade with their L*: the shop's own defaults. */
export const SHADE_STEPS = [
  { name: 'Straw', lstar: 66 },
  { name: 'Honey', lstar: 58 },
  { name: 'Chestnut', lstar: 48 },
  { name: 'Umber', lstar: 38 },
  { name: 'Soot', lstar: 28 },
] as const;

export const cautionIdSchema = z.enum([
  'machine-class',
  'chlorinated',
  'unidentified-plastic',
  'chrome-tanned-leather',
  'glued-board',
  'treated-wood',
  'reflective',
  'wet-finish',
  'oily-rags',
  'darkening-wash',
  'food-contact',
]);
export type CautionId = z.infer<typeof cautionIdSchema>;

export const stockSchema = z.object({
  name: z.string().trim().min(1).max(80),
  /** species or substance, such as birch plywood, cork, slate */
  species: z.string().trim().min(1).max(80),
  thicknessMm: z.number().positive().max(200),
  finish: z.string().trim().max(80),
  direction: stockDirectionSchema,
  /** colour of the unburned surface, sRGB hexadecimal */
  groundColour: z.string().regex(/^#[0-9a-f]{6}$/),
  /** L* of the unburned surface, 0–100 */
  groundLstar: z.number().min(0).max(100),
  /** colour of a full mark, sRGB hexadecimal */
  markColour: z.string().regex(/^#[0-9a-f]{6}$/),
  /** L* of a full mark, 0–100; typed until a wedge has measured it */
  markLstar: z.number().min(0).max(100),
  cautions: z.array(cautionIdSchema),
  /** forbidden stock cannot be submitted or released */
  forbidden: z.boolean(),
  /** routes offered on this stock */
  routes: z.array(routeSchema),
  notes: z.string().max(2000),
});
/** The material of a blank. */
export type Stock = z.infer<typeof stockSchema>;
