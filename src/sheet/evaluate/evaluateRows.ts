import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import type { RowArgument } from "../../call/cellFunction.js";
import type { Column } from "../../call/column.js";
import { cellAt } from "../../call/column.js";
import type { Node, Parameters } from "../formula/node.js";
import { resolveBound } from "../formula/reference.js";
import type { Operand } from "../values/operand.js";
import { negate, percent } from "../values/operate.js";
import { operateOperands } from "../values/operateOperands.js";
import { addressOf, argumentOf, evaluateCell, mapOperand } from "./evaluateCell.js";
import { mathOverColumn } from "./mathOverColumn.js";
import type { Side } from "./operateColumns.js";
import { cellByCell, operateColumns, sideAt } from "./operateColumns.js";
import type { Rows } from "./rows.js";
import { gatherRows, rowAt, scalarOf } from "./rows.js";
import { runningSum } from "./runningSum.js";
import type { Stretch } from "./stretch.js";

/** What a formula's tree is worth in every row of a stretch: the same bits as `evaluateCell` row by row. */
export function evaluateRows(node: Node, stretch: Stretch): Rows {
  if (node.fixed) {
    return { kind: "same", operand: evaluateCell(node, stretch, stretch.from) };
  }
  switch (node.kind) {
    case "reference":
      return referenceRows(node, stretch);
    case "unary":
      return node.operator === "@" ? eachRow(node, stretch) : unaryRows(node, stretch);
    case "binary":
      return binaryRows(node, stretch);
    case "choice":
      return choiceRows(node, stretch);
    case "own":
      return ownRows(node, stretch);
    case "worksheet":
      return worksheetRows(node, stretch);
    case "shared": {
      const known = stretch.shared.get(node) ?? evaluateRows(node.value, stretch);
      stretch.shared.set(node, known);
      return known;
    }
    default:
      return eachRow(node, stretch);
  }
}

function eachRow(node: Node, stretch: Stretch): Rows {
  return { kind: "each", at: (row) => evaluateCell(node, stretch, stretch.from + row) };
}

function referenceRows(node: Extract<Node, { kind: "reference" }>, stretch: Stretch): Rows {
  const { world, formula, from, to, column } = stretch;
  const reference = formula.references[node.index];
  if (reference === undefined || reference.whole !== undefined) {
    return eachRow(node, stretch);
  }
  const { top, bottom } = reference;
  const sheet = reference.sheet === undefined ? stretch.sheet : world.sheetIndex(reference.sheet);
  if (top.fixed || bottom.fixed || top.at !== bottom.at || sheet < 0 || from + top.at < 0) {
    return eachRow(node, stretch);
  }
  const a = resolveBound(reference.left, column);
  const b = resolveBound(reference.right, column);
  const left = Math.min(a, b);
  const columns = Array.from({ length: Math.abs(a - b) + 1 }, (_, index) =>
    world.slice(sheet, left + index, from + top.at, to + top.at),
  );
  return columns.length === 1
    ? { kind: "column", column: columns[0] as Column, reference: true }
    : { kind: "columns", columns, ragged: false };
}

/** Rows as one side of an operator, where they are a cell a row. */
function sideOf(rows: Rows): Side | undefined {
  if (rows.kind === "column") {
    return rows.column;
  }
  const same = rows.kind === "same" ? scalarOf(rows.operand) : undefined;
  return same === undefined ? undefined : { same };
}

function unaryRows(node: Extract<Node, { kind: "unary" }>, stretch: Stretch): Rows {
  const operand = evaluateRows(node.operand, stretch);
  if (node.operator === "+") {
    return operand;
  }
  const change = node.operator === "-" ? negate : percent;
  if (operand.kind !== "column") {
    return { kind: "each", at: (row) => mapOperand(rowAt(operand, row), change) };
  }
  const { column } = operand;
  return computed(cellByCell(column.length, (row) => change(cellAt(column, row))));
}

function computed(column: Column): Rows {
  return { kind: "column", column, reference: false };
}

function binaryRows(node: Extract<Node, { kind: "binary" }>, stretch: Stretch): Rows {
  const left = evaluateRows(node.left, stretch);
  const right = evaluateRows(node.right, stretch);
  const a = sideOf(left);
  const b = sideOf(right);
  if (a !== undefined && b !== undefined) {
    return computed(operateColumns(node.operator, a, b, stretch.to - stretch.from));
  }
  return { kind: "each", at: (row) => operateOperands(node.operator, rowAt(left, row), rowAt(right, row)) };
}

/** IF, IFERROR, IFNA: all arguments over all rows, then in every row the one that counts. */
function choiceRows(node: Extract<Node, { kind: "choice" }>, stretch: Stretch): Rows {
  const [first, ...rest] = node.parameters;
  const given = first && sideOf(evaluateRows(first, stretch));
  if (given === undefined) {
    return eachRow(node, stretch);
  }
  return node.name === "IF" ? ifRows(node, given, rest, stretch) : insteadRows(node, given, rest[0], stretch);
}

type ChoiceNode = Extract<Node, { kind: "choice" }>;

function ifRows(node: ChoiceNode, given: Side, branches: Parameters, stretch: Stretch): Rows {
  const rows = branches.map((each) => each && evaluateRows(each, stretch));
  const count = stretch.to - stretch.from;
  const slow = (row: number): Operand => evaluateCell(node, stretch, stretch.from + row);
  const branchAt = (row: number): 0 | 1 | undefined => {
    const condition = sideAt(given, row);
    const truth = typeof condition === "number" ? condition !== 0 : condition;
    return truth === true ? 0 : truth === false ? 1 : undefined;
  };
  const sides = rows.map((each) => each && sideOf(each));
  const asCells = sides.every((each) => each !== undefined);
  const cellOf = (row: number): Cell => {
    const branch = branchAt(row);
    const side = branch === undefined ? undefined : sides[branch];
    return side === undefined ? (scalarOf(slow(row)) as Cell) : sideAt(side, row);
  };
  const at = (row: number): Operand => {
    const branch = branchAt(row);
    const chosen = branch === undefined ? undefined : rows[branch];
    return chosen === undefined ? slow(row) : rowAt(chosen, row);
  };
  return asCells ? computed(cellByCell(count, cellOf)) : gatherRows(count, at);
}

function insteadRows(node: ChoiceNode, given: Side, instead: Parameters[number], stretch: Stretch): Rows {
  const isBad = (cell: Cell): boolean => cell instanceof CellError && (node.name === "IFERROR" || cell.code === "#N/A");
  if (!("same" in given) && !given.others?.some((each) => each !== undefined && isBad(each))) {
    return computed(given);
  }
  const rows = instead && evaluateRows(instead, stretch);
  return gatherRows(stretch.to - stretch.from, (row) => {
    const cell = sideAt(given, row);
    return isBad(cell) ? node.otherwise.call([cell, rows && rowAt(rows, row)]) : cell;
  });
}

function worksheetRows(node: Extract<Node, { kind: "worksheet" }>, stretch: Stretch): Rows {
  const running = runningSum(node, stretch);
  if (running !== undefined) {
    return computed(running);
  }
  const parameters = node.parameters.map((each) => each && evaluateRows(each, stretch));
  const count = stretch.to - stretch.from;
  const call = (row: number): Operand => node.called.call(parameters.map((each) => each && rowAt(each, row)));
  const only = parameters.length === 1 ? parameters[0] : undefined;
  const fast = only?.kind === "column" ? mathOverColumn(node.called.name, only.column) : undefined;
  if (fast === undefined) {
    return gatherRows(count, call);
  }
  return computed(fast((row) => scalarOf(call(row)) as Cell));
}

/** Widest argument that is one value a row: value, upper and lower uncertainty. */
const widestValue = 3;

function ownRows(node: Extract<Node, { kind: "own" }>, stretch: Stretch): Rows {
  const rowArguments: RowArgument[] = [];
  for (const parameter of node.parameters) {
    const argument = rowArgument(parameter, stretch);
    if (argument === undefined) {
      return eachRow(node, stretch);
    }
    rowArguments.push(argument);
  }
  const { columns } = node.called.eachRow(stretch.to - stretch.from, rowArguments);
  return columns.length === 1 ? computed(columns[0] as Column) : { kind: "columns", columns, ragged: true };
}

function rowArgument(parameter: Parameters[number], stretch: Stretch): RowArgument | undefined {
  if (parameter === undefined) {
    return { fixed: undefined };
  }
  const rows = evaluateRows(parameter, stretch);
  switch (rows.kind) {
    case "same":
      return { fixed: argumentOf(parameter, rows.operand, stretch, stretch.from) };
    case "column":
      return { perRow: [rows.column], ...addressOf(parameter, stretch, stretch.from) };
    case "columns":
      if (rows.ragged || rows.columns.length > widestValue) {
        return undefined;
      }
      return { perRow: rows.columns, ...addressOf(parameter, stretch, stretch.from) };
    case "each":
      return undefined;
  }
}
