import type { z } from 'zod';

/** Reads a column of JSON through its schema: what an older version wrote is brought up to date or refused here. */
export function decode<T extends z.ZodType>(schema: T, column: string): z.output<T> {
  return schema.parse(JSON.parse(column));
}
