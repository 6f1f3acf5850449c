import type { Area, Book } from "../../../../sheet/book/book.js";
import { columnAt } from "../../../../sheet/book/book.js";
import { readCell } from "../../../../sheet/book/cells.js";
import { usedColumns } from "../../../../sheet/book/usedRows.js";
import type { Edit } from "../../../../sheet/edit/draft.js";
import { fillCells } from "../../../../sheet/edit/fillCells.js";
import { fillRows } from "../../../../sheet/edit/fillRows.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import type { Action } from "../../protocol/request.js";
import { bookOfSession, type Session } from "../session.js";
import { countRows, visibleSpans } from "../view/visibleRows.js";
import { clipArea } from "./clipArea.js";
import type { Plan } from "./plan.js";
import { columnNames, counted } from "./words.js";

/** Repeats an area beyond one of its sides. */
export function fill(session: Session, { area, toward, count, series }: Extract<Action, { do: "fill" }>): Plan {
  const { sheet, top, bottom, left, right } = area;
  const book = bookOfSession(session);
  const name = `filled ${columnNames(book, sheet, left, right)} ${toward}`;
  if (toward === "down" || toward === "up") {
    const filled =
      toward === "down"
        ? { ...area, top: bottom + 1, bottom: bottom + count }
        : { ...area, top: Math.max(0, top - count), bottom: top - 1 };
    const whole: Area = { ...area, top: Math.min(top, filled.top), bottom: Math.max(bottom, filled.bottom) };
    const filtered = session.filters[sheet] !== undefined;
    const edits = filtered ? fillSeen(session, area, filled, series) : [fillCells(area, toward, count, series)];
    const rows = countRows(visibleSpans(session, sheet, filled.top, filled.bottom + 1));
    return { name: `${name} ${counted(rows, "row")}`, edits, edited: [filled], select: whole };
  }
  const filled =
    toward === "right"
      ? { ...area, left: right + 1, right: right + count }
      : { ...area, left: Math.max(0, left - count), right: left - 1 };
  const spans = visibleSpans(session, sheet, top, bottom + 1);
  const edits = spans.map(({ from, to }) => fillCells({ ...area, top: from, bottom: to - 1 }, toward, count, series));
  const select = { ...area, left: Math.min(left, filled.left), right: Math.max(right, filled.right) };
  return { name: `${name} ${counted(count, "column")}`, edits, edited: [filled], select };
}

/** The first row of an area over its other rows. */
export function fillOver(session: Session, area: Area): Plan {
  const book = bookOfSession(session);
  const { sheet, top, left, right } = area;
  const clipped = area.bottom - top > 1000 ? clipArea(book, area) : area;
  const from: Area = { ...clipped, right, bottom: top };
  const filled: Area = { ...clipped, right, top: top + 1 };
  if (filled.top > filled.bottom) {
    throw new EditRefused(
      "fill: one row is selected; select the rows below it too, which its cells are to be filled over",
    );
  }
  const rows = countRows(visibleSpans(session, sheet, filled.top, filled.bottom + 1));
  return {
    name: `filled ${columnNames(book, sheet, left, right)} down ${counted(rows, "row")}`,
    edits: fillSeen(session, from, filled, false),
    edited: [filled],
    select: area,
  };
}

/** Down to the last row of the table that the area stands in or beside. */
export function fillToEnd(session: Session, area: Area): Plan {
  const book = bookOfSession(session);
  const end = tableEnd(book, area);
  if (end <= area.bottom) {
    throw new EditRefused(
      "fill: the table beside these cells ends here or is not there; drag the fill handle as far as it is to go",
    );
  }
  const filled: Area = { ...area, top: area.bottom + 1, bottom: end };
  const rows = countRows(visibleSpans(session, area.sheet, filled.top, end + 1));
  return {
    name: `filled ${columnNames(book, area.sheet, area.left, area.right)} down ${counted(rows, "row")}`,
    edits: fillSeen(session, area, filled, false),
    edited: [filled],
    select: { ...area, bottom: end },
  };
}

/** The last row below an area in which the columns beside it, up to a blank one, hold anything. */
function tableEnd(book: Book, { sheet, left, right, bottom }: Area): number {
  const used = usedColumns(book, sheet);
  const filledAt = (column: number, row: number) => readCell(columnAt(book, sheet, column).cells, row) !== null;
  const belongs = (column: number) => filledAt(column, bottom) || filledAt(column, bottom + 1);
  const beside: number[] = [];
  for (let column = left - 1; column >= 0 && belongs(column); column--) beside.push(column);
  for (let column = right + 1; column < used && belongs(column); column++) beside.push(column);
  let row = bottom;
  while (beside.some((column) => filledAt(column, row + 1))) row++;
  return row;
}

/** Fills rows that are seen, from those of the area that are. */
function fillSeen(session: Session, area: Area, filled: Area, series: boolean): readonly Edit[] {
  const { sheet, top, bottom } = area;
  const targets = visibleSpans(session, sheet, filled.top, filled.bottom + 1);
  const sources = visibleSpans(session, sheet, top, bottom + 1).flatMap(({ from, to }) =>
    Array.from({ length: to - from }, (_, index) => from + index),
  );
  if (series && (countRows(targets) < filled.bottom + 1 - filled.top || sources.length < bottom + 1 - top)) {
    throw new EditRefused(
      "fill: a series would go over rows that the filter hides; take the filter off, or fill without a series",
    );
  }
  if (series) return [fillCells(area, filled.top > bottom ? "down" : "up", filled.bottom + 1 - filled.top, true)];
  return sources.length === 0 || targets.length === 0 ? [] : [fillRows(area, sources, targets)];
}
