import { deleteColumns } from "../../../../sheet/edit/deleteColumns.js";
import { deleteRows } from "../../../../sheet/edit/deleteRows.js";
import { insertColumns } from "../../../../sheet/edit/insertColumns.js";
import { insertRows } from "../../../../sheet/edit/insertRows.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import { reorderColumns } from "../../../../sheet/edit/reorderColumns.js";
import { mostRows } from "../../../../sheet/limits.js";
import {
  deletePresentedColumns,
  insertPresentedColumns,
  reorderPresentedColumns,
} from "../../../../sheet/presentation/followColumns.js";
import type { Action } from "../../protocol/request.js";
import { bookOfSession, presentationOfSession, type Session } from "../session.js";
import { sheetSize } from "../state/sheetSize.js";
import { countRows, visibleSpans } from "../view/visibleRows.js";
import type { Plan } from "./plan.js";
import { columnName, columnNames, counted } from "./words.js";

type Of<Name extends Action["do"]> = Extract<Action, { do: Name }>;

export function insertRowsPlan({ sheet, at, count }: Of<"insert rows">): Plan {
  return {
    name: `inserted ${counted(count, "row")} at row ${at + 1}`,
    edits: [insertRows(sheet, at, count)],
    edited: [],
    moved: true,
    select: { sheet, top: at, left: 0, bottom: at + count - 1, right: 0 },
  };
}

/** Rows that a filter hides are kept. */
export function deleteRowsPlan(session: Session, { sheet, at, count }: Of<"delete rows">): Plan {
  const { rows } = sheetSize(bookOfSession(session).sheets[sheet]!);
  const spans = visibleSpans(session, sheet, at, Math.min(at + count, Math.max(rows, at + 1), mostRows));
  const edits = spans.toReversed().map(({ from, to }) => deleteRows(sheet, from, to - from));
  const gone = countRows(spans);
  const name =
    gone === 1 ? `deleted row ${(spans[0]?.from ?? at) + 1}` : `deleted ${counted(gone, "row")} from row ${at + 1} on`;
  return { name, edits, edited: [], moved: true, select: { sheet, top: at, left: 0, bottom: at, right: 0 } };
}

export function insertColumnsPlan(session: Session, { sheet, at, count }: Of<"insert columns">): Plan {
  const book = bookOfSession(session);
  return {
    name: `inserted ${counted(count, "column")} before ${columnName(book, sheet, at)}`,
    edits: [insertColumns(sheet, at, count)],
    presentation: insertPresentedColumns(presentationOfSession(session), sheet, at, count),
    edited: [],
    moved: true,
    select: { sheet, top: 0, left: at, bottom: 0, right: at + count - 1 },
  };
}

export function deleteColumnsPlan(session: Session, { sheet, at, count }: Of<"delete columns">): Plan {
  const book = bookOfSession(session);
  return {
    name: `deleted ${columnNames(book, sheet, at, at + count - 1)}`,
    edits: [deleteColumns(sheet, at, count)],
    presentation: deletePresentedColumns(presentationOfSession(session), sheet, at, count),
    edited: [],
    moved: true,
    select: { sheet, top: 0, left: at, bottom: 0, right: at },
  };
}

export function reorderPlan(session: Session, { sheet, from, count, before }: Of<"reorder columns">): Plan {
  const book = bookOfSession(session);
  if (before >= from && before <= from + count) {
    throw new EditRefused("move columns: they stand there already; choose another place");
  }
  const { columns } = sheetSize(book.sheets[sheet]!);
  const what = columnNames(book, sheet, from, from + count - 1);
  const target = before > from ? before - count : before;
  return {
    name: before >= columns ? `moved ${what} to the end` : `moved ${what} before ${columnName(book, sheet, before)}`,
    edits: [reorderColumns(sheet, from, count, before)],
    presentation: reorderPresentedColumns(presentationOfSession(session), sheet, from, count, before),
    edited: [],
    moved: true,
    select: { sheet, top: 0, left: target, bottom: 0, right: target + count - 1 },
  };
}
