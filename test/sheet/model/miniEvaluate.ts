import type { Cell, ErrorCode } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import type { Operand } from "../../../src/sheet/values/operand.js";
import { isMatrix, matrixOfRows } from "../../../src/sheet/values/operand.js";
import type { Operator } from "../../../src/sheet/values/operate.js";
import { negate, operate, percent } from "../../../src/sheet/values/operate.js";
import { findWorksheetFunction } from "../../../src/sheet/worksheetFunctions/findWorksheetFunction.js";
import type { TextReference } from "./references.js";
import { referencesIn } from "./references.js";

const tokens =
  /\s*(?:("(?:[^"]|"")*")|(#[A-Z/0]+[!?A]?)|((?:(?:'(?:[^']|'')+'|[A-Za-z_][A-Za-z0-9_]*)!)?\$?[A-Z]{1,2}\$?\d+(?::\$?[A-Z]{1,2}\$?\d+)?)|(\d+(?:\.\d+)?)|([A-Z][A-Z.]*)(?=\()|(<>|<=|>=|[-+*/^&=<>%(),]))/y;

type Token = { kind: "text" | "error" | "reference" | "number" | "call" | "symbol"; value: string };

function tokenize(text: string): Token[] {
  const list: Token[] = [];
  tokens.lastIndex = 1;
  while (tokens.lastIndex < text.length) {
    const at = tokens.lastIndex;
    const found = tokens.exec(text);
    if (found === null) {
      throw new Error(`${text} at ${at}`);
    }
    const kinds = ["text", "error", "reference", "number", "call", "symbol"] as const;
    const index = kinds.findIndex((_, each) => found[each + 1] !== undefined);
    list.push({ kind: kinds[index] as Token["kind"], value: found[index + 1] as string });
  }
  return list;
}

/** Binding strength (ISO/IEC 26300-3 section 5.5): ^ before * and /, those before + and -, then &, then comparison. */
const strength: Readonly<Record<string, number>> = {
  "^": 5,
  "*": 4,
  "/": 4,
  "+": 3,
  "-": 3,
  "&": 2,
  "=": 1,
  "<>": 1,
  "<": 1,
  "<=": 1,
  ">": 1,
  ">=": 1,
};

/**
 * A plain evaluator, cell by cell and without any shortcut, for the formulas the property tests write. `read` gives
 * the cell of an already resolved reference.
 */
export function miniEvaluate(
  text: string,
  read: (sheet: string | undefined, row: number, column: number) => Cell,
): Operand {
  const list = tokenize(text);
  let at = 0;

  const next = (): Token => list[at++] as Token;
  const isSymbol = (value: string): boolean => list[at]?.kind === "symbol" && list[at]?.value === value;
  const scalar = (operand: Operand): Cell => (isMatrix(operand) ? operand.at(0, 0) : operand);

  const expression = (least: number): Operand => {
    let left = prefix();
    for (;;) {
      const token = list[at];
      const binding = token?.kind === "symbol" ? strength[token.value] : undefined;
      if (token === undefined || binding === undefined || binding < least) {
        return left;
      }
      at++;
      left = operate(token.value as Operator, scalar(left), scalar(expression(binding + 1)));
    }
  };
  const prefix = (): Operand => {
    if (isSymbol("-")) {
      at++;
      return negate(scalar(prefix()));
    }
    let operand = primary();
    while (isSymbol("%")) {
      at++;
      operand = percent(scalar(operand));
    }
    return operand;
  };
  const primary = (): Operand => {
    const { kind, value } = next();
    switch (kind) {
      case "number":
        return Number(value);
      case "text":
        return value.slice(1, -1).replaceAll('""', '"');
      case "error":
        return new CellError(value as ErrorCode, "", "");
      case "reference":
        return cells(referencesIn(value)[0] as TextReference);
      case "call":
        return call(value);
      default: {
        const inner = expression(0);
        at++;
        return inner;
      }
    }
  };
  const cells = ({ sheet, first, second }: TextReference): Operand => {
    const top = Math.min(first.row, second.row);
    const left = Math.min(first.column, second.column);
    const rows = Array.from({ length: Math.abs(first.row - second.row) + 1 }, (_, row) =>
      Array.from({ length: Math.abs(first.column - second.column) + 1 }, (_, column) =>
        read(sheet, top + row, left + column),
      ),
    );
    return { ...matrixOfRows(rows), reference: true };
  };
  const call = (name: string): Operand => {
    at++;
    const given: Operand[] = [];
    while (!isSymbol(")")) {
      given.push(expression(0));
      at += isSymbol(",") ? 1 : 0;
    }
    at++;
    const called = findWorksheetFunction(name);
    return called === undefined ? new CellError("#NAME?", "", "") : called.call(given);
  };
  return expression(0);
}
