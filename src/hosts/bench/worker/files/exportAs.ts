import type { BookDocument } from "../../../../files/bookFile/bookDocument.js";
import { writeBookFile } from "../../../../files/bookFile/writeBookFile.js";
import { delimitedOfTable } from "../../../../files/delimited/delimitedOfTable.js";
import type { Delimiter } from "../../../../files/delimited/dialect.js";
import { writeDelimited } from "../../../../files/delimited/writeDelimited.js";
import { writeEcsv } from "../../../../files/ecsv/writeEcsv.js";
import { writtenTable } from "../../../../files/table/writtenColumn.js";
import { writeVotable } from "../../../../files/votable/writeVotable.js";
import { writeWorkbook } from "../../../../files/xlsx/writeWorkbook.js";
import { workbookOfPresentation } from "../../../../sheet/presentation/workbookPresentation.js";
import type { ExportedFile } from "../../protocol/answers.js";
import type { ExportFormat } from "../../protocol/bench.js";
import { describedSheet, valuesSentences } from "./describedSheet.js";

export interface ExportWatch {
  onProgress?(done: number, total: number): void;
}

interface Written {
  readonly content: Iterable<string> | Uint8Array;
  readonly told: readonly string[];
}

interface Exporter {
  readonly ending: string;
  readonly type: string;
  write(document: BookDocument, sheet: number, watch: ExportWatch): Written | Promise<Written>;
}

/** The kinds of files that can be written. */
const exporters: Readonly<Record<ExportFormat, Exporter>> = {
  csv: { ending: "csv", type: "text/csv;charset=utf-8", write: (document, sheet) => delimited(document, sheet, ",") },
  tsv: {
    ending: "tsv",
    type: "text/tab-separated-values;charset=utf-8",
    write: (document, sheet) => delimited(document, sheet, "\t"),
  },
  ecsv: {
    ending: "ecsv",
    type: "text/plain;charset=utf-8",
    write(document, sheet) {
      const table = describedSheet(document, sheet);
      const written = writtenTable(table);
      return { content: writeEcsv(table, written), told: [...valuesSentences(document, sheet), ...written.losses] };
    },
  },
  votable: {
    ending: "vot",
    type: "application/x-votable+xml",
    write(document, sheet) {
      const table = describedSheet(document, sheet);
      const written = writtenTable(table);
      const content = writeVotable(table, "TABLEDATA", written);
      return { content, told: [...valuesSentences(document, sheet), ...written.losses] };
    },
  },
  xlsx: {
    ending: "xlsx",
    type: "application/vnd.openxmlformats-officedocument.spreadsheetml.sheet",
    async write({ book, presentation, marks, revisions }, _, watch) {
      const bytes = await writeWorkbook(workbookOfPresentation(book, presentation), watch);
      const told = [];
      if (marks.length > 0) told.push("Marks are kept in the Barycell book alone, not in a workbook.");
      if (revisions) told.push("What belongs to revisions is kept in the Barycell book alone, not in a workbook.");
      return { content: bytes!, told };
    },
  },
  book: {
    ending: "barycell",
    type: "application/json",
    write: (document) => ({ content: writeBookFile(document), told: [] }),
  },
};

/** A book, or one of its sheets where the format holds one table, as a file. */
export async function exportAs(
  document: BookDocument,
  format: ExportFormat,
  sheet: number,
  watch: ExportWatch = {},
): Promise<ExportedFile> {
  const exporter = exporters[format];
  const { content, told } = await exporter.write(document, sheet, watch);
  const { sheets } = document.book;
  const part = format === "book" || format === "xlsx" || sheets.length === 1 ? "" : ` - ${sheets[sheet]?.name}`;
  const name = `${document.title}${part}`.replace(/[\\/:*?"<>|\p{Cc}]/gu, "_").trim() || "Table";
  return {
    name: `${name}.${exporter.ending}`,
    type: exporter.type,
    bytes: content instanceof Uint8Array ? content : encoded(content),
    told,
  };
}

/** The first row as the header, all others as they stand; values only. */
function delimited(document: BookDocument, sheet: number, delimiter: Delimiter): Written {
  const { table, losses } = delimitedOfTable(describedSheet(document, sheet, "as it stands"));
  return { content: writeDelimited(table, { delimiter }), told: [...valuesSentences(document, sheet), ...losses] };
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
