const FULL: readonly unknown[] = ['ENOSPC', 'EDQUOT', 'SQLITE_FULL'];

/** Whether an error says, itself or through its causes, that there is no room left on the disk. */
export function isDiskFull(error: unknown): boolean {
  if (typeof error !== 'object' || error === null) return false;
  const { code, cause } = error as { code?: unknown; cause?: unknown };
  return FULL.includes(code) || isDiskFull(cause);
}
