import { CellError } from "../../call/cell.js";

/** The host may refuse to send more, and a reference to a whole column is hardly ever meant. */
const mostRows = 100_000;
const widest = 3;

/** Why an argument of this size is refused; undefined where it is not. */
export function tooLarge(rows: number, columns: number, input: string, called: string): CellError | undefined {
  if (rows <= mostRows && rows * columns <= mostRows * widest) return undefined;
  const size = columns === 1 ? `${rows} rows` : `${rows} x ${columns} cells`;
  const what = rows >= 1_048_576 ? "a whole column of the worksheet" : "more than one call takes";
  return new CellError(
    "#VALUE!",
    `${called}: too large: ${input}`,
    `${called}: ${input} is ${size}, ${what}; give the rows of the table alone, at most ${mostRows}, for example B2:B500.`,
  );
}
