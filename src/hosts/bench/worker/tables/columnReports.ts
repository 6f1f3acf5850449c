import { addressText } from "../../../../sheet/book/address.js";
import type { Book, Place, SheetColumn } from "../../../../sheet/book/book.js";
import { listProblems } from "../../../../sheet/book/listProblems.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import { type ColumnCheck, checkColumn } from "../../../../table/checkColumn.js";
import { withNeighbours } from "../../../../table/checkTable.js";
import { sentenceOfColumnFinding } from "../../../../table/columnFinding.js";
import type { RecognisedColumn } from "../../../../table/recogniseColumn.js";
import { kindPhrase } from "../../../../units/kind.js";
import type { ColumnReport, TableReport } from "../../protocol/answers.js";
import { counted } from "../actions/words.js";
import { lengthInUse } from "../state/sheetSize.js";
import { tableOfSheet } from "./tableOfSheet.js";

const known = new WeakMap<
  SheetColumn,
  { readonly rows: number; readonly unitCell: string | undefined; readonly check: ColumnCheck }
>();

/**
 * What was understood of the table of a sheet, and what to look at. Between two columns others have their turn; columns
 * that did not change since they were looked at are not looked at again.
 */
export async function tableReport(book: Book, sheet: number): Promise<TableReport> {
  const { columns, firstRow, rows } = tableOfSheet(book, sheet);
  const checks: ColumnCheck[] = [];
  for (const { index, header, unitCell, column } of columns) {
    const key = book.sheets[sheet]!.columns[index]!;
    let seen = known.get(key);
    if (seen?.rows !== rows || seen.unitCell !== unitCell) {
      await new Promise((resume) => setTimeout(resume, 0));
      seen = { rows, unitCell, check: checkColumn(header, unitCell, column) };
      known.set(key, seen);
    }
    checks.push(seen.check);
  }
  const reports = withNeighbours(checks).map((check, at) => {
    const { index } = columns[at]!;
    return columnReport(check, { sheet, row: firstRow, column: index });
  });
  const spans = (book.sheets[sheet]?.columns ?? []).map(({ cells }, column) => ({
    sheet,
    column,
    from: 0,
    to: cells.length,
  }));
  const errors = spans.flatMap((span) =>
    listProblems(book, span).map(({ message, count, first }) => ({ message, count, first })),
  );
  return { sheet, columns: reports, errors };
}

/** What another header would make of a column. */
export function headerReport(book: Book, header: string, { sheet, column }: Place): ColumnReport {
  const cells = book.sheets[sheet]?.columns[column]?.cells;
  const to = Math.max(1, cells ? lengthInUse(cells) : 1);
  const check = checkColumn(header, undefined, readColumn(book, { sheet, column, from: 1, to }));
  return columnReport(check, { sheet, row: 1, column });
}

/** `first` is the first cell below the header. */
function columnReport(check: ColumnCheck, first: Place): ColumnReport {
  const { header, recognised, numbers, texts, blanks, findings } = check;
  const counts = [numbers && counted(numbers, "number"), texts && counted(texts, "text"), blanks && `${blanks} blank`];
  return {
    column: first.column,
    header,
    understood: understood(recognised),
    contents: counts.filter(Boolean).join(", ") || "no cells",
    findings: findings.map((finding) => {
      const message = sentenceOfColumnFinding(finding, header, (row) => addressText(first.row + row, first.column));
      const row = "row" in finding ? first.row + finding.row : 0;
      return { message, place: { ...first, row } };
    }),
  };
}

function understood({ quantity, isUncertainty, unit }: RecognisedColumn): string {
  const what = quantity
    ? `${isUncertainty ? "uncertainty of " : ""}${quantity.name}`
    : isUncertainty
      ? "an uncertainty"
      : unit && unit.text !== "1"
        ? kindPhrase(unit.kind)
        : "not a known quantity";
  return unit && unit.text !== "1" ? `${what}, in ${unit.text}` : `${what}, no unit`;
}
