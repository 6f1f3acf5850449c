import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { CellError } from "../../../src/call/cell.js";
import { columnOf } from "../../../src/call/column.js";
import type { BookDocument } from "../../../src/files/bookFile/bookDocument.js";
import { calculateAll } from "../../../src/files/bookFile/calculateAll.js";
import { isBookFile, readBookFile } from "../../../src/files/bookFile/readBookFile.js";
import { writeBookFile } from "../../../src/files/bookFile/writeBookFile.js";
import { FileProblem } from "../../../src/files/fileProblem.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { cellOf } from "../../../src/sheet/book/cellOf.js";
import { formulaOf } from "../../../src/sheet/book/formulaOf.js";
import { change } from "../../../src/sheet/change.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { formulaText } from "../../../src/sheet/formula/formula.js";
import { changes } from "../../../src/sheet/history/changes.js";
import type { Presentation } from "../../../src/sheet/presentation/presentation.js";
import { anyBook, functions } from "./anyBook.js";

const plain = (book: BookDocument["book"]): BookDocument => ({
  title: "t",
  book,
  presentation: [],
  marks: [],
  history: [],
});
const write = (document: BookDocument) => [...writeBookFile(document)].join("");
const read = (text: string) => readBookFile(text, functions);

describe("a book file", () => {
  test("gives the book back to the bit: values, formulas, errors, names", () => {
    fc.assert(
      fc.property(anyBook, (book) => {
        const { book: back } = read(write(plain(book)));
        const calculated = change(back, [calculateAll(back)], functions);
        expect([...changes(book, calculated)]).toEqual([]);
        const names = (each: typeof book) => each.names.map(({ name, formula }) => [name, formulaText(formula, 0, 0)]);
        expect(names(calculated)).toEqual(names(book));
        expect(calculated.sheets.map(({ name }) => name)).toEqual(["Targets", "Other"]);
      }),
      { numRuns: 300 },
    );
  });

  test("keeps how it is seen, its marks and its history", () => {
    const presentation: Presentation = [
      {
        frozenColumns: 2,
        columns: [undefined, { width: 90, hidden: true, format: { kind: "fixed", decimals: 2, grouped: true } }],
      },
    ];
    const error = new CellError("#VALUE!", "topic", "a sentence");
    const table = {
      keys: ["a", "b"],
      columns: [{ header: "K [m/s]", column: columnOf([-0, error]), sigma: columnOf([null, 0.1]) }],
    };
    const marks = [{ id: "m1", name: "before", at: 1_790_000_000_000, sheet: "S", table }];
    const book = bookOf([{ name: "S", columns: [columnOf(["Period [d]", 4.23])] }]);
    const back = read(write({ title: "Survey \u2028", book, presentation, marks, history: ["typed B2"] }));
    expect(back).toMatchObject({ title: "Survey \u2028", presentation: [{ frozenColumns: 2 }], history: ["typed B2"] });
    expect(back.presentation[0]?.columns).toEqual(presentation[0]?.columns);
    expect(back.marks).toMatchObject([{ id: "m1", name: "before", at: 1_790_000_000_000, sheet: "S" }]);
    const column = back.marks[0]?.table.columns[0];
    expect(Object.is(column?.column.numbers[0], -0)).toBe(true);
    expect(column?.column.others?.[1]).toEqual(error);
    expect(column?.sigma?.numbers[1]).toBe(0.1);
  });

  test("is told from a table by its first words, whatever stands before them", () => {
    const text = write(plain(bookOf([{ name: "S", columns: [] }])));
    expect([text, `\uFEFF\n ${text}`].map(isBookFile)).toEqual([true, true]);
    expect(["{}", "Target,Period [d]", '{"format":"x"}'].some(isBookFile)).toBe(false);
    expect(read(`\uFEFF${text}`).book.sheets).toHaveLength(1);
  });
});

// Written by hand from the description of the format, not by the writer.
const byHand = `{ "format": "barycell book", "version": 1, "title": "By hand", "sheets": [{ "name": "Stars",
  "frozenColumns": 1, "columns": [
    { "values": [{ "row": 1, "cells": ["Period [d]", 4.5] }, { "row": 4, "cells": [null, true] }], "formulas": [] },
    { "width": 80, "values": [{ "row": 1, "cells": ["Twice"] }],
      "formulas": [{ "from": 2, "to": 3, "formula": "=A2*2" }] }] }],
  "names": [{ "name": "first", "refersTo": "=Stars!$A$2" }], "marks": [], "history": [] }`;

test("a file written by hand from the description is read", () => {
  const { book, title } = read(byHand);
  const calculated = change(book, [calculateAll(book)], functions);
  const at = (row: number, column: number) => cellOf(calculated, { sheet: 0, row, column });
  expect(title).toBe("By hand");
  expect([at(1, 0), at(3, 0), at(4, 0), at(1, 1), at(2, 1)]).toEqual([4.5, null, true, 9, 0]);
  expect(formulaOf(calculated, { sheet: 0, row: 2, column: 1 })).toBe("=A3*2");
});

const damage: readonly (readonly [from: string, to: string, message: string])[] = [
  [byHand, "{", "The book file is cut off or damaged: its text is no JSON. Take another copy of it."],
  [
    '"version": 1',
    '"version": 2',
    "The book file is of version 2 and this program reads version 1; a newer Barycell is needed.",
  ],
  ['"barycell book"', '"other"', 'format is "other"; "barycell book" is needed.'],
  ['"By hand"', "7", "title is 7; a text of at most 255 characters is needed."],
  ['"Stars"', '"A/B"', 'sheets[0].name is "A/B"; a name of a sheet is needed.'],
  [
    '"frozenColumns": 1',
    '"frozenColumns": -1',
    "sheets[0].frozenColumns is -1; a whole number from 0 to 16384 is needed.",
  ],
  ['"row": 4', '"row": 2', "sheets[0].columns[0].values[1].row is 2; a whole number from 3 to 1048576 is needed."],
  ["[null, true]", "[null, 1e999]", "sheets[0].columns[0].values[1].cells[1] is null; an object is needed."],
  [
    "[null, true]",
    '[{"error":"#BAD!"}]',
    'sheets[0].columns[0].values[1].cells[0].error is "#BAD!"; "#VALUE!" or "#N/A" or "#DIV/0!" or "#REF!" or "#NAME?" or "#NUM!" or "#NULL!" is needed.',
  ],
  ['"to": 3', '"to": 1', "sheets[0].columns[1].formulas[0].to is 1; a whole number from 2 to 1048576 is needed."],
  [
    '"from": 2',
    '"from": 1',
    'sheets[0].columns[1].formulas is "over values in row 1"; a formula or a value for a cell is needed.',
  ],
  ['"=A2*2"', '"A2*2"', 'sheets[0].columns[1].formulas[0].formula is "A2*2"; a formula that begins with = is needed.'],
  ['"width": 80', '"width": "80"', 'sheets[0].columns[1].width is "80"; a whole number from 1 to 10000 is needed.'],
  [
    '"width": 80',
    '"format": {"kind":"fixed","decimals":2}',
    "sheets[0].columns[1].format.grouped is missing; true or false is needed.",
  ],
  ['"marks": []', '"marks": {}', "marks is {}; a list is needed."],
  [
    '"names": [',
    '"names": [{ "name": "FIRST", "refersTo": "=1" }, ',
    'names[1].name is "first"; another name for each is needed.',
  ],
];

test.each(damage)("what is wrong in a file is told: %s -> %s", (from, to, message) => {
  expect(byHand).toContain(from);
  const told = (() => {
    try {
      read(byHand.replace(from, to));
    } catch (error) {
      expect(error).toBeInstanceOf(FileProblem);
      return (error as FileProblem).message;
    }
    return "read";
  })();
  expect(told.replace("The book file is damaged or was changed by hand: ", "")).toBe(message);
  expect(told.length).toBeLessThanOrEqual(250);
});

test("a file with a part changed or cut is read whole or refused with a sentence, never anything else", () => {
  const text = write(
    plain(
      change(
        bookOf([{ name: "S", columns: [columnOf(["A", 1, -0, null, "x"])] }]),
        [fillFormula({ sheet: 0, column: 1, from: 1, to: 4 }, "=A2*2")],
        functions,
      ),
    ),
  );
  const values = [null, -1, 1e99, "", "#N/A", [], {}, true, { number: "-0" }, { error: "#N/A" }, 2 ** 31, "=A1"];
  const parts: (string | number)[][] = [];
  const walk = (value: unknown, path: (string | number)[]): void => {
    parts.push(path);
    if (typeof value === "object" && value !== null) {
      for (const [name, inner] of Object.entries(value)) walk(inner, [...path, name]);
    }
  };
  walk(JSON.parse(text), []);
  const changed = fc
    .tuple(fc.constantFrom(...parts.slice(1)), fc.constantFrom(undefined, ...values))
    .map(([path, value]) => {
      const whole = JSON.parse(text);
      const holder = path.slice(0, -1).reduce((each, name) => each[name], whole);
      holder[path.at(-1) as string] = value;
      return JSON.stringify(whole);
    });
  const cut = fc.nat(text.length - 1).map((length) => text.slice(0, length));
  fc.assert(
    fc.property(fc.oneof(changed, cut, fc.string(), fc.json()), (damaged) => {
      try {
        const { book } = read(damaged);
        expect(book.sheets.length).toBeGreaterThan(0);
      } catch (error) {
        expect(error).toBeInstanceOf(FileProblem);
        expect((error as Error).message.length).toBeLessThanOrEqual(250);
      }
    }),
    { numRuns: 1000 },
  );
});
