import type { AstExpression } from "@borgar/fx";
import { parse, parseA1Ref, toCol, tokenize } from "@borgar/fx";
import type { Cell, ErrorCode } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import type { Operand } from "../../../src/sheet/values/operand.js";
import { buildMatrix, isMatrix, matrixOfRows } from "../../../src/sheet/values/operand.js";
import type { Operator } from "../../../src/sheet/values/operate.js";
import { negate, percent } from "../../../src/sheet/values/operate.js";
import { elementAt, operateOperands } from "../../../src/sheet/values/operateOperands.js";
import { toLogical } from "../../../src/sheet/values/toLogical.js";
import { findWorksheetFunction } from "../../../src/sheet/worksheetFunctions/findWorksheetFunction.js";

/** Cells by their address in capital letters, "A1" or "Sheet2!A1": a value, or a formula that begins with "=". */
export type NaiveCells = ReadonlyMap<string, Cell | { readonly formula: string }>;

/**
 * What a cell is worth, worked out afresh from the cells it looks at: no order, no memory, no spilling. A cell that
 * depends on itself is #VALUE!. The model against which the engine is tested, so kept as plain as can be.
 */
export function naiveEvaluate(cells: NaiveCells, address: string): Operand {
  return evaluateCell(cells, address, []);
}

/** A formula that stands in no cell. */
export function naiveFormula(cells: NaiveCells, formula: string): Operand {
  return evaluate(tree(formula), { cells, busy: [], names: new Map() });
}

interface Scope {
  readonly cells: NaiveCells;
  /** Addresses that are being worked out. */
  readonly busy: readonly string[];
  readonly names: ReadonlyMap<string, Operand>;
}

function tree(formula: string): AstExpression {
  return parse(tokenize(formula)) as AstExpression;
}

function evaluateCell(cells: NaiveCells, address: string, busy: readonly string[]): Operand {
  const content = cells.get(address) ?? null;
  if (typeof content !== "object" || content === null || content instanceof CellError) {
    return content;
  }
  if (busy.includes(address)) {
    return problem("#VALUE!", `${address} depends on itself`);
  }
  return evaluate(tree(content.formula), { cells, busy: [...busy, address], names: new Map() });
}

function problem(code: ErrorCode, message: string): CellError {
  return new CellError(code, message, message);
}

function evaluate(node: AstExpression, scope: Scope): Operand {
  switch (node.type) {
    case "Literal":
      return node.value as Cell;
    case "ErrorLiteral":
      return problem(node.value as ErrorCode, node.value);
    case "ArrayExpression":
      return matrixOfRows(node.elements.map((row) => row.map((each) => evaluate(each, scope) as Cell)));
    case "ReferenceIdentifier":
      return scope.names.get(node.value.toUpperCase()) ?? reference(node.value, scope);
    case "UnaryExpression":
      return unary(node.operator, evaluate(node.arguments[0] as AstExpression, scope));
    case "BinaryExpression": {
      const [left, right] = node.arguments.map((each) => evaluate(each as AstExpression, scope));
      return operateOperands(node.operator as Operator, left as Operand, right as Operand);
    }
    case "LetExpression": {
      const names = new Map(scope.names);
      for (const { id, init } of node.declarations) {
        names.set(id.name.toUpperCase(), evaluate(init as AstExpression, { ...scope, names }));
      }
      return evaluate(node.body as AstExpression, { ...scope, names });
    }
    case "CallExpression":
      return call(node.callee.name.toUpperCase(), node.arguments as (AstExpression | null)[], scope);
    default:
      return problem("#NAME?", `${node.type} is not known`);
  }
}

function call(name: string, given: readonly (AstExpression | null)[], scope: Scope): Operand {
  const known = findWorksheetFunction(name);
  if (!known) {
    return problem("#NAME?", `${name} is not known`);
  }
  // IF works out one of its values only: the other may lead back to this very cell.
  const condition = name === "IF" && given[0] ? evaluate(given[0], scope) : undefined;
  const choice =
    condition === undefined || isLarge(condition) ? undefined : toLogical(elementAt(condition, 0, 0), "IF");
  const skipped = choice === true ? 2 : choice === false ? 1 : -1;
  return known.call(
    given.map((each, index) => (each === null ? undefined : index === skipped ? 0 : evaluate(each, scope))),
  );
}

const isLarge = (operand: Operand) => isMatrix(operand) && (operand.rows > 1 || operand.columns > 1);

function unary(operator: string, operand: Operand): Operand {
  const apply = (cell: Cell): Cell => (operator === "-" ? negate(cell) : operator === "%" ? percent(cell) : cell);
  return isMatrix(operand)
    ? operator === "+"
      ? operand
      : buildMatrix(operand.rows, operand.columns, (row, column) => apply(operand.at(row, column)))
    : apply(operand);
}

function reference(text: string, scope: Scope): Operand {
  const parsed = parseA1Ref(text);
  const range = parsed && "range" in parsed ? parsed.range : undefined;
  if (!parsed || !range) {
    return problem("#NAME?", `${text} is not known`);
  }
  const sheet = "context" in parsed && parsed.context?.[0] ? `${String(parsed.context[0]).toUpperCase()}!` : "";
  const top = range.top ?? 0;
  const left = range.left ?? 0;
  const rows = (range.bottom ?? lastRow(scope.cells)) - top + 1;
  const columns = (range.right ?? left) - left + 1;
  const values = Array.from({ length: rows }, (_, row) =>
    Array.from({ length: columns }, (__, column) => {
      const value = evaluateCell(scope.cells, `${sheet}${toCol(left + column)}${top + row + 1}`, scope.busy);
      return isMatrix(value) ? value.at(0, 0) : value;
    }),
  );
  return { ...matrixOfRows(values), reference: true };
}

function lastRow(cells: NaiveCells): number {
  return Math.max(0, ...[...cells.keys()].map((address) => Number(/\d+$/.exec(address)?.[0]) - 1));
}
