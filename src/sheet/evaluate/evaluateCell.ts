import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import type { Argument } from "../../call/cellFunction.js";
import type { Block } from "../../call/column.js";
import { cellAt, columnOf } from "../../call/column.js";
import { nearest } from "../../units/nearest.js";
import type { Node, Parameters } from "../formula/node.js";
import { referenceText } from "../formula/reference.js";
import type { Matrix, Operand } from "../values/operand.js";
import { buildMatrix, isMatrix, matrixOfBlock } from "../values/operand.js";
import { negate, percent } from "../values/operate.js";
import { elementAt, operateOperands } from "../values/operateOperands.js";
import { toLogical } from "../values/toLogical.js";
import { areaOf, cellsOf, positionOf, readSingle } from "./areas.js";
import { matrixOf } from "./lookOut.js";
import { oneCell } from "./rows.js";
import type { Scene } from "./scene.js";

/** What a part of a formula is worth in one row. */
export function evaluateCell(node: Node, scene: Scene, row: number): Operand {
  return evaluate(node, scene, row, undefined);
}

type Shared = Map<Node, Operand> | undefined;

function evaluate(node: Node, scene: Scene, row: number, shared: Shared): Operand {
  if (node.kind === "value") {
    return node.value;
  }
  if (!node.fixed || scene.known === undefined) {
    return evaluateAny(node, scene, row, shared);
  }
  let worth = scene.known.get(node);
  if (worth === undefined) {
    worth = evaluateAny(node, scene, row, shared);
    scene.known.set(node, worth);
  }
  return worth;
}

function evaluateAny(node: Node, scene: Scene, row: number, shared: Shared): Operand {
  switch (node.kind) {
    case "value":
      return node.value;
    case "reference": {
      const cell = readSingle(node, scene, row);
      return cell === undefined ? cellsOf(node, scene, row) : oneCell(cell);
    }
    case "spill":
    case "intersection":
      return cellsOf(node, scene, row);
    case "name":
      return evaluateName(node.name, scene);
    case "unary":
      return evaluateUnary(node, scene, row, shared);
    case "binary": {
      const left = evaluateValue(node.left, scene, row, shared);
      return operateOperands(node.operator, left, evaluateValue(node.right, scene, row, shared));
    }
    case "choice":
      return evaluateChoice(node, scene, row, shared);
    case "own":
      return operandOfBlock(node.called.once(ownArguments(node.parameters, scene, row, shared)));
    case "worksheet":
      return node.called.call(node.parameters.map((each) => each && evaluate(each, scene, row, shared)));
    case "position":
      return positionOf(node, scene, row);
    case "shared": {
      const values = shared ?? new Map<Node, Operand>();
      let worth = values.get(node);
      if (worth === undefined) {
        worth = evaluate(node.value, scene, row, values);
        values.set(node, worth);
      }
      return worth;
    }
  }
}

/** What a part is worth where a cell and a reference to it are the same. */
function evaluateValue(node: Node, scene: Scene, row: number, shared: Shared): Operand {
  const cell = node.kind === "reference" ? readSingle(node, scene, row) : undefined;
  return cell === undefined ? evaluate(node, scene, row, shared) : cell;
}

function evaluateName(name: string, scene: Scene): Operand {
  const formula = scene.world.definedName(name);
  if (formula === undefined) {
    return new CellError("#NAME?", `${name} is not a known name`, () => {
      const near = nearest(name, scene.world.definedNames());
      return near === undefined
        ? `${name}: nothing has this name; a cell, a defined name or a text in quotes is needed, for example "${name}"`
        : `${name}: nothing has this name; did you mean ${near}?`;
    });
  }
  return evaluate(formula.tree, { ...scene, formula, known: undefined }, 0, undefined);
}

function evaluateUnary(node: Extract<Node, { kind: "unary" }>, scene: Scene, row: number, shared: Shared): Operand {
  if (node.operator === "@") {
    return evaluateSingle(node.operand, scene, row, shared);
  }
  const operand = evaluateValue(node.operand, scene, row, shared);
  return node.operator === "+" ? operand : mapOperand(operand, node.operator === "-" ? negate : percent);
}

export function mapOperand(operand: Operand, change: (cell: Cell) => Cell): Operand {
  if (!isMatrix(operand)) {
    return change(operand);
  }
  return operand.rows === 1 && operand.columns === 1
    ? change(operand.at(0, 0))
    : buildMatrix(operand.rows, operand.columns, (row, column) => change(operand.at(row, column)));
}

/** `@`: of a range the cell in the formula's own row or column, of an array the first cell. */
function evaluateSingle(node: Node, scene: Scene, row: number, shared: Shared): Operand {
  if (node.kind !== "reference" && node.kind !== "spill" && node.kind !== "intersection") {
    return elementAt(evaluate(node, scene, row, shared), 0, 0);
  }
  const area = areaOf(node, scene, row);
  if (area instanceof CellError) {
    return area;
  }
  const atRow = area.top === area.bottom ? area.top : row;
  const atColumn = area.left === area.right ? area.left : scene.column;
  const inside = atRow >= area.top && atRow <= area.bottom && atColumn >= area.left && atColumn <= area.right;
  return inside
    ? matrixOf(scene.world, { sheet: area.sheet, top: atRow, bottom: atRow, left: atColumn, right: atColumn })
    : new CellError(
        "#VALUE!",
        '"@" without a cell in this row or column',
        '"@": the range has no cell in the row or column of the formula; a range that reaches there is needed',
      );
}

function evaluateChoice(node: Extract<Node, { kind: "choice" }>, scene: Scene, row: number, shared: Shared): Operand {
  const { name, parameters, otherwise } = node;
  const [first, ...rest] = parameters;
  const given = first && evaluateValue(first, scene, row, shared);
  const cell = given === undefined ? null : isMatrix(given) ? singleCell(given) : given;
  const all = (): Operand => otherwise.call([given, ...rest.map((each) => each && evaluate(each, scene, row, shared))]);
  if (cell === undefined) {
    return all();
  }
  if (name !== "IF") {
    const good = !(cell instanceof CellError) || (name === "IFNA" && cell.code !== "#N/A");
    return good ? cell : all();
  }
  const truth = toLogical(cell, "IF: condition");
  if (truth instanceof CellError) {
    return otherwise.call([given, ...rest.map((each) => each && null)]);
  }
  const chosen = rest[truth ? 0 : 1];
  return chosen === undefined
    ? otherwise.call([given, ...rest.map((each) => each && null)])
    : evaluate(chosen, scene, row, shared);
}

/** The cell of a 1 x 1 rectangle. */
function singleCell(matrix: Matrix): Cell | undefined {
  return matrix.rows === 1 && matrix.columns === 1 ? matrix.at(0, 0) : undefined;
}

function ownArguments(parameters: Parameters, scene: Scene, row: number, shared: Shared): Argument[] {
  return parameters.map((each) => each && argumentOf(each, evaluate(each, scene, row, shared), scene, row));
}

/** An argument as our functions take it, with the address of its first cell where it is a reference. */
export function argumentOf(node: Node, operand: Operand, scene: Scene, row: number): Argument {
  return { block: blockOfOperand(operand), ...addressOf(node, scene, row) };
}

export function addressOf(node: Node, scene: Scene, row: number): { readonly address?: string } {
  const reference = node.kind === "reference" ? scene.formula.references[node.index] : undefined;
  return reference ? { address: referenceText(reference, row, scene.column).split(":")[0] as string } : {};
}

export function blockOfOperand(operand: Operand): Block {
  if (!isMatrix(operand)) {
    return { rows: 1, columns: [columnOf([operand])] };
  }
  if (operand.block !== undefined) {
    return operand.block;
  }
  const columns = Array.from({ length: operand.columns }, (_, column) =>
    columnOf(Array.from({ length: operand.rows }, (_, row) => operand.at(row, column))),
  );
  return { rows: operand.rows, columns };
}

function operandOfBlock(block: Block): Operand {
  const first = block.columns[0];
  return block.rows === 1 && block.columns.length === 1 && first !== undefined
    ? cellAt(first, 0)
    : matrixOfBlock(block);
}
