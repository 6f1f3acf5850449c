import type { ErrorCode } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import { addressText } from "./address.js";
import type { Book, ColumnSpan, Place } from "./book.js";
import { columnAt } from "./book.js";

/** Cells whose errors are of one topic. */
export interface CellProblem {
  readonly code: ErrorCode;
  readonly topic: string;
  /** The sentence of the first of them. */
  readonly message: string;
  readonly count: number;
  readonly first: Place;
  readonly address: string;
}

/** The error cells of a span, or of the whole book, grouped by topic, in the order of their first cells by column. */
export function listProblems(book: Book, span?: ColumnSpan): CellProblem[] {
  const found = new Map<string, { count: number; error: CellError; first: Place }>();
  const spans = span === undefined ? allColumns(book) : [span];
  for (const { sheet, column, from, to } of spans) {
    const { chunks, starts } = columnAt(book, sheet, column).cells;
    for (const [index, { others }] of chunks.entries()) {
      const start = starts[index] as number;
      for (let at = Math.max(0, from - start); at < Math.min(others?.length ?? 0, to - start); at++) {
        const cell = others?.[at];
        if (cell instanceof CellError) {
          const key = `${cell.code} ${cell.topic}`;
          const known = found.get(key);
          if (known === undefined) {
            found.set(key, { count: 1, error: cell, first: { sheet, column, row: start + at } });
          } else {
            known.count++;
          }
        }
      }
    }
  }
  return [...found.values()].map(({ count, error, first }) => {
    const sheet = book.sheets.length > 1 ? book.sheets[first.sheet]?.name : undefined;
    const { code, topic, message } = error;
    return { code, topic, message, count, first, address: addressText(first.row, first.column, sheet) };
  });
}

function allColumns(book: Book): ColumnSpan[] {
  return book.sheets.flatMap(({ columns }, sheet) =>
    columns.map(({ cells }, column) => ({ sheet, column, from: 0, to: cells.length })),
  );
}
