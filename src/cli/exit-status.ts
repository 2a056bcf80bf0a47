/** What the command line ends with. */
export const EXIT = {
  fine: 0,
  blockers: 1,
  wrongUsage: 2,
  unreadable: 3,
  /** the disk is full, a folder may not be written: no fault of the artwork or of the command */
  trouble: 4,
} as const;
export type ExitStatus = (typeof EXIT)[keyof typeof EXIT];
