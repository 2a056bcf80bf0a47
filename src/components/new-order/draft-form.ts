import type { CheckReport } from '@/lib/prepare/report';
import {
  orderFieldsSchema,
  type Blank,
  type OrderFields,
  type OrderPatch,
  type Placement,
  type Use,
} from '@/lib/orders/order';
import type { Treatment } from '@/lib/prepare/settings';
import type { Route } from '@/lib/stock/stock';

/** What the form holds: an order's fields, where anything may still be missing. */
export interface DraftForm {
  title: string;
  quantity: number | null;
  /** ISO date or empty */
  dueOn: string;
  widthMm: number | null;
  heightMm: number | null;
  blank: {
    outline: Blank['outline'];
    widthMm: number | null;
    heightMm: number | null;
    thicknessMm: number | null;
    stockId: number | null;
    side: Blank['side'];
    grainDeg: number | null;
    source: Blank['source'];
    condition: string;
    spare: boolean;
  };
  placement: Placement;
  treatment: Treatment | null;
  shadeLstar: number | null;
  route: Route;
  use: Use;
  notes: string;
  withoutProof: boolean;
}

export const EMPTY_FORM: DraftForm = {
  title: '',
  quantity: 1,
  dueOn: '',
  widthMm: null,
  heightMm: null,
  blank: {
    outline: 'rectangle',
    widthMm: null,
    heightMm: null,
    thicknessMm: null,
    stockId: null,
    side: 'front',
    grainDeg: null,
    source: 'shop',
    condition: '',
    spare: false,
  },
  placement: { datum: 'centre', xMm: 0, yMm: 0, quarterTurns: 0, fixture: '' },
  treatment: null,
  shadeLstar: null,
  route: 'bare-burn',
  use: 'decoration',
  notes: '',
  withoutProof: false,
};

export function formOf(fields: OrderFields): DraftForm {
  return { ...fields, dueOn: fields.dueOn ?? '', blank: fields.blank ?? EMPTY_FORM.blank };
}

/** What of the form can be kept as it stands; a field that does not fit yet is left out, never bent. */
export function patchOf(form: DraftForm): OrderPatch {
  const candidates: Record<string, unknown> = {
    ...form,
    dueOn: form.dueOn === '' ? null : form.dueOn,
    blank: blankIsEmpty(form.blank) ? null : form.blank,
  };
  const kept = Object.entries(orderFieldsSchema.shape).flatMap(([name, schema]) => {
    const parsed = schema.safeParse(candidates[name]);
    return parsed.success ? [[name, parsed.data] as const] : [];
  });
  return Object.fromEntries(kept) as OrderPatch;
}

/** Only what differs from what the server already has. */
export function changesSince(patch: OrderPatch, known: OrderFields): OrderPatch {
  const changed = Object.entries(patch).filter(
    ([name, value]) => JSON.stringify(value) !== JSON.stringify(known[name as keyof OrderFields]),
  );
  return Object.fromEntries(changed) as OrderPatch;
}

function blankIsEmpty(blank: DraftForm['blank']): boolean {
  return (
    blank.widthMm === null && blank.heightMm === null && blank.thicknessMm === null && blank.stockId === null
  );
}

/** Width ÷ height of the artwork before quarter turns; null until it has been read. */
export function aspectOf(check: CheckReport | null): number | null {
  if (!check) return null;
  const { ownWidthMm, ownHeightMm, widthPx, heightPx } = check.artwork;
  return ownWidthMm !== null && ownHeightMm !== null ? ownWidthMm / ownHeightMm : widthPx / heightPx;
}

export interface Size {
  widthMm: number | null;
  heightMm: number | null;
}

const toHundredth = (mm: number): number => Math.round(mm * 100) / 100;

/**
 * Both sides after one was entered. With the proportions locked the other side follows; emptied, both are.
 * lockedSize('width', 84, 1.4) gives 84 × 60
 */
export function lockedSize(side: 'width' | 'height', valueMm: number | null, aspect: number): Size {
  if (valueMm === null) return { widthMm: null, heightMm: null };
  return side === 'width'
    ? { widthMm: valueMm, heightMm: toHundredth(valueMm / aspect) }
    : { widthMm: toHundredth(valueMm * aspect), heightMm: valueMm };
}

/** The smallest sound width as something to enter: up to the next 0.1 mm, so that it is never under. 92.31 gives 92.4 */
export function soundWidth(smallestSoundWidthMm: number): number {
  return Math.ceil(smallestSoundWidthMm * 10 - 1e-6) / 10;
}

/** What still keeps the order from being submitted and can be said by the form alone, in its order. */
export function missingWords(form: DraftForm, hasArtwork: boolean): string[] {
  const { blank } = form;
  const words: string[] = [];
  if (!hasArtwork) words.push('The artwork. Drop it at the top of this page.');
  if (form.widthMm === null || form.heightMm === null) words.push('The size of the engraving.');
  if (blank.widthMm === null || blank.heightMm === null || blank.thicknessMm === null)
    words.push('The size of the blank.');
  if (blank.stockId === null && blank.source === 'shop') words.push('What the blank is made of.');
  if (form.quantity === null) words.push('How many pieces.');
  return words;
}
