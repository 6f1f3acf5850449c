import { cellAt } from "../../../../call/column.js";
import type { Area, Book } from "../../../../sheet/book/book.js";
import { readColumn } from "../../../../sheet/book/readColumn.js";
import type { Reference } from "../../../../sheet/formula/reference.js";
import { readReference, resolve } from "../../../../sheet/formula/reference.js";
import { columnName } from "../actions/words.js";
import { sheetSize } from "../state/sheetSize.js";

/**
 * The cells that a text names: an address or a range, with its sheet or without, a defined name, a target in the first
 * column, a column by its name. A target whose name reads as an address far outside the table, HD209458, is the target.
 */
export function placeOf(book: Book, text: string, sheet: number): Area | undefined {
  const wanted = text.trim();
  if (wanted === "") return undefined;
  const area = areaOf(book, wanted, sheet);
  if (area && isNear(book, area)) return area;
  const name = book.names.find((each) => each.name.toUpperCase() === wanted.toUpperCase());
  const named = name && areaOfReference(book, name.formula.references[0], sheet);
  return named ?? targetOf(book, wanted, sheet) ?? columnOf(book, wanted, sheet) ?? area;
}

function areaOf(book: Book, text: string, sheet: number): Area | undefined {
  return areaOfReference(book, readReference(text, 0, 0) ?? readReference(text.toUpperCase(), 0, 0), sheet);
}

function areaOfReference(book: Book, reference: Reference | undefined, home: number): Area | undefined {
  if (!reference) return undefined;
  const wanted = reference.sheet?.toUpperCase();
  const sheet = wanted === undefined ? home : book.sheets.findIndex(({ name }) => name.toUpperCase() === wanted);
  const found = book.sheets[sheet];
  if (!found) return undefined;
  const area = { sheet, ...resolve(reference, 0, 0) };
  const { rows, columns } = sheetSize(found);
  if (reference.whole === "columns") return { ...area, bottom: Math.max(0, rows - 1) };
  return reference.whole === "rows" ? { ...area, right: Math.max(0, columns - 1) } : area;
}

/** Rows and columns beyond the table that one still means by their address. */
const margin = 1000;

function isNear(book: Book, { sheet, top, left }: Area): boolean {
  const { rows, columns } = sheetSize(book.sheets[sheet]!);
  return top < rows + margin && left < columns + margin / 10;
}

/** The row of a target by its name, whole or its beginning, else a part of it. */
function targetOf(book: Book, text: string, sheet: number): Area | undefined {
  const { rows } = sheetSize(book.sheets[sheet]!);
  const names = readColumn(book, { sheet, column: 0, from: 0, to: rows });
  const wanted = plain(text);
  let best: { readonly row: number; readonly rank: number } | undefined;
  for (let row = 1; row < rows; row++) {
    const cell = cellAt(names, row);
    if (typeof cell !== "string" && typeof cell !== "number") continue;
    const name = plain(String(cell));
    const rank = name === wanted ? 3 : name.startsWith(wanted) ? 2 : name.includes(wanted) ? 1 : 0;
    if (rank > (best?.rank ?? 0)) best = { row, rank };
    if (rank === 3) break;
  }
  return best && { sheet, top: best.row, bottom: best.row, left: 0, right: 0 };
}

/** Blanks and capitals do not matter in names: "hd209458" is "HD 209458". */
function plain(text: string): string {
  return text.replace(/\s+/g, "").toLowerCase();
}

function columnOf(book: Book, text: string, sheet: number): Area | undefined {
  const { rows, columns } = sheetSize(book.sheets[sheet]!);
  const wanted = text.toLowerCase();
  for (let column = 0; column < columns; column++) {
    if (columnName(book, sheet, column).toLowerCase() === wanted) {
      return { sheet, top: 0, bottom: rows - 1, left: column, right: column };
    }
  }
  return undefined;
}
