// What a command's exit code says to the shell.

export const exitCodes = {
  /** Done; refused and not determinable records are honest results. */
  good: 0,
  /** Faults in the content. */
  faults: 1,
  /** Wrong usage. */
  usage: 2,
  /** Failed otherwise: disk, lock, a mistake of the program. */
  failed: 3,
} as const;
