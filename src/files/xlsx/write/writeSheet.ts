import { addressText } from "../../../sheet/book/address.js";
import type { Sheet } from "../../../sheet/book/book.js";
import { emptyColumn } from "../../../sheet/book/book.js";
import type { WorkbookColumn, WorkbookSheet } from "../../../sheet/display/workbook.js";
import { plainWorkbookColumn } from "../../../sheet/display/workbook.js";
import type { ZipWriter } from "../../zip/zipWriter.js";
import type { SheetColumnWriter, SheetWriting } from "./sheetColumnWriter.js";
import { sheetColumnWriter } from "./sheetColumnWriter.js";
import { mainSpace, xmlDeclaration } from "./spaces.js";

/** Rows made ready at a time. */
const blockRows = 512;
/** The width of a column of which none is said [characters]. */
const usualWidth = 9.140625;

/** Writes the XML of a sheet; yields the rows done. */
export function* writeSheet(
  sheet: Sheet,
  presentation: WorkbookSheet,
  writing: SheetWriting,
  zip: ZipWriter,
): Generator<number, void> {
  const width = Math.max(sheet.columns.length, presentation.columns.length);
  const presentations = Array.from(
    { length: width },
    (_, column) => presentation.columns[column] ?? plainWorkbookColumn,
  );
  const columns = presentations.map((each, column) =>
    sheetColumnWriter(sheet.columns[column] ?? emptyColumn, each, column, writing),
  );
  const rows = columns.reduce((most, each) => Math.max(most, each.rows), 0);
  const area = rows === 0 ? "A1" : `A1:${addressText(rows - 1, Math.max(width - 1, 0))}`;
  zip.write(
    `${xmlDeclaration}<worksheet xmlns="${mainSpace}"><dimension ref="${area}"/>${sheetViews(presentation)}` +
      `<sheetFormatPr defaultRowHeight="15"/>${columnsElement(presentations, columns)}<sheetData>`,
  );
  for (let from = 0; from < rows; from += blockRows) {
    const to = Math.min(rows, from + blockRows);
    zip.write(rowsElement(columns, from, to));
    yield to - from;
  }
  zip.write("</sheetData></worksheet>");
}

function rowsElement(columns: readonly SheetColumnWriter[], from: number, to: number): string {
  const alive = columns.filter((each) => each.rows > from);
  for (const column of alive) {
    column.prepare(from, to);
  }
  let text = "";
  for (let row = from; row < to; row++) {
    let cells = "";
    for (const column of alive) {
      if (row < column.rows) {
        cells += column.cell(row);
      }
    }
    text += cells === "" ? "" : `<row r="${row + 1}">${cells}</row>`;
  }
  return text;
}

function sheetViews({ frozenRows, frozenColumns }: WorkbookSheet): string {
  if (frozenRows === 0 && frozenColumns === 0) {
    return '<sheetViews><sheetView workbookViewId="0"/></sheetViews>';
  }
  const across = frozenColumns > 0 ? ` xSplit="${frozenColumns}"` : "";
  const down = frozenRows > 0 ? ` ySplit="${frozenRows}"` : "";
  const pane = frozenRows === 0 ? "topRight" : frozenColumns === 0 ? "bottomLeft" : "bottomRight";
  const first = addressText(frozenRows, frozenColumns);
  return (
    `<sheetViews><sheetView workbookViewId="0"><pane${across}${down} topLeftCell="${first}" activePane="${pane}"` +
    ` state="frozen"/><selection pane="${pane}"/></sheetView></sheetViews>`
  );
}

function columnsElement(presentations: readonly WorkbookColumn[], columns: readonly SheetColumnWriter[]): string {
  let text = "";
  for (const [index, { width, hidden }] of presentations.entries()) {
    const style = columns[index]?.usualStyle ?? 0;
    if (width !== undefined || hidden || style !== 0) {
      const own = `width="${width ?? usualWidth}" customWidth="${width === undefined ? 0 : 1}"`;
      const rest = `${style === 0 ? "" : ` style="${style}"`}${hidden ? ' hidden="1"' : ""}`;
      text += `<col min="${index + 1}" max="${index + 1}" ${own}${rest}/>`;
    }
  }
  return text === "" ? "" : `<cols>${text}</cols>`;
}
