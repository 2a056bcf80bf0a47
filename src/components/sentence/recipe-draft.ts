import type { Design } from '@/lib/orders/views';

export type Recipe = NonNullable<Design['recipe']>;

/** Figures as they are being typed; null where nothing is typed yet. */
export interface RecipeDraft {
  powerPercent: number | null;
  speedMmPerS: number | null;
  secondPowerPercent: number | null;
  secondSpeedMmPerS: number | null;
  focusOffsetMm: number | null;
}

export function draftOf(recipe: Design['recipe']): RecipeDraft {
  return {
    powerPercent: recipe?.powerPercent ?? null,
    speedMmPerS: recipe?.speedMmPerS ?? null,
    secondPowerPercent: recipe?.perpendicular?.powerPercent ?? null,
    secondSpeedMmPerS: recipe?.perpendicular?.speedMmPerS ?? null,
    focusOffsetMm: recipe?.focusOffsetMm ?? 0,
  };
}

const within = (value: number | null, least: number, most: number): value is number =>
  value !== null && value >= least && value <= most;

/** The recipe once every figure that its passes need is typed and in range; null until then. Nothing is filled in. */
export function completeRecipe(
  draft: RecipeDraft,
  perpendicular: Design['perpendicular'],
  fastestMmPerS: number,
): Recipe | null {
  const { powerPercent, speedMmPerS, secondPowerPercent, secondSpeedMmPerS, focusOffsetMm } = draft;
  if (
    !within(powerPercent, 1, 100) ||
    !within(speedMmPerS, 0.1, fastestMmPerS) ||
    !within(focusOffsetMm, -20, 50)
  )
    return null;
  if (!perpendicular) return { powerPercent, speedMmPerS, focusOffsetMm, perpendicular: null };
  if (!within(secondPowerPercent, 1, 100) || !within(secondSpeedMmPerS, 0.1, fastestMmPerS)) return null;
  return {
    powerPercent,
    speedMmPerS,
    focusOffsetMm,
    perpendicular: { powerPercent: secondPowerPercent, speedMmPerS: secondSpeedMmPerS },
  };
}
