import type { Book, DefinedName, Sheet, SheetColumn } from "../../sheet/book/book.js";
import type { Functions } from "../../sheet/formula/functions.js";
import { readFormula } from "../../sheet/formula/readFormula.js";
import { mostColumns, mostRows } from "../../sheet/limits.js";
import type { ColumnPresentation, SheetPresentation } from "../../sheet/presentation/presentation.js";
import { FileProblem } from "../fileProblem.js";
import type { BookDocument, KeptLedger, KeptMark, KeptRevisions } from "./bookDocument.js";
import { anObject, ifThere, list, member, oneOf, type Part, text, unlike, wholeNumber } from "./expectation.js";
import { type PackedCells, packCells } from "./packedCells.js";
import { type PackedRun, unpackColumn } from "./packedColumn.js";
import { longestText, readCells } from "./readCells.js";
import { readFormat } from "./readFormat.js";
import { bookFormat, bookFormatVersion } from "./writeBookFile.js";

const mostSheets = 1000;
const mostNames = 100_000;
const longestFormula = 8192;
const longestName = 255;
const longestLines = 1_000_000;
const mostLedgers = 1000;

/** Cells that formulas of one book may fill: a line of a file can ask for a million. */
const mostFormulaCells = 50_000_000;

/**
 * A book from the text of a file that writeBookFile wrote; every part is checked. Its formulas are still to be
 * calculated. Throws a FileProblem that says where the text departs from the format.
 */
export function readBookFile(source: string, functions: Functions): BookDocument {
  const whole = anObject({ value: parsed(source), path: "" });
  oneOf(member(whole, "format"), [bookFormat]);
  const version = wholeNumber(member(whole, "version"), 1, 1_000_000);
  if (version > bookFormatVersion) {
    throw new FileProblem(
      "other-kind",
      `The book file is of version ${version} and this program reads version ${bookFormatVersion}; a newer Barycell is needed.`,
    );
  }
  const sheets = list(member(whole, "sheets"), mostSheets);
  if (sheets.length === 0) throw unlike(member(whole, "sheets"), "at least one sheet");
  const room = { left: mostFormulaCells };
  const read = sheets.map((sheet) => readSheet(sheet, functions, room));
  refuseTwins(
    sheets.map((sheet) => member(sheet, "name")),
    "another name for each sheet",
  );
  const revisions = ifThere(member(whole, "revisions"), readRevisions);
  const book: Book = { sheets: read.map(({ sheet }) => sheet), names: readNames(member(whole, "names"), functions) };
  return {
    title: text(member(whole, "title"), longestName),
    book,
    presentation: read.map(({ presentation }) => presentation),
    marks: list(member(whole, "marks"), mostNames).map(readMark),
    ...(revisions && { revisions }),
    history: list(member(whole, "history"), mostNames).map((label) => text(label, longestText)),
  };
}

/** Whether a text begins as a book file does; to tell it from tables. */
export function isBookFile(start: string): boolean {
  return /^\uFEFF?\s*\{\s*"format"\s*:\s*"barycell book"/.test(start);
}

function parsed(source: string): unknown {
  try {
    return JSON.parse(source.replace(/^\uFEFF/, ""));
  } catch {
    throw new FileProblem(
      "not-as-standard",
      "The book file is cut off or damaged: its text is no JSON. Take another copy of it.",
    );
  }
}

function readSheet(part: Part, functions: Functions, room: { left: number }) {
  const sheet = anObject(part);
  const name = text(member(sheet, "name"), 31);
  if (name.trim() === "" || /[[\]:*?/\\]|^'|'$/.test(name)) throw unlike(member(sheet, "name"), "a name of a sheet");
  const frozenColumns = wholeNumber(member(sheet, "frozenColumns"), 0, mostColumns);
  const parts = list(member(sheet, "columns"), mostColumns).map(anObject);
  const columns = parts.map((column, index) => readColumn(column, index, functions, room));
  const presentation: SheetPresentation = { frozenColumns, columns: parts.map(readPresentation) };
  return { sheet: { name, columns } satisfies Sheet, presentation };
}

function readColumn(column: Part, index: number, functions: Functions, room: { left: number }): SheetColumn {
  const stretches: PackedCells[] = [];
  let row = 0;
  for (const stretch of list(member(column, "values"), mostRows).map(anObject)) {
    const first = wholeNumber(member(stretch, "row"), row + 1, mostRows) - 1;
    const cells = readCells(member(stretch, "cells"), mostRows - first);
    const packed = packCells(cells, 0, cells.length, first);
    if (packed) stretches.push(packed);
    row = first + cells.length;
  }
  const runs: PackedRun[] = [];
  for (const run of list(member(column, "formulas"), mostRows).map(anObject)) {
    const from = wholeNumber(member(run, "from"), (runs.at(-1)?.to ?? 0) + 1, mostRows) - 1;
    const to = wholeNumber(member(run, "to"), from + 1, mostRows);
    room.left -= to - from;
    if (room.left < 0) throw unlike(member(run, "to"), `fewer than ${mostFormulaCells} cells of formulas in all`);
    runs.push({ from, to, formula: readFormulaText(member(run, "formula")) });
  }
  refuseOverlap(member(column, "formulas"), stretches, runs);
  return unpackColumn(stretches, runs, index, functions);
}

/** A cell is typed or calculated, never both. */
function refuseOverlap(part: Part, stretches: readonly PackedCells[], runs: readonly PackedRun[]): void {
  let at = 0;
  for (const { from, to } of runs) {
    while (at < stretches.length && endOf(stretches[at] as PackedCells) <= from) at++;
    const next = stretches[at];
    if (next !== undefined && next.row < to) {
      throw unlike({ ...part, value: `over values in row ${next.row + 1}` }, "a formula or a value for a cell");
    }
  }
}

function endOf({ row, numbers }: PackedCells): number {
  return row + numbers.length;
}

function readFormulaText(part: Part): string {
  const formula = text(part, longestFormula);
  if (!formula.startsWith("=")) throw unlike(part, "a formula that begins with =");
  return formula;
}

function readPresentation(column: Part): ColumnPresentation | undefined {
  const width = ifThere(member(column, "width"), (part) => wholeNumber(part, 1, 10_000));
  const hidden = ifThere(member(column, "hidden"), (part) => oneOf(part, [true] as const));
  const format = ifThere(member(column, "format"), readFormat);
  if (width === undefined && hidden === undefined && format === undefined) return undefined;
  return { ...(width && { width }), ...(hidden && { hidden }), ...(format && { format }) };
}

function readNames(part: Part, functions: Functions): DefinedName[] {
  const names = list(part, mostNames).map(anObject);
  refuseTwins(
    names.map((name) => member(name, "name")),
    "another name for each",
  );
  return names.map((name) => ({
    name: text(member(name, "name"), longestName),
    formula: readFormula(readFormulaText(member(name, "refersTo")), 0, 0, functions),
  }));
}

function refuseTwins(parts: readonly Part[], needed: string): void {
  const seen = new Set<string>();
  for (const part of parts) {
    const name = text(part, longestName).toUpperCase();
    if (seen.has(name)) throw unlike(part, needed);
    seen.add(name);
  }
}

function readMark(part: Part): KeptMark {
  const mark = anObject(part);
  const keys = list(member(mark, "keys"), mostRows).map((key) => text(key, longestText));
  const columns = list(member(mark, "columns"), mostColumns)
    .map(anObject)
    .map((column) => {
      const sigma = ifThere(member(column, "sigma"), (cells) => readCells(cells, mostRows));
      const header = text(member(column, "header"), longestText);
      return { header, column: readCells(member(column, "cells"), mostRows), ...(sigma && { sigma }) };
    });
  return {
    id: text(member(mark, "id"), longestName),
    name: text(member(mark, "name"), longestText),
    at: wholeNumber(member(mark, "at"), 0, Number.MAX_SAFE_INTEGER),
    sheet: text(member(mark, "sheet"), longestName),
    table: { keys, columns },
  };
}

function readRevisions(part: Part): KeptRevisions {
  const revisions = anObject(part);
  return {
    aliases: text(member(revisions, "aliases"), longestLines),
    conditions: text(member(revisions, "conditions"), longestLines),
    ledgers: list(member(revisions, "ledgers"), mostLedgers).map(readLedger),
  };
}

/** Whatever a later version adds to a ledger is kept. */
function readLedger(part: Part): KeptLedger {
  const ledger = anObject(part);
  oneOf(member(ledger, "kind"), ["barycell-ledger"]);
  wholeNumber(member(ledger, "version"), 1, 1_000_000);
  for (const entry of list(member(ledger, "entries"), mostRows)) anObject(entry);
  return ledger.value as KeptLedger;
}
