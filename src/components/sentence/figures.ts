import { z } from 'zod';
import { type Design } from '@/lib/orders/views';
import { SCREEN_NAMES, treatmentSchema } from '@/lib/prepare/settings';

const range = (least: number, most: number) => {
  const message = `Enter a figure from ${least} to ${most}.`;
  return z.number(message).min(least, message).max(most, message);
};
const pitch = range(0.01, 2);

/** Every choice of the sentence, flat, as the plain form holds it. */
export const figuresSchema = z
  .object({
    treatment: treatmentSchema,
    screen: z.enum(SCREEN_NAMES),
    toneMode: z.enum(['absolute', 'scaled']),
    corners: z.enum(['kept', 'eased']),
    machineAndSpot: z.string().regex(/^\d+\/\d+$/, 'Choose a machine and its spot.'),
    mirror: z.boolean(),
    linePitchMm: pitch,
    alongPitchMm: pitch,
    directionDeg: range(-180, 180),
    perpendicularPitchMm: pitch.nullable(),
    blackPoint: range(0, 0.95),
    whitePoint: range(0.05, 1),
    gamma: range(0.2, 5),
    dividingLstar: range(1, 99),
    powerPercent: range(1, 100).nullable(),
    speedMmPerS: range(0.1, 20_000).nullable(),
    secondPowerPercent: range(1, 100).nullable(),
    secondSpeedMmPerS: range(0.1, 20_000).nullable(),
    focusOffsetMm: range(-20, 50).nullable(),
  })
  .superRefine((figures, context) => {
    const say = (path: string, message: string) =>
      context.addIssue({ code: 'custom', path: [path], message });
    if (figures.blackPoint >= figures.whitePoint)
      say('blackPoint', 'Enter a black point below the white point.');
    const typed = figures.powerPercent !== null || figures.speedMmPerS !== null;
    if (typed && figures.powerPercent === null)
      say('powerPercent', 'Type the power that goes with this speed.');
    if (typed && figures.speedMmPerS === null)
      say('speedMmPerS', 'Type the speed that goes with this power.');
    if (typed && figures.perpendicularPitchMm !== null) {
      if (figures.secondPowerPercent === null)
        say('secondPowerPercent', 'Type the power of the perpendicular pass.');
      if (figures.secondSpeedMmPerS === null)
        say('secondSpeedMmPerS', 'Type the speed of the perpendicular pass.');
    }
  });
export type Figures = z.infer<typeof figuresSchema>;

export function figuresOf(design: Design): Figures {
  const { scan, tone, recipe } = design;
  return {
    treatment: design.treatment,
    screen: design.screen,
    toneMode: tone.mode,
    corners: design.corners,
    machineAndSpot: `${design.machineId}/${design.spotPresetId}`,
    mirror: design.mirror,
    ...scan,
    perpendicularPitchMm: design.perpendicular?.linePitchMm ?? null,
    blackPoint: tone.blackPoint,
    whitePoint: tone.whitePoint,
    gamma: tone.gamma,
    dividingLstar: design.dividingLstar,
    powerPercent: recipe?.powerPercent ?? null,
    speedMmPerS: recipe?.speedMmPerS ?? null,
    secondPowerPercent: recipe?.perpendicular?.powerPercent ?? null,
    secondSpeedMmPerS: recipe?.perpendicular?.speedMmPerS ?? null,
    focusOffsetMm: recipe?.focusOffsetMm ?? 0,
  };
}

function recipeOf(figures: Figures): Design['recipe'] {
  const { powerPercent, speedMmPerS, secondPowerPercent, secondSpeedMmPerS } = figures;
  if (powerPercent === null || speedMmPerS === null) return null;
  const second =
    figures.perpendicularPitchMm !== null && secondPowerPercent !== null && secondSpeedMmPerS !== null;
  return {
    powerPercent,
    speedMmPerS,
    perpendicular: second ? { powerPercent: secondPowerPercent, speedMmPerS: secondSpeedMmPerS } : null,
    focusOffsetMm: figures.focusOffsetMm ?? 0,
  };
}

function perpendicularOf(
  linePitchMm: number | null,
  before: Design['perpendicular'],
): Design['perpendicular'] {
  if (linePitchMm === null) return null;
  return before?.linePitchMm === linePitchMm ? before : { linePitchMm, alongPitchMm: linePitchMm };
}

/** The choices that the form holds; a perpendicular pass that was not touched keeps its pixel pitch. */
export function designOf(figures: Figures, before: Design): Design {
  const [machineId, spotPresetId] = figures.machineAndSpot.split('/').map(Number);
  const { perpendicularPitchMm: second } = figures;
  return {
    machineId,
    spotPresetId,
    treatment: figures.treatment,
    screen: figures.screen,
    scan: {
      directionDeg: figures.directionDeg,
      linePitchMm: figures.linePitchMm,
      alongPitchMm: figures.alongPitchMm,
    },
    perpendicular: perpendicularOf(second, before.perpendicular),
    tone: {
      mode: figures.toneMode,
      blackPoint: figures.blackPoint,
      whitePoint: figures.whitePoint,
      gamma: figures.gamma,
    },
    dividingLstar: figures.dividingLstar,
    corners: figures.corners,
    mirror: figures.mirror,
    recipe: recipeOf(figures),
  };
}
