/** A length in the customer's words: two decimals, a third below 0.1 mm. */
export function mm(value: number): string {
  const places = Math.abs(value) < 0.0995 ? 3 : 2;
  return `${Number(value.toFixed(places))} mm`;
}

/** A width to set, mm: rounded up to half a millimetre under 100 mm, to whole ones above, so that it is enough. */
export function roundUpMm(value: number): string {
  const step = value < 20 ? 0.1 : value < 100 ? 0.5 : 1;
  return `${Number((Math.ceil(value / step - 1e-9) * step).toFixed(1))} mm`;
}

/** A count with its noun: "1 place", "12 places". */
export const counted = (count: number, one: string, many = `${one}s`): string =>
  `${count} ${count === 1 ? one : many}`;

/** Names in a row: "A", "A and B", "A, B and C". */
export const listed = (names: readonly string[]): string =>
  names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} and ${names[names.length - 1]}`;
