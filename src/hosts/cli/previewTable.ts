import { type Cell, CellError } from "../../call/cell.js";
import { cellAt } from "../../call/column.js";
import type { FilledColumn } from "./fillTable.js";
import type { SheetTable } from "./tableBook.js";

const digits = 6;

/** The first rows as an aligned table for the eye: numbers to six significant digits, under their own headers. */
export function* previewTable(table: SheetTable, added: readonly FilledColumn[], most: number): Generator<string> {
  const rows = Math.min(table.rows, most);
  const columns = [
    ...table.columns.map((column, index) => ({ header: table.header[index]!, unit: table.unitsRow?.[index], column })),
    ...added,
  ];
  const texts = columns.map(({ header, unit, column }) => [
    header,
    ...(table.unitsRow ? [unit ?? ""] : []),
    ...Array.from({ length: rows }, (_, row) => shortText(cellAt(column, row))),
  ]);
  const right = columns.map(
    ({ column }) => !Number.isNaN(column.numbers[0]) || column.numbers.some((number) => !Number.isNaN(number)),
  );
  const widths = texts.map((cells) => Math.max(...cells.map((cell) => cell.length)));
  for (let line = 0; line < (texts[0]?.length ?? 0); line++) {
    const cells = texts.map((column, index) =>
      right[index] ? column[line]!.padStart(widths[index]!) : column[line]!.padEnd(widths[index]!),
    );
    yield `${cells.join("  ").trimEnd()}\n`;
  }
  const more = table.rows - rows;
  if (more > 0) yield `and ${more.toLocaleString("en")} more ${more === 1 ? "row" : "rows"}\n`;
}

function shortText(cell: Cell): string {
  if (cell === null) return "";
  if (cell instanceof CellError) return cell.code;
  if (typeof cell !== "number") return String(cell).replace(/\s+/g, " ");
  const short = String(Number(cell.toPrecision(digits)));
  return short.length <= 10 ? short : cell.toExponential(digits - 1).replace(/\.?0+e/, "e");
}
