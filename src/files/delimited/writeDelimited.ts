import { type Column, cellAt } from "../../call/column.js";
import { guardFormula } from "../cell/guardFormula.js";
import type { Delimiter, Newline } from "./dialect.js";
import { type GuardText, guardedField } from "./fieldWriter.js";
import { lineOfFields } from "./lineOfFields.js";

/** A table to be written: one header, one column and, where units stand in a row of their own, one unit a column. */
export interface TableToWrite {
  readonly header: readonly string[];
  readonly unitsRow?: readonly string[];
  readonly columns: readonly Column[];
}

export interface WriteOptions {
  /** Comma where left out. */
  readonly delimiter?: Delimiter;
  /** Line feed where left out. */
  readonly newline?: Newline;
  readonly byteOrderMark?: boolean;
  /** Where left out, no program takes a text for a formula, and reading gives it back as it was. */
  readonly guardText?: GuardText;
}

const pieceLength = 1 << 16;

/** The text of a table, every line ended. Reading it gives the same cells, save texts that look like another kind of cell. */
export function* writeDelimited(table: TableToWrite, options: WriteOptions = {}): Generator<string> {
  const { delimiter = ",", newline = "\n", byteOrderMark = false, guardText = guardFormula } = options;
  const { header, unitsRow, columns } = table;
  const rows = columns[0]?.length ?? 0;
  checkShape(table, rows);
  const guarded = (text: string) => guardedField(text, guardText);
  let text = byteOrderMark ? "\uFEFF" : "";
  text += lineOfFields(header.map(guarded), delimiter) + newline;
  if (unitsRow !== undefined) {
    text += lineOfFields(unitsRow.map(guarded), delimiter) + newline;
  }
  for (let row = 0; row < rows; row++) {
    text +=
      lineOfFields(
        columns.map((column) => guardedField(cellAt(column, row), guardText)),
        delimiter,
      ) + newline;
    if (text.length >= pieceLength) {
      yield text;
      text = "";
    }
  }
  yield text;
}

function checkShape({ header, unitsRow = header, columns }: TableToWrite, rows: number): void {
  if (header.length !== columns.length || unitsRow.length !== columns.length) {
    throw new RangeError(`${columns.length} columns, ${header.length} headers, ${unitsRow.length} units`);
  }
  if (columns.some((column) => column.length !== rows)) {
    throw new RangeError(`columns of unequal length: ${columns.map((column) => column.length).join(", ")}`);
  }
}
