import type { DelimitedTable } from "../../files/delimited/delimitedTable.js";
import type { CellProblem } from "../../sheet/book/listProblems.js";
import type { FilledTable } from "./fillTable.js";

/** What was done in one line, then each distinct problem once. */
export function fillSummary(table: DelimitedTable, { added, problems }: FilledTable): string {
  const distinct = mergeProblems(problems);
  const cells = distinct.reduce((sum, { count }) => sum + count, 0);
  const names = added.map(({ header, letters }) => `${letters} ${header}`).join(", ");
  const attention =
    cells === 0 ? "no cell needs attention" : `${counted(cells, "cell")} ${cells === 1 ? "needs" : "need"} attention`;
  const summary = `${counted(table.rows, "row")}; ${counted(added.length, "column")} added (${names}); ${attention}.\n`;
  return summary + distinct.map(problemLine).join("");
}

function problemLine({ address, code, count, message }: CellProblem): string {
  const others = count === 1 ? "" : ` and ${counted(count - 1, "cell")} more`;
  return `  ${address}${others}: ${code} ${message}\n`;
}

/** One problem can spoil several columns, each of which passes the same error on. */
function mergeProblems(problems: readonly CellProblem[]): CellProblem[] {
  const merged = new Map<string, CellProblem>();
  for (const problem of problems) {
    const key = `${problem.code} ${problem.topic}`;
    const known = merged.get(key);
    merged.set(key, known ? { ...known, count: known.count + problem.count } : problem);
  }
  return [...merged.values()];
}

function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}
