import type { Cell } from "../../../../call/cell.js";
import { CellError } from "../../../../call/cell.js";
import type { Area, SheetColumn } from "../../../../sheet/book/book.js";
import { columnAt } from "../../../../sheet/book/book.js";
import { readCell } from "../../../../sheet/book/cells.js";
import { spanAt } from "../../../../sheet/book/spans.js";
import { displayCell } from "../../../../sheet/display/displayCell.js";
import { displayMeasured } from "../../../../sheet/display/displayMeasured.js";
import { general, type MeasuredFormat, type NumberFormat } from "../../../../sheet/display/numberFormat.js";
import { sameFormula } from "../../../../sheet/formula/formula.js";
import { sameCell } from "../../../../sheet/history/changes.js";
import { sheetPresentation } from "../../../../sheet/presentation/presentation.js";
import type { ShownCell, ShownWindow } from "../../protocol/shown.js";
import { bookOfSession, presentationOfSession, type Session } from "../session.js";
import { columnStates } from "../state/columnStates.js";
import { sheetRowOf } from "./visibleRows.js";

/** A column of a window, with all that its cells are drawn by. */
interface WindowColumn {
  readonly index: number;
  readonly now: SheetColumn;
  /** As it was before the last action, where it was another. */
  readonly before: SheetColumn | undefined;
  readonly format: NumberFormat;
  /** The columns of its uncertainties. */
  readonly sigmas: readonly SheetColumn[];
}

/** The cells of a rectangle of rows in view as they are drawn: work for so many cells, whatever the sheet's size. */
export function windowOf(
  session: Session,
  sheet: number,
  from: number,
  to: number,
  left: number,
  right: number,
): ShownWindow {
  const filter = session.filters[sheet];
  const rows = Int32Array.from({ length: Math.max(0, to - from) }, (_, index) => sheetRowOf(filter, from + index));
  const columns = windowColumns(session, sheet, left, right);
  const edited = session.flash?.edited.filter((area) => area.sheet === sheet) ?? [];
  const cells = Array.from(rows, (row) => columns.map((column) => shownCell(column, row, edited)));
  return { version: session.version, sheet, from, to, left, right, rows, cells };
}

function windowColumns(session: Session, sheet: number, left: number, right: number): readonly WindowColumn[] {
  const book = bookOfSession(session);
  const found = book.sheets[sheet];
  const states = found ? columnStates(found, sheetPresentation(presentationOfSession(session), sheet)) : [];
  return Array.from({ length: Math.max(0, right - left) }, (_, across) => {
    const index = left + across;
    const now = columnAt(book, sheet, index);
    const old = session.flash ? columnAt(session.flash.before, sheet, index) : now;
    const { format = general, sigmasTo = index } = states[index] ?? {};
    const sigmas = Array.from({ length: sigmasTo - index }, (_, beside) => columnAt(book, sheet, index + 1 + beside));
    return { index, now, before: old === now ? undefined : old, format, sigmas };
  });
}

function shownCell(column: WindowColumn, row: number, edited: readonly Area[]): ShownCell {
  const { now, before, index } = column;
  const cell = readCell(now.cells, row);
  const run = spanAt(now.runs, row);
  const shown: { -readonly [Key in keyof ShownCell]: ShownCell[Key] } = {
    text: textOf(column, cell, row),
    is: kindOf(cell),
  };
  if (cell instanceof CellError) shown.message = cell.message;
  if (run !== undefined) shown.hasFormula = true;
  else if (now.claims.length > 0 && spanAt(now.claims, row) !== undefined) shown.spilled = true;
  if (before !== undefined) {
    const old = spanAt(before.runs, row);
    const sameRun = run === undefined || old === undefined ? run === old : sameFormula(run.formula, old.formula);
    if (!sameRun || !sameCell(readCell(before.cells, row), cell)) {
      shown.flash = edited.some((area) => isIn(area, row, index)) ? "edited" : "followed";
    }
  }
  return shown;
}

function isIn({ top, bottom, left, right }: Area, row: number, column: number): boolean {
  return row >= top && row <= bottom && column >= left && column <= right;
}

function kindOf(cell: Cell): ShownCell["is"] {
  if (cell === null) return "blank";
  if (typeof cell === "number") return "number";
  return typeof cell === "string" ? "text" : typeof cell === "boolean" ? "logical" : "error";
}

const mostTexts = 20_000;
const texts = new Map<string, string>();

/** Rounding a value with its uncertainty takes longer than all else of a window: texts in view are made once. */
function measured(value: number, upper: number, lower: number | undefined, format: MeasuredFormat): string {
  const key = `${value} ${upper} ${lower} ${format.kind} ${format.digits}`;
  let text = texts.get(key);
  if (text === undefined) {
    text = displayMeasured(value, upper, lower, format);
    if (texts.size >= mostTexts) texts.clear();
    texts.set(key, text);
  }
  return text;
}

/** A number in the format of its column; with its uncertainty where the format asks for it and one stands beside. */
function textOf({ format, sigmas }: WindowColumn, cell: Cell, row: number): string {
  const isMeasured = format.kind === "plus-minus" || format.kind === "brackets";
  if (row > 0 && isMeasured && typeof cell === "number") {
    const [upper, lower] = sigmas.map(({ cells }) => readCell(cells, row));
    if (typeof upper === "number") return measured(cell, upper, typeof lower === "number" ? lower : undefined, format);
    return displayCell(cell, general);
  }
  return displayCell(cell, row === 0 ? general : format);
}
