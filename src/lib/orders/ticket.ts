import type { Blank, OrderFields, Placement } from './order';
import { placedSize } from './settings';

const DATUM_WORDS: Record<Placement['datum'], string> = {
  'top-left': 'top left corner',
  'top-right': 'top right corner',
  'bottom-left': 'bottom left corner',
  'bottom-right': 'bottom right corner',
  centre: 'centre',
};

const TURN_WORDS = ['', 'a quarter turn clockwise', 'half a turn', 'a quarter turn anticlockwise'] as const;

/** Millimetres without needless digits. 12.50 gives "12.5 mm". */
export const mmWords = (mm: number): string => `${Number(mm.toFixed(2))} mm`.replace('-', '−');

function offsetWords({ xMm, yMm }: Placement): string {
  const parts = [
    ...(xMm === 0 ? [] : [`${mmWords(Math.abs(xMm))} to the ${xMm > 0 ? 'right' : 'left'}`]),
    ...(yMm === 0 ? [] : [`${mmWords(Math.abs(yMm))} ${yMm > 0 ? 'down' : 'up'}`]),
  ];
  return parts.join(' and ');
}

/**
 * Where the artwork lies, for someone who stands at the machine: "60 × 40 mm. Its centre lies on the blank's centre."
 * @param fields without a size: says that the size is missing
 */
export function placementWords(fields: Pick<OrderFields, 'widthMm' | 'heightMm' | 'placement'>): string {
  const size = placedSize(fields);
  if (!size) return 'The size is missing.';
  const { placement } = fields;
  const datum = DATUM_WORDS[placement.datum];
  const offset = offsetWords(placement);
  const where = offset ? `lies ${offset} from the blank’s ${datum}` : `lies on the blank’s ${datum}`;
  const turn = TURN_WORDS[placement.quarterTurns];
  return [
    `${Number(size.widthMm.toFixed(2))} × ${mmWords(size.heightMm)}.`,
    `The artwork’s ${datum} ${where}.`,
    ...(turn ? [`Turned by ${turn}.`] : []),
    ...(placement.fixture ? [`Held by ${placement.fixture}.`] : []),
  ].join(' ');
}

/** The blank in a line: "Rectangle 100 × 60 × 4 mm, birch plywood, front, grain at 0°, from the shop". */
export function blankWords(blank: Blank, stockName: string | null): string {
  const outline = { rectangle: 'Rectangle', round: 'Round', own: 'Own outline' }[blank.outline];
  return [
    `${outline} ${Number(blank.widthMm.toFixed(2))} × ${Number(blank.heightMm.toFixed(2))} × ${mmWords(blank.thicknessMm)}`,
    stockName ?? 'stock not identified',
    blank.side,
    ...(blank.grainDeg === null ? [] : [`grain at ${Number(blank.grainDeg.toFixed(1))}°`]),
    blank.source === 'shop'
      ? 'from the shop'
      : `the customer’s own, ${blank.spare ? 'with a spare' : 'no spare'}`,
  ].join(', ');
}
