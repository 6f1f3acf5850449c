import { describe, expect, test } from "vitest";
import { area, at, type OpenTable, openTable } from "./openTable.js";

const headers = ["Target", "Period [d]", "M [solMass]", "m [Mjupp]", "m err", "Double [d]"];
const table = (): OpenTable =>
  openTable([
    headers,
    ["HD 1", 10, 1, 2, 0.3, null],
    ["HD 2", "4.5 \u00b1 0.5 d", -1, "x", 0.1, null],
    ["HD 3", 30, 1.2, 2, null, null],
  ]);

async function doubled(): Promise<OpenTable> {
  const open = table();
  await open.service.act({ do: "type over", area: area("F2:F4"), place: at("F2"), text: "=2*B2" });
  return open;
}

describe("checking a table", () => {
  test("what was understood and what to look at", async () => {
    const { columns, errors } = await (await doubled()).service.checkTable(0);
    expect(columns.map(({ column, header, understood, contents }) => [column, header, understood, contents])).toEqual([
      [0, "Target", "not a known quantity, no unit", "3 texts"],
      [1, "Period [d]", "period, in d", "2 numbers, 1 text"],
      [2, "M [solMass]", "mass, in solMass", "3 numbers"].with(
        2,
        expect.stringMatching(/in solMass$/) as unknown as string,
      ),
      [3, "m [Mjupp]", "planet mass, no unit", "2 numbers, 1 text"],
      [4, "m err", "uncertainty of planet mass, no unit", "2 numbers, 1 blank"],
      [5, "Double [d]", "a duration, in d", "2 numbers"],
    ]);
    expect(columns[3]!.findings.map(({ message, place }) => [message, place])).toEqual([
      ['"m [Mjupp]": "Mjupp" is not a known unit; did you mean "Mjup" (jupiterMass)?', at("D1")],
      [
        '"m [Mjupp]" holds 2 numbers and 1 text that is none, first "x" in D3; leave the cell blank or type a number.',
        at("D3"),
      ],
    ]);
    expect(errors).toEqual([{ message: expect.stringContaining("4.5 \u00b1 0.5 d"), count: 1, first: at("F3") }]);
  });

  test("another header for a column, before it is entered", () => {
    const { service } = table();
    expect(service.checkUnit("m [jupiterMass]", at("D1"))).toMatchObject({
      column: 3,
      understood: "planet mass, in jupiterMass",
    });
    expect(service.checkUnit("m [d]", at("D1")).findings[0]!.message).toContain("d");
  });

  test("which columns hold which quantity", () => {
    expect(table().service.columnsOf(0)).toMatchObject({ period: 1, planetMass: 3 });
  });
});

describe("marks", () => {
  test("what moved since, most of all first, then on a sheet of its own", async () => {
    const open = await doubled();
    const mark = open.service.mark(0);
    expect(mark).toMatchObject({ name: "1 column of 3 rows", sheet: "Targets" });
    await open.type("B2", [["11"]]);
    await open.type("B4", [["60"]]);
    const { movements, movedCells, sentence } = open.service.compare(mark.id);
    expect(movedCells).toBe(2);
    expect(sentence).toBe("2 values moved.");
    expect(movements).toEqual([
      {
        place: at("F4"),
        key: "HD 3",
        header: "Double",
        before: "60.0000 d",
        after: "120.000 d",
        change: "+60.00",
        sigmas: undefined,
        relative: 1,
      },
      {
        place: at("F2"),
        key: "HD 1",
        header: "Double",
        before: "20.0000 d",
        after: "22.0000 d",
        change: "+2.000",
        sigmas: undefined,
        relative: 0.1,
      },
    ]);
    expect(await open.service.writeComparison(mark.id)).toMatchObject({
      is: "done",
      said: 'What moved is in the sheet "Comparison".',
    });
    expect(["A1", "A2", "C2", "D2", "F2"].map((address) => open.cell(address, 1))).toEqual([
      "Row",
      "HD 3",
      60,
      120,
      100,
    ]);
    await open.service.writeComparison(mark.id);
    expect(open.state().sheets.map(({ name }) => name)).toEqual(["Targets", "Comparison", "Comparison 2"]);
  });

  test("numbers that differ late are shown with the digits that tell them apart", async () => {
    const open = openTable([
      ["Name", "x"],
      ["a", 1.23456789012],
    ]);
    const mark = open.service.mark(0);
    await open.type("B2", [["1.23456789013"]]);
    const [movement] = open.service.compare(mark.id).movements;
    expect(movement!.before).not.toBe(movement!.after);
  });

  test("marks are kept until they are forgotten, whatever is undone", async () => {
    const open = await doubled();
    const mark = open.service.mark(0);
    await open.service.undo();
    expect(open.service.marks()).toEqual([mark]);
    open.service.forget(mark.id);
    expect(open.service.marks()).toEqual([]);
    expect(() => open.service.compare(mark.id)).toThrow("compare: this mark was forgotten; choose another one");
  });

  test("a sheet that is gone, a sheet with nothing to mark", async () => {
    const open = await doubled();
    await open.service.act({ do: "add sheet", name: "Empty" });
    expect(() => open.service.mark(1)).toThrow(
      "mark: this sheet holds no columns with headers, so there is nothing to mark",
    );
    const mark = open.service.mark(0);
    await open.service.act({ do: "remove sheet", sheet: 0 });
    expect(() => open.service.compare(mark.id)).toThrow(
      'compare: the sheet "Targets" of this mark is not there; undo its removal, or give it its name again',
    );
  });
});

describe("columns for plots", () => {
  test("numbers, quantity texts and uncertainties in the unit of the header", () => {
    const { service } = table();
    const period = service.plotColumn(0, 1);
    expect(period).toMatchObject({ header: "Period [d]", name: "Period", unit: "d", words: undefined });
    expect([...period.rows]).toEqual([1, 2, 3]);
    expect([...period.values]).toEqual([10, 4.5, 30]);
    expect([...period.upper!]).toEqual([Number.NaN, 0.5, Number.NaN]);
    const mass = service.plotColumn(0, 3);
    expect([...mass.values]).toEqual([2, Number.NaN, 2]);
    expect([...mass.upper!]).toEqual([0.3, 0.1, Number.NaN]);
    expect(service.plotColumn(0, 0).words).toEqual(["HD 1", "HD 2", "HD 3"]);
    service.filter(0, [{ column: 0, test: "<>", text: "HD 2" }]);
    expect([...service.plotColumn(0, 1).rows]).toEqual([1, 3]);
  });
});
