import type { Check } from '../check';
import type { PlacementFacts } from '../facts';
import { listed, mm } from '../words';

/** Overhang that counts as touching, mm. */
const TOUCHING_MM = 0.005;

function overBlank({ beyondBlank, beyondRoundMm }: PlacementFacts): string[] {
  if (beyondRoundMm !== null) {
    return beyondRoundMm > TOUCHING_MM
      ? [`reaches ${mm(beyondRoundMm)} beyond the round edge of the blank`]
      : [];
  }
  if (!beyondBlank) return [];
  const sides = [
    ['left', beyondBlank.leftMm],
    ['right', beyondBlank.rightMm],
    ['top', beyondBlank.topMm],
    ['bottom', beyondBlank.bottomMm],
  ] as const;
  const over = sides.filter(([, by]) => by > TOUCHING_MM).map(([side, by]) => `${mm(by)} on the ${side}`);
  return over.length > 0 ? [`reaches beyond the blank by ${listed(over)}`] : [];
}

function overBed({ beyondBed, runOffMm }: PlacementFacts): string[] {
  if (!beyondBed) return [];
  const axes = [
    ['width', beyondBed.xMm],
    ['height', beyondBed.yMm],
  ] as const;
  const over = axes.filter(([, by]) => by > TOUCHING_MM).map(([axis, by]) => `${mm(by)} in ${axis}`);
  if (over.length === 0) return [];
  const runOff = runOffMm > 0 ? `, with ${mm(runOffMm)} of run-off at each end of a line` : '';
  return [`is larger than the machine’s bed by ${listed(over)}${runOff}`];
}

function worst({ beyondBlank, beyondRoundMm, beyondBed }: PlacementFacts): number {
  const blank = beyondRoundMm ?? Math.max(0, ...Object.values(beyondBlank ?? {}));
  return Math.max(blank, beyondBed?.xMm ?? 0, beyondBed?.yMm ?? 0);
}

/** Artwork that reaches beyond the blank or the machine's bed: cannot be waived. */
export const outside: Check = {
  id: 'outside',
  title: 'Beyond the blank or the bed',
  check({ placement }) {
    const troubles = [...overBlank(placement), ...overBed(placement)];
    if (troubles.length === 0) return null;
    return {
      severity: 'blocker',
      count: troubles.length,
      places: [],
      measured: { value: worst(placement), limit: 0, unit: 'mm' },
      waivable: false,
      advice: `The artwork ${listed(troubles)}. Make it smaller or move it.`,
    };
  },
};
