export const PAPERS = { a4: { name: 'A4', css: 'A4' }, letter: { name: 'Letter', css: 'letter' } } as const;
export type Paper = keyof typeof PAPERS;

/** Margin on every side of the sheet, mm. */
export const MARGIN_MM = 12;
/** Room that a plate may take on either paper: as wide as the narrower allows, less than half as high. */
const ROOM_WIDTH_MM = 182;
const ROOM_HEIGHT_MM = 112;

/** How many times smaller than life the plate is drawn: 1 where it fits, else the next whole number. */
export function paperScale(widthMm: number, heightMm: number): number {
  return Math.max(1, Math.ceil(widthMm / ROOM_WIDTH_MM), Math.ceil(heightMm / ROOM_HEIGHT_MM));
}

export const scaleWords = (scale: number): string => (scale === 1 ? 'At true size' : `Drawn 1 : ${scale}`);

/** Width of the sheet's broader column, mm. */
const COLUMN_MM = 104;

/** Whether the plate is narrow enough to stand in a column beside the placement, so that most tickets fill one page. */
export function standsInColumn(widthMm: number, heightMm: number): boolean {
  return widthMm / paperScale(widthMm, heightMm) <= COLUMN_MM;
}
