import { cellAt } from "../../../../call/column.js";
import type { Book } from "../../../../sheet/book/book.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
import { isMostlyText } from "../../../../table/rowNames.js";
import { isProblem } from "../../../../units/problem.js";
import { readQuantity } from "../../../../units/readQuantity.js";
import { baseSlope, convertible, fromBase, one, toBase, type Unit } from "../../../../units/unit.js";
import type { PlotColumn } from "../../protocol/answers.js";
import { columnName, headerText } from "../actions/words.js";
import { bookOfSession, type Session } from "../session.js";
import { columnStatesOf } from "../state/columnStates.js";
import { sheetSize } from "../state/sheetSize.js";
import { countRows, visibleSpans } from "../view/visibleRows.js";

interface Sides {
  readonly upper: Float64Array;
  readonly lower: Float64Array;
}

/** The cells of a column that are in view, as numbers in the unit of its header. */
export function plotColumn(session: Session, sheet: number, column: number): PlotColumn {
  const book = bookOfSession(session);
  const end = sheetSize(book.sheets[sheet]!).rows;
  const spans = visibleSpans(session, sheet, 1, end);
  const count = countRows(spans);
  const rows = new Int32Array(count);
  const values = new Float64Array(count).fill(Number.NaN);
  const header = headerText(book, sheet, column);
  const { unit } = recogniseColumn(header);
  const sides: Sides = {
    upper: new Float64Array(count).fill(Number.NaN),
    lower: new Float64Array(count).fill(Number.NaN),
  };
  const words: string[] = [];
  let [next, texts, uncertain] = [0, 0, false];
  for (const { from, to } of spans) {
    const cells = readColumn(book, { sheet, column, from, to });
    const beside = sigmasBeside(book, sheet, column, from, to);
    texts += isMostlyText(cells, to - from) ? to - from : 0;
    for (let row = 0; row < to - from; row++, next++) {
      rows[next] = from + row;
      const cell = cellAt(cells, row);
      words.push(typeof cell === "string" ? cell : "");
      if (typeof cell === "number") values[next] = cell;
      const [upper, lower = upper] = beside.map((sigmas) => sigmas.numbers[row] as number);
      if (upper !== undefined) {
        sides.upper[next] = Math.abs(upper);
        sides.lower[next] = Math.abs(lower as number);
        uncertain = true;
      }
      if (typeof cell === "string" && readText(cell, unit ?? one, next, values, sides)) uncertain = true;
    }
  }
  return {
    header,
    name: columnName(book, sheet, column),
    unit: unit && unit.text !== "1" ? unit.text : "",
    rows,
    values,
    upper: uncertain ? sides.upper : undefined,
    lower: uncertain ? sides.lower : undefined,
    words: 2 * texts > count ? words : undefined,
  };
}

function sigmasBeside(book: Book, sheet: number, column: number, from: number, to: number) {
  const last = columnStatesOf(book, sheet)[column]?.sigmasTo ?? column;
  return Array.from({ length: last - column }, (_, index) =>
    readColumn(book, { sheet, column: column + 1 + index, from, to }),
  );
}

/** A quantity text as a number in the column's unit; whether it states an uncertainty. */
function readText(text: string, unit: Unit, at: number, values: Float64Array, { upper, lower }: Sides): boolean {
  const read = readQuantity(text);
  if (isProblem(read)) return false;
  const own = read.unit ?? unit;
  if (!convertible(own, unit)) return false;
  const base = toBase(own, read.value);
  const same = own.text === unit.text;
  values[at] = same ? read.value : fromBase(unit, base);
  if (read.upper === undefined || read.lower === undefined) return false;
  const slope = same ? 1 : baseSlope(own, base) / baseSlope(unit, base);
  upper[at] = read.upper * slope;
  lower[at] = read.lower * slope;
  return true;
}
