import { type Column, cellAt } from "../../call/column.js";
import { type DelimitedTable, recordOfRow } from "./delimitedTable.js";
import { type GuardText, quotedCell } from "./fieldWriter.js";

/** A column to stand to the right of a table that was read. */
export interface AddedColumn {
  readonly header: string;
  /** Written into the table's row of units, where it has one. */
  readonly unit?: string;
  readonly column: Column;
}

export interface AppendOptions {
  readonly guardText?: GuardText;
}

const pieceLength = 1 << 16;

/**
 * The text of the file a table was read from, with columns added: every character of the original is there, in order,
 * comments, blank lines and line endings included. A record is followed by as many delimiters as it has fields fewer
 * than the table has columns, so that the added columns line up under their headers; a quote the file never closes is
 * closed.
 */
export function* appendColumns(
  table: DelimitedTable,
  added: readonly AddedColumn[],
  { guardText }: AppendOptions = {},
): Generator<string> {
  checkLengths(table, added);
  const { source } = table;
  const tail = tailOfRecord(table, added, guardText);
  let text = table.dialect.byteOrderMark ? "\uFEFF" : "";
  let record = 0;
  for (const [index, block] of source.blocks.entries()) {
    const recordsEnd = source.recordsBefore[index + 1] ?? source.records;
    let from = 0;
    for (; record < recordsEnd; record++) {
      const end = source.ends[record] as number;
      text += block.slice(from, end) + tail(record);
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
): (record: number) => string {
  const { source, dialect, columns } = table;
  const { delimiter } = dialect;
  const firstRow = recordOfRow(table, 0);
  const field = (column: AddedColumn, record: number) => {
    if (record >= firstRow) {
      return quotedCell(cellAt(column.column, record - firstRow), guardText);
    }
    return quotedCell(record === 0 ? column.header : (column.unit ?? ""), guardText);
  };
  return (record) => {
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

function checkLengths(table: DelimitedTable, added: readonly AddedColumn[]): void {
  for (const { header, column } of added) {
    if (column.length !== table.rows) {
      throw new RangeError(`added column "${header}" has ${column.length} rows, the table ${table.rows}`);
    }
  }
}
