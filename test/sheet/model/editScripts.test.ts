import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import type { Book } from "../../../src/sheet/book/book.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { cellOf } from "../../../src/sheet/book/cellOf.js";
import { formulaOf } from "../../../src/sheet/book/formulaOf.js";
import { change } from "../../../src/sheet/change.js";
import { clearCells } from "../../../src/sheet/edit/clearCells.js";
import { deleteColumns } from "../../../src/sheet/edit/deleteColumns.js";
import { deleteRows } from "../../../src/sheet/edit/deleteRows.js";
import type { Edit } from "../../../src/sheet/edit/draft.js";
import { fillCells } from "../../../src/sheet/edit/fillCells.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { insertColumns } from "../../../src/sheet/edit/insertColumns.js";
import { insertRows } from "../../../src/sheet/edit/insertRows.js";
import { moveCells } from "../../../src/sheet/edit/moveCells.js";
import { pasteCells } from "../../../src/sheet/edit/pasteCells.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";
import { renameSheet } from "../../../src/sheet/edit/sheets.js";
import { sortRows } from "../../../src/sheet/edit/sortRows.js";
import { noFunctions } from "../../../src/sheet/formula/functions.js";
import { changes } from "../../../src/sheet/history/changes.js";
import type { Box, NaiveBook } from "./naiveBook.js";
import * as naive from "./naiveBook.js";
import { columnName } from "./references.js";

const rows = 9;
const columns = 6;
const margin = 12;

interface Step {
  readonly says: string;
  readonly edit: (book: Book) => Edit;
  readonly model: (book: NaiveBook) => NaiveBook;
}

const row = fc.nat(rows - 1);
const column = fc.nat(columns - 1);
const sheet = fc.nat(1);
const dollar = fc.constantFrom("", "", "$");
const cell = fc.tuple(dollar, column, dollar, row).map(([a, c, b, r]) => `${a}${columnName(c)}${b}${r + 1}`);
const anySheet = fc.constantFrom("", "", "", "First!", "'Second one'!");
const reference = fc.tuple(anySheet, cell).map(([name, at]) => name + at);
const range = fc.tuple(anySheet, cell, cell).map(([name, a, b]) => `${name}${a}:${b}`);
const formula = fc.oneof(
  reference.map((a) => `=${a}`),
  fc
    .tuple(reference, reference, fc.constantFrom("+", "-", "*", "/", "&", "<", "="))
    .map(([a, b, o]) => `=${a}${o}${b}`),
  fc.tuple(reference, fc.integer({ min: -3, max: 9 })).map(([a, n]) => `=${a}*2+${n < 0 ? `(${n})` : n}`),
  range.map((a) => `=SUM(${a})`),
  fc.tuple(range, reference).map(([a, b]) => `=MAX(${a})-${b}`),
  fc.tuple(reference, reference, reference).map(([a, b, c]) => `=IF(${a}>${b},${c},-${a}%)`),
  fc.tuple(reference, reference).map(([a, b]) => `=IFERROR(${a}/${b},"A1 "&${b})`),
  fc.constant("=-2^2"),
);
const literal: fc.Arbitrary<Cell> = fc.oneof(
  fc.integer({ min: -5, max: 5 }),
  fc.constantFrom(1.5, 1e-300, -0, "x", "12", "Abc", true, false, null),
);

const box = fc.tuple(sheet, row, row, column, column).map(
  ([s, a, b, c, d]): Box => ({
    sheet: s,
    top: Math.min(a, b),
    bottom: Math.max(a, b),
    left: Math.min(c, d),
    right: Math.max(c, d),
  }),
);

const step: fc.Arbitrary<Step> = fc.oneof(
  {
    weight: 3,
    arbitrary: fc.tuple(sheet, row, column, literal).map(
      ([s, r, c, value]): Step => ({
        says: `set ${s}:${columnName(c)}${r + 1} ${String(value)}`,
        edit: () => setCells({ sheet: s, row: r, column: c }, [[value]]),
        model: (book) => naive.put(book, s, r, c, value),
      }),
    ),
  },
  {
    weight: 4,
    arbitrary: fc.tuple(sheet, row, column, formula).map(
      ([s, r, c, text]): Step => ({
        says: `set ${s}:${columnName(c)}${r + 1} ${text}`,
        edit: () => setCells({ sheet: s, row: r, column: c }, [[{ formula: text }]]),
        model: (book) => naive.put(book, s, r, c, { formula: text }),
      }),
    ),
  },
  {
    weight: 5,
    arbitrary: fc.tuple(sheet, row, row, column, formula).map(([s, a, b, c, text]): Step => {
      const [from, to] = [Math.min(a, b), Math.max(a, b)];
      return {
        says: `fill ${s}:${columnName(c)}${from + 1}..${to + 1} ${text}`,
        edit: () => fillFormula({ sheet: s, column: c, from, to: to + 1 }, text),
        model: (book) => {
          const first = naive.put(book, s, from, c, { formula: text });
          const one = { sheet: s, top: from, bottom: from, left: c, right: c };
          return Array.from({ length: to - from }, (_, index) => from + 1 + index).reduce(
            (filled, at) => naive.copyTo(filled, first, one, s, at, c),
            first,
          );
        },
      };
    }),
  },
  box.map(
    (area): Step => ({
      says: `clear ${JSON.stringify(area)}`,
      edit: () => clearCells(area),
      model: (book) => naive.clear(book, area),
    }),
  ),
  fc.tuple(box, sheet, row, column).map(
    ([area, s, r, c]): Step => ({
      says: `copy ${JSON.stringify(area)} to ${s}:${columnName(c)}${r + 1}`,
      edit: (book) => pasteCells({ book, area }, { sheet: s, row: r, column: c }),
      model: (book) => naive.copyTo(book, book, area, s, r, c),
    }),
  ),
  fc.tuple(box, sheet, row, column).map(
    ([area, s, r, c]): Step => ({
      says: `cut ${JSON.stringify(area)} to ${s}:${columnName(c)}${r + 1}`,
      edit: () => moveCells(area, { sheet: s, row: r, column: c }),
      model: (book) => naive.cut(book, area, s, r, c),
    }),
  ),
  fc.tuple(sheet, row, fc.integer({ min: 1, max: 3 })).map(
    ([s, at, count]): Step => ({
      says: `insert ${count} rows at ${s}:${at + 1}`,
      edit: () => insertRows(s, at, count),
      model: (book) => naive.insert(book, s, "row", at, count),
    }),
  ),
  fc.tuple(sheet, row, fc.integer({ min: 1, max: 3 })).map(
    ([s, at, count]): Step => ({
      says: `delete ${count} rows at ${s}:${at + 1}`,
      edit: () => deleteRows(s, at, count),
      model: (book) => naive.remove(book, s, "row", at, count),
    }),
  ),
  fc.tuple(sheet, column, fc.integer({ min: 1, max: 2 })).map(
    ([s, at, count]): Step => ({
      says: `insert ${count} columns at ${s}:${columnName(at)}`,
      edit: () => insertColumns(s, at, count),
      model: (book) => naive.insert(book, s, "column", at, count),
    }),
  ),
  fc.tuple(sheet, column, fc.integer({ min: 1, max: 2 })).map(
    ([s, at, count]): Step => ({
      says: `delete ${count} columns at ${s}:${columnName(at)}`,
      edit: () => deleteColumns(s, at, count),
      model: (book) => naive.remove(book, s, "column", at, count),
    }),
  ),
  fc.tuple(box, column, fc.boolean()).map(([area, by, descending]): Step => {
    const at = Math.min(area.right, Math.max(area.left, by));
    return {
      says: `sort ${JSON.stringify(area)} by ${columnName(at)} ${descending}`,
      edit: () => sortRows(area, [{ column: at, descending }]),
      model: (book) => naive.sort(book, area, at, descending),
    };
  }),
  fc
    .tuple(box, fc.constantFrom("down" as const, "up" as const, "right" as const, "left" as const))
    .map(([area, direction]): Step => {
      const vertical = direction === "down" || direction === "up";
      const size = vertical ? area.bottom - area.top + 1 : area.right - area.left + 1;
      const room = direction === "up" ? area.top : direction === "left" ? area.left : 2 * size;
      const times = Math.floor(Math.min(2 * size, room) / size);
      return {
        says: `fill ${JSON.stringify(area)} ${direction} x${times}`,
        edit: () => fillCells(area, direction, times * size),
        model: (book) =>
          Array.from(
            { length: times },
            (_, index) => (index + 1) * size * (direction === "up" || direction === "left" ? -1 : 1),
          ).reduce(
            (filled, by) =>
              naive.copyTo(
                filled,
                book,
                area,
                area.sheet,
                area.top + (vertical ? by : 0),
                area.left + (vertical ? 0 : by),
              ),
            book,
          ),
      };
    }),
  fc.tuple(sheet, fc.constantFrom("First", "Second one", "Other")).map(([s, name]): Step => {
    const taken = (names: readonly string[]): boolean => names.some((each, index) => index !== s && each === name);
    return {
      says: `rename ${s} ${name}`,
      edit: (book) => (taken(book.sheets.map((each) => each.name)) ? () => undefined : renameSheet(s, name)),
      model: (book) => (taken(book.names) ? book : naive.rename(book, s, name)),
    };
  }),
);

function dump(book: Book): Map<string, { value: string; formula: string | undefined }> {
  const cells = new Map<string, { value: string; formula: string | undefined }>();
  for (const [s, { columns: all }] of book.sheets.entries()) {
    for (let c = 0; c < Math.max(all.length, columns); c++) {
      for (let r = 0; r < rows + 4 * margin; r++) {
        const place = { sheet: s, row: r, column: c };
        const value = cellOf(book, place);
        const text = formulaOf(book, place);
        if (value !== null || text !== undefined) {
          cells.set(naive.key(s, r, c), { value: showValue(value), formula: text });
        }
      }
    }
  }
  return cells;
}

function showValue(value: Cell): string {
  return value instanceof CellError ? value.code : Object.is(value, -0) ? "-0" : JSON.stringify(value);
}

function dumpModel(book: NaiveBook): Map<string, { value: string; formula: string | undefined }> {
  const values = naive.evaluateAll(book);
  return new Map(
    [...book.cells].map(([place, { formula: text }]) => [
      place,
      { value: showValue(values.get(place) ?? null), formula: text },
    ]),
  );
}

const sortedEntries = (cells: Map<string, unknown>) =>
  Object.fromEntries([...cells].sort(([a], [b]) => (a < b ? -1 : 1)));

function run(steps: readonly Step[]): { book: Book; model: NaiveBook } {
  let book = bookOf([
    { name: "First", columns: [] },
    { name: "Second one", columns: [] },
  ]);
  let model: NaiveBook = { names: ["First", "Second one"], cells: new Map() };
  for (const each of steps) {
    const before = dump(book);
    const after = change(book, [each.edit(book)], noFunctions);
    expect(dump(book)).toEqual(before);
    model = each.model(model);
    expect(sortedEntries(dump(after)), each.says).toEqual(sortedEntries(dumpModel(model)));
    expectChanges(before, dump(after), book, after);
    book = after;
  }
  return { book, model };
}

/** What is told to have changed is what has: no more and no less. */
function expectChanges(before: ReturnType<typeof dump>, after: ReturnType<typeof dump>, old: Book, now: Book): void {
  const told = new Set([...changes(old, now)].map(({ sheet: s, row: r, column: c }) => naive.key(s, r, c)));
  for (const place of new Set([...before.keys(), ...after.keys()])) {
    const a = before.get(place);
    const b = after.get(place);
    if (a?.value !== b?.value || a?.formula !== b?.formula) {
      expect(told).toContain(place);
    } else if (!a?.value.startsWith("#")) {
      expect(told).not.toContain(place);
    }
  }
}

describe("random edits on the engine and on a map of cells", () => {
  test("give the same values, formulas and errors, and leave the book before as it was", () => {
    fc.assert(
      fc.property(fc.array(step, { minLength: 1, maxLength: 12 }), (steps) => {
        run(steps);
      }),
      { numRuns: Number(process.env.EDIT_SCRIPTS ?? 300) },
    );
  });

  test("many edits at once are the edits one by one", () => {
    fc.assert(
      fc.property(fc.array(step, { minLength: 2, maxLength: 6 }), (steps) => {
        const start = bookOf([
          { name: "First", columns: [] },
          { name: "Second one", columns: [] },
        ]);
        const oneByOne = steps.reduce((book, each) => change(book, [each.edit(book)], noFunctions), start);
        const together = steps.filter((each) => !/^(copy|rename)/.test(each.says));
        if (together.length === steps.length) {
          const atOnce = change(
            start,
            steps.map((each) => each.edit(start)),
            noFunctions,
          );
          expect(sortedEntries(dump(atOnce))).toEqual(sortedEntries(dump(oneByOne)));
        }
      }),
      { numRuns: 150 },
    );
  });
});
