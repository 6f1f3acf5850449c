import { CellError } from "../../../call/cell.js";
import type { DefinedName } from "../../../sheet/book/book.js";
import type { Formula } from "../../../sheet/formula/formula.js";
import { formulaText } from "../../../sheet/formula/formula.js";
import type { Functions } from "../../../sheet/formula/functions.js";
import { readFormula } from "../../../sheet/formula/readFormula.js";
import { plainFormula } from "./plainFormula.js";
import { isRange, surveyArrays } from "./surveyArrays.js";
import type { FileTables } from "./tableReferences.js";
import { withoutTables } from "./tableReferences.js";

/** What formulas of a file are read with. */
export interface FormulaReading {
  readonly functions: Functions;
  readonly names: readonly DefinedName[];
  readonly tables: FileTables;
  /** The sheet of the formulas. */
  readonly sheet: string;
}

/**
 * A formula of a cell from its text in a file. A formula stored plainly takes, of a range where one value is wanted, the
 * cell in its own row or column; here ranges are taken whole unless "@" says otherwise, so it gets its "@".
 */
export function fileFormula(
  stored: string,
  row: number,
  column: number,
  isArray: boolean,
  reading: FormulaReading,
): Formula {
  const text = withoutTables(plainFormula(stored), row, reading.sheet, reading.tables);
  const formula = readFormula(text, row, column, reading.functions);
  if (isArray || formula.problem !== undefined) {
    return formula;
  }
  const { ranges } = surveyArrays(formula, (name) => isOneCell(name, reading.names));
  if (ranges.length === 0) {
    return formula;
  }
  const texts = formula.texts.map((text, index) => (ranges.includes(index) ? `${text}@` : text));
  return readFormula(formulaText({ ...formula, texts }, row, column), row, column, reading.functions);
}

/** Whether a defined name stands for one cell or one constant. */
export function isOneCell(name: string, names: readonly DefinedName[]): boolean {
  const upper = name.toUpperCase();
  const formula = names.find((each) => each.name.toUpperCase() === upper)?.formula;
  return formula !== undefined && !formula.references.some(isRange) && !surveyArrays(formula, () => false).needsArray;
}

/** A formula whose text is kept and whose value is an error that says why. */
export function keptFormula(text: string, topic: string, message: string): Formula {
  const value = new CellError("#NAME?", topic, message);
  const tree = { kind: "value", fixed: true, value } as const;
  const problem = { position: 0, code: "#NAME?", topic, message } as const;
  return { key: text, texts: [text], references: [], names: [], tree, positional: false, problem };
}
