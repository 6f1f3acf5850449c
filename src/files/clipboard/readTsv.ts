import type { Cell } from "../../call/cell.js";
import { cellOfField } from "../cell/cellOfField.js";

const quote = '"';

/**
 * Cells from the plain text that programs put on the clipboard: tabs between cells, line ends between rows, quotes
 * around what holds either of them (common practice, no source). What begins with "=" is text: who copied it saw a
 * text. A number is a number only where nothing of it is lost.
 */
export function readTsv(text: string): Cell[][] {
  const rows: Cell[][] = [[]];
  let at = 0;
  while (at < text.length) {
    const { field, end } = readField(text, at);
    (rows.at(-1) as Cell[]).push(cellOfField(field));
    const after = text[end];
    if (after === "\t") {
      at = end + 1;
      if (at === text.length) {
        (rows.at(-1) as Cell[]).push(null);
      }
    } else {
      at = after === "\r" && text[end + 1] === "\n" ? end + 2 : end + 1;
      if (at < text.length) {
        rows.push([]);
      }
    }
  }
  const width = rows.reduce((most, row) => Math.max(most, row.length), 0);
  return width === 0 ? [] : rows.map((row) => [...row, ...new Array<Cell>(width - row.length).fill(null)]);
}

function readField(text: string, from: number): { readonly field: string; readonly end: number } {
  const quoted = text[from] === quote ? endOfQuoted(text, from) : undefined;
  if (quoted !== undefined) {
    return { field: text.slice(from + 1, quoted - 1).replaceAll('""', quote), end: quoted };
  }
  let end = from;
  while (end < text.length && !isSeparator(text.charCodeAt(end))) {
    end++;
  }
  return { field: text.slice(from, end), end };
}

/** Where a field in quotes ends; undefined where its quotes do not go around all of it, and so are its own. */
function endOfQuoted(text: string, from: number): number | undefined {
  for (let at = text.indexOf(quote, from + 1); at >= 0; at = text.indexOf(quote, at + 2)) {
    if (text[at + 1] !== quote) {
      return at + 1 === text.length || isSeparator(text.charCodeAt(at + 1)) ? at + 1 : undefined;
    }
  }
  return undefined;
}

function isSeparator(code: number): boolean {
  return code === 9 || code === 10 || code === 13;
}
