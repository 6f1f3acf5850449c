import type { Cell } from "../../../call/cell.js";
import { addressText } from "../../../sheet/book/address.js";
import { damaged } from "../../zip/zipProblem.js";
import type { FormulaReading } from "../formula/fileFormula.js";
import { decodeText } from "../xml/xmlText.js";
import type { CellBudget } from "./cellsBuilder.js";
import { daysFrom1900To1904, errorOfText, numberOfText, serialOfIso } from "./cellValue.js";
import type { CellStyle } from "./readStyles.js";

/** A cell as it stands in the XML of a sheet. */
export interface RawCell {
  type: string;
  style: number;
  /** Undefined where there is none, which is not an empty one. */
  value: string | undefined;
  /** Undefined where there is none. */
  formula: string | undefined;
  formulaType: string;
  formulaArea: string;
  sharedIndex: string;
}

/** What the cells of all sheets of a file are read with. */
export interface CellReading extends FormulaReading {
  readonly strings: readonly string[];
  readonly styles: readonly CellStyle[];
  readonly since1904: boolean;
  readonly budget: CellBudget;
}

/** Why a cell holds an error. */
export type ExplainError = (row: number, column: number) => string | undefined;

/** What a cell holds, or what the file says that its formula gave. */
export function cellOfRaw(
  raw: RawCell,
  row: number,
  column: number,
  hasFormula: boolean,
  style: CellStyle,
  reading: CellReading,
  explain: ExplainError,
): Cell {
  const { type, value } = raw;
  if (value === undefined || (value === "" && type !== "str" && type !== "inlineStr")) {
    return null;
  }
  const wrong = () =>
    damaged(
      `the cell ${addressText(row, column)} holds "${value.slice(0, 20)}" as ${kinds[type] ?? "something unknown"}`,
    );
  switch (type) {
    case "n": {
      const number = numberOfText(value);
      if (number === undefined) {
        throw wrong();
      }
      if (typeof number === "string") {
        return hasFormula ? calculated(Number(number), () => explain(row, column)) : number;
      }
      const isDate = style.format.kind === "date" || style.format.kind === "date-time";
      return reading.since1904 && isDate ? number + daysFrom1900To1904 : number;
    }
    case "s": {
      const index = /^\d{1,9}$/.test(value) ? Number(value) : Number.NaN;
      const text = reading.strings[index];
      if (text === undefined) {
        throw wrong();
      }
      return text;
    }
    case "str":
    case "inlineStr":
      return decodeText(value);
    case "b":
      if (!/^(0|1|true|false)$/.test(value)) {
        throw wrong();
      }
      return value === "1" || value === "true";
    case "e":
      return errorOfText(value, () => explain(row, column));
    case "d": {
      const serial = serialOfIso(value);
      if (serial === undefined) {
        throw wrong();
      }
      return serial;
    }
    default:
      throw wrong();
  }
}

/** What a formula gave has no digits of its own to lose. */
function calculated(number: number, explain: () => string | undefined): Cell {
  return Number.isFinite(number) ? number : errorOfText("#NUM!", explain);
}

const kinds: Readonly<Record<string, string>> = {
  n: "a number",
  s: "the number of a text",
  b: "a truth value",
  d: "a date",
};
