import { FileProblem } from "../fileProblem.js";

/** No table has more columns; a file that says it has is no table. */
export const mostColumns = 16_384;

export function checkColumnCount(count: number): void {
  if (count <= mostColumns) return;
  const [counted, most] = [count.toLocaleString("en"), mostColumns.toLocaleString("en")];
  throw new FileProblem(
    "too-many-columns",
    `The file describes ${counted} columns, more than the ${most} a table may have.`,
  );
}
