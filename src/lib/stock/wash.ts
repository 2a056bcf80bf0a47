import { z } from 'zod';

export const washSchema = z.object({
  /** name of the product as its label has it */
  product: z.string().trim().min(1).max(120),
  /** in the words of its sheet, such as "1 part to 10 parts warm water by volume" */
  ratio: z.string().trim().min(1).max(200),
  /** until it is fully dry, minutes */
  dryingMinutes: z.number().int().min(1).max(10_080),
  /** address of the product's safety data sheet: without it the route is not offered */
  sheetUrl: z.url({ protocol: /^https?$/ }).max(500),
});
/** The shop's own darkening wash. */
export type Wash = z.infer<typeof washSchema>;
