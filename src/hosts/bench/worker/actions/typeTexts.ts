import { CellError } from "../../../../call/cell.js";
import type { Area } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { entryOf } from "../../../../sheet/edit/entryOf.js";
import { EditRefused } from "../../../../sheet/edit/refused.js";
import { type Entry, setCells } from "../../../../sheet/edit/setCells.js";
import { writeOver } from "../../../../sheet/edit/writeOver.js";
import { readFormula } from "../../../../sheet/formula/readFormula.js";
import type { Action } from "../../protocol/request.js";
import { functions } from "../functions.js";
import { bookOfSession, type Session } from "../session.js";
import { countRows, nextVisibleSpans, visibleSpans } from "../view/visibleRows.js";
import { clipArea } from "./clipArea.js";
import type { Plan } from "./plan.js";
import { areaWords, columnName, counted } from "./words.js";

type Typed = Extract<Action, { do: "type" }>;

/** A selection of more rows means the rows of the table, not a million blank ones. */
const mostTyped = 10_000;

/** What was typed, row by row; under a filter it goes into the rows that are seen. */
export function typeTexts(session: Session, { place, texts }: Typed): Plan {
  const { sheet, row, column } = place;
  const entries = texts.map((line) => line.map(entryOf));
  const width = Math.max(1, ...texts.map((line) => line.length));
  refuseUnreadable(entries, place);
  const spans = texts.length > 1 ? nextVisibleSpans(session, sheet, row, texts.length) : [{ from: row, to: row + 1 }];
  const edited = spans.map(
    ({ from, to }): Area => ({ sheet, top: from, left: column, bottom: to - 1, right: column + width - 1 }),
  );
  let next = 0;
  const edits = spans.map(({ from, to }) => {
    const lines = entries.slice(next, next + to - from);
    next += to - from;
    return setCells({ sheet, row: from, column }, lines);
  });
  return { name: nameOf(session, place, entries, width), edits, edited };
}

/** One text over a whole area; under a filter in the rows that are seen. */
export function typeOver(session: Session, { area, place, text }: Extract<Action, { do: "type over" }>): Plan {
  const book = bookOfSession(session);
  const { sheet } = area;
  const entry = entryOf(text);
  refuseUnreadable([[entry]], place);
  const end = area.bottom - area.top > mostTyped ? clipArea(book, area).bottom : area.bottom;
  const spans = visibleSpans(session, sheet, area.top, end + 1);
  const edited = spans.map(({ from, to }): Area => ({ ...area, top: from, bottom: to - 1 }));
  const isFormula = typeof entry === "object" && entry !== null;
  const verb = entry === null ? "cleared" : isFormula ? "entered a formula for" : "entered one value for";
  const name = `${verb} ${areaWords(book, area, countRows(spans))}`;
  return { name, edits: edited.map((part) => writeOver(part, entry, place)), edited, select: area };
}

/** A formula that cannot be read stays where it is typed, with the reason, until it can. */
function refuseUnreadable(entries: readonly (readonly Entry[])[], place: Typed["place"]): void {
  const only = entries.length === 1 && entries[0]?.length === 1 ? entries[0][0] : undefined;
  if (typeof only !== "object" || only === null || only instanceof CellError) return;
  const { problem } = readFormula(only.formula, place.row, place.column, functions);
  if (problem?.topic === "a formula that cannot be read") throw new EditRefused(problem.message);
}

function nameOf(
  session: Session,
  { sheet, row, column }: Typed["place"],
  entries: readonly (readonly Entry[])[],
  width: number,
): string {
  const book = bookOfSession(session);
  const first = entries[0]?.[0] ?? null;
  if (row === 0 && entries.length === 1) {
    if (width > 1) return `named ${counted(width, "column")}`;
    return first === null ? `took the name from ${columnName(book, sheet, column)}` : `named a column ${said(first)}`;
  }
  const all = entries.flat();
  const area = { sheet, top: row, left: column, bottom: row, right: column + width - 1 };
  const where = areaWords(book, area, entries.length);
  if (all.every((entry) => entry === null)) return `cleared ${where}`;
  if (all.some((entry) => typeof entry === "object" && entry !== null)) {
    return `entered ${all.length === 1 ? "a formula" : "formulas"} for ${where}`;
  }
  const wasBlank = entries.every((line, down) =>
    line.every((_, across) => cellOf(book, { sheet, row: row + down, column: column + across }) === null),
  );
  return `${wasBlank ? "entered" : "revised"} ${where}`;
}

function said(entry: Entry): string {
  return typeof entry === "object" ? "by a formula" : `"${String(entry)}"`;
}
