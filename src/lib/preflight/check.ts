import type { Facts } from './facts';
import type { Finding, FindingId, Place, Severity } from './finding';
import type { Limits } from './limits';

/** One check: it compares what was measured and says what to do. */
export interface Check {
  /** permanent */
  id: FindingId;
  title: string;
  /** null where all is well */
  check(facts: Facts, limits: Limits): CheckResult | null;
}

export interface CheckResult {
  severity: Severity;
  count: number;
  places: Place[];
  minMm?: number | null;
  limitMm?: number | null;
  measured?: Finding['measured'];
  advice: string;
  /** true unless said otherwise */
  waivable?: boolean;
}
