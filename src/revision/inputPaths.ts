import { type Book, columnAt } from "../sheet/book/book.js";
import { columnsInUse } from "../sheet/book/usedRows.js";
import type { Formula } from "../sheet/formula/formula.js";
import { resolve } from "../sheet/formula/reference.js";

/** A column of a sheet. */
export interface ColumnPlace {
  readonly sheet: number;
  readonly column: number;
}

/** The columns that the formulas of a column read, its own among them where they do. */
type Precedents = (place: ColumnPlace) => readonly ColumnPlace[];

/** The columns on the way from an input to a column of formulas, both ends included; undefined where there is no way. */
export type PathFrom = (inputs: readonly ColumnPlace[], derived: ColumnPlace) => readonly ColumnPlace[] | undefined;

/** Ways through the formulas of a book, the shortest first. */
export function inputPaths(book: Book): PathFrom {
  const precedents = precedentsIn(book);
  return (inputs, derived) => {
    const isInput = new Set(inputs.map(keyOf));
    const next = new Map<string, ColumnPlace | undefined>([[keyOf(derived), undefined]]);
    const waiting = [derived];
    for (let at = 0; at < waiting.length; at++) {
      const place = waiting[at]!;
      if (isInput.has(keyOf(place))) return wayFrom(place, next);
      for (const source of precedents(place)) {
        if (next.has(keyOf(source))) continue;
        next.set(keyOf(source), place);
        waiting.push(source);
      }
    }
    return undefined;
  };
}

function wayFrom(place: ColumnPlace, next: ReadonlyMap<string, ColumnPlace | undefined>): ColumnPlace[] {
  const way: ColumnPlace[] = [];
  for (let at: ColumnPlace | undefined = place; at; at = next.get(keyOf(at))) way.push(at);
  return way;
}

function precedentsIn(book: Book): Precedents {
  const known = new Map<string, readonly ColumnPlace[]>();
  return (place) => {
    const key = keyOf(place);
    const found = known.get(key) ?? precedentsOf(book, place);
    known.set(key, found);
    return found;
  };
}

function precedentsOf(book: Book, { sheet, column }: ColumnPlace): ColumnPlace[] {
  const { runs, claims } = columnAt(book, sheet, column);
  const owners = [...new Set(claims.map((claim) => claim.column))].map((owner) => ({ sheet, column: owner }));
  const formulas = [...new Map(runs.map((run) => [run.formula.key, run])).values()];
  return [...owners, ...formulas.flatMap(({ formula, from }) => columnsRead(book, formula, sheet, from, column))];
}

function columnsRead(book: Book, formula: Formula, sheet: number, row: number, column: number): ColumnPlace[] {
  const named = formula.names.flatMap((name) => {
    const defined = book.names.find((own) => own.name.toLowerCase() === name.toLowerCase());
    return defined ? columnsRead(book, defined.formula, sheet, row, column) : [];
  });
  const direct = formula.references.flatMap((reference): ColumnPlace[] => {
    if (!reference) return [];
    const on = sheetOf(book, reference.sheet, sheet);
    const { left, right } = resolve(reference, row, column);
    const last = Math.min(right, columnsInUse(book.sheets[on]) - 1);
    return Array.from({ length: Math.max(0, last - left + 1) }, (_, index) => ({ sheet: on, column: left + index }));
  });
  return [...direct, ...named];
}

export function sheetOf(book: Book, name: string | undefined, home: number): number {
  if (name === undefined) return home;
  return book.sheets.findIndex((sheet) => sheet.name.toLowerCase() === name.toLowerCase());
}

function keyOf({ sheet, column }: ColumnPlace): string {
  return `${sheet} ${column}`;
}
