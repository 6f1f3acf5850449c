import { type Cell, CellError, type ErrorCode } from "../../call/cell.js";
import type { Argument } from "../../call/cellFunction.js";
import { type Block, type Column, columnOf } from "../../call/column.js";
import { codeOf, hostError } from "./hostError.js";
import { tooLarge } from "./tooLarge.js";

/** Messages beyond this many characters in one spill are left out; a host refuses a result of some megabytes. */
const mostMessageCharacters = 500_000;

/**
 * What the host hands over for one argument as ours: a rectangle of cells, or undefined where it was left out.
 * A range comes as rows of cells, a value typed into the formula as one such cell or bare. The host gives 0 for a
 * blank cell of a range, so a blank uncertainty reads as 0, "exact".
 */
export function argumentOfHost(value: unknown, input: string, called: string, address?: string): Argument | CellError {
  if (value === null || value === undefined) return undefined;
  const rows: readonly (readonly unknown[])[] = isRows(value) ? value : [[value]];
  const width = rows[0]?.length ?? 0;
  const refused = tooLarge(rows.length, width, input, called);
  if (refused) return refused;
  const columns = Array.from({ length: width }, (_, column) => columnOf(rows.map((row) => cellOfHost(row[column]))));
  const block: Block = { rows: rows.length, columns };
  return address === undefined ? { block } : { block, address };
}

/**
 * A result as the host takes it: rows of finite numbers, texts, logical values and error objects. One error alone is
 * thrown where the host then shows its code and sentence. Anything else inside a matrix would be shown as 0.
 */
export function hostOfResult(block: Block, called: string): unknown[][] {
  if (block.rows === 1 && block.columns.length === 1) {
    const only = cellOfResult(block.columns[0]!, 0, called);
    if (only instanceof CellError && isThrown(only.code)) throw hostError(only.code, only.message);
  }
  const errorOf = errorMaker();
  const hostCell = (column: Column, row: number): unknown => {
    const cell = cellOfResult(column, row, called);
    return cell === null ? "" : cell instanceof CellError ? errorOf(cell) : cell;
  };
  return Array.from({ length: block.rows }, (_, row) => block.columns.map((column) => hostCell(column, row)));
}

/** Error objects for the cells of one spill; those without a sentence of their own are one object each code. */
function errorMaker(): (error: CellError) => CustomFunctions.Error {
  const bare = new Map<ErrorCode, CustomFunctions.Error>();
  let room = mostMessageCharacters;
  return (error) => {
    if (room > 0) {
      const { message } = error;
      room -= message.length;
      return hostError(error.code, message);
    }
    const known = bare.get(error.code) ?? hostError(error.code);
    bare.set(error.code, known);
    return known;
  };
}

function isRows(value: unknown): value is readonly (readonly unknown[])[] {
  return Array.isArray(value) && value.every(Array.isArray);
}

function cellOfHost(value: unknown): Cell {
  switch (typeof value) {
    case "number":
      return Number.isFinite(value) ? value : unreadable(String(value));
    case "boolean":
      return value;
    case "string":
      return value === "" ? null : value;
    case "undefined":
      return null;
    case "object":
      return value === null ? null : cellOfRichValue(value as RichValue);
    default:
      return unreadable(`a ${typeof value}`);
  }
}

/** A formatted number, an entity, an error: the host wraps what a plain value cannot say. */
interface RichValue {
  readonly type?: unknown;
  readonly code?: unknown;
  readonly basicValue?: unknown;
  readonly basicType?: unknown;
  readonly text?: unknown;
  readonly message?: unknown;
}

function cellOfRichValue(value: RichValue): Cell {
  const { type, code, basicValue, basicType, text } = value;
  if (type === "Empty") return null;
  if (type === "Error" || value instanceof Error || (code !== undefined && basicValue === undefined)) {
    return passedOn(String(basicValue ?? code), value.message);
  }
  if (basicType === "Error") return typeof text === "string" ? text : unreadable(`a value of type ${type}`);
  if (typeof basicValue === "object" || basicValue === undefined) return unreadable(`a value of type ${type}`);
  return cellOfHost(basicValue);
}

/** An error that stands in an input cell stays the same error. */
function passedOn(text: string, message: unknown): CellError {
  const code = codeOf(text);
  const own = typeof message === "string" && message !== "" ? message : undefined;
  if (code) return new CellError(code, "passed on", own ?? `A cell it reads holds ${code}; mend that cell first.`);
  return unreadable(text);
}

function unreadable(what: string): CellError {
  return new CellError(
    "#VALUE!",
    "not a value of a cell",
    `A cell it reads holds ${what}, which no function can read; put a number or a text there, for example "4.23 d".`,
  );
}

function cellOfResult(column: Column, row: number, called: string): Cell {
  const other = column.others?.[row];
  if (other !== undefined) return other;
  const number = column.numbers[row];
  return number !== undefined && Number.isFinite(number) ? number : ownMistake(called, `it gave ${number}`);
}

/** A mistake of ours says so in words; it never leaves as a number. */
export function ownMistake(called: string, what: string): CellError {
  return new CellError(
    "#VALUE!",
    `${called}: own mistake`,
    `${called}: ${what}, a mistake of Barycell and not of your table; report it with this formula and its inputs.`.slice(
      0,
      250,
    ),
  );
}

/** Whether the host keeps the code of an error that is thrown; it makes #VALUE! of the others. */
function isThrown(code: ErrorCode): boolean {
  return code !== "#REF!" && code !== "#NAME?";
}
