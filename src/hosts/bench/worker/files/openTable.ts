import { FileProblem } from "../../../../files/fileProblem.js";
import type { TableFile, TableFormat } from "../../../../files/table/tableFile.js";
import { TableFileReading } from "../../../../files/table/tableFileReading.js";
import { sentenceOfTableFinding } from "../../../../files/table/tableFinding.js";
import { bookOf } from "../../../../sheet/book/bookOf.js";
import { mostRows } from "../../../../sheet/limits.js";
import { counted } from "../actions/words.js";
import { namedHeader } from "./namedHeader.js";
import { notesName, notesSheet } from "./notesSheet.js";
import type { FileToOpen, Opener, OpenWatch } from "./opener.js";
import { tableColumns } from "./tableColumns.js";
import { titleOf } from "./titleOf.js";

const named: Readonly<Record<TableFormat, string>> = {
  delimited: "",
  ecsv: " (ECSV)",
  votable: " (VOTable)",
  "machine-readable": " (machine-readable table)",
  ipac: " (IPAC table)",
  "fixed-width": " (fixed-width table)",
  workbook: " (workbook)",
};

/** A table as text, of whatever form its content has: what every other kind of file is not. */
export const openTable: Opener = {
  isFor: () => true,
  longest: 400_000_000,
  async read(file, watch) {
    const table = await readTable(file, watch);
    const { rows, columns, format } = table;
    const header = table.header.map((text, index) =>
      namedHeader(text, table.unitsRow?.[index], table.notes[index]?.ucd),
    );
    const isDescribed = format !== "delimited" && format !== "fixed-width";
    const notes = isDescribed ? notesSheet({ ...table, header }) : undefined;
    const book = bookOf([
      { name: "Table", columns: tableColumns({ ...table, header }) },
      ...(notes ? [{ name: notesName, columns: notes }] : []),
    ]);
    const findings = table.findings.map(sentenceOfTableFinding);
    if (notes) findings.push(`What the file says of its columns and of itself stands in the sheet ${notesName}.`);
    else if (table.remarks.length > 0) findings.push(asideSentence(table));
    const history = [
      `opened ${file.name}${named[format]}: ${counted(rows, "row")}, ${counted(columns.length, "column")}`,
    ];
    return { document: { title: titleOf(file.name), book, presentation: [], marks: [], history }, findings };
  },
};

async function readTable({ content }: FileToOpen, { signal, progress }: OpenWatch): Promise<TableFile> {
  const reading = new TableFileReading();
  const pieces = content.stream().getReader();
  try {
    signal.throwIfAborted();
    for (let read = await pieces.read(); !read.done; read = await pieces.read()) {
      signal.throwIfAborted();
      reading.push(read.value);
      if (reading.rows >= mostRows) throw tooManyRows();
      progress(reading.taken);
    }
  } finally {
    await pieces.cancel();
  }
  signal.throwIfAborted();
  const table = reading.finish();
  if (table.rows + (table.unitsRow ? 2 : 1) > mostRows) throw tooManyRows();
  return table;
}

function tooManyRows(): FileProblem {
  return new FileProblem(
    "too-large",
    `It has more than the ${(mostRows - 1).toLocaleString("en")} rows that a sheet holds below its headers; cut it into parts and open each.`,
  );
}

function asideSentence({ delimited, remarks }: TableFile): string {
  const lines = delimited?.preamble ?? remarks;
  const [first = ""] = lines;
  const quoted = first.length > 60 ? `${first.slice(0, 59)}…` : first;
  const before = lines.length === 1 ? "A line" : `${lines.length} lines`;
  return `${before} of comment above the header ${lines.length === 1 ? "was" : "were"} left aside: "${quoted}".`;
}
