import type { RevisionPlan } from "./planRevision.js";
import { counted } from "./words.js";

/** What the history of a book calls a revision that was applied: "revised 5,000 cells from new.csv". */
export function stepName({ columns }: RevisionPlan, file: string): string {
  const cells = columns.flatMap(({ values, sigmas }) => [values, ...sigmas]);
  return `revised ${counted(
    cells.reduce((sum, { changed }) => sum + changed, 0),
    "cell",
  )} from ${file}`;
}
