import type { Finding } from '@/lib/preflight/finding';

/** The finding in the customer's measure: "Too thin by 0.04 mm", or what was measured instead. */
export function shortfallWords(finding: Finding): string {
  const { id, minMm, limitMm, measured } = finding;
  if (minMm !== null && limitMm !== null && limitMm > minMm) {
    const by = `${(limitMm - minMm).toFixed(2)} mm`;
    if (id === 'fill-in') return `Gap too narrow by ${by}`;
    if (id === 'speck' || id === 'pinhole') return `Too small by ${by}`;
    return `Too thin by ${by}`;
  }
  if (!measured) return '';
  const value = `${Number(measured.value.toFixed(2))} ${measured.unit}`;
  return measured.limit === null
    ? value
    : `${value}, asked for ${Number(measured.limit.toFixed(2))} ${measured.unit}`;
}

export function countWords(count: number): string {
  return count === 1 ? '1 place' : `${count.toLocaleString('en-GB')} places`;
}

const RANK = { blocker: 0, warning: 1, note: 2 } as const;

/** Findings as they are read: gravest first, then from the top of the artwork. */
export function inReadingOrder(findings: readonly Finding[]): Finding[] {
  const top = (finding: Finding) => finding.places[0]?.yMm ?? -1;
  return [...findings].sort((a, b) => RANK[a.severity] - RANK[b.severity] || top(a) - top(b));
}
