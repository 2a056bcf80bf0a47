/** The first order is U-1001: a number that people can say. */
const BEFORE_FIRST = 1000;

/** Number of an order by its place in the books, from 1. */
export const orderNumber = (id: number): string => `U-${BEFORE_FIRST + id}`;

/** Place in the books of a number such as U-1001, or null where it is none. */
export function orderIdOf(number: string): number | null {
  const digits = /^U-([1-9]\d{3,7})$/.exec(number)?.[1];
  const id = digits === undefined ? 0 : Number(digits) - BEFORE_FIRST;
  return id > 0 ? id : null;
}
