import type { Design } from '@/lib/orders/views';
import type { ChoiceContext } from './context';

/** Dose of a typed recipe in words, before anything is prepared. */
export function recipeOutcome(design: Design, context: ChoiceContext): string {
  const { recipe, scan } = design;
  if (!recipe || !context.machine) return '';
  const watts = (context.machine.wattsAtFull * recipe.powerPercent) / 100;
  return `Dose ${(watts / (recipe.speedMmPerS * scan.linePitchMm)).toFixed(3)} J/mm²`;
}
