import { z } from 'zod';
import { findingSchema } from '../preflight/finding';
import { manifestFileSchema } from './manifest';
import { settingsSchema, treatmentSchema } from './settings';

export const REPORT_VERSION = 1;

/** What ingest learned of the artwork. */
export const artworkFactsSchema = z.object({
  sha256: z.string(),
  bytes: z.number().int(),
  format: z.enum(['png', 'jpeg', 'webp', 'tiff', 'gif', 'avif', 'bmp', 'svg']),
  kind: z.enum(['raster', 'vector']),
  /** pixels after orientation; for a vector the pixels of its nominal size at 96 per inch */
  widthPx: z.number(),
  heightPx: z.number(),
  /** size that the file itself states, mm; null where it states none */
  ownWidthMm: z.number().nullable(),
  ownHeightMm: z.number().nullable(),
  /** plain remarks: first frame of several, colour profile converted, alpha laid over the ground … */
  remarks: z.array(z.string()),
  /** what the picture looks like and why: suggested treatment */
  suggestedTreatment: treatmentSchema,
  suggestionReason: z.string(),
  /** share of the area that is tonal, 0–1 */
  tonalShare: z.number().min(0).max(1),
});
export type ArtworkFacts = z.infer<typeof artworkFactsSchema>;

/** The quick answer to an upload: no files, only what was found. */
export const checkReportSchema = z.object({
  reportVersion: z.literal(REPORT_VERSION),
  artwork: artworkFactsSchema,
  widthMm: z.number(),
  heightMm: z.number(),
  directionDeg: z.number(),
  /** size across the scan direction, mm */
  sizeAcrossMm: z.number(),
  findings: z.array(findingSchema),
  /** smallest physical width without hairline and fill-in, mm; null for photographs and where there is nothing thin */
  smallestSoundWidthMm: z.number().nullable(),
  /** pixels per mm that widths were measured at; null where nothing was measured */
  measuredPxPerMm: z.number().nullable(),
});
export type CheckReport = z.infer<typeof checkReportSchema>;

/** One pass as it will be run. */
export const passReportSchema = z.object({
  pass: z.union([z.literal(1), z.literal(2)]),
  directionDeg: z.number(),
  linePitchMm: z.number(),
  alongPitchMm: z.number(),
  sizeAcrossMm: z.number(),
  pitchRatio: z.number(),
  lines: z.number().int(),
  pixelsAlong: z.number().int(),
  /** for angles other than 0 and 90: where the raster's own frame lies, mm and degrees in the artwork's frame; else null */
  scanFrame: z
    .object({
      angleDeg: z.number(),
      originXMm: z.number(),
      originYMm: z.number(),
      outline: z.array(z.object({ xMm: z.number(), yMm: z.number() })),
    })
    .nullable(),
  /** power ÷ (speed × pitch), J/mm²; null without recipe or machine */
  doseJPerMm2: z.number().nullable(),
  assumesLinearPower: z.boolean(),
  /** scanning time by the trapezoid of speed, s; null without recipe or machine */
  scanSeconds: z.number().nullable(),
  runOffMm: z.number().nullable(),
  /** share of the pixels that fire (mask) or mean burn (continuous), 0–1 */
  meanBurn: z.number(),
});
export type PassReport = z.infer<typeof passReportSchema>;

export const traceReportSchema = z.object({
  /** followed: strokes kept as centrelines, fills inset; traced: outlines found in pixels */
  method: z.enum(['followed', 'traced']),
  nodes: z.number().int(),
  paths: z.number().int(),
  islandsDropped: z.number().int(),
  /** between drawn outline and mask, mm; null where not measured */
  meanBoundaryMm: z.number().nullable(),
  hausdorffMm: z.number().nullable(),
  lengthMm: z.number(),
  optimised: z.boolean(),
});
export type TraceReport = z.infer<typeof traceReportSchema>;

export const reportSchema = checkReportSchema.extend({
  settings: settingsSchema,
  passes: z.array(passReportSchema),
  trace: traceReportSchema.nullable(),
  totalDoseJPerMm2: z.number().nullable(),
  totalSeconds: z.number().nullable(),
  files: z.array(manifestFileSchema),
  preparationKey: z.string(),
  manifestSha256: z.string(),
});
/** What a preparation says of itself; timings live beside it, never in it. */
export type Report = z.infer<typeof reportSchema>;

/** The five pictures of the passage, PNG, longest side at most `PASSAGE_MAX_PX`. */
export const PASSAGE = ['sent', 'sized', 'toned', 'screened', 'burned'] as const;
export type PassagePicture = (typeof PASSAGE)[number];
export const PASSAGE_MAX_PX = 2400;
