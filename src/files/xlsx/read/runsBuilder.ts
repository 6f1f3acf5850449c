import type { Run } from "../../../sheet/book/book.js";
import type { Span } from "../../../sheet/book/spans.js";
import { mergeSpans } from "../../../sheet/book/spans.js";
import { sameRun } from "../../../sheet/edit/draft.js";
import { placeFormula } from "../../../sheet/edit/placeFormula.js";
import type { Formula } from "../../../sheet/formula/formula.js";
import { type FormulaReading, fileFormula } from "../formula/fileFormula.js";
import type { RowTemplate } from "../formula/rowTemplate.js";
import { rowTemplate, textInRow } from "../formula/rowTemplate.js";

/** The formulas of a column, from top to bottom. */
export interface RunsBuilder {
  /** A formula by its text in the file. */
  putText(row: number, text: string, isArray: boolean): Formula;
  put(row: number, formula: Formula): void;
  finish(): readonly Run[];
}

/** How many of the last formulas are kept to be recognised again. */
const mostKnown = 4;

interface Known {
  readonly template: RowTemplate;
  readonly isArray: boolean;
  readonly formula: Formula;
}

/**
 * A formula that was filled down stands in the file once a row, with other row numbers. Each text is held against what
 * the formulas above would be in its row, so that a filled column is parsed once.
 */
export function runsBuilder(column: number, reading: FormulaReading): RunsBuilder {
  const runs: { from: number; to: number; readonly formula: Formula }[] = [];
  const known: Known[] = [];

  const put = (row: number, formula: Formula): void => {
    const last = runs.at(-1);
    if (last !== undefined && last.to === row && last.formula === formula) {
      last.to++;
    } else {
      runs.push({ from: row, to: row + 1, formula });
    }
  };
  return {
    put,
    putText(row, text, isArray) {
      const same = known.find((each) => each.isArray === isArray && textInRow(each.template, row) === text);
      const formula = same?.formula ?? fileFormula(text, row, column, isArray, reading);
      if (same === undefined) {
        known.unshift({ template: rowTemplate(text, row), isArray, formula });
        known.length = Math.min(known.length, mostKnown);
      }
      put(row, formula);
      return formula;
    },
    finish() {
      const placed = runs.flatMap(({ from, to, formula }: Span & { formula: Formula }) =>
        placeFormula(formula, column, from, to),
      );
      return mergeSpans(placed, sameRun);
    },
  };
}
