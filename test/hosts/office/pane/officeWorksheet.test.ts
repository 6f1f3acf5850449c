import fc from "fast-check";
import { afterEach, describe, expect, test } from "vitest";
import { type Cell, CellError } from "../../../../src/call/cell.js";
import { cellAt, columnOf } from "../../../../src/call/column.js";
import { readArea } from "../../../../src/hosts/office/pane/areaText.js";
import { cellOfOffice, officeOfCell } from "../../../../src/hosts/office/pane/officeCells.js";
import { officeWorksheet } from "../../../../src/hosts/office/pane/officeWorksheet.js";
import { tellCell } from "../../../../src/hosts/office/pane/why/tellCell.js";
import { type Mark, marksText, readMarks } from "../../../../src/table/mark.js";
import { standInOffice } from "./standIn/standInOffice.js";
import { targets } from "./targets.js";

function start(cells: readonly (readonly Cell[])[]) {
  const standIn = standInOffice(cells);
  Object.assign(globalThis, { Excel: standIn.Excel, Office: standIn.Office });
  return standIn;
}

afterEach(() => {
  for (const name of ["Excel", "Office"]) Reflect.deleteProperty(globalThis, name);
});

const at = (address: string) => readArea(address, "Targets")!;

describe("the worksheet through the host's objects", () => {
  test("values, formulas, blanks and errors", async () => {
    const { sheet } = start([["x", 1, true, null]]);
    sheet.type("E1", "=1/0");
    const [cells, gone] = await officeWorksheet.read([at("A1:E1"), { ...at("A1"), sheet: "Elsewhere" }]);
    expect(cells!.values[0]!.slice(0, 4)).toEqual(["x", 1, true, null]);
    expect(cells!.values[0]![4]).toMatchObject({ code: "#DIV/0!" });
    expect(cells!.formulas[0]).toEqual([undefined, undefined, undefined, undefined, "=1/0"]);
    expect(gone).toBeUndefined();
  });

  test("a large area is read in parts and comes as one", async () => {
    start([["x"]]);
    // The stand-in refuses more than 400,000 cells in one answer, as a host on the web does by size.
    const area = { ...at("A1"), rows: 30_000, columns: 20 };
    const [cells] = await officeWorksheet.read([area]);
    expect([cells!.values.length, cells!.formulas.length, cells!.values[0]![0]]).toEqual([30_000, 30_000, "x"]);
  });

  test("the used area, also of a sheet that is empty or not there", async () => {
    const { sheet } = start([]);
    expect(await officeWorksheet.usedArea()).toBeUndefined();
    expect(await officeWorksheet.usedArea("Elsewhere")).toBeUndefined();
    sheet.type("C3", 1);
    sheet.type("D9", 1);
    expect(await officeWorksheet.usedArea()).toEqual(at("C3:D9"));
  });

  test("a new sheet takes a name that is free", async () => {
    const { sheet } = start(targets);
    const cells = [
      ["Row", "Change"],
      ["=evil", 0.1],
      [null, -0.1],
    ];
    expect(await officeWorksheet.addSheet("Comparison", cells)).toBe("Comparison");
    expect(await officeWorksheet.addSheet("Comparison", cells)).toBe("Comparison 2");
    expect([sheet.value("A2"), sheet.formula("A2"), sheet.value("B3")]).toEqual(["=evil", "=evil", -0.1]);
  });

  test("what was not saved is not kept", async () => {
    const standIn = start(targets);
    await officeWorksheet.keep("name", "first");
    standIn.faults.saving = true;
    await expect(officeWorksheet.keep("name", "second")).rejects.toThrow("read-only");
    expect(await officeWorksheet.kept("name")).toBe("first");
  });

  // The stand-in is worth something only if it notices what a host would.
  test("a property read before load and sync fails in the stand-in", async () => {
    const { Excel } = start(targets);
    const run = Excel.run as (work: (context: never) => Promise<unknown>) => Promise<unknown>;
    const read = (load: boolean, sync: boolean) =>
      run(
        async (context: {
          workbook: { getSelectedRange(): { load(name: string): void; address: string } };
          sync(): Promise<void>;
        }) => {
          const range = context.workbook.getSelectedRange();
          if (load) range.load("address");
          if (sync) await context.sync();
          return range.address;
        },
      );
    await expect(read(true, true)).resolves.toBe("Targets!A1");
    await expect(read(false, true)).rejects.toThrow("PropertyNotLoaded");
    await expect(read(true, false)).rejects.toThrow("PropertyNotLoaded");
  });

  test("all that another formula filled is read through #", async () => {
    const { sheet } = start(targets);
    sheet.type("J2", '=BARY.INTO(B2:B6, B$1, "yr")');
    sheet.type("L2", '=BARY.AXIS(J2#, C2:C6,, "yr; solMass")');
    const told = await tellCell(officeWorksheet, at("L4"));
    expect(sheet.value("L4")).toBeTypeOf("number");
    expect(told).toMatchObject({
      is: "call",
      source: "L2",
      value: sheet.value("L4"),
      story: { result: sheet.value("L4") },
    });
  });
});

describe("cells on their way", () => {
  test.each([
    ["", null],
    ["#N/A", "#N/A"],
    ["#SPILL!", "#VALUE!"],
    ["#1 target", "#1 target"],
    [Number.NaN, null],
  ])("%s comes as %s", (value, expected) => {
    const cell = cellOfOffice(value);
    expect(cell instanceof CellError ? cell.code : cell).toBe(expected);
  });

  test("texts stay texts", () => {
    expect(["=1", "+1", "-x", "@a", "'q", "plain"].map(officeOfCell)).toEqual([
      "'=1",
      "'+1",
      "'-x",
      "'@a",
      "''q",
      "plain",
    ]);
  });

  test("a mark keeps every double, the sign of a zero apart", () => {
    const cell = fc.oneof(
      fc.double({ noNaN: true, noDefaultInfinity: true }),
      fc.string(),
      fc.boolean(),
      fc.constant(null),
    );
    fc.assert(
      fc.property(fc.array(cell), fc.array(fc.double({ noNaN: true, noDefaultInfinity: true })), (cells, sigmas) => {
        const column = { header: "K [m/s]", column: columnOf(cells), sigma: columnOf(sigmas) };
        const mark: Mark = {
          sheet: "Targets",
          taken: "2026-01-01T00:00:00.000Z",
          table: { keys: ["a"], columns: [column] },
        };
        const [read] = readMarks(marksText([mark]))!;
        const { column: back, sigma } = read!.table.columns[0]!;
        const positive = (value: unknown) => (value === 0 ? 0 : value);
        expect(cells.map((_, row) => cellAt(back, row))).toEqual(cells.map(positive));
        expect(sigmas.map((_, row) => cellAt(sigma!, row))).toEqual(sigmas.map(positive));
      }),
    );
    expect(readMarks('{"version":2}')).toBeUndefined();
    expect(readMarks("not JSON")).toBeUndefined();
  });
});
