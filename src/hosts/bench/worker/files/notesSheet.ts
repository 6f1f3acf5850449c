import { type Column, cellAt, columnOf } from "../../../../call/column.js";
import type { DescribedTable } from "../../../../files/table/describedTable.js";
import type { ColumnNotes } from "../../../../files/table/tableFile.js";
import type { Book } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import { usedRows } from "../../../../sheet/book/usedRows.js";

/** The sheet that holds what a file says of its columns and of itself; files that have a place for it get it back. */
export const notesName = "Notes";

const headers = ["Column", "Name in the file", "Unit in the file", "Description", "UCD", "Remarks on the table"];

export interface NotedTable {
  /** As they head the columns of the table's own sheet. */
  readonly header: readonly string[];
  readonly notes: readonly ColumnNotes[];
  readonly description: string | undefined;
  readonly remarks: readonly string[];
}

/** The columns of the sheet of notes; undefined where the file says nothing beside the headers. */
export function notesSheet({ header, notes, description, remarks }: NotedTable): Column[] | undefined {
  const told = [...(description ? [description] : []), ...remarks];
  if (told.length === 0 && notes.every((own) => !own.description && !own.ucd)) return undefined;
  const rows = Math.max(header.length, told.length);
  const parts = [
    header,
    notes.map(({ name }) => name),
    notes.map(({ unit }) => unit),
    notes.map((own) => own.description),
    notes.map(({ ucd }) => ucd),
    told,
  ];
  return parts.map((texts, column) =>
    columnOf([headers[column]!, ...Array.from({ length: rows }, (_, row) => texts[row] || null)]),
  );
}

/** What the sheet of notes of a book says of a table with these headers; nothing where the book has none. */
export function notesOfBook(book: Book, header: readonly string[]): Pick<DescribedTable, "notes" | "remarks"> {
  const sheet = book.sheets.findIndex(({ name }) => name === notesName);
  const isOurs = sheet >= 0 && headers.every((text, column) => cellOf(book, { sheet, row: 0, column }) === text);
  if (!isOurs) return {};
  const to = usedRows(book, sheet);
  const texts = (column: number): readonly (string | undefined)[] => {
    const cells = readColumn(book, { sheet, column, from: 1, to });
    return Array.from({ length: to - 1 }, (_, row) => textOf(cellAt(cells, row)));
  };
  const [heads, names, units] = [texts(0), texts(1), texts(2)];
  const [descriptions, ucds, remarks] = [texts(3), texts(4), texts(5)];
  const notes = header.map((text): ColumnNotes | undefined => {
    const row = heads.indexOf(text);
    const name = names[row];
    if (name === undefined) return undefined;
    return { name, unit: units[row], description: descriptions[row], ucd: ucds[row] };
  });
  return { notes, remarks: remarks.filter((text) => text !== undefined) };
}

function textOf(cell: unknown): string | undefined {
  return typeof cell === "string" || typeof cell === "number" ? String(cell) : undefined;
}
