import type { AstExpression, BinaryExpression, CallExpression, LetExpression, UnaryExpression } from "@borgar/fx";
import type { Cell, ErrorCode } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import type { Operand } from "../values/operand.js";
import { matrixOfRows } from "../values/operand.js";
import type { Operator } from "../values/operate.js";
import { findWorksheetFunction } from "../worksheetFunctions/findWorksheetFunction.js";
import type { WorksheetFunction } from "../worksheetFunctions/worksheetFunction.js";
import { argumentCount, count, unknownFunction } from "./callMessages.js";
import type { FormulaProblem } from "./formula.js";
import type { Functions } from "./functions.js";
import { goneError } from "./goneError.js";
import type { Choice, Node, Parameters } from "./node.js";
import type { Reference } from "./reference.js";

export interface TreeReading {
  readonly tree: Node;
  readonly names: readonly string[];
  readonly positional: boolean;
  readonly problem: FormulaProblem | undefined;
}

/** Deeper than any formula a person writes, shallower than the stack. */
const deepest = 1000;

const choices: ReadonlySet<string> = new Set<Choice>(["IF", "IFERROR", "IFNA"]);
const positionNames: ReadonlySet<string> = new Set(["ROW", "COLUMN"]);

/** A tree in the making. */
interface Building {
  readonly references: readonly (Reference | undefined)[];
  /** The index of the reference that starts at a character. */
  indexAt(position: number): number | undefined;
  readonly functions: Functions;
  readonly names: Set<string>;
  /** What LET has named so far, by name in capital letters. */
  readonly locals: Map<string, Node>;
  depth: number;
  positional: boolean;
  problem: FormulaProblem | undefined;
}

type Located = { readonly loc?: number[] };

/**
 * The tree of a parsed formula with its functions found. `indexAt` gives the index of the reference that starts at a
 * character. What cannot be computed becomes an error in its place and the first such place is the problem.
 */
export function buildTree(
  root: AstExpression,
  references: readonly (Reference | undefined)[],
  indexAt: (position: number) => number | undefined,
  functions: Functions,
): TreeReading {
  const building: Building = {
    references,
    indexAt,
    functions,
    names: new Set(),
    locals: new Map(),
    depth: 0,
    positional: false,
    problem: undefined,
  };
  const tree = build(building, root);
  const { names, positional, problem } = building;
  return { tree, names: [...names], positional, problem };
}

function build(building: Building, expression: AstExpression): Node {
  if (building.depth > deepest) {
    throw new RangeError("nested too deeply");
  }
  building.depth++;
  const node = buildAny(building, expression);
  building.depth--;
  return node;
}

function buildAny(building: Building, expression: AstExpression): Node {
  switch (expression.type) {
    case "Literal":
      return buildLiteral(building, expression as { value: Cell; raw: string } & Located);
    case "ErrorLiteral":
      return constant(errorLiteral((expression as { value: string }).value));
    case "ReferenceIdentifier":
      return buildReference(building, expression as { value: string; kind: string } & Located);
    case "UnaryExpression":
      return buildUnary(building, expression as UnaryExpression);
    case "BinaryExpression":
      return buildBinary(building, expression as BinaryExpression);
    case "ArrayExpression":
      return buildArray(building, expression as { elements: { type: string; value: Cell }[][] } & Located);
    case "CallExpression":
      return buildCall(building, expression as CallExpression);
    case "LetExpression":
      return buildLet(building, expression as LetExpression);
    default:
      return unsupported(building, expression, "a function made inside a formula");
  }
}

function constant(value: Operand): Node {
  return { kind: "value", fixed: true, value };
}

/** An error in place of a part; the first one is the problem of the formula. */
function fail(building: Building, at: Located, code: ErrorCode, topic: string, message: string): Node {
  building.problem ??= { position: startOf(at), code, topic, message };
  return constant(new CellError(code, topic, message));
}

function unsupported(building: Building, at: Located, what: string): Node {
  const message = `formula: ${what} is not supported here; write it with plain cells, ranges and functions`;
  return fail(building, at, "#VALUE!", "a formula with a part that is not supported", message);
}

function buildLiteral(building: Building, expression: { value: Cell; raw: string } & Located): Node {
  const { value, raw } = expression;
  if (typeof value !== "number" || Number.isFinite(value)) {
    return constant(value);
  }
  const message = `formula: ${raw} is beyond 1.79E+308, the largest double; a smaller number is needed`;
  return fail(building, expression, "#NUM!", "a number beyond the largest double", message);
}

function buildReference(building: Building, expression: { value: string; kind: string } & Located): Node {
  const { locals, names, references } = building;
  if (expression.kind === "name") {
    const local = locals.get(expression.value.toUpperCase());
    if (local === undefined) {
      names.add(expression.value);
    }
    return local ?? { kind: "name", fixed: true, name: expression.value };
  }
  const index = building.indexAt(startOf(expression));
  const target = index === undefined ? undefined : references[index];
  if (index === undefined || target === undefined) {
    return unsupported(building, expression, `"${expression.value}"`);
  }
  return { kind: "reference", fixed: target.top.fixed && target.bottom.fixed, index };
}

function buildUnary(building: Building, expression: UnaryExpression): Node {
  const operand = build(building, expression.arguments[0] as AstExpression);
  if (expression.operator === "#") {
    return buildSpill(building, expression, operand);
  }
  const fixed = operand.fixed && expression.operator !== "@";
  return { kind: "unary", fixed, operator: expression.operator, operand };
}

function buildSpill(building: Building, expression: UnaryExpression, operand: Node): Node {
  if (operand.kind === "value" && operand.value instanceof CellError) {
    return operand;
  }
  return operand.kind === "reference"
    ? { kind: "spill", fixed: operand.fixed, index: operand.index }
    : unsupported(building, expression, '"#" after something other than one cell');
}

function buildBinary(building: Building, expression: BinaryExpression): Node {
  const { operator } = expression;
  if (operator === ":" || operator === ",") {
    const what = operator === ":" ? "a range between two computed cells" : "a union of ranges";
    return unsupported(building, expression, what);
  }
  const left = build(building, expression.arguments[0] as AstExpression);
  const right = build(building, expression.arguments[1] as AstExpression);
  const fixed = left.fixed && right.fixed;
  return operator === " "
    ? { kind: "intersection", fixed, left, right }
    : { kind: "binary", fixed, operator: operator as Operator, left, right };
}

function buildArray(building: Building, expression: { elements: { type: string; value: Cell }[][] } & Located): Node {
  const width = expression.elements[0]?.length ?? 0;
  if (expression.elements.some((row) => row.length !== width)) {
    return unsupported(building, expression, "an array whose rows differ in length");
  }
  const cells = expression.elements.map((row) =>
    row.map((each) => (each.type === "ErrorLiteral" ? errorLiteral(each.value as string) : each.value)),
  );
  return constant(matrixOfRows(cells));
}

function buildLet(building: Building, expression: LetExpression): Node {
  const { locals } = building;
  const before = new Map(locals);
  for (const { id, init } of expression.declarations) {
    const value = init === null ? constant(null) : build(building, init);
    locals.set(id.name.toUpperCase(), { kind: "shared", fixed: value.fixed, value });
  }
  const body = expression.body === null ? constant(null) : build(building, expression.body);
  locals.clear();
  for (const [name, value] of before) {
    locals.set(name, value);
  }
  return body;
}

function buildCall(building: Building, expression: CallExpression): Node {
  const { functions } = building;
  const name = expression.callee.name.toUpperCase().replace(/^_XLFN\.(_XLWS\.)?/, "");
  const parameters = expression.arguments.map((each) => (each === null ? undefined : build(building, each)));
  if (positionNames.has(name) && parameters.length <= 1) {
    building.positional = true;
    return positionNode(name, parameters[0]);
  }
  const own = functions.cellFunction(name);
  const called = own ?? findWorksheetFunction(name);
  if (called === undefined) {
    return fail(building, expression, "#NAME?", `${name} is not a known function`, unknownFunction(name, functions));
  }
  const { leastArguments, mostArguments } = called;
  if (parameters.length < leastArguments || parameters.length > mostArguments) {
    const names = own?.argumentNames ? `: ${own.argumentNames.join(", ")}` : "";
    const message = `${name}: ${count(parameters.length)} came; ${argumentCount(leastArguments, mostArguments)} needed${names}`;
    return fail(building, expression, "#VALUE!", `${name}: number of arguments`, message);
  }
  const fixed = parameters.every((each) => each === undefined || each.fixed);
  if (own !== undefined) {
    return { kind: "own", fixed, called: own, parameters };
  }
  const worksheet = called as WorksheetFunction;
  return choices.has(name)
    ? { kind: "choice", fixed, name: name as Choice, parameters, otherwise: worksheet }
    : { kind: "worksheet", fixed, called: worksheet, parameters };
}

function positionNode(name: string, of: Parameters[number]): Node {
  const axis = name === "ROW" ? "row" : "column";
  return { kind: "position", fixed: axis === "column" ? true : (of?.fixed ?? false), axis, of };
}

function startOf(expression: Located): number {
  return expression.loc?.[0] ?? 0;
}

function errorLiteral(code: string): CellError {
  if (code === goneError.code) {
    return goneError;
  }
  return new CellError(code as ErrorCode, `${code} typed in a formula`, `${code} stands in the formula itself`);
}
