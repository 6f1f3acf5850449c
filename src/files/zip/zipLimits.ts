/** What a zip file may grow to. A file beyond a limit is refused before or while it is unpacked. */
export interface ZipLimits {
  /** All parts that are unpacked, together [byte]. */
  readonly mostBytes: number;
  /** Unpacked over packed size, for a part beyond `smallBytes`. */
  readonly mostRatio: number;
  /** A part up to this size may have any ratio [byte]. */
  readonly smallBytes: number;
  readonly mostEntries: number;
}

/**
 * A million rows by 25 columns of numbers unpack to about 1 GB; the XML of sheets shrinks 5 to 40 times, of equal cells
 * up to 150 times (measured), a file made to exhaust memory a thousand times.
 */
export const zipLimits: ZipLimits = {
  mostBytes: 2 ** 31,
  mostRatio: 250,
  smallBytes: 2 ** 24,
  mostEntries: 4_000,
};
