import { CellError } from "../../../call/cell.js";
import type { PlainCell } from "../../values/compareCells.js";
import type { Matrix, Operand } from "../../values/operand.js";
import { partOf } from "../../values/part.js";
import { quoteCell } from "../../values/quoteCell.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { logical, matrix, number, omittable, optional, value, whole } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { exactPlace, firstPlace, wildcardTest } from "./exactPlace.js";
import { sortedPlace } from "./sortedPlace.js";
import type { Vector } from "./vector.js";
import { columnVector, rowVector, vectorOf } from "./vector.js";

export function notFound(name: string, wanted: PlainCell): CellError {
  return new CellError(
    "#N/A",
    `${name}: value not found`,
    () => `${name}: ${quoteCell(wanted)} is not among the cells searched; a value that is there is needed`,
  );
}

/** The first place that equals the value; a text may hold wildcards. */
export function equalPlace(vector: Vector, wanted: PlainCell): number {
  const key = wanted ?? 0;
  return typeof key === "string" && /[*?~]/.test(key)
    ? firstPlace(vector, 1, wildcardTest(key))
    : exactPlace(vector, key);
}

function single(matrix: Matrix, row: number, column: number): Operand {
  return matrix.reference ? partOf(matrix, row, 1, column, 1) : matrix.at(row, column);
}

/** VLOOKUP and HLOOKUP: search the first line, give the cell of another line at the same place. */
function tableLookup(name: string, across: boolean): WorksheetFunction {
  const line = across ? "row" : "column";
  const parameters = [value("value"), matrix("table"), whole(line), optional(logical("sorted"), true)] as const;
  return define(name, parameters, (wanted, table, index, isSorted) => {
    const lines = across ? table.rows : table.columns;
    if (index < 1) {
      return outside(
        `${name}: ${line}`,
        index,
        "below 1",
        `a ${line} of the table is needed, for example 2`,
        "#VALUE!",
      );
    }
    if (index > lines) {
      return outside(
        `${name}: ${line}`,
        index,
        `beyond the ${lines} of the table`,
        `a ${line} up to ${lines} is needed`,
        "#REF!",
      );
    }
    const vector = across ? rowVector(table, 0) : columnVector(table, 0);
    const place = isSorted ? sortedPlace(vector, wanted ?? 0, "ascending") : equalPlace(vector, wanted);
    if (place < 0) {
      return notFound(name, wanted);
    }
    return across ? table.at(index - 1, place) : table.at(place, index - 1);
  });
}

const notOneLine = (name: string, what: string) =>
  new CellError(
    "#N/A",
    `${name}: ${what} is a rectangle`,
    `${name}: ${what} has several rows and columns; one row or one column is needed, for example A2:A9`,
  );

const match = define(
  "MATCH",
  [value("value"), matrix("range"), optional(number("type"), 1)] as const,
  (wanted, range, type) => {
    const vector = vectorOf(range);
    if (!vector) {
      return notOneLine("MATCH", "range");
    }
    const place =
      type === 0 ? equalPlace(vector, wanted) : sortedPlace(vector, wanted ?? 0, type > 0 ? "ascending" : "descending");
    return place < 0 ? notFound("MATCH", wanted) : place + 1;
  },
);

const lookup = define(
  "LOOKUP",
  [value("value"), matrix("searched"), omittable<Matrix | undefined>(matrix("results"), undefined)] as const,
  (wanted, searched, results) => {
    const across = searched.columns > searched.rows;
    const vector = across ? rowVector(searched, 0) : columnVector(searched, 0);
    const place = sortedPlace(vector, wanted ?? 0, "ascending");
    if (place < 0) {
      return notFound("LOOKUP", wanted);
    }
    if (results) {
      const line = vectorOf(results);
      if (!line) return notOneLine("LOOKUP", "results");
      return place < line.length ? line.at(place) : notFound("LOOKUP", wanted);
    }
    return across ? searched.at(searched.rows - 1, place) : searched.at(place, searched.columns - 1);
  },
);

/** Section 6.14.6: row or column 0 is all of them; one number alone counts along a single row or column. */
const index = define(
  "INDEX",
  [matrix("range"), omittable(whole("row"), 0), omittable<number | undefined>(whole("column"), undefined)] as const,
  (range, first, second) => {
    const alongRow = second === undefined && range.rows === 1;
    const row = alongRow ? 0 : first;
    const column = alongRow ? first : (second ?? (range.columns === 1 ? 1 : 0));
    const wholeRow = alongRow ? 1 : row;
    if (wholeRow < 0 || wholeRow > range.rows) {
      return outside(
        "INDEX: row",
        wholeRow,
        `outside 1 to ${range.rows}`,
        "a row of the range is needed, for example 1",
        "#REF!",
      );
    }
    if (column < 0 || column > range.columns) {
      return outside(
        "INDEX: column",
        column,
        `outside 1 to ${range.columns}`,
        "a column of the range is needed, for example 1",
        "#REF!",
      );
    }
    if (wholeRow > 0 && column > 0) {
      return single(range, wholeRow - 1, column - 1);
    }
    const [fromRow, rows] = wholeRow === 0 ? [0, range.rows] : [wholeRow - 1, 1];
    const [fromColumn, columns] = column === 0 ? [0, range.columns] : [column - 1, 1];
    return partOf(range, fromRow, rows, fromColumn, columns);
  },
);

const columnName = (column: number): string =>
  column === 0 ? "" : columnName(Math.floor((column - 1) / 26)) + String.fromCharCode(65 + ((column - 1) % 26));

/** Section 6.14.2, in the forms A1 and R1C1. */
const address = define(
  "ADDRESS",
  [whole("row"), whole("column"), omittable(whole("kind"), 1), omittable(logical("A1 form"), true)] as const,
  (row, column, kind, a1) => {
    if (row < 1 || column < 1) {
      return outside(
        `ADDRESS: ${row < 1 ? "row" : "column"}`,
        row < 1 ? row : column,
        "below 1",
        "a number of 1 or more is needed, for example 2",
        "#VALUE!",
      );
    }
    if (kind < 1 || kind > 4) {
      return outside(
        "ADDRESS: kind",
        kind,
        "outside 1 to 4",
        "1 for both fixed, 2 for the row, 3 for the column, 4 for none is needed",
        "#VALUE!",
      );
    }
    const fixedRow = kind === 1 || kind === 2;
    const fixedColumn = kind === 1 || kind === 3;
    if (a1) {
      return `${fixedColumn ? "$" : ""}${columnName(column)}${fixedRow ? "$" : ""}${row}`;
    }
    return `R${fixedRow ? row : `[${row}]`}C${fixedColumn ? column : `[${column}]`}`;
  },
);

/** Section 6.14. */
export const lookups: readonly WorksheetFunction[] = [
  tableLookup("VLOOKUP", false),
  tableLookup("HLOOKUP", true),
  match,
  lookup,
  index,
  address,
];
