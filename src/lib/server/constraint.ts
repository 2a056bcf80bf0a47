import { AppError, type RefusalCode } from './errors';

type Constraint = 'SQLITE_CONSTRAINT_UNIQUE' | 'SQLITE_CONSTRAINT_FOREIGNKEY';

/** Runs a statement; what the database refuses by a constraint becomes a sentence for the person who asked. */
export async function refuseOn<T>(
  constraint: Constraint,
  code: RefusalCode,
  work: () => Promise<T>,
): Promise<T> {
  try {
    return await work();
  } catch (error) {
    if (error instanceof Error && 'code' in error && error.code === constraint)
      throw new AppError(code, {}, { cause: error });
    throw error;
  }
}
