import type { Check } from './check';
import { background } from './checks/background';
import { empty } from './checks/empty';
import { fillIn } from './checks/fill-in';
import { firstFrame } from './checks/first-frame';
import { hairline } from './checks/hairline';
import { missingFont } from './checks/missing-font';
import { outside } from './checks/outside';
import { pinhole } from './checks/pinhole';
import { resolution } from './checks/resolution';
import { sharpTip } from './checks/sharp-tip';
import { speck } from './checks/speck';
import { tonalRange } from './checks/tonal-range';
import { unsafeContent } from './checks/unsafe-content';
import type { Facts } from './facts';
import type { Finding, Severity } from './finding';
import type { Limits } from './limits';

/** All checks, in the order in which they are read. */
export const CHECKS: readonly Check[] = [
  empty,
  outside,
  hairline,
  fillIn,
  speck,
  pinhole,
  resolution,
  tonalRange,
  background,
  missingFont,
  sharpTip,
  unsafeContent,
  firstFrame,
];

const RANK: Record<Severity, number> = { blocker: 0, warning: 1, note: 2 };

/**
 * What the facts mean for the job: the findings, blockers first and otherwise in the order of the checks.
 * Each check compares and words one thing.
 * @param facts what was measured; unchanged
 * @param limits spot and treatment; unchanged
 * @returns findings as data; empty where all is well
 * @example judge(facts of a blank picture, limits)[0].id === 'empty'
 */
export function judge(facts: Facts, limits: Limits): Finding[] {
  return CHECKS.flatMap(({ id, title, check }): Finding[] => {
    const result = check(facts, limits);
    if (!result) return [];
    const { minMm = null, limitMm = null, measured = null, waivable = true } = result;
    return [{ id, title, ...result, minMm, limitMm, measured, waivable }];
  }).sort((a, b) => RANK[a.severity] - RANK[b.severity]);
}
