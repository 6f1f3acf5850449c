/** What the explanation of a column says besides words. */
export interface Explanation {
  readonly description: string | undefined;
  /** What stands for no value, besides blanks. */
  readonly nullText: string | undefined;
  readonly limits: Limits | undefined;
}

/** A range that the file states; `text` as it is written. */
export interface Limits {
  readonly text: string;
  readonly least: number;
  readonly most: number;
  readonly isLeastOpen: boolean;
  readonly isMostOpen: boolean;
}

const limitsForm = /^([[\]])([^[\]/]*)\/([^[\]/]*)([[\]])\s*/;
/** `?` alone: blanks are no value; `?=-9.9`: so is this. Marks of order follow. */
const nullForm = /^\?(?:=(\S*))?(?:\s*[+-]=?)?(?:\s+|$|;\s*)/;

/**
 * Reads `[0/1]?=-9 Eccentricity (1)`: limits, the mark of values that may be missing, then the description (CDS,
 * Standards for Astronomical Catalogues 2.0, section 3.2.5).
 */
export function readExplanation(text: string): Explanation {
  let rest = text.trim().replace(/^\*\s*/, "");
  const limits = limitsForm.exec(rest);
  if (limits) rest = rest.slice(limits[0].length);
  const missing = nullForm.exec(rest);
  if (missing) rest = rest.slice(missing[0].length);
  return {
    description: rest.trim() || undefined,
    nullText: missing?.[1] || undefined,
    limits: limits ? limitsOf(limits) : undefined,
  };
}

function limitsOf([text, opening, least = "", most = "", closing]: RegExpExecArray): Limits | undefined {
  const ends = [
    least.trim() === "" ? Number.NEGATIVE_INFINITY : Number(least),
    most.trim() === "" ? Number.POSITIVE_INFINITY : Number(most),
  ];
  if (ends.some((end) => Number.isNaN(end))) return undefined;
  const [lower, upper] = ends as [number, number];
  return { text: text.trim(), least: lower, most: upper, isLeastOpen: opening === "]", isMostOpen: closing === "[" };
}

export function isBeyond({ least, most, isLeastOpen, isMostOpen }: Limits, value: number): boolean {
  return value < least || value > most || (isLeastOpen && value === least) || (isMostOpen && value === most);
}
