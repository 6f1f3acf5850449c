import fc from "fast-check";
import { describe, expect, test } from "vitest";
import type { Cell } from "../../src/call/cell.js";
import { ownFunctions } from "../../src/files/xlsx/ownFunctions.js";
import { lastMovedBy } from "../../src/revision/lastMovedBy.js";
import type { Ledger } from "../../src/revision/ledger.js";
import { ledgerCells } from "../../src/revision/ledgerCells.js";
import { ledgerEntries } from "../../src/revision/ledgerEntry.js";
import { ledgerMarkdown } from "../../src/revision/ledgerMarkdown.js";
import { ledgerOf } from "../../src/revision/ledgerOf.js";
import { ledgerRecord, ledgerText, readLedgerRecord } from "../../src/revision/ledgerRecord.js";
import type { Book } from "../../src/sheet/book/book.js";
import { change } from "../../src/sheet/change.js";
import { setCells } from "../../src/sheet/edit/setCells.js";
import { addSheet } from "../../src/sheet/edit/sheets.js";
import { sortRows } from "../../src/sheet/edit/sortRows.js";
import { at } from "../sheet/grid.js";
import { expectGolden } from "./golden.js";
import { bookWith, revised, revisionOf, source } from "./tables.js";

const reflex = "=BARY.REFLEX(B2,C2:D2,E2:F2,,,B$1:F$1,G$1)";

/** A target with orbit, masses and their uncertainties; K beside its uncertainty, and what follows from K. */
const targets = bookWith(
  {
    Target: ["A", "B", "C"],
    "P [d]": [4.23, 100, 3000],
    "Mstar [solMass]": [1.1, 0.8, 0.3],
    "Mstar sigma [solMass]": [0.05, 0.04, 0.02],
    "m [jupiterMass]": [0.47, 1, 5],
    "m sigma [jupiterMass]": [0.02, 0.1, 0.3],
  },
  { "K [m/s]": reflex },
);
const withVisits = change(
  targets,
  [
    setCells(at("H1"), [["K sigma [m/s]", "visits"]]),
    setCells(at("I2"), [[{ formula: "=(30/G2)^2" }], [{ formula: "=(30/G3)^2" }], [{ formula: "=(30/G4)^2" }]]),
  ],
  ownFunctions,
);

function ledger(before: Book, after: Book, conditions: readonly string[] = []): Ledger {
  return ledgerOf(before, after, 0, conditions, source, "Target");
}

function set(book: Book, address: string, cell: Cell): Book {
  return change(book, [setCells(at(address), [[cell]])], ownFunctions);
}

describe("a change of one mass", () => {
  test("moves K by -(2/3) M/(M+m) of its own relative change, to first order", () => {
    // K is in proportion to m (M + m)^(-2/3) at fixed period (Lovis & Fischer 2010, Radial Velocity, eq. 14, in
    // Exoplanets, ed. Seager), so dlnK/dlnM = -(2/3) M/(M+m) and dlnK/dlnm = 1 - (2/3) m/(M+m). m = 0.47 jupiterMass
    // is 0.47/1047.5655 solMass (IAU 2015 resolution B3).
    const step = 1e-6;
    const [star, planet] = [1.1, 0.47 / 1047.5655];
    const inStar = ledgerEntries(ledger(targets, set(targets, "C2", star * (1 + step))))[0]!;
    expect(inStar.relative! / step).toBeCloseTo((-2 / 3) * (star / (star + planet)), 5);
    expect(inStar).toMatchObject({ key: "A", header: "K [m/s]", cell: "G2", movedBy: "Mstar [solMass]" });
    const inPlanet = ledgerEntries(ledger(targets, set(targets, "E2", 0.47 * (1 + step))))[0]!;
    expect(inPlanet.relative! / step).toBeCloseTo(1 - (2 / 3) * (planet / (star + planet)), 5);
  });

  test("of both masses is shared out by the same laws", () => {
    const [star, planet] = [0.8, 1 / 1047.5655];
    const both = change(targets, [setCells(at("C3"), [[star * (1 + 2e-6)]]), setCells(at("E3"), [[1 + 1e-6]])], ownFunctions); // biome-ignore format: one value
    const [entry] = ledgerEntries(ledger(targets, both));
    const [byStar, byPlanet] = entry!.parts.map(({ part }) => part / (entry!.before as number));
    // dlnK = -(2/3) M/(M+m) dlnM + (1 - (2/3) m/(M+m)) dlnm, from the same proportion.
    expect(byStar! / 2e-6).toBeCloseTo((-2 / 3) * (star / (star + planet)), 5);
    expect(byPlanet! / 1e-6).toBeCloseTo(1 - (2 / 3) * (planet / (star + planet)), 5);
    expect(entry!.movedBy).toBe("Mstar [solMass]");
  });

  test("is told in units of its own uncertainty, and traced through K to the visits", () => {
    const before = withVisits;
    const entries = ledgerEntries(ledger(before, set(before, "C2", 1.2)));
    const visits = entries.find(({ header }) => header === "visits")!;
    expect(visits.way).toEqual(["Mstar [solMass]", "K [m/s]", "visits"]);
    const k = entries.find(({ header }) => header === "K [m/s]")!;
    const sigma = before.sheets[0]!.columns[7]!.cells.chunks[0]!.numbers[1] as number;
    expect(k.sigmas).toBe(k.change! / sigma);
    expect(k.parts).toEqual([{ input: "Mstar [solMass]", part: k.change }]);
    expect(k.remainder).toBe(0);
    // By the closed form above at full size: visits go with K^-2, K with (M + m)^(-2/3), so visits with (M + m)^(4/3).
    const planet = 0.47 / 1047.5655;
    expect(1 + visits.relative!).toBeCloseTo(((1.2 + planet) / (1.1 + planet)) ** (4 / 3), 6);
  });
});

describe("the parts of a change", () => {
  const number = (min: number, max: number) => fc.double({ min, max, noNaN: true });

  test("add up to it, whatever moved: two inputs", () => {
    fc.assert(
      fc.property(number(0.1, 3), number(0.01, 9), (star, planet) => {
        const after = change(withVisits, [setCells(at("C3"), [[star]]), setCells(at("E3"), [[planet]])], ownFunctions);
        for (const { change: whole, parts, remainder } of ledgerEntries(ledger(withVisits, after))) {
          const sum = parts.reduce((total, { part }) => total + part, 0);
          expect(parts.length).toBe(2);
          expect(Math.abs(sum - whole!)).toBeLessThanOrEqual(1e-12 * parts.reduce((total, { part }) => total + Math.abs(part), 0)); // biome-ignore format: one value
          expect(sum + remainder!).toBeCloseTo(whole!, 9);
        }
      }),
      { numRuns: 60 },
    );
  });

  test("and the remainder do, with three inputs and formulas of any kind", () => {
    const numbers = fc.tuple(number(1, 9), number(1, 9), number(1, 9));
    fc.assert(
      fc.property(numbers, numbers, (old, now) => {
        const columns = { Target: ["A"], a: [old[0]], b: [old[1]], c: [old[2]] };
        const before = bookWith(columns, { d: "=B2*C2+SQRT(D2)", e: "=E2*D2-B2", f: "=SUM(E$2:E$2)/C2" });
        const after = change(before, [setCells(at("B2"), [[...now]])], ownFunctions);
        for (const { change: whole, parts, remainder } of ledgerEntries(ledger(before, after))) {
          const sum = parts.reduce((total, { part }) => total + part, 0);
          expect(sum + remainder!).toBeCloseTo(whole!, 9);
        }
        // a b has no term of third order, so nothing remains; by hand its parts are da (b + b')/2 and db (a + a')/2.
        const d = ledgerEntries(ledger(before, after)).find(({ header }) => header === "d");
        if (!d || now.some((value, index) => value === old[index])) return;
        expect(d.remainder).toBeCloseTo(0, 9);
        expect(d.parts.find(({ input }) => input === "a")!.part).toBeCloseTo(
          ((now[0] - old[0]) * (old[1] + now[1])) / 2,
          9,
        );
        expect(d.parts.find(({ input }) => input === "b")!.part).toBeCloseTo(
          ((now[1] - old[1]) * (old[0] + now[0])) / 2,
          9,
        );
      }),
      { numRuns: 60 },
    );
  });

  test("are the same whether some rows are calculated or all", () => {
    const rows = 3000;
    const list = (of: (row: number) => Cell) => Array.from({ length: rows }, (_, row) => of(row));
    const before = bookWith(
      { Target: list((row) => `T${row}`), a: list((row) => 1 + row), b: list((row) => 2 + row), c: list(() => 3) },
      { d: "=B2*C2*D2", e: "=LOG10(E2)" },
    );
    const file = revisionOf({ Target: list((row) => `T${row}`), a: list((row) => 2 + row), b: list((row) => 2.5 + row), c: list((row) => 3 + (row % 7)) }); // biome-ignore format: one table
    const made = ledger(before, revised(before, file));
    const all = ledgerEntries(made);
    const some = ledgerEntries(made, 50);
    expect(all.length).toBe(2 * rows);
    expect(some).toEqual(all.slice(0, 50));
    expect(all[0]!.parts.length).toBe(3);
  });

  test("of a change to an error name the input that alone makes it", () => {
    const before = bookWith({ Target: ["A"], a: [1], b: [2] }, { d: "=C2/B2" });
    const after = change(before, [setCells(at("B2"), [[0, 3]])], ownFunctions);
    expect(ledgerEntries(ledger(before, after))).toMatchObject([
      { after: { error: "#DIV/0!" }, change: null, movedBy: "a", parts: [], remainder: null },
    ]);
  });

  test("of a changed formula and of cells on another sheet are told too", () => {
    const sheets = change(bookWith({ Target: ["A"], a: [2] }), [addSheet("Set")], ownFunctions);
    const before = change(sheets, [setCells({ sheet: 1, row: 0, column: 0 }, [[10]]), setCells(at("C1"), [["d"], [{ formula: "=B2*Set!A1" }]])], ownFunctions); // biome-ignore format: one value
    const after = change(before, [setCells({ sheet: 1, row: 0, column: 0 }, [[20]]), setCells(at("C2"), [[{ formula: "=B2*Set!A1+1" }]])], ownFunctions); // biome-ignore format: one value
    const [entry] = ledgerEntries(ledger(before, after));
    // By hand: 2 * 10 = 20 before, 2 * 20 + 1 = 41 after; the cell gives 20, the formula 1.
    expect(entry).toMatchObject({ change: 21, remainder: 0, movedBy: "Set!A" });
    expect(entry!.parts).toEqual([{ input: "formula of d", part: 1 }, { input: "Set!A", part: 20 }]); // biome-ignore format: one value
  });

  test("are none where only the unit of a header was changed", () => {
    const made = ledger(withVisits, set(withVisits, "B1", "P [yr]"));
    // Other numbers of years than of days: that is a change of K.
    expect(made.columns.find(({ header }) => header === "K [m/s]")!.changed).toBe(3);
    expect(ledgerEntries(made).every(({ movedBy }) => movedBy === "P [yr]")).toBe(true);
    const shown = ledger(targets, set(targets, "G1", "K [km/s]"));
    expect(shown.columns.find(({ header }) => header === "K [m/s]")!.changed).toBe(0);
  });

  test("are left out, with the reason, where rows were put in another order", () => {
    const sorted = change(withVisits, [sortRows({ sheet: 0, top: 1, left: 0, bottom: 3, right: 8 }, [{ column: 0, descending: true }])], ownFunctions); // biome-ignore format: one value
    const made = ledger(withVisits, set(sorted, "C2", 0.4));
    expect(made.unshared).toBe("rows were added, taken away, renamed or put in another order");
    expect(ledgerEntries(made).map(({ key, cell }) => [key, cell])).toEqual([["C", "G2"], ["C", "I2"]]); // biome-ignore format: one value
  });
});

describe("conditions", () => {
  const after = set(withVisits, "C2", 3);

  test("are crossed either way, with units, by name or quantity", () => {
    const k = ledgerEntries(ledger(withVisits, after)).find(({ header }) => header === "K [m/s]")!;
    const between = ((k.before as number) + (k.after as number)) / 2;
    const made = ledger(withVisits, after, [`K >= ${between / 1000} km/s`, "visits \u2264 0.5", "visits<=1e9", `semi-amplitude < ${between} m/s`]); // biome-ignore format: one value
    expect(made.conditions.map(({ gained, lost, metBefore, metAfter }) => [gained.map(({ key }) => key), lost.map(({ key }) => key), metBefore - metAfter])).toEqual([[[], ["A"], 1], expect.anything(), [[], [], 0], [["A"], [], -1]]); // biome-ignore format: one value
  });

  test.each([
    ["K 1 m/s", 'the condition "K 1 m/s" cannot be read; write for example "K >= 1 m/s".'],
    ["K >= 1", 'the condition "K >= 1" states no unit, and "K [m/s]" is in m/s; write "K >= 1 m/s".'],
    ["K >= 1 d", 'the condition "K >= 1 d" compares with a duration, and "K [m/s]" holds a speed; make the two agree.'],
    [
      "visits >= 1 d",
      'the condition "visits >= 1 d" compares with a duration, and "visits" states no unit; make the two agree.',
    ],
    [
      "K >= fast",
      'the condition "K >= fast" compares with "fast", which is no number with a unit that is known; write for example "K >= 1 m/s".',
    ],
    [
      "nights < 3",
      'the condition "nights < 3" names "nights", which is no column; the table has "Target", "P [d]", "Mstar [solMass]" and 6 more.',
    ],
  ])("%s is refused", (text, message) => {
    expect(() => ledger(withVisits, after, [text])).toThrow(message);
    expect(message.length).toBeLessThanOrEqual(250);
  });
});

describe("a ledger", () => {
  const file = revisionOf({ Target: ["B", "A"], "Mstar [solMass]": [0.9, 1.2], "m [jupiterMass]": [1.1, 0.47] });
  const after = revised(withVisits, file);
  const made = ledger(withVisits, after, ["visits <= 0.3"]);

  test("of a state with itself is empty", () => {
    expect(ledgerEntries(ledger(withVisits, withVisits))).toEqual([]);
    expect([...ledgerMarkdown(ledger(withVisits, withVisits))].join("")).toContain("## Changes\n\nNone.\n");
  });

  test("comes back from its text as it was, and is left alone where its version is not known", () => {
    const record = ledgerRecord(made);
    const text = [...ledgerText(made)].join("");
    expect(readLedgerRecord(text)).toEqual(record);
    expect(readLedgerRecord(text.replace('"version":1', '"version":2'))).toBeUndefined();
    expect(readLedgerRecord("no ledger")).toBeUndefined();
    expect(record.entries.every((entry) => entry.source === source)).toBe(true);
  });

  test("says which revision last moved a number", () => {
    const later = { ...source, date: "2026-04-01T00:00:00.000Z", file: "newer.csv" };
    const next = revised(after, revisionOf({ Target: ["A"], "Mstar [solMass]": [1.3] }));
    const records = [ledgerRecord(ledgerOf(after, next, 0, [], later, "Target")), ledgerRecord(made)];
    expect(lastMovedBy(records, { key: "A", header: "K" })?.source.file).toBe("newer.csv");
    expect(lastMovedBy(records, { key: "b", header: "K [km/s]" })).toMatchObject({ source, way: ["m [jupiterMass]", "K [m/s]"] }); // biome-ignore format: one value
    expect(lastMovedBy(records, { cell: "$C$2" })).toMatchObject({ role: "revised", before: 1.2, after: 1.3 });
    expect(lastMovedBy(records, { key: "C", header: "K" })).toBeUndefined();
  });

  test("is a sheet whose rows say all of it", () => {
    const [head, first] = ledgerCells(made);
    expect(head).toEqual(["Row", "Column", "Before", "After", "Change", "Change [%]", "Change in sigma", "Moved most by", "By Mstar [solMass]", "By m [jupiterMass]", "Remainder", "Revision", "Date", "SHA-256"]); // biome-ignore format: one value
    expect(first!.slice(-3)).toEqual([source.file, source.date, source.sha256]);
    expect(first!.length).toBe(head!.length);
  });

  test("is a report", () => {
    expectGolden("report", [...ledgerMarkdown(made)].join(""));
  });
});
