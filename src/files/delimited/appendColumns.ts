import { type Column, cellAt } from "../../call/column.js";
import { type DelimitedTable, recordOfRow } from "./delimitedTable.js";
import { type GuardText, quotedCell } from "./fieldWriter.js";
import { rawFields } from "./rawFields.js";

/** A column to stand to the right of a table that was read. */
export interface AddedColumn {
  readonly header: string;
  /** Written into the table's row of units, where it has one. */
  readonly unit?: string;
  readonly column: Column;
}

/** A column of the table of which some cells are written anew. */
export interface ReplacedColumn {
  readonly index: number;
  readonly column: Column;
  isReplaced(row: number): boolean;
}

export interface AppendOptions {
  readonly guardText?: GuardText;
  readonly replaced?: readonly ReplacedColumn[];
}

const pieceLength = 1 << 16;

/**
 * The text of the file a table was read from, with columns added: every character of the original is there, in order,
 * comments, blank lines and line endings included. A record is followed by as many delimiters as it has fields fewer
 * than the table has columns, so that the added columns line up under their headers; a quote the file never closes is
 * closed. Of a record with replaced cells all other fields stay as they were.
 */
export function* appendColumns(
  table: DelimitedTable,
  added: readonly AddedColumn[],
  { guardText, replaced = [] }: AppendOptions = {},
): Generator<string> {
  checkLengths(table, added);
  const { source } = table;
  const firstRow = recordOfRow(table, 0);
  const tail = tailOfRecord(table, added, guardText);
  const body = (record: number, text: string, cells: readonly ReplacedColumn[]) =>
    cells.length === 0 ? text : rewrittenRecord(table, record, text, cells, guardText);
  let text = table.dialect.byteOrderMark ? "\uFEFF" : "";
  let record = 0;
  for (const [index, block] of source.blocks.entries()) {
    const recordsEnd = source.recordsBefore[index + 1] ?? source.records;
    let from = 0;
    for (; record < recordsEnd; record++) {
      const end = source.ends[record] as number;
      const cells =
        replaced.length === 0
          ? []
          : replaced.filter(({ isReplaced }) => record >= firstRow && isReplaced(record - firstRow));
      const start = cells.length === 0 ? end : (source.starts[record] as number);
      text += block.slice(from, start) + body(record, block.slice(start, end), cells) + tail(record, cells.length > 0);
      from = end;
      if (text.length >= pieceLength) {
        yield text;
        text = "";
      }
    }
    text += block.slice(from);
  }
  yield text;
}

/** What follows a record: padding, then the added fields, each after a delimiter. */
function tailOfRecord(
  table: DelimitedTable,
  added: readonly AddedColumn[],
  guardText: GuardText | undefined,
): (record: number, isRewritten: boolean) => string {
  const { source, dialect, columns } = table;
  const { delimiter } = dialect;
  const firstRow = recordOfRow(table, 0);
  const field = (column: AddedColumn, record: number) => {
    if (record >= firstRow) {
      return quotedCell(cellAt(column.column, record - firstRow), guardText);
    }
    return quotedCell(record === 0 ? column.header : (column.unit ?? ""), guardText);
  };
  return (record, isRewritten) => {
    if (isRewritten) return added.map((column) => delimiter + field(column, record)).join("");
    if (added.length === 0) {
      return "";
    }
    let tail = source.unclosed && record === source.records - 1 ? '"' : "";
    tail += delimiter.repeat(columns.length - (source.widths[record] as number));
    for (const column of added) {
      tail += delimiter + field(column, record);
    }
    return tail;
  };
}

/** A record with some of its cells written anew, as wide as the table; all other fields as they were written. */
function rewrittenRecord(
  table: DelimitedTable,
  record: number,
  text: string,
  cells: readonly ReplacedColumn[],
  guardText: GuardText | undefined,
): string {
  const { source, dialect, columns } = table;
  const row = record - recordOfRow(table, 0);
  const isUnclosed = source.unclosed && record === source.records - 1;
  const raw = rawFields(isUnclosed ? `${text}"` : text, dialect.delimiter);
  // Where quotes stand oddly, the fields as they were understood count and not their characters.
  const isClear = raw.length === source.widths[record];
  const written = (column: Column, index: number) => {
    const field = quotedCell(cellAt(column, row), guardText);
    // A comment must not begin where a cell was written.
    return index === 0 && /^[#\uFEFF]/.test(field) ? `"${field}"` : field;
  };
  const fields = columns.map((column, index) => (isClear ? (raw[index] ?? "") : written(column, index)));
  for (const { index, column } of cells) fields[index] = written(column, index);
  return fields.join(dialect.delimiter);
}

function checkLengths(table: DelimitedTable, added: readonly AddedColumn[]): void {
  for (const { header, column } of added) {
    if (column.length !== table.rows) {
      throw new RangeError(`added column "${header}" has ${column.length} rows, the table ${table.rows}`);
    }
  }
}
