import type { z } from 'zod';
import { AppError } from '../errors';

/** First complaint of each field, by its path with dots. */
function complaints(error: z.ZodError): Record<string, string> {
  const fields: Record<string, string> = {};
  for (const issue of error.issues) fields[issue.path.join('.') || 'form'] ??= issue.message;
  return fields;
}

/** Reads what a person sent through its schema; throws `malformed` with a complaint for every field that does not fit. */
export function parseGiven<T extends z.ZodType>(schema: T, given: unknown): z.output<T> {
  const parsed = schema.safeParse(given);
  if (!parsed.success)
    throw new AppError('malformed', { fields: complaints(parsed.error) }, { cause: parsed.error });
  return parsed.data;
}
