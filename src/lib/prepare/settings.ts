import { z } from 'zod';
import { firingSchema, sizeAcross, spotSchema, type Spot } from '../machines/spot';

export const treatmentSchema = z.enum(['linework', 'solid', 'halftone', 'continuous']);
export type Treatment = z.infer<typeof treatmentSchema>;

/** Halftone methods. Published ones are named by author and year and stand apart, for comparison. */
export const SCREEN_NAMES = [
  'even-grain',
  'published:floyd-steinberg-1976',
  'published:jarvis-judice-ninke-1976',
  'published:stucki-1981',
  'published:bayer-1973',
] as const;
export const screenNameSchema = z.enum(SCREEN_NAMES);
export type ScreenName = z.infer<typeof screenNameSchema>;
/** Used where no screen is asked for. */
export const DEFAULT_SCREEN: ScreenName = 'published:floyd-steinberg-1976';

export const pitchSchema = z.number().min(0.01).max(2);

export const scanSchema = z.object({
  /** angle of the scan lines to X, degrees, −180 up to 180 */
  directionDeg: z.number().min(-180).max(180),
  /** distance between neighbouring scan lines, mm, 0.01 to 2 */
  linePitchMm: pitchSchema,
  /** distance between neighbouring pixels along a scan line, mm, 0.01 to 2 */
  alongPitchMm: pitchSchema,
});
export type Scan = z.infer<typeof scanSchema>;

export const toneSchema = z.object({
  /** absolute: coverage = 1 − relative luminance, or what the stock's ground and mark ask for; scaled: into the reachable range */
  mode: z.enum(['absolute', 'scaled']).default('absolute'),
  /** relative luminance that becomes full burn, 0–1 */
  blackPoint: z.number().min(0).max(0.95).default(0),
  /** relative luminance that stays untouched, 0–1, above the black point */
  whitePoint: z.number().min(0.05).max(1).default(1),
  /** exponent on the lightness between the points; above 1 darkens, 0.2–5 */
  gamma: z.number().min(0.2).max(5).default(1),
});
export type Tone = z.infer<typeof toneSchema>;

/** What tone and forecast must know of the stock; null in the settings: none named. */
export const stockToneSchema = z.object({
  name: z.string(),
  direction: z.enum(['darkens', 'lightens']),
  groundLstar: z.number().min(0).max(100),
  markLstar: z.number().min(0).max(100),
  groundColour: z.string().regex(/^#[0-9a-f]{6}$/),
  markColour: z.string().regex(/^#[0-9a-f]{6}$/),
});
export type StockTone = z.infer<typeof stockToneSchema>;

/** What scanning time, run-off and dose need of the machine; null in the settings: none named. */
export const machineRunSchema = z.object({
  name: z.string(),
  bedWidthMm: z.number().positive(),
  bedHeightMm: z.number().positive(),
  accelerationMmPerS2: z.number().positive(),
  wattsAtFull: z.number().positive(),
  powerCurve: z.array(z.object({ settingPercent: z.number(), watts: z.number() })),
  scanning: z.enum(['one-way', 'two-way']),
  maxSpeedMmPerS: z.number().positive(),
});
export type MachineRun = z.infer<typeof machineRunSchema>;

/** Power, speed and focus as a person typed them: "typed by …, not measured". */
export const typedRecipeSchema = z.object({
  powerPercent: z.number().min(1).max(100),
  speedMmPerS: z.number().min(0.1).max(20_000),
  /** power and speed of the perpendicular pass; null where there is none */
  perpendicular: z
    .object({ powerPercent: z.number().min(1).max(100), speedMmPerS: z.number().min(0.1).max(20_000) })
    .nullable(),
  /** height of the head above focus, mm */
  focusOffsetMm: z.number().min(-20).max(50),
  typedBy: z.string(),
});
export type TypedRecipe = z.infer<typeof typedRecipeSchema>;

export const settingsSchema = z.object({
  /** placed size of the artwork after its quarter turns, mm, 1 to 3000 */
  widthMm: z.number().min(1).max(3000),
  heightMm: z.number().min(1).max(3000),
  /** quarter turns clockwise that the artwork is placed with */
  quarterTurns: z.union([z.literal(0), z.literal(1), z.literal(2), z.literal(3)]).default(0),
  spot: spotSchema,
  firing: firingSchema.default('swept'),
  treatment: treatmentSchema,
  /** used by halftone alone */
  screen: screenNameSchema.default(DEFAULT_SCREEN),
  scan: scanSchema,
  /** a second pass at +90° with its own pitches, or null */
  perpendicular: z.object({ linePitchMm: pitchSchema, alongPitchMm: pitchSchema }).nullable().default(null),
  tone: toneSchema,
  /** L* that parts burned from unburned in solid and linework, 1–99; 53.4 is sRGB 127.5, an edge pixel half covered by black */
  dividingLstar: z.number().min(1).max(99).default(53.4),
  /** corners of traced outlines */
  corners: z.enum(['kept', 'eased']).default('kept'),
  mirror: z.boolean().default(false),
  /** raster files asked for; linework is always written as SVG and PDF */
  formats: z
    .array(z.enum(['png', 'tiff', 'bmp']))
    .min(1)
    .default(['png', 'tiff', 'bmp']),
  /** blank that the artwork must fit, and where it lies on it, or null */
  blank: z
    .object({
      outline: z.enum(['rectangle', 'round', 'own']),
      widthMm: z.number().positive(),
      heightMm: z.number().positive(),
      /** left and top edge of the artwork from the blank's left and top edges, mm */
      leftMm: z.number(),
      topMm: z.number(),
    })
    .nullable()
    .default(null),
  stock: stockToneSchema.nullable().default(null),
  machine: machineRunSchema.nullable().default(null),
  recipe: typedRecipeSchema.nullable().default(null),
  /** first part of the file names: order number or the artwork's own name; letters, digits, - and _ */
  label: z.string().regex(/^[A-Za-z0-9_-]{1,60}$/),
});
/** Everything that decides the bytes of a prepared file, apart from the artwork and the versions of the programs. */
export type Settings = z.infer<typeof settingsSchema>;
export type SettingsInput = z.input<typeof settingsSchema>;

/**
 * The scan that a spot asks for at a direction: pitch ratio 1, the same pitch along the lines.
 * @param spot widths in mm; unchanged
 * @param directionDeg angle of the scan lines to X, degrees
 * @throws RangeError as `sizeAcross`
 * @example scanFor({ widthMm: 0.07, heightMm: 0.11, shape: 'ellipse' }, 0).linePitchMm // 0.11
 */
export function scanFor(spot: Spot, directionDeg: number): Scan {
  const pitch = Math.round(sizeAcross(spot, directionDeg) * 1e6) / 1e6;
  return { directionDeg, linePitchMm: pitch, alongPitchMm: pitch };
}
