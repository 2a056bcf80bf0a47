import type { View } from './view';

export interface Tick {
  xPx: number;
  /** 0 short, 1 middle, 2 long */
  rank: 0 | 1 | 2;
  label: string | null;
}

export interface RuleTicks {
  mm: Tick[];
  lines: Tick[];
  /** whether single scan lines are drawn */
  single: boolean;
}

const CLOSEST_LABEL_PX = 64;
const CLOSEST_TICK_PX = 5;
/** No rule draws more ticks than a screen has room for. */
const MOST_TICKS = 2000;

/** Steps of 1, 2 and 5 times a power of ten. The smallest whose width on screen is at least `leastPx`. */
export function stepFor(pxPerUnit: number, leastPx: number): number {
  const power = 10 ** Math.floor(Math.log10(leastPx / pxPerUnit));
  const found = [1, 2, 5, 10].find((m) => m * power * pxPerUnit >= leastPx * (1 - 1e-9));
  return (found ?? 10) * power;
}

/** Short without trailing zeros: 0.5, 12, 1,200. */
export function plainNumber(value: number): string {
  const [whole, part] = String(Number(value.toFixed(4))).split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+(?!\d))/g, ',');
  return part ? `${grouped}.${part}` : grouped;
}

function span(
  view: View,
  widthPx: number,
  unitMm: number,
  extentMm: number,
): { first: number; last: number } {
  const left = Math.max(0, view.centreXMm - widthPx / 2 / view.pxPerMm);
  const right = Math.min(extentMm, view.centreXMm + widthPx / 2 / view.pxPerMm);
  return { first: Math.ceil(left / unitMm - 1e-9), last: Math.floor(right / unitMm + 1e-9) };
}

function ticksOf(
  view: View,
  widthPx: number,
  unitMm: number,
  extentMm: number,
  describe: (index: number) => { rank: 0 | 1 | 2; label: string | null },
): Tick[] {
  const { first, last } = span(view, widthPx, unitMm, extentMm);
  if (last - first > MOST_TICKS) return [];
  const ticks: Tick[] = [];
  for (let index = first; index <= last; index += 1) {
    ticks.push({ xPx: widthPx / 2 + (index * unitMm - view.centreXMm) * view.pxPerMm, ...describe(index) });
  }
  return ticks;
}

function mmTicks(view: View, widthPx: number, extentMm: number): Tick[] {
  const label = stepFor(view.pxPerMm, CLOSEST_LABEL_PX);
  const small =
    [10, 5, 2].map((parts) => label / parts).find((step) => step * view.pxPerMm >= CLOSEST_TICK_PX) ?? label;
  const perLabel = Math.round(label / small);
  return ticksOf(view, widthPx, small, extentMm, (index) => {
    const labelled = index % perLabel === 0;
    const middle = perLabel === 10 && index % 5 === 0;
    return { rank: labelled ? 2 : middle ? 1 : 0, label: labelled ? plainNumber(index * small) : null };
  });
}

/**
 * The ticks of the rule for what the frame shows: millimetres from the artwork's left edge above the line, scan lines
 * below it: one per ten, a long one per hundred; single lines only where each has 8 px.
 */
export function ruleTicks(view: View, widthPx: number, extentMm: number, pitchMm: number): RuleTicks {
  const linePx = pitchMm * view.pxPerMm;
  const single = linePx >= 8;
  const stride = single ? 1 : linePx * 10 >= 3 ? 10 : 100;
  const labelLines = Math.max(stepFor(linePx, CLOSEST_LABEL_PX), single ? 1 : 10);
  const lines = ticksOf(view, widthPx, pitchMm * stride, extentMm, (index) => {
    const line = index * stride;
    const rank = line % 100 === 0 ? 2 : line % 10 === 0 ? 1 : 0;
    return { rank, label: line % labelLines === 0 ? plainNumber(line) : null };
  });
  return { mm: mmTicks(view, widthPx, extentMm), lines, single };
}
