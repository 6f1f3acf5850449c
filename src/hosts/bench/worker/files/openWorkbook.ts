import type { Cell } from "../../../../call/cell.js";
import { isPacked } from "../../../../files/otherKinds.js";
import { readWorkbook } from "../../../../files/xlsx/readWorkbook.js";
import type { Book } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { usedColumns, usedRows } from "../../../../sheet/book/usedRows.js";
import { presentationOfWorkbook } from "../../../../sheet/presentation/workbookPresentation.js";
import { tableOf } from "../../../../table/tableOf.js";
import { keepValues } from "./keepValues.js";
import type { Opener } from "./opener.js";
import { titleOf } from "./titleOf.js";

/** Rows in which the headers of a sheet are looked for. */
const nearRows = 40;

/** A workbook (.xlsx), whole: all its sheets with formulas, names, widths and formats. */
export const openWorkbook: Opener = {
  isFor: ({ start }) => isPacked(start),
  longest: 400_000_000,
  async read({ name, size, content }, { signal, progress }) {
    const bytes = new Uint8Array(await content.arrayBuffer());
    signal.throwIfAborted();
    const workbook = await readWorkbook(bytes, {
      isCancelled: () => signal.aborted,
      onProgress: (done, total) => progress(total > 0 ? (size * done) / total : 0),
    });
    signal.throwIfAborted();
    const { book, finding } = keepValues(workbook!.book);
    const { presentation, losses } = presentationOfWorkbook({ ...workbook!, book });
    const findings = [
      ...workbook!.notes,
      ...(finding === undefined ? [] : [finding]),
      ...losses,
      ...book.sheets.flatMap((_, sheet) => belowTitles(book, sheet)),
    ];
    const { sheets } = book;
    const history = [`opened ${name}: ${sheets.length === 1 ? "1 sheet" : `${sheets.length} sheets`}`];
    return { document: { title: titleOf(name), book, presentation, marks: [], history }, findings, calculated: book };
  },
};

/** Headers stand in the first row here; where a file has titles above them, that is told. */
function belowTitles(book: Book, sheet: number): string[] {
  const [rows, columns] = [Math.min(nearRows, usedRows(book, sheet)), usedColumns(book, sheet)];
  const near = Array.from({ length: rows }, (_, row) =>
    Array.from({ length: columns }, (_, column): Cell => cellOf(book, { sheet, row, column })),
  );
  const { headerRow = 0 } = tableOf(near) ?? {};
  if (headerRow === 0) return [];
  const above = headerRow === 1 ? "row 1" : `rows 1 to ${headerRow}`;
  return [
    `The column names of the sheet ${book.sheets[sheet]!.name} seem to stand in row ${headerRow + 1}; here they are read from row 1: delete ${above} if that is so.`,
  ];
}
