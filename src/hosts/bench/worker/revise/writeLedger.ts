import type { Ledger } from "../../../../revision/ledger.js";
import { entryCells, ledgerCells } from "../../../../revision/ledgerCells.js";
import { ledgerMarkdown, recordMarkdown } from "../../../../revision/ledgerMarkdown.js";
import { ledgerText } from "../../../../revision/ledgerRecord.js";
import { setCells } from "../../../../sheet/edit/setCells.js";
import { addSheet } from "../../../../sheet/edit/sheets.js";
import { sheetPresentation } from "../../../../sheet/presentation/presentation.js";
import type { ExportedFile } from "../../protocol/answers.js";
import type { Plan } from "../actions/plan.js";
import { type BookLedger, bookOfSession, presentationOfSession, type Session } from "../session.js";

/** The report lists so many changes and crossings; the sheet and the record hold more. */
const mostTold = 200;

/** A ledger on a sheet of its own; `whole` where both states of its table are held. */
export function ledgerSheet(session: Session, ledger: BookLedger, whole: Ledger | undefined): Plan {
  const book = bookOfSession(session);
  const cells = whole ? ledgerCells(whole) : cellsOfKept(ledger);
  const taken = new Set(book.sheets.map(({ name }) => name.toUpperCase()));
  let name = "Ledger";
  for (let number = 2; taken.has(name.toUpperCase()); number++) name = `Ledger ${number}`;
  const sheet = book.sheets.length;
  const before = presentationOfSession(session);
  return {
    name: `wrote the ledger of ${ledger.source.file} to the sheet ${name}`,
    edits: [addSheet(name), setCells({ sheet, row: 0, column: 0 }, cells)],
    presentation: [
      ...book.sheets.map((_, index) => sheetPresentation(before, index)),
      { frozenColumns: 1, columns: [{ width: 160 }, { width: 160 }] },
    ],
    edited: [],
    moved: true,
    select: { sheet, top: 0, left: 0, bottom: 0, right: 0 },
    said: `The ledger is in the sheet "${name}".`,
  };
}

function cellsOfKept({ inputs, source, entries }: BookLedger) {
  const derived = entries.filter(({ role }) => role === "derived");
  return entryCells(
    inputs.map(({ input }) => input),
    source,
    derived,
  );
}

export function ledgerFile(ledger: BookLedger, whole: Ledger | undefined, form: "markdown" | "json"): ExportedFile {
  const { changes, key: _, ...record } = ledger;
  const derived = { ...record, entries: record.entries.filter(({ role }) => role === "derived") };
  const isJson = form === "json";
  const pieces = isJson
    ? whole
      ? ledgerText(whole)
      : [`${JSON.stringify(record)}\n`]
    : whole
      ? ledgerMarkdown(whole, mostTold)
      : recordMarkdown(derived, changes);
  const left = changes - record.entries.length;
  return {
    name: `${nameOf(ledger.source.file)} ledger ${ledger.source.date.slice(0, 10)}.${isJson ? "json" : "md"}`,
    type: isJson ? "application/json" : "text/markdown;charset=utf-8",
    bytes: new TextEncoder().encode([...pieces].join("")),
    told:
      whole === undefined && left > 0
        ? [
            `It holds the ${record.entries.length.toLocaleString("en")} most important of ${changes.toLocaleString("en")} changes, as they were kept with the book.`,
          ]
        : [],
  };
}

function nameOf(file: string): string {
  return (
    file
      .replace(/\.[^.]*$/, "")
      .replace(/[\\/:*?"<>|\p{Cc}]/gu, "_")
      .trim() || "Revision"
  );
}
