import type { Cell } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import { compareCells } from "../../../src/sheet/values/compareCells.js";
import { isMatrix } from "../../../src/sheet/values/operand.js";
import { miniEvaluate } from "./miniEvaluate.js";
import type { Corner, TextReference } from "./references.js";
import { referencesIn, rewriteText } from "./references.js";

export interface NaiveCell {
  readonly formula?: string;
  readonly value: Cell;
}

export interface Box {
  readonly sheet: number;
  readonly top: number;
  readonly left: number;
  readonly bottom: number;
  readonly right: number;
}

/** The smallest thing that can be called a worksheet: a map of cells, every edit cell by cell, everything calculated anew. */
export interface NaiveBook {
  readonly names: readonly string[];
  readonly cells: ReadonlyMap<string, NaiveCell>;
}

export const key = (sheet: number, row: number, column: number): string => `${sheet}:${row}:${column}`;

function placeOf(text: string): [number, number, number] {
  return text.split(":").map(Number) as [number, number, number];
}

export function sheetOf(book: NaiveBook, name: string | undefined, home: number): number {
  return name === undefined ? home : book.names.findIndex((each) => each.toUpperCase() === name.toUpperCase());
}

type Writable = Map<string, NaiveCell>;

function edited(book: NaiveBook, change: (cells: Writable) => void): NaiveBook {
  const cells = new Map(book.cells);
  change(cells);
  for (const [place, cell] of cells) {
    if (cell.formula === undefined && cell.value === null) {
      cells.delete(place);
    }
  }
  return { ...book, cells };
}

export function put(
  book: NaiveBook,
  sheet: number,
  row: number,
  column: number,
  entry: Cell | { formula: string },
): NaiveBook {
  const isFormula = typeof entry === "object" && entry !== null && !(entry instanceof CellError);
  return edited(book, (cells) => {
    cells.set(
      key(sheet, row, column),
      isFormula ? { formula: rewriteText(entry.formula, (each) => each), value: null } : { value: entry },
    );
  });
}

/** A formula text as it reads when its cell is copied so far down and right. */
export function shiftText(text: string, down: number, right: number): string {
  const move = (corner: Corner): Corner => ({
    ...corner,
    row: corner.row + (corner.fixedRow ? 0 : down),
    column: corner.column + (corner.fixedColumn ? 0 : right),
  });
  return rewriteText(text, (reference) => {
    const [first, second] = [move(reference.first), move(reference.second)];
    const off = [first, second].some(({ row, column }) => row < 0 || column < 0);
    return off ? undefined : { ...reference, first, second };
  });
}

export function copyTo(
  book: NaiveBook,
  from: NaiveBook,
  box: Box,
  sheet: number,
  top: number,
  left: number,
): NaiveBook {
  return edited(book, (cells) => {
    for (let row = box.top; row <= box.bottom; row++) {
      for (let column = box.left; column <= box.right; column++) {
        const source = from.cells.get(key(box.sheet, row, column)) ?? { value: null };
        const [down, right] = [top - box.top, left - box.left];
        const target =
          source.formula === undefined ? source : { formula: shiftText(source.formula, down, right), value: null };
        cells.set(key(sheet, row + down, column + right), target);
      }
    }
  });
}

export function clear(book: NaiveBook, box: Box): NaiveBook {
  return edited(book, (cells) => {
    for (const place of [...cells.keys()]) {
      if (isInside(place, box)) {
        cells.delete(place);
      }
    }
  });
}

function isInside(place: string, box: Box): boolean {
  const [sheet, row, column] = placeOf(place);
  return sheet === box.sheet && row >= box.top && row <= box.bottom && column >= box.left && column <= box.right;
}

/** Every cell and every reference put where `cell` and `reference` say. */
function moveAll(
  book: NaiveBook,
  cell: (sheet: number, row: number, column: number) => [number, number, number] | undefined,
  reference: (target: number, reference: TextReference, home: string) => TextReference | undefined,
): NaiveBook {
  const cells: Writable = new Map();
  for (const [place, content] of book.cells) {
    const [sheet, row, column] = placeOf(place);
    const moved = cell(sheet, row, column);
    if (moved !== undefined) {
      const rewritten =
        content.formula === undefined
          ? content
          : {
              ...content,
              formula: rewriteText(content.formula, (each) => reference(sheetOf(book, each.sheet, sheet), each, place)),
            };
      cells.set(key(...moved), rewritten);
    }
  }
  return { ...book, cells };
}

export type Axis = "row" | "column";

export function insert(book: NaiveBook, sheet: number, axis: Axis, at: number, count: number): NaiveBook {
  const shift = (index: number): number => (index >= at ? index + count : index);
  return moveAll(
    book,
    (home, row, column) =>
      home !== sheet ? [home, row, column] : axis === "row" ? [home, shift(row), column] : [home, row, shift(column)],
    (target, reference) =>
      target !== sheet
        ? reference
        : {
            ...reference,
            first: { ...reference.first, [axis]: shift(reference.first[axis]) },
            second: { ...reference.second, [axis]: shift(reference.second[axis]) },
          },
  );
}

export function remove(book: NaiveBook, sheet: number, axis: Axis, at: number, count: number): NaiveBook {
  const end = at + count;
  const gone = (index: number): boolean => index >= at && index < end;
  const shift = (index: number): number => (index >= end ? index - count : index);
  return moveAll(
    book,
    (home, row, column) => {
      const index = axis === "row" ? row : column;
      if (home !== sheet) {
        return [home, row, column];
      }
      return gone(index) ? undefined : axis === "row" ? [home, shift(row), column] : [home, row, shift(column)];
    },
    (target, reference) => {
      if (target !== sheet) {
        return reference;
      }
      // The rows left of the reference, one by one.
      const low = Math.min(reference.first[axis], reference.second[axis]);
      const high = Math.max(reference.first[axis], reference.second[axis]);
      const left = Array.from({ length: high - low + 1 }, (_, index) => low + index)
        .filter((index) => !gone(index))
        .map(shift);
      if (left.length === 0) {
        return undefined;
      }
      const [least, most] = [Math.min(...left), Math.max(...left)];
      const upsideDown = reference.first[axis] > reference.second[axis];
      return {
        ...reference,
        first: { ...reference.first, [axis]: upsideDown ? most : least },
        second: { ...reference.second, [axis]: upsideDown ? least : most },
      };
    },
  );
}

export function cut(book: NaiveBook, box: Box, sheet: number, top: number, left: number): NaiveBook {
  const [down, right] = [top - box.top, left - box.left];
  const target: Box = { sheet, top, left, bottom: box.bottom + down, right: box.right + right };
  const survivors = new Map([...book.cells].filter(([place]) => isInside(place, box) || !isInside(place, target)));
  const within = ({ first, second }: TextReference): boolean =>
    [first, second].every(
      ({ row, column }) => row >= box.top && row <= box.bottom && column >= box.left && column <= box.right,
    );
  const move = (corner: Corner): Corner => ({ ...corner, row: corner.row + down, column: corner.column + right });
  return moveAll(
    { ...book, cells: survivors },
    (home, row, column) =>
      isInside(key(home, row, column), box) ? [sheet, row + down, column + right] : [home, row, column],
    (targetSheet, reference, home) => {
      const follows = targetSheet === box.sheet && within(reference);
      const means = follows ? sheet : targetSheet;
      const homeSheet = isInside(home, box) ? sheet : placeOf(home)[0];
      const plain = reference.sheet === undefined && means === homeSheet;
      const keeps = !follows && reference.sheet !== undefined;
      const sameName = follows && reference.sheet !== undefined && sheet === box.sheet;
      return {
        sheet: plain ? undefined : keeps || sameName ? reference.sheet : book.names[means],
        first: follows ? move(reference.first) : reference.first,
        second: follows ? move(reference.second) : reference.second,
      };
    },
  );
}

/** Rows sorted by the values of columns, blanks last, in the order numbers, texts, logicals, errors. */
export function sort(book: NaiveBook, box: Box, column: number, descending: boolean): NaiveBook {
  const values = evaluateAll(book);
  const rows = Array.from({ length: box.bottom - box.top + 1 }, (_, index) => box.top + index);
  const cellAt = (row: number): Cell => values.get(key(box.sheet, row, column)) ?? null;
  const rank = (cell: Cell): number => (cell === null ? 2 : cell instanceof CellError ? (descending ? -1 : 1) : 0);
  const order = rows.slice().sort((a, b) => {
    const [x, y] = [cellAt(a), cellAt(b)];
    if (rank(x) !== rank(y) || rank(x) !== 0) {
      return rank(x) - rank(y);
    }
    const difference = compareCells(x as number, y as number);
    return descending ? -difference : difference;
  });
  return order.reduce(
    (sorted, from, index) =>
      copyTo(sorted, book, { ...box, top: from, bottom: from }, box.sheet, box.top + index, box.left),
    book,
  );
}

export function rename(book: NaiveBook, sheet: number, name: string): NaiveBook {
  const before = book.names[sheet] as string;
  const moved = moveAll(
    book,
    (...place) => place,
    (_, reference) =>
      reference.sheet?.toUpperCase() === before.toUpperCase() ? { ...reference, sheet: name } : reference,
  );
  return { ...moved, names: book.names.map((each, index) => (index === sheet ? name : each)) };
}

/** The value of every cell. A cell that reads itself, over whatever way, is an error. */
export function evaluateAll(book: NaiveBook): Map<string, Cell> {
  const values = new Map<string, Cell>();
  const circular = circularCells(book);
  const evaluate = (place: string): Cell => {
    const known = values.get(place);
    if (known !== undefined) {
      return known;
    }
    const content = book.cells.get(place);
    let value: Cell = content?.value ?? null;
    if (content?.formula !== undefined) {
      const [home] = placeOf(place);
      const read = (sheet: string | undefined, row: number, column: number): Cell => {
        const target = sheetOf(book, sheet, home);
        return target < 0 ? new CellError("#REF!", "", "") : evaluate(key(target, row, column));
      };
      if (circular.has(place)) {
        value = new CellError("#VALUE!", "circle", "circle");
      } else {
        const operand = miniEvaluate(content.formula, read);
        value = (isMatrix(operand) ? operand.at(0, 0) : operand) ?? 0;
      }
    }
    values.set(place, value);
    return value;
  };
  for (const place of book.cells.keys()) {
    evaluate(place);
  }
  return values;
}

function circularCells(book: NaiveBook): Set<string> {
  const reads = new Map<string, string[]>();
  for (const [place, { formula }] of book.cells) {
    const [home] = placeOf(place);
    const read: string[] = [];
    for (const { sheet, first, second } of formula === undefined ? [] : referencesIn(formula)) {
      for (let row = Math.min(first.row, second.row); row <= Math.max(first.row, second.row); row++) {
        for (
          let column = Math.min(first.column, second.column);
          column <= Math.max(first.column, second.column);
          column++
        ) {
          read.push(key(sheetOf(book, sheet, home), row, column));
        }
      }
    }
    reads.set(place, read);
  }
  const circular = new Set<string>();
  for (const start of reads.keys()) {
    const seen = new Set<string>();
    const queue = [...(reads.get(start) ?? [])];
    for (let place = queue.pop(); place !== undefined; place = queue.pop()) {
      if (place === start) {
        circular.add(start);
        break;
      }
      if (!seen.has(place)) {
        seen.add(place);
        queue.push(...(reads.get(place) ?? []));
      }
    }
  }
  return circular;
}
