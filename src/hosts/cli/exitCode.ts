/** How a command ended, for scripts. */
export const exitCode = {
  done: 0,
  /** A formula or a cell has an error. */
  cellError: 1,
  /** The command line cannot be understood; nothing was read or written. */
  usage: 2,
  /** A file cannot be read or written. */
  file: 3,
  /** Values that a file holds are not what its formulas give. */
  changed: 4,
  /** A row crossed a condition that was watched. */
  crossed: 5,
} as const;
