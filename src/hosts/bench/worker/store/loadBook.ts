import type { BookDocument } from "../../../../files/bookFile/bookDocument.js";
import type { PackedCells } from "../../../../files/bookFile/packedCells.js";
import { unpackColumn } from "../../../../files/bookFile/packedColumn.js";
import { emptyColumn, type SheetColumn } from "../../../../sheet/book/book.js";
import type { Functions } from "../../../../sheet/formula/functions.js";
import { readFormula } from "../../../../sheet/formula/readFormula.js";
import { type BookRecord, bookRecordFormat, type ColumnPart, type Database, type Part, partsOf } from "./database.js";
import { unpackMark } from "./packedMark.js";

export interface LoadedBook {
  readonly record: BookRecord;
  /** Its formulas are still to be calculated. */
  readonly document: BookDocument;
  readonly columns: readonly (readonly (ColumnPart | undefined)[])[];
  readonly parts: readonly number[];
}

/** A book that is stored and cannot be read. */
export class BookUnreadable extends Error {
  override readonly name = "BookUnreadable";
}

export async function loadBook(database: Database, id: string, functions: Functions): Promise<LoadedBook | undefined> {
  const transaction = database.transaction(["books", "parts"]);
  const [record, keys, values] = await Promise.all([
    transaction.objectStore("books").get(id),
    transaction.objectStore("parts").getAllKeys(partsOf(id)),
    transaction.objectStore("parts").getAll(partsOf(id)),
  ]);
  if (record === undefined) return undefined;
  if (record.format > bookRecordFormat) {
    throw new BookUnreadable(
      `"${record.title}" was saved by a newer Barycell; load the page anew, or use the newer program.`,
    );
  }
  const parts = new Map(keys.map(([, number], index) => [number, values[index] as Part]));
  const columns = record.sheets.map((sheet) =>
    sheet.columns.map((number) => (number === 0 ? undefined : part(record, parts, number, "column").column)),
  );
  const stretchesOf = ({ pieces }: ColumnPart): PackedCells[] =>
    pieces.flatMap(({ start, part: number }) =>
      part(record, parts, number, "cells").cells.map((cells) => ({ ...cells, row: cells.row + start })),
    );
  const unpacked = (column: ColumnPart | undefined, index: number): SheetColumn =>
    column ? unpackColumn(stretchesOf(column), column.runs, index, functions) : emptyColumn;
  const { title, names, presentation, marks, revisions, history } = record;
  const document: BookDocument = {
    title,
    book: {
      sheets: record.sheets.map(({ name }, sheet) => ({ name, columns: (columns[sheet] ?? []).map(unpacked) })),
      names: names.map(({ name, refersTo }) => ({ name, formula: readFormula(refersTo, 0, 0, functions) })),
    },
    presentation,
    marks: marks.map((number) => unpackMark(part(record, parts, number, "mark").mark)),
    ...(revisions && {
      revisions: {
        ...revisions,
        ledgers: revisions.ledgers.map((number) => part(record, parts, number, "ledger").ledger),
      },
    }),
    history,
  };
  return { record, document, columns, parts: [...parts.keys()] };
}

function part<Is extends Part["is"]>(
  { title }: BookRecord,
  parts: ReadonlyMap<number, Part>,
  number: number,
  is: Is,
): Extract<Part, { is: Is }> {
  const found = parts.get(number);
  if (found?.is !== is) throw new BookUnreadable(`A part of "${title}" is gone from the browser's storage.`);
  return found as Extract<Part, { is: Is }>;
}
