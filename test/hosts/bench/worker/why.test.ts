import { describe, expect, test } from "vitest";
import { blockOf } from "../../../../src/call/column.js";
import { tellCall } from "../../../../src/call/tellCall.js";
import { definitions } from "../../../../src/functions/definitions.js";
import { area, at, type OpenTable, openTable } from "./openTable.js";

const reflex = definitions.find(({ name }) => name === "REFLEX")!;

async function planets(): Promise<OpenTable> {
  const table = openTable([
    ["Target", "Period [d]", "M [solMass]", "M err", "m [jupiterMass]", "m err", "K [m/s]", "K err", "Twice"],
    ["HD 1", 10, 1, 0.05, 2, 0.3, null, null, null],
    ["HD 2", 20, 1.2, 0.05, 3, 0.3, null, null, null],
  ]);
  const text = "=BARY.REFLEX(B2,C2:D2,E2:F2,,,B$1:F$1,G$1)";
  await table.service.act({ do: "type over", area: area("G2:G3"), place: at("G2"), text });
  await table.type("I2", [['=2*BARY.REFLEX(B2*2,C2,E2,,,"d; solMass; jupiterMass")']]);
  return table;
}

/** The same call from quantities as texts. */
const story = (cells: readonly string[]) =>
  tellCall(
    reflex,
    cells.map((cell) => ({ block: blockOf([[cell]]) })),
  );

describe("why", () => {
  test("a call tells what tellCall does of the same quantities", async () => {
    const { service } = await planets();
    const why = service.why(at("G2"));
    const told = story(["10 d", "1 \u00b1 0.05 solMass", "2 \u00b1 0.3 jupiterMass"]);
    expect(Number(why.exact)).toBe(told.result);
    expect(why.call!.sigma).toEqual([told.upper, told.lower]);
    expect(why).toMatchObject({
      address: "G2",
      unit: "m/s",
      error: undefined,
      formula: "=BARY.REFLEX(B2,C2:D2,E2:F2,,,B$1:F$1,G$1)",
      filledFrom: undefined,
      changedBy: "entered a formula for K in 2 rows",
      call: {
        name: "BARY.REFLEX",
        part: false,
        unit: "m/s",
        canDraw: true,
        formula: reflex.formula,
        source: reflex.source,
      },
    });
    expect(why.call!.formulaMath).toMatch(/^<math /);
    expect(why.call!.inputs.map(({ share }) => share)).toEqual(
      told.inputs.map(({ share }) => share && expect.closeTo(share, 12)),
    );
    expect(why.call!.inputs.slice(0, 2)).toEqual([
      {
        name: "period",
        cell: "10",
        address: "B2",
        place: at("B2"),
        read: "10 d",
        base: "864000.000 s",
        header: "B$1: Period [d]",
        assumed: undefined,
        share: undefined,
        problem: false,
      },
      expect.objectContaining({
        name: "star mass",
        address: "C2",
        read: "1.000 \u00b1 0.050 solMass",
        header: "C$1: M [solMass]",
      }),
    ]);
    expect(why.call!.inputs[3]).toMatchObject({
      assumed: "a circular orbit",
      cell: "",
      address: undefined,
      problem: false,
    });
    expect(why.reads.map(({ address, text }) => [address, text])).toEqual([
      ["B2", "10"],
      ["C2:D2", "2 cells"],
      ["E2:F2", "2 cells"],
      ["B1:F1", "5 cells"],
      ["G1", "K [m/s]"],
    ]);
  });

  test("a cell that another formula filled leads there", async () => {
    const { service } = await planets();
    const why = service.why(at("H3"));
    expect(why).toMatchObject({
      filledFrom: { address: "G3", place: at("G3") },
      formula: "=BARY.REFLEX(B3,C3:D3,E3:F3,,,B$1:F$1,G$1)",
      unit: "m/s",
    });
    expect(why.call!.inputs[0]!.cell).toBe("20");
  });

  test("an argument that is worked out within the formula is told too", async () => {
    const table = await planets();
    const why = table.service.why(at("I2"));
    expect(why.call).toMatchObject({ part: true, canDraw: false, sigma: undefined });
    expect(why.call!.inputs[0]).toMatchObject({ cell: "20", address: undefined, read: "20 d" });
    const told = story(["20 d", "1 solMass", "2 jupiterMass"]);
    expect(table.cell("I2")).toBe(2 * (told.result as number));
  });

  test("an error names the input at fault", async () => {
    const table = await planets();
    await table.type("C3", [["-1"]]);
    const why = table.service.why(at("G3"));
    expect(why.error).toBe(
      "REFLEX: star mass is -1 solMass; it must be above 0, because a body has mass; for example 1.1 solMass.",
    );
    expect(why.exact).toBe("#VALUE!");
    expect(why.changedBy).toBe("revised M in row 3");
    await table.type("C3", [["many"]]);
    expect(table.service.why(at("G3")).call!.inputs.map(({ problem }) => problem)).toEqual([
      false,
      true,
      false,
      false,
      false,
    ]);
  });

  test("values and blanks", async () => {
    const { service } = await planets();
    expect(service.why(at("B2"))).toMatchObject({
      value: "10",
      exact: "10",
      unit: "d",
      formula: undefined,
      call: undefined,
      reads: [],
      changedBy: "opened",
    });
    expect(service.why(at("D2"))).toMatchObject({ unit: "solMass" });
    expect(service.why(at("Z99"))).toMatchObject({ value: "", exact: "", unit: "", call: undefined });
  });
});

describe("drawing a cell", () => {
  test("beside the first order, the same for the same seed", async () => {
    const { service } = await planets();
    const drawn = service.draw(at("G2"), 5)!;
    const why = service.why(at("G2"));
    expect(drawn).toMatchObject({
      place: at("G2"),
      unit: "m/s",
      draws: 10_000,
      seed: 5,
      value: Number(why.exact),
      upper: why.call!.sigma![0],
    });
    // m, of 15 per cent, makes nearly all of the deviation: K is proportional to it.
    expect(Math.abs(drawn.deviation / drawn.upper - 1)).toBeLessThan(0.05);
    expect(service.draw(at("G2"), 5)).toEqual(drawn);
    expect(service.draw(at("G2"), 6)!.mean).not.toBe(drawn.mean);
    expect(service.draw(at("I2"), 5)).toBeUndefined();
    expect(service.draw(at("B2"), 5)).toBeUndefined();
  });
});
