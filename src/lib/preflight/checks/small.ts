import type { AreaFacts } from '../facts';
import type { CheckResult } from '../check';

/** Result of a check on islands or holes that are smaller than the spot. */
export function judgeSmall(found: AreaFacts, advice: (count: number) => string): CheckResult | null {
  if (found.count === 0) return null;
  return {
    severity: 'warning',
    count: found.count,
    places: found.places,
    minMm: found.places[0]?.minMm ?? null,
    limitMm: found.limitMm,
    advice: advice(found.count),
  };
}
