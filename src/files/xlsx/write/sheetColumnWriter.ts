import type { Cell } from "../../../call/cell.js";
import { CellError } from "../../../call/cell.js";
import type { Column } from "../../../call/column.js";
import { cellAt } from "../../../call/column.js";
import { columnLetters } from "../../../sheet/book/address.js";
import type { Book, Run, SheetColumn } from "../../../sheet/book/book.js";
import { sliceCells } from "../../../sheet/book/cells.js";
import type { Span } from "../../../sheet/book/spans.js";
import { firstSpanAfter } from "../../../sheet/book/spans.js";
import { spillSize } from "../../../sheet/book/spillSize.js";
import { usedLength } from "../../../sheet/book/usedRows.js";
import type { WorkbookColumn } from "../../../sheet/display/workbook.js";
import { mostRows } from "../../../sheet/limits.js";
import { fieldOfCell } from "../../cell/fieldOfCell.js";
import { rowTemplate, textInRow } from "../formula/rowTemplate.js";
import type { StoredFormula } from "../formula/storedFormula.js";
import { storedFormula } from "../formula/storedFormula.js";
import { escapeText } from "../xml/xmlText.js";
import type { StringTable } from "./stringTable.js";
import type { StyleTable } from "./styleTable.js";

/** What the columns of a sheet are written with. */
export interface SheetWriting {
  readonly book: Book;
  readonly strings: StringTable;
  readonly styles: StyleTable;
  /** The number of the next formula that stands for the whole column below it. */
  nextShared: number;
}

/** Writes the cells of a column, from top to bottom. */
export interface SheetColumnWriter {
  /** Rows below this need nothing written. */
  readonly rows: number;
  /** The style of the cells that are not written. */
  readonly usualStyle: number;
  /** Makes ready for rows `from` up to `to`, in order. */
  prepare(from: number, to: number): void;
  /** The XML of a cell; empty where nothing needs to be said of it. */
  cell(row: number): string;
}

export function sheetColumnWriter(
  source: SheetColumn,
  { formats }: WorkbookColumn,
  column: number,
  writing: SheetWriting,
): SheetColumnWriter {
  const letters = columnLetters(column);
  const { runs } = source;
  const last = formats.at(-1);
  const isOpen = last?.to === mostRows;
  const usualStyle = isOpen ? writing.styles.indexOf(last) : 0;
  const lastRun = runs.at(-1)?.to ?? 0;
  const lastFormat = (isOpen ? last.from : last?.to) ?? 0;
  const spans = formats.map((each) => ({ from: each.from, to: each.to, style: writing.styles.indexOf(each) }));

  let values: Column = sliceCells(source.cells, 0, 0);
  let start = 0;
  let run = 0;
  let format = 0;
  let written: RunWriter | undefined;

  const styleAt = (row: number): number => {
    while (format < spans.length && (spans[format] as Span).to <= row) {
      format++;
    }
    const span = spans[format];
    return span !== undefined && span.from <= row ? span.style : 0;
  };
  const runAt = (row: number): RunWriter | undefined => {
    while (run < runs.length && (runs[run] as Run).to <= row) {
      run++;
      written = undefined;
    }
    const found = runs[run];
    if (found === undefined || found.from > row) {
      return undefined;
    }
    written ??= runWriter(found, source, column, writing);
    return written;
  };

  return {
    rows: Math.max(usedLength(source.cells), lastRun, lastFormat),
    usualStyle,
    prepare(from, to) {
      values = sliceCells(source.cells, from, to);
      start = from;
      run = Math.max(run, firstSpanAfter(runs, from));
    },
    cell(row) {
      const style = spans.length === 0 ? 0 : styleAt(row);
      const formula = runs.length === 0 ? undefined : runAt(row);
      const cell = formula?.typed(row) ?? cellAt(values, row - start);
      if (cell === null && formula === undefined && style === usualStyle) {
        return "";
      }
      const named = style === 0 ? "" : ` s="${style}"`;
      return `<c r="${letters}${row + 1}"${named}${contentOf(cell, formula?.xml(row), writing.strings)}</c>`;
    },
  };
}

/** Type and content of a cell, from behind its address on. */
function contentOf(cell: Cell, formula: FormulaXml | undefined, strings: StringTable): string {
  const [mark, text] = formula ?? ["", ""];
  if (typeof cell === "number") {
    return `${mark}>${text}<v>${fieldOfCell(cell)}</v>`;
  }
  if (typeof cell === "string") {
    return formula === undefined
      ? ` t="s"><v>${strings.indexOf(cell)}</v>`
      : `${mark} t="str">${text}<v>${escapeText(cell)}</v>`;
  }
  if (cell === null) {
    return `${mark}>${text}`;
  }
  return cell instanceof CellError
    ? `${mark} t="e">${text}<v>${cell.code}</v>`
    : `${mark} t="b">${text}<v>${cell ? 1 : 0}</v>`;
}

/** The attribute of a cell that its formula asks for, and the element of the formula. */
type FormulaXml = readonly [mark: string, element: string];

interface RunWriter {
  xml(row: number): FormulaXml | undefined;
  /** The text that stands for a formula which no file can hold. */
  typed(row: number): string | undefined;
}

function runWriter(run: Run, source: SheetColumn, column: number, writing: SheetWriting): RunWriter {
  const stored = storedFormula(run.formula, column, writing.book);
  const letters = columnLetters(column);
  const nothing = () => undefined;
  if (stored.kind === "value") {
    return { xml: nothing, typed: nothing };
  }
  if (stored.kind === "text") {
    return { xml: nothing, typed: stored.textIn };
  }
  const textIn = quickText(stored, run);
  if (stored.kind === "array") {
    return {
      typed: nothing,
      xml(row) {
        const size = spillSize(source, row);
        const end = size && `:${columnLetters(column + size.width - 1)}${row + size.rows}`;
        return [' cm="1"', `<f t="array" ref="${letters}${row + 1}${end ?? ""}">${escapeText(textIn(row))}</f>`];
      },
    };
  }
  const isShared = run.to - run.from > 1 && run.formula.references.every((each) => each?.sheet === undefined);
  if (!isShared) {
    return { typed: nothing, xml: (row) => ["", `<f>${escapeText(textIn(row))}</f>`] };
  }
  const index = writing.nextShared++;
  const area = `${letters}${run.from + 1}:${letters}${run.to}`;
  const first = `<f t="shared" ref="${area}" si="${index}">${escapeText(textIn(run.from))}</f>`;
  const other = `<f t="shared" si="${index}"/>`;
  return { typed: nothing, xml: (row) => ["", row === run.from ? first : other] };
}

/** The text in each row by its row numbers alone, where that gives the text of the last row too. */
function quickText(stored: Extract<StoredFormula, { textIn: unknown }>, { from, to }: Run): (row: number) => string {
  const template = rowTemplate(stored.textIn(from), from);
  const isSame = textInRow(template, to - 1) === stored.textIn(to - 1);
  return isSame ? (row) => textInRow(template, row) : stored.textIn;
}
