import type { Machine } from '../machines/machine';
import { sizeAcross, type Spot } from '../machines/spot';
import type { CheckSettings } from '../prepare/pipeline';
import {
  DEFAULT_SCREEN,
  machineRunSchema,
  scanFor,
  settingsSchema,
  stockToneSchema,
  type MachineRun,
  type Settings,
  type StockTone,
  type Treatment,
} from '../prepare/settings';
import type { Stock } from '../stock/stock';
import { placeOnBlank, type Blank, type OrderFields } from './order';
import type { Design } from './views';

/** Size of the artwork as it lies on the blank: width and height change places with an odd number of quarter turns. */
export function placedSize(
  fields: Pick<OrderFields, 'widthMm' | 'heightMm' | 'placement'>,
): { widthMm: number; heightMm: number } | null {
  const { widthMm, heightMm } = fields;
  if (widthMm === null || heightMm === null) return null;
  return fields.placement.quarterTurns % 2 === 0
    ? { widthMm, heightMm }
    : { widthMm: heightMm, heightMm: widthMm };
}

export type BlankLimits = NonNullable<Settings['blank']>;

/** The blank as preflight and the pipeline take it: its outline, and where the artwork lies on it. */
export function blankLimits(
  blank: Blank | null,
  fields: Pick<OrderFields, 'widthMm' | 'heightMm' | 'placement'>,
): BlankLimits | null {
  const size = placedSize(fields);
  if (!blank || !size) return null;
  return {
    outline: blank.outline,
    widthMm: blank.widthMm,
    heightMm: blank.heightMm,
    ...placeOnBlank(blank, fields.placement, size.widthMm, size.heightMm),
  };
}

export const stockTone = (stock: Stock): StockTone => stockToneSchema.parse(stock);
export const machineRun = (machine: Machine): MachineRun => machineRunSchema.parse(machine);

/** What a preparation of an order is made from. */
export interface OrderParts {
  number: string;
  fields: OrderFields;
  design: Design;
  machine: Machine;
  spot: Spot;
  stock: Stock | null;
  typedBy: string;
}

/**
 * Settings of the pipeline for an order: the customer's size and blank, the designer's choices, the shop's machine.
 * @throws RangeError when the order has no size yet
 * @throws ZodError when a choice lies outside what the pipeline takes
 */
export function settingsFor({ number, fields, design, machine, spot, stock, typedBy }: OrderParts): Settings {
  const size = placedSize(fields);
  if (!size) throw new RangeError(`expected an order with a size, got ${number} without one`);
  return settingsSchema.parse({
    ...size,
    quarterTurns: fields.placement.quarterTurns,
    spot: { widthMm: spot.widthMm, heightMm: spot.heightMm, shape: spot.shape },
    firing: machine.firing,
    treatment: design.treatment,
    screen: design.screen,
    scan: design.scan,
    perpendicular: design.perpendicular,
    tone: design.tone,
    dividingLstar: design.dividingLstar,
    corners: design.corners,
    mirror: design.mirror,
    blank: blankLimits(fields.blank, fields),
    stock: stock && stockTone(stock),
    machine: machineRun(machine),
    recipe: design.recipe && { ...design.recipe, typedBy },
    label: number,
  });
}

const FIRST_DIVIDING_LSTAR = 53.4;

/** Settings of the check: the designer's choices where there are some, else the customer's wish on the shop's first machine. */
export function checkSettingsFor(
  fields: OrderFields,
  design: Design | null,
  machine: Machine | null,
  spot: Spot,
): CheckSettings {
  const size = placedSize(fields);
  return {
    widthMm: size?.widthMm ?? null,
    heightMm: size?.heightMm ?? null,
    quarterTurns: fields.placement.quarterTurns,
    spot: { widthMm: spot.widthMm, heightMm: spot.heightMm, shape: spot.shape },
    firing: machine?.firing ?? 'swept',
    directionDeg: design?.scan.directionDeg ?? 0,
    linePitchMm: design?.scan.linePitchMm ?? null,
    treatment: design?.treatment ?? fields.treatment,
    dividingLstar: design?.dividingLstar ?? FIRST_DIVIDING_LSTAR,
    blank: blankLimits(fields.blank, fields),
    machine: machine && machineRun(machine),
  };
}

/**
 * The choices that a designer starts from: pitch ratio 1 at 0°, one pass, tones scaled into what the stock can show, the
 * customer's treatment or the suggested one.
 */
export function firstDesign(
  ids: { machineId: number; spotPresetId: number },
  spot: Spot,
  treatment: Treatment,
): Design {
  return {
    ...ids,
    treatment,
    screen: DEFAULT_SCREEN,
    scan: scanFor(spot, 0),
    perpendicular: null,
    tone: { mode: 'scaled', blackPoint: 0, whitePoint: 1, gamma: 1 },
    dividingLstar: FIRST_DIVIDING_LSTAR,
    corners: 'kept',
    mirror: false,
    recipe: null,
  };
}

/** Pitch ratio of a design on a spot: under 1 lines overlap, over 1 they part. */
export const pitchRatio = (design: Pick<Design, 'scan'>, spot: Spot): number =>
  design.scan.linePitchMm / sizeAcross(spot, design.scan.directionDeg);
