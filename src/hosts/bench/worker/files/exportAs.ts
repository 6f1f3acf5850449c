import type { BookDocument } from "../../../../files/bookFile/bookDocument.js";
import { writeBookFile } from "../../../../files/bookFile/writeBookFile.js";
import { fieldOfCell } from "../../../../files/cell/fieldOfCell.js";
import type { Delimiter } from "../../../../files/delimited/dialect.js";
import { writeDelimited } from "../../../../files/delimited/writeDelimited.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import { usedColumns, usedRows } from "../../../../sheet/book/usedRows.js";
import type { ExportFormat } from "../../protocol/bench.js";

export interface ExportedFile {
  readonly name: string;
  readonly type: string;
  readonly bytes: Uint8Array;
}

interface Exporter {
  readonly ending: string;
  readonly type: string;
  write(document: BookDocument, sheet: number): Iterable<string> | Uint8Array;
}

/** The kinds of files that can be written. */
const exporters: Readonly<Partial<Record<ExportFormat, Exporter>>> = {
  csv: { ending: "csv", type: "text/csv;charset=utf-8", write: (document, sheet) => delimited(document, sheet, ",") },
  tsv: {
    ending: "tsv",
    type: "text/tab-separated-values;charset=utf-8",
    write: (document, sheet) => delimited(document, sheet, "\t"),
  },
  book: { ending: "barycell", type: "application/json", write: writeBookFile },
};

/** A book, or one of its sheets where the format holds one table, as a file. */
export function exportAs(document: BookDocument, format: ExportFormat, sheet: number): ExportedFile {
  const exporter = exporters[format];
  if (exporter === undefined) {
    throw new Error(`${format} files cannot be written here; choose ${Object.keys(exporters).join(", ")}.`);
  }
  const written = exporter.write(document, sheet);
  const { sheets } = document.book;
  const part = format === "book" || sheets.length === 1 ? "" : ` - ${sheets[sheet]?.name}`;
  const name = `${document.title}${part}`.replace(/[\\/:*?"<>|\p{Cc}]/gu, "_").trim() || "Table";
  return {
    name: `${name}.${exporter.ending}`,
    type: exporter.type,
    bytes: written instanceof Uint8Array ? written : encoded(written),
  };
}

/** The first row as the header, all others as they stand; values only. */
function delimited({ book }: BookDocument, sheet: number, delimiter: Delimiter): Iterable<string> {
  const to = usedRows(book, sheet);
  const indices = [...Array(usedColumns(book, sheet)).keys()];
  return writeDelimited(
    {
      header: indices.map((column) => fieldOfCell(cellOf(book, { sheet, row: 0, column }))),
      columns: indices.map((column) => readColumn(book, { sheet, column, from: 1, to: Math.max(1, to) })),
    },
    { delimiter },
  );
}

function encoded(pieces: Iterable<string>): Uint8Array {
  const encoder = new TextEncoder();
  const parts = Array.from(pieces, (piece) => encoder.encode(piece));
  const bytes = new Uint8Array(parts.reduce((sum, { length }) => sum + length, 0));
  let at = 0;
  for (const part of parts) {
    bytes.set(part, at);
    at += part.length;
  }
  return bytes;
}
