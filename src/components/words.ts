import type { Blank, OrderFields, Placement, Use } from '@/lib/orders/order';
import type { Treatment } from '@/lib/prepare/settings';
import { SHADE_STEPS, type Route } from '@/lib/stock/stock';

export const USE_WORDS: Record<Use, string> = {
  decoration: 'decoration',
  'touches-food': 'touches food',
  'for-a-child': 'for a child',
  outdoors: 'outdoors',
};
export const ROUTE_WORDS: Record<Route, string> = {
  'bare-burn': 'bare burn',
  'darkening-wash': 'darkening wash',
  'paint-fill': 'paint fill',
};
export const TREATMENT_NAMES: Record<Treatment, string> = {
  linework: 'linework',
  solid: 'solid',
  halftone: 'halftone',
  continuous: 'continuous tone',
};
const DATUM_WORDS: Record<Placement['datum'], string> = {
  'top-left': 'top left corner',
  'top-right': 'top right corner',
  'bottom-left': 'bottom left corner',
  'bottom-right': 'bottom right corner',
  centre: 'centre',
};
const OUTLINE_WORDS: Record<Blank['outline'], string> = {
  rectangle: 'rectangle',
  round: 'round',
  own: 'its own outline',
};

const DATE = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'long',
  year: 'numeric',
  timeZone: 'UTC',
});
const TIME = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  hour: '2-digit',
  minute: '2-digit',
  timeZone: 'UTC',
});
const SHORT_DATE = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  year: 'numeric',
  timeZone: 'UTC',
});
const SHORT_TIME = new Intl.DateTimeFormat('en-GB', {
  day: 'numeric',
  month: 'short',
  hour: '2-digit',
  minute: '2-digit',
  timeZone: 'UTC',
});

/** 2026-12-01 is 1 December 2026. */
export const dateWords = (isoDate: string): string => DATE.format(new Date(isoDate));
/** 1 Dec 2026, 15:20 UTC: the same on server and client. */
export const timeWords = (isoTime: string): string => `${TIME.format(new Date(isoTime))} UTC`;

/** 1 Dec 2026, where room is short. */
export const shortDateWords = (isoDate: string): string => SHORT_DATE.format(new Date(isoDate));
/** 1 Dec, 15:20. */
export const shortTimeWords = (isoTime: string): string => SHORT_TIME.format(new Date(isoTime));

/** 84 mm, 84.5 mm: a length without needless decimals. */
export const mmWords = (mm: number): string => String(Number(mm.toFixed(2)));
export const sizeWords = (widthMm: number, heightMm: number): string =>
  `${mmWords(widthMm)} × ${mmWords(heightMm)} mm`;

/** L* 48 is "Chestnut, L* 48"; a target between the steps takes the nearest name. */
export function shadeWords(lstar: number | null): string {
  if (lstar === null) return 'as it comes';
  const nearest = SHADE_STEPS.reduce((best, step) =>
    Math.abs(step.lstar - lstar) < Math.abs(best.lstar - lstar) ? step : best,
  );
  return `${nearest.name}, L* ${lstar}`;
}

export function blankWords(blank: Blank, stockName: string | null): string {
  const made = stockName ?? (blank.source === 'customer' ? 'not identified yet' : 'stock not chosen');
  const size = [blank.widthMm, blank.heightMm, blank.thicknessMm].map(mmWords).join(' × ');
  return `${made}, ${OUTLINE_WORDS[blank.outline]}, ${size} mm, ${blank.side}, ${blank.source === 'shop' ? 'from the shop' : 'the customer’s own'}`;
}

const TURN_WORDS = [
  '',
  ', turned a quarter clockwise',
  ', upside down',
  ', turned a quarter anticlockwise',
] as const;

export function placementWords(placement: Placement): string {
  const { datum, xMm, yMm, quarterTurns, fixture } = placement;
  const apart = xMm === 0 && yMm === 0 ? '' : `, ${mmWords(xMm)} mm to the right and ${mmWords(yMm)} mm down`;
  return `from the ${DATUM_WORDS[datum]}${apart}${TURN_WORDS[quarterTurns]}${fixture ? `; held by ${fixture}` : ''}`;
}

/** What an order says of itself, as pairs to list; what is not said yet is left out. */
export function fieldPairs(fields: OrderFields, stockName: string | null): [string, string][] {
  const { blank, placement, treatment, shadeLstar, route, use, quantity, dueOn, notes, widthMm, heightMm } =
    fields;
  const pairs: [string, string | null][] = [
    ['Size', widthMm !== null && heightMm !== null ? sizeWords(widthMm, heightMm) : null],
    ['Blank', blank && blankWords(blank, stockName)],
    ['Condition', blank?.condition || null],
    ['Placement', placementWords(placement)],
    ['Treatment', treatment && TREATMENT_NAMES[treatment]],
    ['Shade', shadeWords(shadeLstar)],
    ['Route', ROUTE_WORDS[route]],
    ['Use', USE_WORDS[use]],
    ['Quantity', String(quantity)],
    ['Needed by', dueOn && dateWords(dueOn)],
    ['Proof', fields.withoutProof ? 'goes ahead without one' : null],
    ['Notes', notes || null],
  ];
  return pairs.filter((pair): pair is [string, string] => pair[1] !== null);
}
