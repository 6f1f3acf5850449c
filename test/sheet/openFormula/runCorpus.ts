import { describe, expect, it } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import type { Operand } from "../../../src/sheet/values/operand.js";
import { isMatrix } from "../../../src/sheet/values/operand.js";
import type { FormulaCase } from "./readCases.js";
import { readCases } from "./readCases.js";

export const corpusFiles = [
  "operators.txt",
  "mathematics.txt",
  "statistics.txt",
  "distributions.txt",
  "lookup.txt",
  "text.txt",
  "dates.txt",
  "logical.txt",
  "arrays.txt",
  "engineering.txt",
];

/** What a formula is worth that stands beside the cells. */
export type Evaluate = (cells: FormulaCase["cells"], formula: string) => Operand;

/** The corpus as tests of one evaluator. */
export function runCorpus(evaluator: string, evaluate: Evaluate): void {
  for (const file of corpusFiles) {
    describe(`${evaluator}: ${file}`, () => {
      const cases = readCases(file);
      it.each(cases.map((each) => [`${each.section} ${each.formula}`, each] as const))("%s", (_, each) => {
        const result = evaluate(each.cells, each.formula);
        expectCells(result, each);
      });
    });
  }
}

function expectCells(result: Operand, { expected, tolerance }: FormulaCase): void {
  const rows = isMatrix(result) ? result.rows : 1;
  const columns = isMatrix(result) ? result.columns : 1;
  expect([rows, columns]).toEqual([expected.length, expected[0]?.length]);
  const shown = expected.map((row, r) =>
    row.map((cell, c) => compared(isMatrix(result) ? result.at(r, c) : result, cell, tolerance)),
  );
  expect(shown).toEqual(expected.map((row) => row.map(plain)));
}

/** The expected number where the result is as near as it has to be, else the result. */
function compared(result: Cell, expected: Cell, tolerance: number): unknown {
  const near =
    typeof result === "number" &&
    typeof expected === "number" &&
    Math.abs(result - expected) <= tolerance * Math.abs(expected);
  return near ? plain(expected) : plain(result);
}

function plain(cell: Cell): unknown {
  return cell instanceof CellError ? cell.code : cell === 0 ? 0 : cell;
}
