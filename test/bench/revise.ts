import { type Column, columnOf } from "../../src/call/column.js";
import { ownFunctions } from "../../src/files/xlsx/ownFunctions.js";
import { bookTable } from "../../src/revision/bookTable.js";
import { ledgerEntries } from "../../src/revision/ledgerEntry.js";
import { ledgerOf } from "../../src/revision/ledgerOf.js";
import { planLines } from "../../src/revision/planLines.js";
import { planRevision } from "../../src/revision/planRevision.js";
import { revisionEdits } from "../../src/revision/revisionEdits.js";
import { bookOf } from "../../src/sheet/book/bookOf.js";
import { change } from "../../src/sheet/change.js";
import { fillFormula } from "../../src/sheet/edit/fillFormula.js";
import { setCells } from "../../src/sheet/edit/setCells.js";
import { randomNumbers, report } from "./timing.js";

const typed = [
  "Target",
  "P [d]",
  "Mstar [solMass]",
  "Mstar sigma [solMass]",
  "m [jupiterMass]",
  "m sigma [jupiterMass]",
];
const derived: readonly (readonly [string, string])[] = [
  ["K [m/s]", '=BARY.REFLEX(B2,C2,E2,,,"d; solMass; jupiterMass",G$1)'],
  ["a [AU]", '=BARY.AXIS(B2,C2,E2,"d; solMass; jupiterMass",H$1)'],
  ["Shift", '=BARY.SHIFT(G2,,"m/s",I$1)'],
  ["Line [nm]", '=BARY.LINESHIFT("550 nm",G2,,"nm; m/s",J$1)'],
  ["visits", "=ROUNDUP((30/G2)^2,0)"],
  ["nights", "=K2/4"],
  ["K over 3", "=G2/3"],
  ["mass ratio", "=E2/C2"],
  ["signal", "=G2*SQRT(K2)"],
  ["rank", "=LOG10(G2)+M2"],
];

/** Matching, showing and applying a revision of all masses, and its ledger, against calculating the table once. */
export function benchRevise(): void {
  for (const rows of [100_000, 1_000_000]) benchRows(rows);
}

function benchRows(rows: number): void {
  const random = randomNumbers(7);
  const numbers = (draw: () => number): Column => columnOf(Array.from({ length: rows }, draw));
  const names = columnOf(Array.from({ length: rows }, (_, row) => `T${row}`));
  const values = [numbers(() => 1 + 999 * random()), numbers(() => 0.5 + random()), numbers(() => 0.02 + 0.05 * random()), numbers(() => 0.01 + 5 * random()), numbers(() => 0.01 + 0.1 * random())]; // biome-ignore format: one list
  const revised = values.map((column, index) => (index === 0 ? column : numbers(() => 0)));
  for (let row = 0; row < rows; row++) {
    for (let index = 1; index < values.length; index++) {
      revised[index]!.numbers[row] = values[index]!.numbers[row]! * (0.95 + 0.1 * random());
    }
  }
  const below = (header: string, column: Column): Column => {
    const all = new Float64Array(rows + 1).fill(Number.NaN, 0, 1);
    all.set(column.numbers, 1);
    return { length: rows + 1, numbers: all, others: [header, ...(column.others ?? new Array(rows).fill(undefined))] };
  };
  const columns = [names, ...values].map((column, index) => below(typed[index]!, column));
  const bare = bookOf([{ name: "Targets", columns }]);
  const edits = derived.flatMap(([header, formula], index) => {
    const column = typed.length + index;
    return [setCells({ sheet: 0, row: 0, column }, [[header]]), fillFormula({ sheet: 0, column, from: 1, to: rows + 1 }, formula)]; // biome-ignore format: one list
  });
  const calculated = timed(() => change(bare, edits, ownFunctions));
  const before = calculated.value;
  const order = Array.from({ length: rows }, (_, row) => rows - 1 - row);
  const file = {
    header: typed,
    unitsRow: undefined,
    columns: [names, ...revised].map(({ numbers: own, others }) => ({
      length: rows,
      numbers: Float64Array.from(order, (row) => own[row]!),
      others: others && order.map((row) => others[row]),
    })),
    rows,
    notes: [],
  };
  const plan = timed(() => {
    const planned = planRevision(bookTable(before, 0)!, file, { key: "Target" });
    planLines(planned);
    return planned;
  });
  const source = { date: "2026-01-01T00:00:00.000Z", file: "new.csv", sha256: "" };
  const applied = timed(() => change(before, revisionEdits(plan.value), ownFunctions));
  const ledger = timed(() => {
    const made = ledgerOf(before, applied.value, 0, ["visits <= 40", "K >= 1 m/s"], source, "Target");
    return ledgerEntries(made, 100);
  });
  const text = (seconds: number) => `${seconds.toFixed(2)} s`;
  const what = `${rows.toLocaleString("en")} rows x ${derived.length} derived`;
  const once = `${text(calculated.seconds)} calculating once`;
  report(
    `${what}: match, preview`,
    text(plan.seconds),
    once,
    plan.seconds / calculated.seconds,
    "aim <= 1 s at 100,000",
  );
  const both = applied.seconds + ledger.seconds;
  report(`${what}: apply, ledger`, text(both), once, both / calculated.seconds, "aim <= 1 s at 100,000");
}

function timed<T>(work: () => T): { readonly value: T; readonly seconds: number } {
  const start = performance.now();
  const value = work();
  return { value, seconds: (performance.now() - start) / 1000 };
}
