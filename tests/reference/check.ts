import { test } from 'vitest';

/** Where the expected value comes from: how much weight the check has. */
export const BASES = ['published', 'computed', 'common practice', 'memory'] as const;
export type Basis = (typeof BASES)[number];

export interface ReferenceCheck {
  /** what is held against the source, as a row of the README's table */
  what: string;
  basis: Basis;
  /** paper, standard, handbook, or the program and version that computed the value */
  source: string;
  /** tolerance, in words */
  within?: string;
}

/**
 * A test that holds our result against a source outside this project. The README's table is read from these calls, so
 * the first argument is written out in literals.
 */
export function referenceCheck(
  check: ReferenceCheck,
  fn: () => void | Promise<void>,
  timeoutMs?: number,
): void {
  test(`${check.what} [${check.basis}]`, fn, timeoutMs);
}
