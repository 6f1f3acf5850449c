import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { CellError } from "../../../../src/call/cell.js";
import type { Action } from "../../../../src/hosts/bench/protocol/request.js";
import { formulaOf } from "../../../../src/sheet/book/formulaOf.js";
import { changes } from "../../../../src/sheet/history/changes.js";
import { area, at, type OpenTable, openTable } from "./openTable.js";

const planets = (): OpenTable =>
  openTable([
    [
      "Target",
      "Period [d]",
      "Star mass [solMass]",
      "Planet mass [jupiterMass]",
      "Planet mass err [jupiterMass]",
      "K [m/s]",
    ],
    ["HD 1", 4332.589, 1, 1, 0.1, null],
    ["HD 2", 365.25, 1, 0.5, 0.05, null],
    ["HD 3", 10, 1.2, 2, 0.2, null],
    ["HD 4", 20, 0.9, 3, 0.3, null],
  ]);

const formula = (table: OpenTable, address: string) => formulaOf(table.book(), at(address));

/** Every action, with what it is called in the history; each is done to the planets with K filled down. */
const actions: readonly (readonly [Action, string])[] = [
  [{ do: "type", place: at("C3"), texts: [["1.5"]] }, "revised Star mass in row 3"],
  [{ do: "type", place: at("C2"), texts: [["1.5"], ["2"], ["3"]] }, "revised Star mass in 3 rows"],
  [{ do: "type", place: at("G2"), texts: [["=F2*2"]] }, "entered a formula for column G in row 2"],
  [{ do: "type", place: at("G1"), texts: [["Note"]] }, 'named a column "Note"'],
  [
    { do: "type over", area: area("G2:G5"), place: at("G2"), text: "=F2*2" },
    "entered a formula for column G in 4 rows",
  ],
  [{ do: "clear", area: area("C2:D4") }, "cleared 2 columns in 3 rows"],
  [{ do: "fill", area: area("B2:B3"), toward: "down", count: 2, series: true }, "filled Period down 2 rows"],
  [{ do: "fill", area: area("F2:F5"), toward: "right", count: 1, series: false }, "filled K right 1 column"],
  [{ do: "fill over", area: area("F2:F5") }, "filled K down 3 rows"],
  [
    { do: "paste", place: at("G1"), clipboard: { text: "a\tb\n1\t=2", html: "" }, what: "formulas" },
    "pasted 1 row with headers",
  ],
  [{ do: "move", area: area("B1:B5"), place: at("H1") }, "moved Period in 5 rows to H1"],
  [{ do: "insert rows", sheet: 0, at: 2, count: 2 }, "inserted 2 rows at row 3"],
  [{ do: "delete rows", sheet: 0, at: 2, count: 1 }, "deleted row 3"],
  [{ do: "insert columns", sheet: 0, at: 1, count: 1 }, "inserted 1 column before Period"],
  [{ do: "delete columns", sheet: 0, at: 2, count: 1 }, "deleted Star mass"],
  [{ do: "reorder columns", sheet: 0, from: 2, count: 1, before: 1 }, "moved Star mass before Period"],
  [{ do: "sort", area: area("A2:F5"), keys: [{ column: 1 }] }, "sorted by Period"],
  [{ do: "replace", area: area("A1:F5"), search: "HD", replacement: "HIP" }, 'replaced "HD" by "HIP"'],
  [
    { do: "set unit", place: at("D1"), unit: "earthMass", convert: true },
    "set unit of Planet mass to earthMass, values converted",
  ],
  [
    { do: "set unit", place: at("D1"), unit: "earthMass", convert: false },
    "set unit of Planet mass to earthMass, numbers kept",
  ],
  [
    { do: "format", sheet: 0, columns: [5], format: { kind: "fixed", decimals: 2, grouped: false } },
    "showed K as fixed 2",
  ],
  [{ do: "width", sheet: 0, columns: [0, 1], width: 120 }, "set the width of 2 columns"],
  [{ do: "hide columns", sheet: 0, columns: [4], hidden: true }, "hid Planet mass err"],
  [{ do: "freeze", sheet: 0, columns: 1 }, "kept 1 column in view"],
  [{ do: "add sheet", name: "Notes" }, "added the sheet Notes"],
  [{ do: "rename sheet", sheet: 0, name: "Planets" }, "renamed the sheet Targets to Planets"],
  [{ do: "define name", name: "sun", text: "=C2", sheet: 0 }, "named C2 sun"],
];

async function withK(): Promise<OpenTable> {
  const table = planets();
  await table.type("F2", [["=BARY.REFLEX(B2,C2,D2,,,B$1:D$1,F$1)"]]);
  await table.service.act({ do: "fill to end", area: area("F2") });
  return table;
}

describe("actions", () => {
  test.each(actions)("%j", async (action, label) => {
    const table = await withK();
    const before = { book: table.book(), presentation: table.session().history.versions.at(-1)!.presentation };
    const outcome = await table.service.act(action);
    expect(outcome.is).toBe("done");
    expect(table.state().history.labels.at(-1)).toBe(label);
    const after = table.book();
    const presentation = table.session().history.versions.at(-1)!.presentation;
    expect(after !== before.book || presentation !== before.presentation).toBe(true);
    await table.service.undo();
    // Undo gives back the very same book, so every bit of it.
    expect(table.book()).toBe(before.book);
    expect(table.session().history.versions[table.session().history.present]!.presentation).toBe(before.presentation);
    await table.service.redo();
    expect(table.book()).toBe(after);
  });

  test("K of Jupiter, of which handbooks say about 12.5 m/s (common practice), filled to the end of the table", async () => {
    const table = await withK();
    expect(table.cell("F2")).toBeCloseTo(12.47, 1);
    expect(formula(table, "F5")).toBe("=BARY.REFLEX(B5,C5,D5,,,B$1:D$1,F$1)");
    expect(formula(table, "F6")).toBeUndefined();
    expect(table.state().history.labels).toEqual([
      "opened",
      "entered a formula for K in row 2",
      "filled K down 3 rows",
    ]);
  });

  test("names and sheets are taken away again, texts become numbers", async () => {
    const table = openTable([
      ["Name", "x [d]"],
      ["a", "4.5"],
      ["b", "many"],
    ]);
    const steps: readonly Action[] = [
      { do: "define name", name: "first", text: "=B2", sheet: 0 },
      { do: "text to number", sheet: 0, column: 1 },
      { do: "remove name", name: "first" },
      { do: "add sheet", name: "Notes" },
      { do: "remove sheet", sheet: 1 },
    ];
    for (const step of steps) expect((await table.service.act(step)).is).toBe("done");
    expect([table.cell("B2"), table.cell("B3")]).toEqual([4.5, "many"]);
    expect(table.state()).toMatchObject({ names: [], sheets: [{ name: "Targets" }] });
    expect(table.state().history.labels.slice(1)).toEqual([
      "named B2 first",
      "made numbers of the texts in x",
      "removed the name first",
      "added the sheet Notes",
      "removed the sheet Notes",
    ]);
    await table.service.goTo(1);
    expect(table.cell("B2")).toBe("4.5");
    expect(table.state().names).toEqual([{ name: "first", refersTo: "=Targets!$B$2" }]);
  });

  test("errors that a moved or deleted column leaves behind are told", async () => {
    const table = await withK();
    expect(await table.service.act({ do: "delete columns", sheet: 0, at: 2, count: 1 })).toMatchObject({
      said: "4 more cells hold an error now; look at the formulas that refer to what was moved, or undo.",
    });
    await table.service.undo();
    expect(await table.service.act({ do: "reorder columns", sheet: 0, from: 3, count: 1, before: 6 })).toMatchObject({
      said: "4 more cells hold an error now; look at the formulas that refer to what was moved, or undo.",
    });
  });

  test("a label of the page's own is kept", async () => {
    const table = planets();
    await table.service.act({ do: "clear", area: area("A2") }, "cut the name");
    expect(table.state().history.labels.at(-1)).toBe("cut the name");
  });

  test("typed texts are what entryOf makes of them", async () => {
    const table = planets();
    await table.type("G2", [["'=1+1", "=1+1", "TRUE", "1e3"]]);
    expect(["G2", "H2", "I2", "J2"].map((address) => table.cell(address))).toEqual(["=1+1", 2, true, 1000]);
    expect(["G2", "H2", "I2", "J2"].map((address) => table.service.entryOf(at(address)))).toEqual([
      "'=1+1",
      "=1+1",
      "TRUE",
      "1000",
    ]);
  });

  test("what is typed back as entryOf gives it is the same cell", async () => {
    const texts = fc.oneof(
      fc.string({ maxLength: 12 }),
      fc.double({ noNaN: true, noDefaultInfinity: true }).map(String),
    );
    await fc.assert(
      fc.asyncProperty(texts, async (text) => {
        const table = openTable([["Name"], [text]]);
        const entry = table.service.entryOf(at("A2"));
        await table.type("A2", [[entry]]);
        expect(table.cell("A2")).toBe(text);
      }),
      { numRuns: 60 },
    );
  });

  test("actions asked for at once are done one after the other", async () => {
    const table = planets();
    const outcomes = await Promise.all([
      table.type("G2", [["1"]]),
      table.type("G2", [["=G3"]]),
      table.type("G3", [["7"]]),
      table.service.undo(),
    ]);
    expect(outcomes.map(({ is }) => is)).toEqual(["done", "done", "done", "done"]);
    expect(table.state().history).toMatchObject({ present: 2 });
    // A blank cell counts as 0.
    expect(table.cell("G2")).toBe(0);
    await table.service.redo();
    expect(table.cell("G2")).toBe(7);
  });

  test("a cancelled action leaves the book as it was", async () => {
    const table = openTable([["x"], ...Array.from({ length: 20_000 }, (_, row) => [row])]);
    const before = table.book();
    const acted = table.service.act({ do: "type over", area: area("B2:B20001"), place: at("B2"), text: "=SIN(A2)+B1" });
    await new Promise((resume) => setTimeout(resume, 0));
    table.service.cancel();
    expect((await acted).is).toBe("cancelled");
    expect(table.book()).toBe(before);
    expect((await table.type("B2", [["1"]])).is).toBe("done");
  });

  test("an exception leaves the session at the last whole version, and the next action works", async () => {
    const table = planets();
    const before = table.session();
    await expect(table.service.act({ do: "insert rows" } as unknown as Action)).rejects.toThrow();
    expect(table.session()).toBe(before);
    expect((await table.type("B2", [["1"]])).is).toBe("done");
  });

  test("edited and followed cells flash, by undo too", async () => {
    const table = await withK();
    await table.type("C2", [["2"]]);
    const flashes = () =>
      table.service.windowOf(0, 1, 4, 2, 6).cells.map((row) => row.map(({ flash }) => flash ?? "-").join(" "));
    expect(flashes()).toEqual(["edited - - followed", "- - - -", "- - - -"]);
    await table.service.undo();
    expect(flashes()).toEqual(["followed - - followed", "- - - -", "- - - -"]);
    await table.service.act({ do: "insert rows", sheet: 0, at: 1, count: 1 });
    expect(flashes().join(" ")).not.toMatch(/edited|followed/);
  });
});

describe("refusals", () => {
  test.each<[Action, string]>([
    [
      { do: "type", place: at("G2"), texts: [["=SUM(B2"]] },
      'formula: =SUM(B2 cannot be read at character 5: this "(" is never closed; add ")".',
    ],
    [
      { do: "set unit", place: at("D1"), unit: "Mjupp", convert: false },
      'unit: "Mjupp" is not a known unit; did you mean "Mjup" (jupiterMass)?',
    ],
    [
      { do: "set unit", place: at("D1"), unit: "d", convert: true },
      "unit: Planet mass is in jupiterMass, which cannot be converted to d: they are a mass and a duration; choose a unit of a mass, or keep the numbers as they stand.",
    ],
    [
      { do: "set unit", place: at("A1"), unit: "d", convert: true },
      "unit: Target states no unit yet, so its numbers cannot be converted; set the unit and keep them.",
    ],
    [
      { do: "fill to end", area: area("H2") },
      "fill: the table beside these cells ends here or is not there; drag the fill handle as far as it is to go.",
    ],
    [
      { do: "fill over", area: area("F2") },
      "fill: one row is selected; select the rows below it too, which its cells are to be filled over.",
    ],
    [
      { do: "paste", place: at("A1048575"), clipboard: { text: "1\n2\n3", html: "" }, what: "formulas" },
      "paste: 3 x 1 cells do not fit from there on; the sheet ends at row 1,048,576 and column 16,384; paste higher up or further left, or copy less.",
    ],
    [
      { do: "paste", place: at("A1"), clipboard: { text: "", html: "<b>x</b>" }, what: "formulas" },
      "paste: the clipboard holds no text; copy cells or text before.",
    ],
    [
      { do: "reorder columns", sheet: 0, from: 1, count: 2, before: 2 },
      "move columns: they stand there already; choose another place.",
    ],
    [
      { do: "sort", area: area("A2:F2"), keys: [{ column: 0 }] },
      "sort: there are fewer than two rows to sort; select the rows of the table, without the headers.",
    ],
  ])("%j", async (action, message) => {
    const table = planets();
    const before = table.session();
    expect(await table.service.act(action)).toEqual({ is: "refused", message });
    expect(table.session()).toBe(before);
    expect(message.length).toBeLessThanOrEqual(250);
  });
});

describe("reordering columns", () => {
  test("formulas follow their columns", async () => {
    const table = await withK();
    const before = ["F2", "F3", "F4", "F5"].map((address) => table.cell(address));
    await table.service.act({ do: "reorder columns", sheet: 0, from: 5, count: 1, before: 1 });
    expect(formula(table, "B2")).toBe("=BARY.REFLEX(C2,D2,E2,,,C$1:E$1,B$1)");
    expect(["B2", "B3", "B4", "B5"].map((address) => table.cell(address))).toEqual(before);
    expect(table.cell("A2")).toBe("HD 1");
    expect(table.cell("C1")).toBe("Period [d]");
  });

  test("there and back is the same table, wherever columns go", async () => {
    await fc.assert(
      fc.asyncProperty(fc.nat(5), fc.integer({ min: 1, max: 3 }), fc.nat(8), async (from, count, before) => {
        const table = openTable([
          ["a", "b", "c", "d", "e", "f"],
          [1, 2, 3, 4, 5, 6],
          [7, 8, 9, 10, 11, 12],
        ]);
        await table.type("G2", [["=A2-2*B2+3*C2-5*D2+7*E2-11*F2"]]);
        const start = table.book();
        const value = table.cell("G2");
        const moved = await table.service.act({ do: "reorder columns", sheet: 0, from, count, before });
        if (moved.is === "refused") return;
        const select = moved.is === "done" ? moved.select! : undefined;
        const place = table.book().sheets[0]!.columns.findIndex(({ runs }) => runs.length > 0);
        expect(table.service.windowOf(0, 1, 2, place, place + 1).cells[0]![0]!.text).toBe(String(value));
        const back = before > from ? from : from + count;
        await table.service.act({ do: "reorder columns", sheet: 0, from: select!.left, count, before: back });
        expect([...changes(start, table.book())]).toEqual([]);
      }),
      { numRuns: 40 },
    );
  });

  test("values with their uncertainty stay filled", async () => {
    const table = openTable([
      ["P [d]", "M [solMass]", "m [earthMass]", "m err", "K [m/s]", "K err"],
      [10, 1, 5, 0.5, null, null],
    ]);
    await table.type("E2", [["=BARY.REFLEX(A2,B2,C2:D2,,,A$1:D$1,E$1)"]]);
    const [value, sigma] = [table.cell("E2"), table.cell("F2")];
    // K is proportional to m as long as m is small: the relative uncertainties agree to m / M (first order).
    expect((sigma as number) / (value as number)).toBeCloseTo(0.1, 4);
    await table.service.act({ do: "reorder columns", sheet: 0, from: 4, count: 2, before: 0 });
    expect([table.cell("A2"), table.cell("B2")]).toEqual([value, sigma]);
    expect(table.state().sheets[0]!.columnStates[1]!.sigmaOf).toBe(0);
    await table.service.act({ do: "reorder columns", sheet: 0, from: 1, count: 1, before: 6 });
    const torn = table.cell("A2");
    expect(torn).toBeInstanceOf(CellError);
    expect((torn as CellError).message).toContain("B2 is in the way");
  });
});

describe("presentation", () => {
  const seen = (table: OpenTable) =>
    table.state().sheets[0]!.columnStates.map(({ width, hidden }) => (hidden ? "hidden" : (width ?? "-")));

  test("widths and hidden columns follow their columns", async () => {
    const table = planets();
    await table.service.act({ do: "width", sheet: 0, columns: [1], width: 80 });
    await table.service.act({ do: "hide columns", sheet: 0, columns: [4], hidden: true });
    await table.service.act({ do: "freeze", sheet: 0, columns: 2 });
    await table.service.act({ do: "insert columns", sheet: 0, at: 1, count: 1 });
    await table.type("B1", [["Note"]]);
    expect(seen(table)).toEqual(["-", "-", 80, "-", "-", "hidden", "-"]);
    expect(table.state().sheets[0]!.frozenColumns).toBe(3);
    await table.service.act({ do: "reorder columns", sheet: 0, from: 2, count: 1, before: 7 });
    expect(seen(table)).toEqual(["-", "-", "-", "-", "hidden", "-", 80]);
    await table.service.act({ do: "delete columns", sheet: 0, at: 0, count: 2 });
    expect(seen(table)).toEqual(["-", "-", "hidden", "-", 80]);
    expect(table.state().sheets[0]!.frozenColumns).toBe(1);
    await table.service.goTo(1);
    expect(seen(table)).toEqual(["-", 80, "-", "-", "-", "-"]);
    await table.service.goTo(0);
    expect(seen(table)).toEqual(["-", "-", "-", "-", "-", "-"]);
  });
});
