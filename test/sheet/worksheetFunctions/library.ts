import type { AstExpression } from "@borgar/fx";
import { parse, tokenize } from "@borgar/fx";
import * as formulajs from "@formulajs/formulajs";
import type { Cell } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import type { Operand } from "../../../src/sheet/values/operand.js";
import { isMatrix } from "../../../src/sheet/values/operand.js";
import { naiveEvaluate } from "../naive/naiveEvaluate.js";

type LibraryFunction = (...values: unknown[]) => unknown;

/** What the formulajs library gives for a call by itself, as text. */
export function libraryResult(call: string): string {
  const tree = parse(tokenize(`=${call}`)) as AstExpression;
  if (tree.type !== "CallExpression") {
    throw new Error(`no call: ${call}`);
  }
  const inner = argumentTexts(call);
  const values = inner.map((text) => toLibrary(naiveEvaluate(new Map([["A1", { formula: `=${text}` }]]), "A1")));
  try {
    return shown(findLibraryFunction(tree.callee.name)(...values));
  } catch {
    return "an exception";
  }
}

function findLibraryFunction(name: string): LibraryFunction {
  let found: unknown = formulajs;
  for (const part of name.split(".")) {
    found = (found as Record<string, unknown>)[part];
  }
  return found as LibraryFunction;
}

/** The texts between the commas of a call, outside quotes, brackets and braces. */
function argumentTexts(call: string): string[] {
  const pieces = [""];
  let depth = 0;
  let quoted = false;
  for (const character of call.slice(call.indexOf("(") + 1, -1)) {
    quoted = character === '"' ? !quoted : quoted;
    depth += quoted ? 0 : "({".includes(character) ? 1 : ")}".includes(character) ? -1 : 0;
    if (character === "," && depth === 0 && !quoted) {
      pieces.push("");
    } else {
      pieces[pieces.length - 1] += character;
    }
  }
  return pieces;
}

function toLibrary(operand: Operand): unknown {
  return isMatrix(operand)
    ? Array.from({ length: operand.rows }, (_, row) =>
        Array.from({ length: operand.columns }, (__, column) => cellToLibrary(operand.at(row, column))),
      )
    : cellToLibrary(operand);
}

const cellToLibrary = (cell: Cell) => (cell instanceof CellError ? new Error(cell.code) : cell);

/** A result as the table of deviations writes it. */
export function shown(result: unknown): string {
  if (Array.isArray(result)) {
    return `{${result.map(shown).join(", ")}}`;
  }
  if (result instanceof Date) {
    return "a clock object";
  }
  if (result instanceof Error) {
    return result.message;
  }
  return typeof result === "string" ? `"${result}"` : String(result);
}

export function ourResult(call: string): string {
  const operand = naiveEvaluate(new Map([["A1", { formula: `=${call}` }]]), "A1");
  return isMatrix(operand)
    ? shown(
        Array.from({ length: operand.rows }, (_, row) =>
          Array.from({ length: operand.columns }, (__, column) => cellShown(operand.at(row, column))),
        ),
      )
    : shown(cellShown(operand));
}

const cellShown = (cell: Cell) => (cell instanceof CellError ? new Error(cell.code) : cell === 0 ? 0 : cell);
