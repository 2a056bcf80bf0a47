export interface Ticks {
  /** distance between short ticks, in the rule's own unit */
  short: number;
  /** distance between long ticks; labels stand on these */
  long: number;
}

const MM_STEPS: readonly Ticks[] = [
  { short: 1, long: 10 },
  { short: 5, long: 10 },
  { short: 5, long: 50 },
  { short: 10, long: 50 },
  { short: 10, long: 100 },
  { short: 50, long: 100 },
  { short: 100, long: 500 },
];

/** The finest steps whose short ticks stand at least 4 px and whose labels stand at least 44 px apart. */
export function mmTicks(extentMm: number, widthPx: number): Ticks {
  const px = widthPx / extentMm;
  return MM_STEPS.find((step) => step.short * px >= 4 && step.long * px >= 44) ?? { short: 500, long: 1000 };
}

/** Scan lines: a tick per ten and a long one per hundred, or only the hundreds and thousands where tens would touch. */
export function lineTicks(lines: number, widthPx: number): Ticks {
  const px = widthPx / lines;
  if (10 * px >= 4) return { short: 10, long: 100 };
  return 100 * px >= 4 ? { short: 100, long: 1000 } : { short: 1000, long: 10_000 };
}

/** Positions from 0 up to the extent, with whether each is long. */
export function tickPositions(extent: number, { short, long }: Ticks): { at: number; isLong: boolean }[] {
  const count = Math.floor(extent / short + 1e-9);
  return Array.from({ length: count + 1 }, (_, i) => ({ at: i * short, isLong: (i * short) % long === 0 }));
}
