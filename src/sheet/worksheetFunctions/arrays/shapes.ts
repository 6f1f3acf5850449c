import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import type { Matrix } from "../../values/operand.js";
import { buildMatrix } from "../../values/operand.js";
import { partOf } from "../../values/part.js";
import { define } from "../define/define.js";
import { outside } from "../define/outside.js";
import { matrix, number, omittable, rest, value, whole } from "../define/parameters.js";
import type { WorksheetFunction } from "../worksheetFunction.js";
import { numberMatrix } from "./matrices.js";

const mostCells = 2_000_000;

const tooLarge = (name: string, rows: number, columns: number) =>
  new CellError(
    "#NUM!",
    `${name}: the result is too large`,
    `${name}: the result would have ${rows} rows and ${columns} columns; at most ${mostCells} cells are made, so fewer are needed`,
  );

const belowOne = (name: string, input: string, count: number) =>
  count < 1
    ? outside(`${name}: ${input}`, count, "below 1", "a whole number of 1 or more is needed, for example 3", "#VALUE!")
    : undefined;

const sequence = define(
  "SEQUENCE",
  [whole("rows"), omittable(whole("columns"), 1), omittable(number("start"), 1), omittable(number("step"), 1)] as const,
  (rows, columns, start, step) => {
    const problem = belowOne("SEQUENCE", "rows", rows) ?? belowOne("SEQUENCE", "columns", columns);
    if (problem) {
      return problem;
    }
    return rows * columns > mostCells
      ? tooLarge("SEQUENCE", rows, columns)
      : numberMatrix("SEQUENCE", rows, columns, (row, column) => start + (row * columns + column) * step);
  },
);

/** What is left of `length` after taking (or dropping) `count` from the front, or from the end where it is negative. */
interface Span {
  readonly from: number;
  readonly length: number;
}

function taken(length: number, count: number): Span {
  const kept = Math.min(Math.abs(count), length);
  return { from: count < 0 ? length - kept : 0, length: kept };
}

function dropped(length: number, count: number): Span {
  const gone = Math.min(Math.abs(count), length);
  return { from: count < 0 ? 0 : gone, length: length - gone };
}

const nothingLeft = (name: string) =>
  new CellError(
    "#VALUE!",
    `${name}: nothing is left`,
    `${name}: no rows or no columns are left; counts that leave some are needed, for example 1`,
  );

const cut = (name: string, span: (length: number, count: number) => Span, all: number) =>
  define(
    name,
    [matrix("array"), omittable(whole("rows"), all), omittable(whole("columns"), all)] as const,
    (array, rows, columns) => {
      const down = span(array.rows, rows);
      const across = span(array.columns, columns);
      return down.length > 0 && across.length > 0
        ? partOf(array, down.from, down.length, across.from, across.length)
        : nothingLeft(name);
    },
  );

const chosen = (name: string, line: "row" | "column") =>
  define(name, [matrix("array"), rest(matrix(line))] as const, (array, choices) => {
    const places: number[] = [];
    const count = line === "row" ? array.rows : array.columns;
    for (const choice of choices.flatMap(cellsByRow)) {
      const place = typeof choice === "number" ? Math.trunc(choice) : Number.NaN;
      if (choice instanceof CellError) {
        return choice;
      }
      if (!(Math.abs(place) >= 1 && Math.abs(place) <= count)) {
        return outside(
          `${name}: ${line}`,
          choice,
          `outside 1 to ${count}`,
          `a ${line} of the array is needed, -1 for the last`,
          "#VALUE!",
        );
      }
      places.push(place > 0 ? place - 1 : count + place);
    }
    return line === "row"
      ? buildMatrix(places.length, array.columns, (row, column) => array.at(places[row] as number, column))
      : buildMatrix(array.rows, places.length, (row, column) => array.at(row, places[column] as number));
  });

export function cellsByRow(array: Matrix): Cell[] {
  return Array.from({ length: array.rows * array.columns }, (_, index) =>
    array.at(Math.floor(index / array.columns), index % array.columns),
  );
}

function cellsByColumn(array: Matrix): Cell[] {
  return Array.from({ length: array.rows * array.columns }, (_, index) =>
    array.at(index % array.rows, Math.floor(index / array.rows)),
  );
}

const padding = (name: string): CellError =>
  new CellError(
    "#N/A",
    `${name}: a place without a cell`,
    `${name}: no cell belongs here, the parts are of unequal size; parts of one size or a fill value are needed`,
  );

const stack = (name: string, down: boolean) =>
  define(name, [rest(matrix("array"))] as const, (arrays) => {
    const across = down ? "columns" : "rows";
    const along = down ? "rows" : "columns";
    const width = Math.max(...arrays.map((array) => array[across]));
    const owners = arrays.flatMap((array) => Array.from({ length: array[along] }, (_, index) => ({ array, index })));
    const gap = padding(name);
    const cell = (place: number, other: number): Cell => {
      const { array, index } = owners[place] as { array: Matrix; index: number };
      return other < array[across] ? (down ? array.at(index, other) : array.at(other, index)) : gap;
    };
    return down
      ? buildMatrix(owners.length, width, cell)
      : buildMatrix(width, owners.length, (row, column) => cell(column, row));
  });

const expand = define(
  "EXPAND",
  [
    matrix("array"),
    omittable<number | undefined>(whole("rows"), undefined),
    omittable<number | undefined>(whole("columns"), undefined),
    omittable<Cell | undefined>(value("fill"), undefined),
  ] as const,
  (array, rows, columns, fill) => {
    const [height, width] = [rows ?? array.rows, columns ?? array.columns];
    if (height < array.rows || width < array.columns) {
      return outside(
        "EXPAND: rows and columns",
        `${height} x ${width}`,
        `smaller than the ${array.rows} x ${array.columns} of the array`,
        "at least as many are needed",
        "#VALUE!",
      );
    }
    if (height * width > mostCells) {
      return tooLarge("EXPAND", height, width);
    }
    const filler = fill === undefined ? padding("EXPAND") : fill;
    return buildMatrix(height, width, (row, column) =>
      row < array.rows && column < array.columns ? array.at(row, column) : filler,
    );
  },
);

/** Which cells a line leaves out: 1 blanks, 2 errors, 3 both. */
const toLine = (name: string, across: boolean) =>
  define(
    name,
    [matrix("array"), omittable(whole("leave out"), 0), omittable(whole("by column"), 0)] as const,
    (array, leaveOut, byColumn) => {
      const all = byColumn === 0 ? cellsByRow(array) : cellsByColumn(array);
      const kept = all.filter(
        (cell) => !(cell === null && (leaveOut & 1) === 1) && !(cell instanceof CellError && (leaveOut & 2) === 2),
      );
      if (kept.length === 0) {
        return nothingLeft(name);
      }
      return across
        ? buildMatrix(1, kept.length, (_, column) => kept[column] as Cell)
        : buildMatrix(kept.length, 1, (row) => kept[row] as Cell);
    },
  );

const wrap = (name: string, byRow: boolean) =>
  define(
    name,
    [matrix("line"), whole("count"), omittable<Cell | undefined>(value("fill"), undefined)] as const,
    (line, count, fill) => {
      if (line.rows !== 1 && line.columns !== 1) {
        return new CellError(
          "#VALUE!",
          `${name}: line is a rectangle`,
          `${name}: line has several rows and columns; one row or one column is needed, for example A2:A9`,
        );
      }
      const cells = cellsByRow(line);
      const lines = Math.ceil(cells.length / count);
      const filler = fill === undefined ? padding(name) : fill;
      const at = (place: number): Cell => (place < cells.length ? (cells[place] as Cell) : filler);
      const problem = belowOne(name, "count", count);
      if (problem) {
        return problem;
      }
      if (lines * count > mostCells) {
        return tooLarge(name, byRow ? lines : count, byRow ? count : lines);
      }
      return byRow
        ? buildMatrix(lines, count, (row, column) => at(row * count + column))
        : buildMatrix(count, lines, (row, column) => at(column * count + row));
    },
  );

const transpose = define("TRANSPOSE", [matrix("array")] as const, (array) =>
  buildMatrix(array.columns, array.rows, (row, column) => array.at(column, row)),
);

/** Functions that make, cut and join rectangles; TRANSPOSE is section 6.5.6. */
export const shapes: readonly WorksheetFunction[] = [
  transpose,
  sequence,
  cut("TAKE", taken, Number.MAX_SAFE_INTEGER),
  cut("DROP", dropped, 0),
  chosen("CHOOSEROWS", "row"),
  chosen("CHOOSECOLS", "column"),
  stack("VSTACK", true),
  stack("HSTACK", false),
  expand,
  toLine("TOROW", true),
  toLine("TOCOL", false),
  wrap("WRAPROWS", true),
  wrap("WRAPCOLS", false),
];
