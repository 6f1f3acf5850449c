import type { Cell } from "../../../../call/cell.js";
import { CellError } from "../../../../call/cell.js";
import type { Book } from "../../../../sheet/book/book.js";
import { displayCell } from "../../../../sheet/display/displayCell.js";
import { displayNumber } from "../../../../sheet/display/displayNumber.js";
import { withUnitText } from "../../../../sheet/display/measuredText.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import { type Comparison, compareTables, type Movement } from "../../../../table/compareTables.js";
import { derivedTable } from "../../../../table/derivedTable.js";
import { kindOfChange } from "../../../../table/kindOfChange.js";
import { columnsText } from "../../../../table/mark.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
import type { TablePlan } from "../../../../table/tableOf.js";
import { readHeader } from "../../../../units/readHeader.js";
import type { ComparisonReport, MarkState } from "../../protocol/answers.js";
import { counted } from "../actions/words.js";
import type { SessionMark } from "../session.js";
import { columnStatesOf } from "../state/columnStates.js";
import { tableOfSheet } from "./tableOfSheet.js";

/** The page shows the largest; the sheet that is written holds all. */
const mostShown = 500;

export function markState({ id, name, at, sheet }: SessionMark): MarkState {
  return { id, name, at, sheet };
}

/** What the formulas of a sheet give now; where it has none, what its columns hold. */
export function takeMark(book: Book, sheet: number, id: string, at: number): SessionMark {
  const table = comparedTable(book, sheet, tableOfSheet(book, sheet));
  if (table.columns.length === 0) {
    throw new EditRefused("mark: this sheet holds no columns with headers, so there is nothing to mark");
  }
  const name = book.sheets[sheet]!.name;
  return { id, name: columnsText({ sheet: name, taken: "", table }), at, sheet: name, table };
}

function comparedTable(book: Book, sheet: number, plan: TablePlan) {
  const states = columnStatesOf(book, sheet);
  const hasDerived = plan.columns.some(({ index }) => states[index]?.derived);
  const isCompared = ({ index }: { readonly index: number }) => !hasDerived || states[index]?.derived === true;
  return derivedTable(plan, isCompared, (row) => `row ${plan.firstRow + row + 1}`);
}

/** What moved since a mark; the sheet as it is now is read anew. */
export function compareWithNow(
  book: Book,
  mark: SessionMark,
): { comparison: Comparison; sheet: number; plan: TablePlan } {
  const sheet = book.sheets.findIndex(({ name }) => name === mark.sheet);
  if (sheet < 0) {
    throw new EditRefused(
      `compare: the sheet "${mark.sheet}" of this mark is not there; undo its removal, or give it its name again`,
    );
  }
  const plan = tableOfSheet(book, sheet);
  return { comparison: compareTables(mark.table, comparedTable(book, sheet, plan)), sheet, plan };
}

export function comparisonReport(book: Book, mark: SessionMark): ComparisonReport {
  const { comparison, sheet, plan } = compareWithNow(book, mark);
  const shown = comparison.movements.slice(0, mostShown);
  return {
    mark: markState(mark),
    movements: shown.map((movement) => shownMovement(movement, sheet, plan)),
    movedCells: comparison.movements.length,
    sentence: sentenceOf(comparison),
  };
}

function shownMovement(movement: Movement, sheet: number, plan: TablePlan): ComparisonReport["movements"][number] {
  const { header, key, rowAfter, before, after, change, relative, sigmas } = movement;
  const { name, unit } = readHeader(header);
  const column = plan.columns.find(
    (each) => each.header === header || recogniseColumn(each.header).name === recogniseColumn(header).name,
  );
  const place =
    column === undefined || rowAfter === undefined
      ? undefined
      : { sheet, row: plan.firstRow + rowAfter, column: column.index };
  const digits = digitsFor(relative);
  return {
    place,
    key,
    header: name || header,
    before: cellText(before, digits, unit?.text),
    after: cellText(after, digits, unit?.text),
    change: change === undefined ? kindOfChange(movement) : signed(change, 4),
    sigmas,
    relative,
  };
}

/** Digits enough to tell two numbers apart. */
function digitsFor(relative: number | undefined): number {
  if (relative === undefined || relative === 0) return 6;
  return Math.min(17, Math.max(6, Math.ceil(-Math.log10(Math.abs(relative))) + 2));
}

function cellText(cell: Cell, digits: number, unit: string | undefined): string {
  if (typeof cell === "number") return withUnitText(displayNumber(cell, { kind: "significant", digits }), unit);
  if (cell instanceof CellError) return cell.code;
  return cell === null ? "blank" : displayCell(cell, { kind: "general" });
}

function signed(value: number, digits: number): string {
  const text = displayNumber(Math.abs(value), { kind: "significant", digits });
  return `${value < 0 ? "\u2212" : "+"}${text}`;
}

function sentenceOf({ movements, onlyBefore, onlyAfter }: Comparison): string {
  const [first] = movements;
  const moved = movements.length === 0 ? "Nothing moved" : `${counted(movements.length, "value")} moved`;
  const most = first?.sigmas === undefined ? "" : `, most of all ${first.key} by ${signed(first.sigmas, 3)} \u03c3`;
  const gone = onlyBefore.length > 0 ? ` No longer there, so not compared: ${onlyBefore.join(", ")}.` : "";
  const added = onlyAfter.length > 0 ? ` New since the mark: ${onlyAfter.join(", ")}.` : "";
  return `${moved}${most}.${gone}${added}`;
}
