import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Cell } from "../../src/call/cell.js";
import { cellAt } from "../../src/call/column.js";
import { ownFunctions } from "../../src/files/xlsx/ownFunctions.js";
import { planLines } from "../../src/revision/planLines.js";
import { stepName } from "../../src/revision/stepName.js";
import { cellOf } from "../../src/sheet/book/cellOf.js";
import { formulaOf } from "../../src/sheet/book/formulaOf.js";
import { change } from "../../src/sheet/change.js";
import { setCells } from "../../src/sheet/edit/setCells.js";
import { changes } from "../../src/sheet/history/changes.js";
import { presentBook, record, startHistory, undo } from "../../src/sheet/history/history.js";
import { at } from "../sheet/grid.js";
import { applied, bookWith, plan, revised, revisionOf, sentences } from "./tables.js";

const masses = {
  Target: ["A", "B", "C"],
  "Mstar [solMass]": [1, 0.8, 0.5],
  "Mstar sigma [solMass]": [0.1, 0.04, 0.05],
};

describe("rows are matched", () => {
  test("exactly, then without regard to blanks and capitals, then by alias", () => {
    const book = bookWith({ Target: ["HD 1", "hd  2 ", "Old", "alone"], "Mstar [solMass]": [1, 1, 1, 1] });
    const file = revisionOf({ Target: ["New", "HD 2", "HD 1", "other"], "Mstar [solMass]": [3, 2, 1.5, 9] });
    const made = plan(book, file, {
      aliases: [
        { old: "old", new: "new" },
        { old: "x", new: "y" },
      ],
    });
    expect(made.match).toMatchObject({ exact: 1, folded: 1, aliased: 1, onlyInTable: [3], onlyInRevision: [3] });
    const after = applied(book, made);
    expect(["B2", "B3", "B4", "B5"].map((address) => cellOf(after, at(address)))).toEqual([1.5, 2, 3, 1]);
    expect(planLines(made)).toEqual([
      "3 of 4 rows matched, 1 of them without regard to blanks and capitals, 1 of them by alias.",
      '"Mstar [solMass]": 3 values change; at most +200 % ("Old").',
      '1 row of the table is not in the revision and stays as before: "alone".',
      '1 row of the revision is not in the table and was left aside: "other".',
      'The alias "x" = "y" was not needed, or one of its names is nowhere.',
    ]);
  });

  test("a key of several rows of the table revises all; one of several that differ in the revision, none", () => {
    const book = bookWith({ Target: ["A", "A", "B", "C"], "Mstar [solMass]": [1, 1, 1, 1] });
    const file = revisionOf({ Target: ["A", "B", "B", "C", "C"], "Mstar [solMass]": [2, 2, 3, 4, 4] });
    const after = revised(book, file);
    expect(["B2", "B3", "B4", "B5"].map((address) => cellOf(after, at(address)))).toEqual([2, 2, 1, 4]);
    expect(sentences(plan(book, file))).toEqual([
      '1 key of the table stands in several rows ("A"); all 2 rows take the same revision.',
      '1 key of the revision stands in several rows that differ: "B"; none of them was taken. Leave one row each.',
    ]);
  });

  test("not at all without the key column", () => {
    const file = revisionOf({ Name: ["A"], "Mstar [solMass]": [2] });
    expect(() => plan(bookWith(masses), file)).toThrow('the revision has no column "Target"; it has "Name", "Mstar".');
    expect(() => plan(bookWith(masses), file, { key: "Tarqet" })).toThrow(
      'the table has no column "Tarqet"; did you mean "Target"?',
    );
  });

  test("in any order of the revision's rows", () => {
    const names = ["a", "b", "c", "d", "e", "f"];
    const book = bookWith({ Target: names, "Mstar [solMass]": names.map(() => 1) });
    fc.assert(
      fc.property(fc.shuffledSubarray(names, { minLength: names.length }), (order) => {
        const after = revised(book, revisionOf({ Target: order, "Mstar [solMass]": order.map((name) => 2 + names.indexOf(name)) })); // biome-ignore format: one value
        expect(names.map((_, row) => cellOf(after, { sheet: 0, row: row + 1, column: 1 }))).toEqual([2, 3, 4, 5, 6, 7]);
      }),
      { numRuns: 50 },
    );
  });
});

describe("columns are matched", () => {
  test("by the quantity, converted to the table's unit, uncertainties with their values", () => {
    const file = revisionOf({ Target: ["A"], "stellar mass [jupiterMass]": [2095.131], "e_stellar mass [jupiterMass]": [104.7566] }); // biome-ignore format: one table
    const book = bookWith(masses);
    const after = revised(book, file);
    // Nominal masses of the Sun and Jupiter, IAU 2015 resolution B3: 1.3271244e20 / 1.2668653e17 = 1047.5655...
    expect(cellOf(after, at("B2"))).toBeCloseTo(2095.131 / 1047.5655, 6);
    expect(cellOf(after, at("C2"))).toBeCloseTo(104.7566 / 1047.5655, 6);
    expect(sentences(plan(book, file))).toEqual([
      '2 rows of the table are not in the revision and stay as before: "B", "C".',
      '"Mstar [solMass]" was converted from jupiterMass to solMass.',
    ]);
  });

  test.each<readonly [Readonly<Record<string, readonly Cell[]>>, string]>([
    [
      { Mstar: [2] },
      '"Mstar" states no unit and was left aside; "Mstar [solMass]" holds a mass. Write for example "Mstar [solMass]".',
    ],
    [
      { "Mstar [d]": [2] },
      '"Mstar [d]" holds a duration and "Mstar [solMass]" a mass; it was left aside. Correct the name or the unit.',
    ],
    [
      { "Mstar [MJ]": [2] },
      '"Mstar [MJ]" was left aside: "MJ" has more than one meaning; write "jupiterMass" (Jupiter mass) or "10**6J" (megajoule).',
    ],
    [
      { "stellar mass [solMass]": [2], "M_star [solMass]": [2] },
      '"stellar mass [solMass]", "M_star [solMass]" could all revise "Mstar [solMass]"; none was taken. Name one of them as the table does.',
    ],
    [
      { "Mstar [solMass]": [2] },
      '"Mstar [solMass]": 1 new value comes without uncertainty; the old one stays beside it, first "A".',
    ],
    [
      { "Mstar [solMass]": [null] },
      '"Mstar [solMass]": 1 blank of the revision does not erase what stands there, first "A".',
    ],
    [
      { "Mstar [solMass]": ["N/A"] },
      '"Mstar [solMass]": 1 text such as "N/A" stands for no value and was taken for blank, first "A".',
    ],
    [
      { "Mstar [solMass]": ["about 2"] },
      '"Mstar [solMass]": 1 cell of the revision is no number and was left aside, first "A" with "about 2".',
    ],
    [
      { "Mstar [solMass]": [-1] },
      '"Mstar [solMass]": 1 value of the revision is out of range and was left aside, first "A" with -1.',
    ],
    [
      { "Mstar [solMass]": [1047.5], "Mstar err [solMass]": [0.2] },
      '"Mstar [solMass]": 1 cell became about 1048 times larger, which looks like jupiterMass in a column of solMass; first "A", 1 to 1048.',
    ],
    [
      { "Mstar [solMass]": [1.1], "Mstar err1 [solMass]": [0.2], "Mstar err2 [solMass]": [-0.3] },
      '"Mstar [solMass]": the revision gives an upper and a lower uncertainty and the table has one column; the larger of both counts, in 1 row.',
    ],
    [{ Distance: [1] }, '1 column of the revision has no place in the table and was left aside: "Distance".'],
    [{ K: [1] }, 'Formulas work out "K", so the revision of it was left aside.'],
    [
      { "note [m]": [1] },
      '"note" states no unit, so "note [m]" was left aside; give the table\'s column its unit, for example "note [m]".',
    ],
    [
      { note: ["x"], "note err": [1] },
      'The uncertainties "note err" were left aside: the table has no column for them beside "note".',
    ],
  ])("%j is told of", (columns, sentence) => {
    const book = bookWith({ ...masses, note: ["a", "b", "c"] }, { K: "=B2*2" });
    const said = sentences(plan(book, revisionOf({ Target: ["A"], ...columns }))).slice(1);
    expect(said).toContain(sentence);
    for (const text of said) expect(text.length, text).toBeLessThanOrEqual(250);
  });

  test("by the capitals of a symbol: M is not m", () => {
    const book = bookWith({
      Target: ["A"],
      "m [jupiterMass]": [1],
      "m err": [0.1],
      "M [solMass]": [2],
      "M err": [0.2],
    });
    const file = revisionOf({
      Target: ["A"],
      "M [solMass]": [3],
      "m [jupiterMass]": [1.5],
      "m err": [0.3],
      "M err": [0.5],
    });
    const after = revised(book, file);
    expect(["B2", "C2", "D2", "E2"].map((address) => cellOf(after, at(address)))).toEqual([1.5, 0.3, 3, 0.5]);
  });

  test("the largest change is told in sigmas and in per cent", () => {
    const file = revisionOf({ Target: ["A", "B", "C"], "Mstar [solMass]": [1.05, 0.78, 0.4] });
    // By hand: +0.05 / 0.1, -0.02 / 0.04 and -0.1 / 0.05 sigma; +5 %, -2.5 % and -20 %.
    expect(planLines(plan(bookWith(masses), file))[1]).toBe(
      '"Mstar [solMass]": 3 values change; at most -2 sigma ("C"), -20 % ("C").',
    );
    const { bySigma } = plan(bookWith(masses), revisionOf({ Target: ["A"], "Mstar [solMass]": [1.05] })).columns[0]!.largest; // biome-ignore format: one value
    expect(bySigma!.sigmas).toBeCloseTo(0.5, 12);
  });

  test("the lost uncertainty is not told where the revision has one, though it is the same", () => {
    const file = revisionOf({ Target: ["A"], "Mstar [solMass]": [2], "Mstar err [solMass]": [0.1] });
    expect(sentences(plan(bookWith(masses), file)).slice(1)).toEqual([]);
  });

  test("a slip in the unit shows where there was no value before, too", () => {
    const book = bookWith({ Target: ["A", "B"], "Mstar [solMass]": [1, null] });
    expect(sentences(plan(book, revisionOf({ Target: ["B", "A"], "Mstar [solMass]": [1047.57, 1] })))).toEqual([
      '"Mstar [solMass]": 1 new value where the table had none is unusual for mass of the star; as jupiterMass usual. First "B", 1048 solMass.',
    ]);
    expect(sentences(plan(book, revisionOf({ Target: ["B", "A"], "Mstar [solMass]": [1.2, 1] })))).toEqual([]);
  });

  test("an uncertainty is taken only where its value is", () => {
    const file = revisionOf({ Target: ["A", "B", "C"], "Mstar [solMass]": [-1, null, 0.6], "Mstar err [solMass]": [9, 9, 0.06] }); // biome-ignore format: one table
    const after = revised(bookWith(masses), file);
    expect(["C2", "C3", "C4"].map((address) => cellOf(after, at(address)))).toEqual([0.1, 0.04, 0.06]);
  });

  test("cells with formulas among the typed ones stay", () => {
    const typed = bookWith({ Target: ["A", "B", "C"], "Mstar [solMass]": [1, 2, 3] });
    const book = change(typed, [setCells(at("B3"), [[{ formula: "=B2*2" }]])], ownFunctions);
    const file = revisionOf({ Target: ["A", "B", "C"], "Mstar [solMass]": [5, 6, 7] });
    const after = revised(book, file);
    expect(["B2", "B3", "B4"].map((address) => cellOf(after, at(address)))).toEqual([5, 10, 7]);
    expect(formulaOf(after, at("B3"))).toBe("=B2*2");
    expect(sentences(plan(book, file))).toEqual([
      '"Mstar [solMass]": 1 cell holds a formula and was left as it is, first "B".',
    ]);
  });

  test("blanks erase where asked", () => {
    const book = bookWith({ Target: ["A", "B", "C"], "Mstar [solMass]": [1, 2, 3] });
    const file = revisionOf({ Target: ["A", "B", "C"], "Mstar [solMass]": [5, null, 7] });
    const after = revised(book, file, { erases: true });
    expect(["B2", "B3", "B4"].map((address) => cellOf(after, at(address)))).toEqual([5, null, 7]);
    expect(sentences(plan(book, file, { erases: true }))).toEqual([
      '"Mstar [solMass]": 1 cell is erased, because the revision has a blank there, first "B".',
    ]);
  });
});

describe("applied", () => {
  const file = revisionOf({ Target: ["C", "A"], "Mstar [solMass]": [0.6, 1.2], "Mstar err [solMass]": [0.06, 0.2] });
  const before = bookWith(masses, { "twice [solMass]": "=B2*2" });

  test("only what depends on it is calculated anew, and undo brings every bit back", () => {
    const after = revised(before, file);
    expect([...changes(before, after)].map(({ row, column }) => [row, column])).toEqual([[1, 1], [3, 1], [1, 2], [3, 2], [1, 3], [3, 3]]); // biome-ignore format: one value
    const history = record(startHistory(before), stepName(plan(before, file), "new.csv"), after);
    expect([...changes(presentBook(undo(history)), before)]).toEqual([]);
    expect(history.versions.map(({ name }) => name)).toEqual(["opened", "revised 4 cells from new.csv"]);
    expect(formulaOf(after, at("D2"))).toBe("=B2*2");
  });

  test("twice changes nothing more", () => {
    const after = revised(before, file);
    const again = plan(after, file);
    expect(again.columns.map(({ values, sigmas }) => [values.changed, ...sigmas.map(({ changed }) => changed)])).toEqual([[0, 0]]); // biome-ignore format: one value
    expect([...changes(after, applied(after, again))]).toEqual([]);
  });

  test("of a unit conversion too", () => {
    const inJupiters = revisionOf({ Target: ["A", "B"], "Mstar [jupiterMass]": [1000.1, 777.7] });
    const after = revised(before, inJupiters);
    expect([...changes(after, revised(after, inJupiters))]).toEqual([]);
  });

  test("what is not revised keeps its bits", () => {
    const column = plan(before, file).columns[0]!.values;
    expect(cellAt(column.values, 1)).toBe(0.8);
    expect(column.spans).toEqual([{ from: 0, to: 3 }]);
  });
});

describe("planted slips in 5,000 rows", () => {
  test("are all told, and nothing else is", () => {
    const names = Array.from({ length: 5000 }, (_, row) => `T${row}`);
    const masses = names.map((_, row) => 0.1 + ((row * 7919) % 5000) / 1000);
    const period = names.map((_, row) => 1 + ((row * 104729) % 5000) / 10);
    const book = bookWith({ Target: names, "m [jupiterMass]": masses, "P [d]": period });
    // 317.828 and 1047.566: IAU 2015 resolution B3; 365.25 d: the Julian year.
    const slips: Readonly<Record<number, number>> = { 10: 317.828, 20: 317.828, 4000: 1 / 1047.566 };
    const newer = masses.map((mass, row) => mass * (1 + (((row * 31) % 200) - 100) / 1000) * (slips[row] ?? 1));
    const file = revisionOf({ Target: names, "m [jupiterMass]": newer, "P [d]": period.map((value, row) => (row === 77 ? value / 365.25 : value)) }); // biome-ignore format: one table
    expect(sentences(plan(book, file))).toEqual([
      expect.stringMatching(/^"m \[jupiterMass\]": 2 cells became about 317.8 times larger, which looks like earthMass in a column of jupiterMass; first "T10", /), // biome-ignore format: one value
      expect.stringMatching(/^"m \[jupiterMass\]": 1 cell became about 1048 times smaller, which looks like solMass in a column of jupiterMass; first "T4000", /), // biome-ignore format: one value
      expect.stringMatching(/^"P \[d\]": 1 cell became about 365.3 times smaller, which looks like yr in a column of d; first "T77", /), // biome-ignore format: one value
    ]);
  });
});
