import { columnKey } from "../table/columnKey.js";
import { foldName } from "../table/foldName.js";
import { readHeader } from "../units/readHeader.js";
import type { LedgerEntry } from "./ledgerEntry.js";
import type { LedgerRecord } from "./ledgerRecord.js";

/** A number by its row and column, or by its cell; the sheet is needed where several have ledgers. */
export type NumberAsked = { readonly sheet?: string } & (
  | { readonly key: string; readonly header: string }
  | { readonly cell: string }
);

/** The entry of the revision that last moved a number, by date; undefined where none did. */
export function lastMovedBy(records: readonly LedgerRecord[], asked: NumberAsked): LedgerEntry | undefined {
  let last: LedgerEntry | undefined;
  for (const { entries } of records) {
    for (const entry of entries) {
      if (!isAsked(entry, asked) || (last && entry.source.date < last.source.date)) continue;
      last = entry;
    }
  }
  return last;
}

function isAsked(entry: LedgerEntry, asked: NumberAsked): boolean {
  if (asked.sheet !== undefined && asked.sheet !== entry.sheet) return false;
  if ("cell" in asked) return entry.cell === asked.cell.toUpperCase().replaceAll("$", "");
  return foldName(entry.key) === foldName(asked.key) && nameOf(entry.header) === nameOf(asked.header);
}

/** A column is the same one when its unit changed. */
function nameOf(header: string): string {
  return columnKey(readHeader(header).name || header);
}
