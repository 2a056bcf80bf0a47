import type { OrderFields } from '../../orders/order';
import type { OrderState } from '../../orders/state';
import type { Treatment } from '../../prepare/settings';

/** One order of the demo shop, and how far along its life it is brought. */
export interface DemoOrder {
  title: string;
  /** name of a file in samples/ */
  artwork: string;
  customer: 'registered' | 'walk-in';
  widthMm: number;
  stock: string | null;
  machine: string;
  treatment: Treatment;
  /** power in percent and speed in mm/s, as our designer would type them */
  recipe: [powerPercent: number, speedMmPerS: number];
  dueInDays: number | null;
  state: OrderState;
  fields?: Partial<OrderFields>;
}

/** One order in every state, and a few more where people of the shop look first. All names are invented. */
export const DEMO_ORDERS: readonly DemoOrder[] = [
  {
    title: 'Bread boards with our mark',
    artwork: 'bakery-mark.svg',
    customer: 'registered',
    widthMm: 96,
    stock: 'Cherry board 6 mm',
    machine: 'North bench',
    treatment: 'solid',
    recipe: [62, 45],
    dueInDays: 9,
    state: 'proof-sent',
    fields: { quantity: 6, use: 'touches-food' },
  },
  {
    title: 'The ridge above the valley',
    artwork: 'alpine-photograph.jpg',
    customer: 'registered',
    widthMm: 90,
    stock: 'Birch plywood 4 mm',
    machine: 'North bench',
    treatment: 'halftone',
    recipe: [38, 120],
    dueInDays: 4,
    state: 'released',
  },
  {
    title: 'Shelf labels',
    artwork: 'letterbox.svg',
    customer: 'registered',
    widthMm: 50.8,
    stock: 'Birch plywood 4 mm',
    machine: 'North bench',
    treatment: 'solid',
    recipe: [45, 150],
    dueInDays: 2,
    state: 'running',
    fields: { quantity: 12 },
  },
  {
    title: 'Stamp for paper bags',
    artwork: 'hairline.svg',
    customer: 'registered',
    widthMm: 48,
    stock: 'Birch plywood 4 mm',
    machine: 'North bench',
    treatment: 'solid',
    recipe: [45, 150],
    dueInDays: 6,
    state: 'in-preparation',
  },
  {
    title: 'House sign',
    artwork: 'stamp.png',
    customer: 'walk-in',
    widthMm: 60,
    stock: 'Slate 5 mm',
    machine: 'Long table',
    treatment: 'solid',
    recipe: [55, 320],
    dueInDays: 12,
    state: 'passed',
    fields: { use: 'outdoors' },
  },
  {
    title: 'Still life for the kitchen',
    artwork: 'still-life.png',
    customer: 'walk-in',
    widthMm: 80,
    stock: 'Birch plywood 4 mm',
    machine: 'Long table',
    treatment: 'continuous',
    recipe: [24, 400],
    dueInDays: 7,
    state: 'approved',
    fields: { withoutProof: true },
  },
  {
    title: 'Coasters',
    artwork: 'strokes.svg',
    customer: 'registered',
    widthMm: 70,
    stock: 'Cork sheet 3 mm',
    machine: 'Long table',
    treatment: 'linework',
    recipe: [30, 90],
    dueInDays: 1,
    state: 'finished',
    fields: { quantity: 8 },
  },
  {
    title: 'Door plate',
    artwork: 'stamp.png',
    customer: 'registered',
    widthMm: 45,
    stock: 'Coated aluminium 1 mm',
    machine: 'Long table',
    treatment: 'solid',
    recipe: [40, 300],
    dueInDays: null,
    state: 'handed-over',
  },
  {
    title: 'Box lid',
    artwork: 'colours.png',
    customer: 'registered',
    widthMm: 60,
    stock: 'Oak board 8 mm',
    machine: 'North bench',
    treatment: 'halftone',
    recipe: [50, 120],
    dueInDays: 16,
    state: 'submitted',
  },
  {
    title: 'Grandmother’s tray',
    artwork: 'bakery-mark.svg',
    customer: 'registered',
    widthMm: 96,
    stock: null,
    machine: 'North bench',
    treatment: 'linework',
    recipe: [62, 45],
    dueInDays: 20,
    state: 'on-hold',
  },
  {
    title: 'Market banner',
    artwork: 'banner.svg',
    customer: 'registered',
    widthMm: 120,
    stock: 'Birch plywood 4 mm',
    machine: 'North bench',
    treatment: 'solid',
    recipe: [45, 150],
    dueInDays: null,
    state: 'cancelled',
  },
  {
    title: 'Key fob',
    artwork: 'tiny-type.svg',
    customer: 'registered',
    widthMm: 30,
    stock: 'Vegetable-tanned leather 2.5 mm',
    machine: 'North bench',
    treatment: 'solid',
    recipe: [20, 180],
    dueInDays: null,
    state: 'draft',
  },
];
