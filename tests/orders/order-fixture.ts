import type { Blank, OrderFields } from '@/lib/orders/order';

export const blank = (over: Partial<Blank> = {}): Blank => ({
  outline: 'rectangle',
  widthMm: 100,
  heightMm: 80,
  thicknessMm: 4,
  stockId: 1,
  side: 'front',
  grainDeg: 0,
  source: 'shop',
  condition: '',
  spare: false,
  ...over,
});

export const fields = (over: Partial<OrderFields> = {}): OrderFields => ({
  title: 'Sign',
  quantity: 1,
  dueOn: null,
  widthMm: 60,
  heightMm: 40,
  blank: blank(),
  placement: { datum: 'centre', xMm: 0, yMm: 0, quarterTurns: 0, fixture: '' },
  treatment: 'solid',
  shadeLstar: null,
  route: 'bare-burn',
  use: 'decoration',
  notes: '',
  withoutProof: false,
  ...over,
});
