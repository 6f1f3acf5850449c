import { describe, expect, test } from "vitest";
import { definitions } from "../../../../src/functions/definitions.js";
import { areaText, readArea } from "../../../../src/hosts/office/pane/areaText.js";
import type { InputField } from "../../../../src/hosts/office/pane/find/callFields.js";
import { callFormula } from "../../../../src/hosts/office/pane/find/callFormula.js";
import { readCall } from "../../../../src/hosts/office/pane/why/readCall.js";

const definitionNamed = (name: string) => definitions.find((definition) => definition.name === name)!;

function formula(name: string, inputs: readonly (string | readonly [string, string])[], result = ""): string {
  const definition = definitionNamed(name);
  const fields = definition.inputs.map((_, index): InputField => {
    const given = inputs[index] ?? "";
    return typeof given === "string" ? { text: given, header: "" } : { text: given[0], header: given[1] };
  });
  return callFormula({ definition, sheet: "Targets", inputs: fields, result });
}

describe("the formula of a call", () => {
  test.each<[string, string, readonly (string | readonly [string, string])[], string, string]>([
    [
      "typed quantities",
      "REFLEX",
      ["1 yr", "1 solMass", "1 earthMass"],
      "",
      '=BARY.REFLEX("1 yr", "1 solMass", "1 earthMass")',
    ],
    [
      "headers side by side",
      "AXIS",
      [
        ["B2", "B$1"],
        ["C2", "C$1"],
      ],
      "km",
      '=BARY.AXIS(B2, C2,, B$1:C$1, "km")',
    ],
    ["one header", "AXIS", [["B2", "B$1"], "1 solMass"], "", '=BARY.AXIS(B2, "1 solMass",, B$1&";")'],
    [
      "headers the other way round",
      "AXIS",
      [
        ["C2", "C$1"],
        ["B2", "B$1"],
      ],
      "",
      '=BARY.AXIS(C2, B2,, C$1&";"&B$1)',
    ],
    [
      "an input left out in between",
      "REFLEX",
      [["B2", "B$1"], ["C2", "C$1"], ["D2", "D$1"], "", ["E2", "E$1"]],
      "",
      '=BARY.REFLEX(B2, C2, D2,, E2, B$1&";"&C$1&";"&D$1&";;"&E$1)',
    ],
    ["numbers", "SHIFT", ["12.5 m/s", "linear"], "", '=BARY.SHIFT("12.5 m/s", "linear")'],
    [
      "another sheet",
      "AXIS",
      [
        ["'My stars'!B2", "'My stars'!B$1"],
        ["C2", "C$1"],
      ],
      "G$1",
      "=BARY.AXIS('My stars'!B2, C2,, 'My stars'!B$1&\";\"&C$1, G$1)",
    ],
    ["a quotation mark in a text", "UNITOF", ['P "orbit" [d]'], "", '=BARY.UNITOF("P ""orbit"" [d]")'],
    ["a negative number", "PIXELSPEED", ["-0.015", "115000", "3.2"], "", "=BARY.PIXELSPEED(-0.015, 115000, 3.2)"],
  ])("%s", (_, name, inputs, result, expected) => {
    expect(formula(name, inputs, result)).toBe(expected);
  });

  test("what is written is read back as the same call", () => {
    const text = formula("REFLEX", [["B2:C2", "B$1"], "1 solMass", ["$K$1", "D$1"]], "G$1");
    expect(readCall(text, "Targets")).toMatchObject({
      definition: { name: "REFLEX" },
      whole: true,
      parameters: [
        { is: "cells", text: "B2:C2", area: { sheet: "Targets", row: 1, column: 1, rows: 1, columns: 2 } },
        { is: "value", value: "1 solMass" },
        { is: "cells", text: "$K$1" },
        { is: "left out" },
        { is: "left out" },
        { is: "joined" },
        { is: "cells", text: "G$1" },
      ],
    });
  });
});

describe("our call in a formula", () => {
  test.each([
    ["=bary.reflex(B2, C2, D2)", true],
    ["=_xldudf_BARY_REFLEX(B2,C2,D2)", true],
    ['=IF(A2>0, ROUND(BARY.REFLEX(B2, C2, D2), 2), "")', false],
    ["=-BARY.REFLEX(B2, C2, D2)", false],
  ])("%s", (text, whole) => {
    const call = readCall(text, "Targets");
    expect(call).toMatchObject({ definition: { name: "REFLEX" }, whole });
    expect(call!.parameters.map((parameter) => parameter.is)).toEqual(["cells", "cells", "cells"]);
  });

  test.each(["=SUM(A1:A9)", "=BARY.NOSUCH(1)", "=MYBARY.REFLEX(1)", "=A1", "=1+", "=LET(x,"])("%s has none", (text) => {
    expect(readCall(text, "Targets")).toBeUndefined();
  });

  test("arguments that cannot be shown are said to be so", () => {
    const call = readCall("=BARY.AXIS(B2*2, B2#, B:B, -3)", "Targets")!;
    expect(call.parameters.map((parameter) => parameter.is)).toEqual(["worked out", "spill", "worked out", "value"]);
  });
});

describe("addresses", () => {
  test.each(["B2", "B2:C9", "'My sheet'!AA10", "'It''s'!A1:B2"])("%s is read and written alike", (text) => {
    expect(areaText(readArea(text, "Home")!, "Home")).toBe(text);
  });

  test("edges that stay", () => {
    const area = readArea("$B$2:C3", "Home")!;
    expect([areaText(area), areaText(area, "Home", "row"), areaText(area, "Home", "all")]).toEqual([
      "B2:C3",
      "B$2:C$3",
      "$B$2:$C$3",
    ]);
    expect(areaText(area, "Other")).toBe("Home!B2:C3");
  });

  test.each(["", "4.2 d", "0.47 jupiterMass", "A:A", "1:1", "hello", "B2,C3"])('"%s" is none', (text) => {
    expect(readArea(text, "Home")).toBeUndefined();
  });
});
