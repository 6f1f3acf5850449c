import { parseStructRef, tokenize } from "@borgar/fx";
import { addressText, columnLetters } from "../../../sheet/book/address.js";

/** A table of a file: a range with a name and named columns. */
export interface FileTable {
  readonly name: string;
  readonly sheet: string;
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
  readonly headerRows: number;
  readonly totalsRows: number;
  readonly columns: readonly string[];
}

/** Tables by name in capital letters. */
export type FileTables = ReadonlyMap<string, FileTable>;

/**
 * A formula whose references to tables are references to cells, as files are read into sheets without tables. The text
 * is that of a formula in a row of a sheet; what names no known table is left as it is.
 */
export function withoutTables(text: string, row: number, sheet: string, tables: FileTables): string {
  if (tables.size === 0) {
    return text;
  }
  return tokenize(text, { withLocation: false, mergeRefs: true })
    .map(({ type, value }) => {
      const isTable = type === "structured" || (type === "range_named" && tables.has(value.toUpperCase()));
      return (isTable ? cellsOf(type === "structured" ? value : `${value}[]`, row, sheet, tables) : undefined) ?? value;
    })
    .join("");
}

function cellsOf(text: string, row: number, sheet: string, tables: FileTables): string | undefined {
  const reference = parseStructRef(text);
  const table = tables.get(reference?.table?.toUpperCase() ?? "");
  if (reference === undefined || table === undefined) {
    return undefined;
  }
  const { columns: names = [], sections = [] } = reference;
  const columns = names.map((name) => table.columns.findIndex((each) => each.toUpperCase() === name.toUpperCase()));
  const rows = rowsOf(table, sections.length === 0 ? ["data"] : sections, row);
  if (rows === undefined || columns.includes(-1)) {
    return "#REF!";
  }
  const first = table.left + (columns[0] ?? 0);
  const last = table.left + (columns.at(-1) ?? table.columns.length - 1);
  const place = table.sheet === sheet ? "" : addressText(0, 0, table.sheet).replace(/A1$/, "");
  const corner = (column: number, at: number) => `$${columnLetters(column)}${rows.isOwn ? "" : "$"}${at + 1}`;
  const start = corner(Math.min(first, last), rows.from);
  const end = corner(Math.max(first, last), rows.to);
  return place + (start === end ? start : `${start}:${end}`);
}

/** The rows of some sections of a table; `isOwn` where they are the row of the formula, which moves with it. */
function rowsOf(table: FileTable, sections: readonly string[], row: number) {
  const { top, bottom, headerRows, totalsRows } = table;
  const [data, end] = [top + headerRows, bottom - totalsRows];
  const known: Readonly<Record<string, readonly [number, number]>> = {
    all: [top, bottom],
    headers: [top, data - 1],
    data: [data, end],
    totals: [end + 1, bottom],
    "this row": [row, row],
    "@": [row, row],
  };
  const parts = sections.map((each) => (Object.hasOwn(known, each) ? known[each] : undefined));
  const isOwn = sections.includes("this row") || sections.includes("@");
  const from = Math.min(...parts.map((part) => part?.[0] ?? Number.NaN));
  const to = Math.max(...parts.map((part) => part?.[1] ?? Number.NaN));
  return to >= from ? { from, to, isOwn } : undefined;
}
