import { columnLetters } from "../../sheet/book/address.js";
import type { CellProblem } from "../../sheet/book/listProblems.js";
import type { FilledColumn, FilledTable } from "./fillTable.js";
import type { SheetTable } from "./tableBook.js";

/** What to know of the columns added, what was done in one line, then each distinct problem once. */
export function fillSummary(table: SheetTable, { added, problems, doubts }: FilledTable): string {
  const distinct = mergeProblems(problems);
  const cells = distinct.reduce((sum, { count }) => sum + count, 0);
  const names = added.map(({ header, letters }) => `${letters} "${header}"`).join(", ");
  const attention =
    cells === 0 ? "no cell needs attention" : `${counted(cells, "cell")} ${cells === 1 ? "needs" : "need"} attention`;
  const summary = `${counted(table.rows, "row")}; ${counted(added.length, "column")} added (${names}); ${attention}.`;
  const units = table.unitsRow
    ? ["Row 2 was read as a row of units, so formulas are those of row 3; --units-row no reads it as data."]
    : [];
  return [...units, ...twiceNamed(table, added), ...doubts, summary, ...distinct.map(problemLine)]
    .map((line) => `${line}\n`)
    .join("");
}

function twiceNamed(table: SheetTable, added: readonly FilledColumn[]): string[] {
  return added.flatMap(({ header, letters }, index) => {
    const earlier = table.header.indexOf(header);
    const before =
      earlier >= 0 ? columnLetters(earlier) : added.slice(0, index).find((one) => one.header === header)?.letters;
    return before === undefined
      ? []
      : [`The header "${header}" of column ${letters} stands over column ${before} already.`];
  });
}

function problemLine({ address, code, count, message }: CellProblem): string {
  const others = count === 1 ? "" : ` and ${counted(count - 1, "more cell")}`;
  return `  ${address}${others}: ${code} ${message}`;
}

/** One problem can spoil several columns, each of which passes the same error on. */
function mergeProblems(problems: readonly CellProblem[]): CellProblem[] {
  const merged = new Map<string, CellProblem>();
  for (const problem of problems) {
    const key = `${problem.code} ${problem.topic} ${problem.message}`;
    const known = merged.get(key);
    merged.set(key, known ? { ...known, count: known.count + problem.count } : problem);
  }
  return [...merged.values()];
}

function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}
