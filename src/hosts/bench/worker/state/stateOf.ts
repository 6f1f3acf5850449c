import { formulaText } from "../../../../sheet/formula/formula.js";
import { sheetPresentation } from "../../../../sheet/presentation/presentation.js";
import type { BookState, SavedState, SheetState } from "../../protocol/bookState.js";
import { bookOfSession, presentationOfSession, type Session } from "../session.js";
import { columnStates } from "./columnStates.js";
import { errorCount } from "./errorCount.js";
import { sheetSize } from "./sheetSize.js";

/** What the page is told of a session after every change. */
export function stateOf(session: Session, saved: SavedState): BookState {
  const book = bookOfSession(session);
  const { versions, present } = session.history;
  return {
    id: session.id,
    title: session.title,
    version: session.version,
    sheets: book.sheets.map((_, sheet) => sheetState(session, sheet)),
    names: book.names.map(({ name, formula }) => ({ name, refersTo: formulaText(formula, 0, 0) })),
    history: { labels: versions.map(({ name }) => name), present },
    saved,
    problems: errorCount(book),
  };
}

function sheetState(session: Session, index: number): SheetState {
  const sheet = bookOfSession(session).sheets[index]!;
  const presentation = sheetPresentation(presentationOfSession(session), index);
  const { rows, columns } = sheetSize(sheet);
  const filter = session.filters[index];
  return {
    name: sheet.name,
    rows,
    columns,
    visibleRows: filter ? filter.rows.length : rows,
    filter: filter?.conditions ?? [],
    frozenColumns: presentation.frozenColumns,
    columnStates: columnStates(sheet, presentation),
  };
}
