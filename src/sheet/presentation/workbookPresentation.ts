import { columnLetters } from "../book/address.js";
import type { Book, SheetColumn } from "../book/book.js";
import { sliceCells } from "../book/cells.js";
import { usedLength } from "../book/usedRows.js";
import { printFormat } from "../display/formatText.js";
import { general } from "../display/numberFormat.js";
import type { FormatSpan, Workbook, WorkbookColumn } from "../display/workbook.js";
import { mostRows } from "../limits.js";
import { type ColumnPresentation, type Presentation, sheetPresentation } from "./presentation.js";

/**
 * The width of a digit in the usual font of a workbook [pixel]; widths of files count such digits in steps of 1/256
 * (ECMA-376 part 1, section 18.3.1.13).
 */
const digitWidth = 7;
const widthSteps = 256;

export interface PresentedWorkbook {
  readonly presentation: Presentation;
  /** What of the file's own presentation is not kept, one sentence each. */
  readonly losses: readonly string[];
}

/** How a workbook is seen here, where a column has one format and every sheet is shown. */
export function presentationOfWorkbook({ book, sheets }: Workbook): PresentedWorkbook {
  const losses: string[] = [];
  const presentation = book.sheets.map((sheet, index) => {
    const shown = sheets[index];
    if (shown?.hidden) losses.push(`The sheet ${sheet.name} was hidden; here every sheet is shown.`);
    const mixed: string[] = [];
    const plainer: string[] = [];
    const columns = (shown?.columns ?? []).map(({ width, hidden, formats }, column): ColumnPresentation | undefined => {
      const { format, code, isMixed } = commonest(formats, sheet.columns[column]);
      if (isMixed) mixed.push(`${columnLetters(column)} (${printFormat(format)})`);
      if (code !== undefined) plainer.push(`${columnLetters(column)} (${printFormat(format)})`);
      const seen: ColumnPresentation = {
        ...(width === undefined ? {} : { width: Math.max(1, Math.round(width * digitWidth)) }),
        ...(hidden ? { hidden: true } : {}),
        ...(format.kind === "general" ? {} : { format }),
      };
      return Object.keys(seen).length === 0 ? undefined : seen;
    });
    if (mixed.length > 0) {
      losses.push(
        `Number formats differ from row to row on the sheet ${sheet.name}; the commonest is taken for the whole column: ${listed(mixed)}.`,
      );
    }
    if (plainer.length > 0) {
      losses.push(
        `Number formats of the sheet ${sheet.name} say more than is shown here (words, colours, other forms of dates); the nearest is taken: ${listed(plainer)}.`,
      );
    }
    return { frozenColumns: shown?.frozenColumns ?? 0, columns };
  });
  return { presentation, losses };
}

/** A book with the way it is seen here, as a workbook has it; the headers in the first row stay in sight. */
export function workbookOfPresentation(book: Book, presentation: Presentation): Workbook {
  const sheets = book.sheets.map((_, index) => {
    const { frozenColumns, columns } = sheetPresentation(presentation, index);
    return {
      hidden: false,
      frozenRows: 1,
      frozenColumns,
      columns: Array.from(columns, (column) => columnOfPresentation(column ?? {})),
    };
  });
  return { book, sheets, notes: [] };
}

function columnOfPresentation({ width, hidden, format = general }: ColumnPresentation): WorkbookColumn {
  return {
    width: width === undefined ? undefined : Math.trunc((width / digitWidth) * widthSteps) / widthSteps,
    hidden: hidden === true,
    formats: format.kind === "general" ? [] : [{ from: 1, to: mostRows, format, code: undefined }],
  };
}

interface CommonFormat extends Pick<FormatSpan, "format" | "code"> {
  readonly isMixed: boolean;
}

/** The format in which most numbers below the header are shown, and whether others are shown in another. */
function commonest(formats: readonly FormatSpan[], column: SheetColumn | undefined): CommonFormat {
  if (formats.length === 0) return { format: general, code: undefined, isMixed: false };
  const cells = column?.cells;
  const end = cells === undefined ? 0 : usedLength(cells);
  const { numbers } = cells === undefined || end <= 1 ? { numbers: [] } : sliceCells(cells, 1, end);
  const counts = new Map<string, Pick<FormatSpan, "format" | "code"> & { count: number }>();
  let span = 0;
  for (const [index, number] of numbers.entries()) {
    if (Number.isNaN(number)) continue;
    const row = index + 1;
    while (span < formats.length && formats[span]!.to <= row) span++;
    const found = formats[span];
    const { format, code } = found && found.from <= row ? found : { format: general, code: undefined };
    const key = printFormat(format);
    const known = counts.get(key);
    if (known) known.count++;
    else counts.set(key, { format, code, count: 1 });
  }
  const [first] = [...counts.values()].sort((a, b) => b.count - a.count);
  const { format, code } = first ?? formats[0]!;
  return { format, code, isMixed: counts.size > 1 };
}

function listed(columns: readonly string[]): string {
  const shown = columns.slice(0, 3).join(", ");
  return columns.length > 3 ? `${shown} and ${columns.length - 3} more` : shown;
}
