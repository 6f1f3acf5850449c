import { cellAt } from "../call/column.js";
import { columnLetters } from "../sheet/book/address.js";
import { type Book, columnAt, type Run, type SheetColumn } from "../sheet/book/book.js";
import { chunkRows } from "../sheet/book/cells.js";
import { readColumn } from "../sheet/book/readColumn.js";
import type { Span } from "../sheet/book/spans.js";
import { sameValue } from "../table/changeOf.js";
import type { BookTable } from "./bookTable.js";

/** What was typed anew between two states of a book: a column of values with its uncertainties, as one. */
export interface ChangedInput {
  /** Its header, or where it stands on another sheet; a formula that was typed anew says so. */
  readonly name: string;
  readonly sheet: number;
  readonly columns: readonly number[];
  /** Cells whose typed value is another. */
  readonly cells: number;
}

/** The columns in which typed values or formulas differ between two states that have the same columns. */
export function changedInputs(before: BookTable, after: BookTable): readonly ChangedInput[] {
  const found: (ChangedInput & { readonly owner: number })[] = [];
  for (const [sheet, { name, columns }] of after.book.sheets.entries()) {
    const width = Math.max(columns.length, before.book.sheets[sheet]?.columns.length ?? 0);
    for (let column = 0; column < width; column++) {
      const cells = typedChanges(before.book, after.book, sheet, column);
      const isFormula = !sameRuns(columnAt(before.book, sheet, column).runs, columnAt(after.book, sheet, column).runs);
      if (cells === 0 && !isFormula) continue;
      const own = sheet === after.sheet ? after.columns.find((one) => one.column === column) : undefined;
      const owner = isFormula ? column : (own?.sigmaOf ?? column);
      const header = after.columns.find((one) => one.column === owner)?.header ?? columnLetters(owner);
      const place = sheet === after.sheet ? header : `${name}!${columnLetters(column)}`;
      found.push({ name: isFormula ? `formula of ${place}` : place, sheet, columns: [column], cells, owner });
    }
  }
  const joined = new Map<string, ChangedInput>();
  for (const { owner, ...input } of found) {
    const known = joined.get(`${input.sheet} ${owner}`);
    const together = known && {
      ...known,
      columns: [...known.columns, ...input.columns],
      cells: known.cells + input.cells,
    };
    joined.set(`${input.sheet} ${owner}`, together ?? input);
  }
  return [...joined.values()];
}

function typedChanges(before: Book, after: Book, sheet: number, column: number): number {
  const [old, now] = [columnAt(before, sheet, column), columnAt(after, sheet, column)];
  if (old === now) return 0;
  const end = Math.max(old.cells.length, now.cells.length);
  let count = 0;
  for (const span of typedRows(old, now, end)) {
    for (let from = span.from; from < span.to; ) {
      const to = Math.min(span.to, (Math.floor(from / chunkRows) + 1) * chunkRows);
      const [was, is] = [before, after].map((book) => readColumn(book, { sheet, column, from, to }));
      for (let row = 0; was!.numbers !== is!.numbers && row < to - from; row++) {
        const isSame =
          was!.others?.[row] === undefined && is!.others?.[row] === undefined
            ? was!.numbers[row] === is!.numbers[row]
            : sameValue(cellAt(was!, row), cellAt(is!, row));
        if (!isSame) count++;
      }
      from = to;
    }
  }
  return count;
}

/** Rows in which neither state has a formula, nor what one fills. */
function typedRows(old: SheetColumn, now: SheetColumn, end: number): Span[] {
  const computed = [...old.runs, ...old.claims, ...now.runs, ...now.claims].sort((a, b) => a.from - b.from);
  const typed: Span[] = [];
  let from = 0;
  for (const span of computed) {
    if (span.from > from) typed.push({ from, to: span.from });
    from = Math.max(from, span.to);
  }
  return from < end ? [...typed, { from, to: end }] : typed;
}

function sameRuns(old: readonly Run[], now: readonly Run[]): boolean {
  if (old === now) return true;
  return (
    old.length === now.length &&
    old.every(({ from, to, formula }, index) => {
      const other = now[index]!;
      return from === other.from && to === other.to && formula.key === other.formula.key;
    })
  );
}
