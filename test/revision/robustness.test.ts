import fc from "fast-check";
import { expect, test } from "vitest";
import { CellError } from "../../src/call/cell.js";
import { ledgerEntries } from "../../src/revision/ledgerEntry.js";
import { ledgerMarkdown } from "../../src/revision/ledgerMarkdown.js";
import { ledgerOf } from "../../src/revision/ledgerOf.js";
import { planLines } from "../../src/revision/planLines.js";
import { RevisionRefused } from "../../src/revision/revisionRefused.js";
import { changes } from "../../src/sheet/history/changes.js";
import { applied, bookWith, plan, revised, revisionOf, source } from "./tables.js";

const cell = fc.oneof(
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.constantFrom(null, "", "nan", "--", "N/A", "1.2 \u00b1 0.1 solMass", "3 d", "text", true, 0, -1, 1e308),
  fc.constant(new CellError("#N/A", "elsewhere", "not there")),
);
const headers = ["Mstar [solMass]", "stellar mass [kg]", "Mstar err [solMass]", "m [earthMass]", "m", "e", "P [yr]", "Note", "K [m/s]", "T [degC]", "x [MJ]"]; // biome-ignore format: one list
const keys = fc.constantFrom("A", "a ", "B", "C", "D", "", "Q|`[x]`");

test("any cells under any headers are matched and told, or refused, and applied a second time change nothing", () => {
  const book = bookWith(
    {
      Target: ["A", "B", "C", "C"],
      "Mstar [solMass]": [1, 0.8, null, "1.1 solMass"],
      "Mstar sigma [solMass]": [0.1, null, 0.2, 0.1],
      "m [jupiterMass]": [1, 2, 3, 4],
      e: [0, 0.1, null, 0.9],
      "P [d]": [3, 30, 300, 3000],
      Note: ["x", null, "z", ""],
    },
    { "K [m/s]": '=BARY.REFLEX(F2,B2:C2,D2,E2,,"d; solMass; solMass; jupiterMass; 1",H$1)', twice: "=2*H2" },
  );
  const tables = fc
    .tuple(fc.array(keys, { minLength: 1, maxLength: 5 }), fc.uniqueArray(fc.constantFrom(...headers), { minLength: 1, maxLength: 6 }), fc.boolean()) // biome-ignore format: one value
    .chain(
      ([names, chosen, erases]) =>
      fc
        .array(fc.array(cell, { minLength: names.length, maxLength: names.length }), { minLength: chosen.length, maxLength: chosen.length }) // biome-ignore format: one value
        .map((columns) => ({ erases, columns: { Target: names, ...Object.fromEntries(chosen.map((header, index) => [header, columns[index]!])) } })), // biome-ignore format: one value
    );
  let taken = 0;
  fc.assert(
    fc.property(tables, ({ columns, erases }) => {
      const file = revisionOf(columns);
      const made = (() => {
        try {
          return plan(book, file, { erases });
        } catch (error) {
          expect(error).toBeInstanceOf(RevisionRefused);
          expect((error as Error).message.length).toBeLessThanOrEqual(250);
          return undefined;
        }
      })();
      if (!made) return;
      taken += made.columns.some(({ values }) => values.changed > 0) ? 1 : 0;
      for (const line of planLines(made)) expect(line.length, line).toBeLessThanOrEqual(250);
      const after = applied(book, made);
      expect([...changes(after, revised(after, file, { erases }))]).toEqual([]);
      const ledger = ledgerOf(book, after, 0, ["K < 10 m/s"], source, "Target");
      for (const { change, parts, remainder } of ledgerEntries(ledger)) {
        if (change === null || remainder === null) continue;
        const sum = parts.reduce((total, { part }) => total + part, 0) + remainder;
        const scale = parts.reduce((total, { part }) => total + Math.abs(part), Math.abs(change));
        if (Number.isFinite(scale)) expect(Math.abs(sum - change)).toBeLessThanOrEqual(1e-9 * scale);
      }
      const tableLines = [...ledgerMarkdown(ledger)].join("").split("\n").filter((line) => line.startsWith("| ")); // biome-ignore format: one value
      for (const line of tableLines) expect([3, 5, 9, 10], line).toContain(line.split(/(?<!\\)\|/).length - 1);
    }),
    { numRuns: 300 },
  );
  expect(taken).toBeGreaterThan(50);
});
