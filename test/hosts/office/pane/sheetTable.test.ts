import { afterEach, describe, expect, test } from "vitest";
import type { Cell } from "../../../../src/call/cell.js";
import { definitions } from "../../../../src/functions/definitions.js";
import { readArea } from "../../../../src/hosts/office/pane/areaText.js";
import { derivedTable } from "../../../../src/hosts/office/pane/compare/derivedTable.js";
import { pickedField, proposeInputs } from "../../../../src/hosts/office/pane/find/proposeInputs.js";
import { officeWorksheet } from "../../../../src/hosts/office/pane/officeWorksheet.js";
import { readSheetTable, type SheetTable } from "../../../../src/hosts/office/pane/sheetTable.js";
import { standInOffice } from "./standIn/standInOffice.js";

afterEach(() => {
  for (const name of ["Excel", "Office"]) Reflect.deleteProperty(globalThis, name);
});

async function tableOf(cells: readonly (readonly Cell[])[]): Promise<SheetTable> {
  const standIn = standInOffice(cells);
  Object.assign(globalThis, { Excel: standIn.Excel, Office: standIn.Office });
  return (await readSheetTable(officeWorksheet))!;
}

const definitionNamed = (name: string) => definitions.find((definition) => definition.name === name)!;
const reflex = definitionNamed("REFLEX");

// A title, a row of units, uncertainties on either side, symbols for names (common practice, no source).
const withUnits: Cell[][] = [
  ["Winter list", null, null, null, null, null, null],
  [null, null, null, null, null, null, null],
  ["Star", "M*", "P", "err1", "err2", "m sin i", "e"],
  ["-", "solMass", "d", "d", "d", "earthMass", "-"],
  ["Lantern 1", 0.94, 3.08, 0.01, -0.02, 226, 0.01],
  ["Lantern 2", 1.21, 412.6, 0.2, -0.1, 763, 0.31],
];

describe("inputs proposed from the headers", () => {
  test("a row of units states the units; uncertainties come along; a minimum mass serves as a mass", async () => {
    expect(proposeInputs(reflex, await tableOf(withUnits))).toEqual([
      { text: "C5:E5", header: "C$4" },
      { text: "B5", header: "B$4" },
      { text: "F5", header: "F$4" },
      { text: "G5", header: "G$3" },
      { text: "", header: "" },
    ]);
  });

  test("a column of another kind or of another name is not taken", async () => {
    const table = await tableOf([
      ["Star", "Period [AU]", "Planet mass", "Mass ratio", "Rotation [d]"],
      ["Lantern 1", 1, 2, 0.1, 20],
    ]);
    expect(proposeInputs(reflex, table).map(({ text }) => text)).toEqual(["", "", "C2", "", ""]);
  });

  test("without a table, nothing", () => {
    expect(proposeInputs(reflex, undefined).every(({ text, header }) => text === "" && header === "")).toBe(true);
  });
});

describe("cells that were picked", () => {
  test.each([
    ["B6", { text: "B5", header: "B$4" }],
    ["C6:E6", { text: "C5:E5", header: "C$4" }],
    ["G3", { text: "G5", header: "G$3" }],
    ["A1:G6", { text: "A5:C5", header: "A$3" }],
    ["K9", { text: "$K$9", header: "" }],
    ["Elsewhere!B2", { text: "Elsewhere!$B$2", header: "" }],
  ])("%s", async (address, expected) => {
    const area = readArea(address, "Targets")!;
    expect(pickedField(reflex.inputs[0]!, area, await tableOf(withUnits), "Targets")).toEqual(expected);
  });
});

describe("the derived values of a table", () => {
  test("columns with formulas, the uncertainty beside, the first texts as names", async () => {
    const table = await tableOf([
      ["Number", "Star", "P [d]", "a [AU]", "a sigma [AU]", "Twice"],
      [1, "Lantern 1", 365.25, '=BARY.INTO("1 AU",, "AU")', 0.1, "=2*C2"],
      [2, null, 3.1, "=1/0", 0.1, "=2*C3"],
    ]);
    const { keys, columns } = derivedTable(table);
    expect(keys).toEqual(["row 2", "row 3"]);
    expect(columns.map(({ header, sigma }) => [header, sigma !== undefined])).toEqual([
      ["a [AU]", true],
      ["Twice", false],
    ]);
  });

  test("rows are named by their first column of texts", async () => {
    const table = await tableOf([
      ["Star", "P", "Twice"],
      ["-", "d", "d"],
      ["Lantern 1", 3, "=2*B3"],
      ["Lantern 2", 4, "=2*B4"],
    ]);
    expect(derivedTable(table)).toMatchObject({ keys: ["Lantern 1", "Lantern 2"], columns: [{ header: "Twice [d]" }] });
  });
});
