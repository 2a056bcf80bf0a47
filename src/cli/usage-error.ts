/** A command that was typed wrongly: names the option and what it takes. Exit status 2. */
export class UsageError extends Error {
  override readonly name = 'UsageError';
}
