import { isOptional } from "../functions/argumentNames.js";
import type { Definition, Input } from "../functions/definition.js";
import { columnOfAddress } from "./address.js";
import { assignHeaders, type HeaderAssignment } from "./assignHeaders.js";
import type { CallProblem, HeaderCell } from "./callProblem.js";
import { CellError } from "./cell.js";
import { type Column, cellAt } from "./column.js";
import { quote } from "./explain.js";
import { type HeaderUnit, headerUnit, noHeader } from "./headerUnit.js";
import { fits } from "./readCell.js";
import { fitsSigma } from "./readSigma.js";

/** The cells one input was given, with what their headers say; no columns where the input was left out. */
export interface InputColumns {
  readonly input: Input;
  /** Value, then uncertainty, or upper and lower uncertainty. */
  readonly columns: readonly Column[];
  readonly headers: readonly HeaderUnit[];
  /** One cell serves every row. */
  readonly single: boolean;
}

/** The inputs of a call, ready to be read row by row. */
export interface CallInputs {
  readonly rows: number;
  /** One call filled down over the rows, not one call with columns. */
  readonly filledDown: boolean;
  /** The rows are as many results as were asked for of the same inputs. */
  readonly spilled: boolean;
  readonly inputs: readonly InputColumns[];
}

/** What was handed over for one input: its columns, of `rows` cells each, or none. */
export interface GivenCells {
  readonly rows: number;
  readonly columns: readonly Column[];
  /** Address of the first cell, where the host knows it. */
  readonly address?: string | undefined;
}

export function callInputs(
  definition: Definition,
  given: readonly (GivenCells | undefined)[],
  headers: readonly HeaderCell[],
  filledDown: boolean,
): CallInputs | CallProblem | CellError {
  const inputs: readonly Input[] = definition.inputs;
  for (let index = 0; index < inputs.length; index++) {
    const input = inputs[index]!;
    const cells = given[index];
    if (!cells) {
      if (!isOptional(input)) return { about: "missing", input: input.name };
    } else if (cells.columns.length > mostColumns(input) || cells.columns.length === 0) {
      return { about: "shape", input: input.name, rows: cells.rows, columns: cells.columns.length };
    }
  }
  const lengths = inputs.map((_, index) => given[index]?.rows ?? 1);
  const longest = lengths.findIndex((rows) => rows !== 1);
  const ownRows = longest < 0 ? 1 : lengths[longest]!;
  const unequal = lengths.findIndex((length) => length !== 1 && length !== ownRows);
  if (unequal >= 0) {
    const [input, other] = [inputs[unequal]!.name, inputs[longest]!.name];
    return { about: "lengths", input, rows: lengths[unequal]!, other, otherRows: ownRows };
  }
  const count = resultCount(inputs, given);
  if (typeof count !== "number") return count;
  if (count > 1 && filledDown) return { about: "several rows", rows: count };
  if (count > 1 && ownRows > 1) {
    const { name } = inputs.find(({ takes }) => takes === "count")!;
    return { about: "count of columns", input: name, count, rows: ownRows };
  }
  const rows = count > 1 ? count : ownRows;
  const headed = inputs.filter(takesHeader);
  const widths = headed.map((input) => given[inputs.indexOf(input)]?.columns.length ?? 0);
  const ways = assignHeaders(headers, widths);
  if ("about" in ways) return ways;
  const assigned = ways.find((way) => agrees(way, headed, widths)) ?? ways[0]!;
  const misplaced = headerOfAnotherColumn(
    headed,
    given.filter((_, index) => takesHeader(inputs[index]!)),
    assigned,
    headers,
  );
  if (misplaced) return misplaced;
  return {
    rows,
    filledDown,
    spilled: count > 1,
    inputs: inputs.map((input, index) => {
      const cells = given[index];
      const own = takesHeader(input) ? assigned[headed.indexOf(input)]! : [];
      const columns = cells?.columns ?? [];
      const names = columns.map((_, column) => (column === 0 ? input.name : `uncertainty of ${input.name}`));
      return {
        input,
        columns,
        headers: names.map((name, column) =>
          own[column] ? headerUnit(name, own[column], countsHours(input)) : noHeader,
        ),
        single: lengths[index] === 1,
      };
    }),
  };
}

/** How many results are asked for; 1 where the function gives one. */
function resultCount(
  inputs: readonly Input[],
  given: readonly (GivenCells | undefined)[],
): number | CallProblem | CellError {
  const index = inputs.findIndex(({ takes }) => takes === "count");
  const input = inputs[index];
  const cells = given[index];
  if (input?.takes !== "count" || !cells) return 1;
  if (cells.rows !== 1) return { about: "shape", input: input.name, rows: cells.rows, columns: cells.columns.length };
  const cell = cellAt(cells.columns[0]!, 0);
  if (cell instanceof CellError) return cell;
  if (cell === null || cell === "" || cell === 0) return 1;
  const count = typeof cell === "string" && cell.trim() !== "" ? Number(cell) : cell;
  if (typeof count === "number" && Number.isInteger(count) && count >= 1 && count <= input.most) return count;
  const value = typeof cell === "string" ? quote(cell) : String(cell).toUpperCase();
  return { about: "count", input: input.name, value, most: input.most };
}

/**
 * An input whose own column is headed by another of the header cells: the headers are in another order than the
 * inputs, and a number would be read in the unit of the wrong column.
 */
function headerOfAnotherColumn(
  inputs: readonly Input[],
  given: readonly (GivenCells | undefined)[],
  assigned: HeaderAssignment,
  headers: readonly HeaderCell[],
): CallProblem | undefined {
  for (let index = 0; index < inputs.length; index++) {
    const column = columnOfAddress(given[index]?.address);
    const header = assigned[index]![0];
    if (!column || !header || columnOfAddress(header.address) === column) continue;
    const own = headers.find(({ address }) => columnOfAddress(address) === column);
    if (own) return { about: "header of another column", input: inputs[index]!.name, header, own };
  }
  return undefined;
}

/** Whether every unit that is stated is of the kind of its input; headers of omitted inputs do not count. */
function agrees(way: HeaderAssignment, inputs: readonly Input[], widths: readonly number[]): boolean {
  return inputs.every((input, index) =>
    way[index]!.slice(0, widths[index]).every((header, column) => {
      const unit = header && headerUnit(input.name, header, countsHours(input)).unit;
      const kind = input.takes === "quantity" ? input.quantity.kind : undefined;
      return !unit || fits(unit, kind) || (column > 0 && fitsSigma(unit, kind));
    }),
  );
}

function mostColumns(input: Input): number {
  return takesHeader(input) && !(input.takes === "quantity" && input.alone) ? 3 : 1;
}

function countsHours(input: Input): boolean {
  return input.takes === "quantity" && input.quantity.sexagesimal === "hours";
}

function takesHeader(input: Input): boolean {
  return input.takes === "quantity" || input.takes === "any quantity";
}
