import { z } from 'zod';
import { firingSchema, spotMeasuredBySchema, spotSchema } from './spot';

export const spotPresetSchema = spotSchema.extend({
  name: z.string().trim().min(1).max(60),
  measuredBy: spotMeasuredBySchema,
  /** dose at which the spot was measured, J/mm², or null where it was not noted */
  measuredAtDoseJPerMm2: z.number().positive().max(1000).nullable(),
});
export type SpotPreset = z.infer<typeof spotPresetSchema>;

export const powerPointSchema = z.object({
  settingPercent: z.number().min(0).max(100),
  watts: z.number().min(0),
});

export const machineSchema = z.object({
  name: z.string().trim().min(1).max(60),
  bedWidthMm: z.number().positive().max(10_000),
  bedHeightMm: z.number().positive().max(10_000),
  /** highest scanning speed, mm/s */
  maxSpeedMmPerS: z.number().positive().max(20_000),
  accelerationMmPerS2: z.number().positive().max(200_000),
  /** optical power at 100 %, W */
  wattsAtFull: z.number().positive().max(10_000),
  /** measured power curve; empty: dose says "assumes linear power" */
  powerCurve: z.array(powerPointSchema).max(101),
  /** power below which the tube does not lase, percent */
  lasingThresholdPercent: z.number().min(0).max(90),
  /** number of power levels that the controller can tell apart */
  powerLevels: z.number().int().min(2).max(65_536),
  speedUnit: z.enum(['mm/s', 'mm/min']),
  firing: firingSchema,
  scanning: z.enum(['one-way', 'two-way']),
});
/** One laser of the shop. */
export type Machine = z.infer<typeof machineSchema>;
