import { columnLetters } from "../../../../sheet/book/address.js";
import type { Area } from "../../../../sheet/book/book.js";
import { printFormat } from "../../../../sheet/display/formatText.js";
import { clearCells } from "../../../../sheet/edit/clearCells.js";
import type { Edit } from "../../../../sheet/edit/draft.js";
import { moveCells } from "../../../../sheet/edit/moveCells.js";
import { defineName, removeName } from "../../../../sheet/edit/names.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import { replaceText } from "../../../../sheet/edit/replaceText.js";
import { addSheet, removeSheet, renameSheet } from "../../../../sheet/edit/sheets.js";
import { sortRows } from "../../../../sheet/edit/sortRows.js";
import { textToNumber } from "../../../../sheet/edit/textToNumber.js";
import { insertPresentedSheet, removePresentedSheet } from "../../../../sheet/presentation/followColumns.js";
import type { Presentation } from "../../../../sheet/presentation/presentation.js";
import { freezeColumns, presentColumns } from "../../../../sheet/presentation/presentColumns.js";
import type { Action } from "../../protocol/request.js";
import { bookOfSession, presentationOfSession, type Session } from "../session.js";
import { lengthInUse } from "../state/sheetSize.js";
import { countRows, visibleSpans } from "../view/visibleRows.js";
import { clipArea } from "./clipArea.js";
import type { OwnClip } from "./clips.js";
import { fill, fillOver, fillToEnd } from "./fills.js";
import { paste } from "./paste.js";
import type { Plan } from "./plan.js";
import { setUnit } from "./setUnit.js";
import { deleteColumnsPlan, deleteRowsPlan, insertColumnsPlan, insertRowsPlan, reorderPlan } from "./structure.js";
import { typeOver, typeTexts } from "./typeTexts.js";
import { areaWords, columnName, counted } from "./words.js";

/** What an action comes to in a session. Throws EditRefused where it cannot be done as asked. */
export function planOf(session: Session, action: Action, clip: OwnClip | undefined): Plan {
  const book = bookOfSession(session);
  switch (action.do) {
    case "type":
      return typeTexts(session, action);
    case "type over":
      return typeOver(session, action);
    case "clear":
      return clear(session, action.area);
    case "fill":
      return fill(session, action);
    case "fill over":
      return fillOver(session, action.area);
    case "fill to end":
      return fillToEnd(session, action.area);
    case "paste":
      return paste(session, action, clip);
    case "move":
      return move(session, action);
    case "insert rows":
      return insertRowsPlan(action);
    case "delete rows":
      return deleteRowsPlan(session, action);
    case "insert columns":
      return insertColumnsPlan(session, action);
    case "delete columns":
      return deleteColumnsPlan(session, action);
    case "reorder columns":
      return reorderPlan(session, action);
    case "sort":
      return sort(session, action);
    case "replace":
      return replace(session, action);
    case "text to number": {
      const { sheet, column } = action;
      const end = lengthInUse(book.sheets[sheet]!.columns[column]?.cells ?? { length: 0, chunks: [], starts: [] });
      const spans = visibleSpans(session, sheet, 1, end);
      const edits = spans.map(({ from, to }) => textToNumber({ sheet, column, from, to }));
      return {
        name: `made numbers of the texts in ${columnName(book, sheet, column)}`,
        edits,
        edited: areasOf(spans, { sheet, top: 1, bottom: end - 1, left: column, right: column }),
      };
    }
    case "set unit":
      return setUnit(session, action);
    case "format":
    case "width":
    case "hide columns":
    case "freeze":
      return seen(session, action);
    case "add sheet":
      return sheetPlan(
        `added the sheet ${action.name}`,
        addSheet(action.name),
        insertPresentedSheet(presentationOfSession(session), book.sheets.length),
      );
    case "remove sheet":
      return sheetPlan(
        `removed the sheet ${sheetName(session, action.sheet)}`,
        removeSheet(action.sheet),
        removePresentedSheet(presentationOfSession(session), action.sheet),
      );
    case "rename sheet":
      return sheetPlan(
        `renamed the sheet ${sheetName(session, action.sheet)} to ${action.name}`,
        renameSheet(action.sheet, action.name),
      );
    case "define name":
      return {
        name: `named ${action.text.replace(/^=/, "")} ${action.name}`,
        edits: [defineName(action.name, action.text, action.sheet)],
        edited: [],
      };
    case "remove name":
      return { name: `removed the name ${action.name}`, edits: [removeName(action.name)], edited: [] };
  }
}

function areasOf(spans: readonly { readonly from: number; readonly to: number }[], area: Area): Area[] {
  return spans.map(({ from, to }) => ({ ...area, top: from, bottom: to - 1 }));
}

function clear(session: Session, asked: Area): Plan {
  const book = bookOfSession(session);
  const area = clipArea(book, asked);
  const spans = visibleSpans(session, area.sheet, area.top, area.bottom + 1);
  const edited = areasOf(spans, area);
  return { name: `cleared ${areaWords(book, area, countRows(spans))}`, edits: edited.map(clearCells), edited };
}

function move(session: Session, { area, place }: Extract<Action, { do: "move" }>): Plan {
  const book = bookOfSession(session);
  const from = clipArea(book, area);
  const rows = from.bottom - from.top + 1;
  const target: Area = {
    sheet: place.sheet,
    top: place.row,
    left: place.column,
    bottom: place.row + rows - 1,
    right: place.column + from.right - from.left,
  };
  const isWhole = ({ sheet, top, bottom }: Area) => countRows(visibleSpans(session, sheet, top, bottom + 1)) === rows;
  if (!isWhole(from) || !isWhole(target)) {
    throw new EditRefused("move: the filter hides rows between these; take the filter off before, or copy and paste");
  }
  const name = `moved ${areaWords(book, from, rows)} to ${columnLetters(place.column)}${place.row + 1}`;
  return { name, edits: [moveCells(from, place)], edited: [from, target], select: target };
}

function sort(session: Session, { area, keys }: Extract<Action, { do: "sort" }>): Plan {
  const book = bookOfSession(session);
  if (session.filters[area.sheet] !== undefined) {
    throw new EditRefused("sort: the filter hides rows, and they would be sorted too; take the filter off before");
  }
  const clipped = clipArea(book, area);
  const rows = { ...clipped, top: Math.max(1, clipped.top) };
  if (rows.top >= rows.bottom) {
    throw new EditRefused(
      "sort: there are fewer than two rows to sort; select the rows of the table, without the headers",
    );
  }
  const by = keys.map(
    ({ column, descending }) => `${columnName(book, area.sheet, column)}${descending ? ", largest first" : ""}`,
  );
  return {
    name: `sorted by ${by.join(", then ")}`,
    edits: [sortRows(rows, keys)],
    edited: [],
    moved: true,
    select: rows,
  };
}

function replace(session: Session, { area, search, replacement }: Extract<Action, { do: "replace" }>): Plan {
  const clipped = clipArea(bookOfSession(session), area);
  const edited = areasOf(visibleSpans(session, clipped.sheet, clipped.top, clipped.bottom + 1), clipped);
  const edits = edited.map((part) => replaceText(part, { text: search }, replacement));
  return { name: `replaced "${search}" by "${replacement}"`, edits, edited };
}

type Seen = Extract<Action, { do: "format" | "width" | "hide columns" | "freeze" }>;

/** What changes how columns are seen and no cell. */
function seen(session: Session, action: Seen): Plan {
  const book = bookOfSession(session);
  const before = presentationOfSession(session);
  const { sheet } = action;
  if (action.do === "freeze") {
    const name = action.columns === 0 ? "let all columns scroll" : `kept ${counted(action.columns, "column")} in view`;
    return { name, edits: [], edited: [], presentation: freezeColumns(before, sheet, action.columns) };
  }
  const { columns } = action;
  const names = columns.length === 1 ? columnName(book, sheet, columns[0]!) : counted(columns.length, "column");
  const change = (name: string, presentation: Presentation): Plan => ({ name, edits: [], edited: [], presentation });
  switch (action.do) {
    case "format": {
      const { format } = action;
      return change(
        `showed ${names} as ${printFormat(format)}`,
        presentColumns(before, sheet, columns, (column) => ({ ...column, format })),
      );
    }
    case "width":
      return change(
        `set the width of ${names}`,
        presentColumns(before, sheet, columns, (column) => ({ ...column, width: action.width })),
      );
    case "hide columns":
      return change(
        `${action.hidden ? "hid" : "showed"} ${names}`,
        presentColumns(before, sheet, columns, ({ hidden: _, ...column }) =>
          action.hidden ? { ...column, hidden: true } : column,
        ),
      );
  }
}

function sheetName(session: Session, sheet: number): string {
  return bookOfSession(session).sheets[sheet]?.name ?? "";
}

function sheetPlan(name: string, edit: Edit, presentation?: Presentation): Plan {
  return { name, edits: [edit], edited: [], moved: true, ...(presentation ? { presentation } : {}) };
}
