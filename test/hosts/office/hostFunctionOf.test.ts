import { describe, expect, test } from "vitest";
import type { NumberDefinition } from "../../../src/functions/definition.js";
import { noiseSum } from "../../../src/functions/plan/noiseSum.js";
import { reflex } from "../../../src/functions/reflex/reflex.js";
import { hostFunctionOf } from "../../../src/hosts/office/hostFunctionOf.js";
import type { HostError } from "./standInHost.js";
import { standInHost } from "./standInHost.js";

standInHost();

const called = hostFunctionOf(reflex);
const headers = [["Period [d]", "Star mass [solMass]", "Planet mass"]];
const numbers = [[[4.23]], [[1.1]], [[0.47]], null, null, headers, null];

function messageOf(run: () => unknown): string {
  try {
    run();
  } catch (error) {
    return (error as HostError).message;
  }
  return "no error";
}

describe("a call by the host", () => {
  test("names header cells by their addresses where the host gives them", () => {
    const parameterAddresses = ["T!B2", "T!C2", "T!D2", null, null, "T!B1:D1", null];
    expect(messageOf(() => called(...numbers, { functionName: "REFLEX", parameterAddresses }))).toContain(
      'write the unit in its header D1 ("Planet mass [jupiterMass]")',
    );
  });

  test("names the sheet where there are two", () => {
    const parameterAddresses = ["T!B2", "T!C2", "T!D2", null, null, "'My heads'!B1:D1", null];
    expect(messageOf(() => called(...numbers, { functionName: "REFLEX", parameterAddresses }))).toContain(
      "'My heads'!D1",
    );
  });

  test.each([[[{ functionName: "REFLEX" }]], [[{ functionName: "REFLEX", parameterAddresses: null }]], [[]]])(
    "works without: %j",
    (invocation) => {
      expect(messageOf(() => called(...numbers, ...invocation))).toContain(
        'write the unit in its header ("Planet mass',
      );
    },
  );

  test("takes an argument that repeats as the list of ranges that the host makes of it", () => {
    const sum = hostFunctionOf(noiseSum);
    const terms = [[[3]], [[4]]];
    expect(
      sum([...terms, [["Photon [m/s]", "Floor [m/s]"]], [["Total [cm/s]"]]], { functionName: "NOISESUM" }),
    ).toEqual([[500]]);
    expect(sum([[["3 m/s"]]], { functionName: "NOISESUM" })).toEqual([[3]]);
    expect(sum([[["3 m/s"]], null, [["cm/s"]]], { functionName: "NOISESUM" })).toEqual([[300]]);
    const parameterAddresses = [["T!B2", "T!C2", "T!B1:C1"]];
    expect(
      messageOf(() => sum([...terms, [["Photon [m/s]", "Floor"]]], { functionName: "NOISESUM", parameterAddresses })),
    ).toContain('noise 2 is 4 with no unit; write the unit in its header C1 ("Floor [m/s]")');
  });

  test("says so where a function of ours stops", () => {
    const broken: NumberDefinition = {
      ...reflex,
      compute: () => {
        throw new TypeError("x is not a function");
      },
    };
    const message = messageOf(() => hostFunctionOf(broken)("1 d", "1 solMass", "1 jupiterMass"));
    expect(message).toContain("REFLEX: it stopped with TypeError: x is not a function, a mistake of Barycell");
  });

  test("lets nothing out that is no number where a kernel gives it", () => {
    const broken: NumberDefinition = { ...reflex, compute: (rows, out) => out.fill(Number.NaN, 0, rows) };
    expect(messageOf(() => hostFunctionOf(broken)("1 d", "1 solMass", "1 jupiterMass"))).toMatch(
      /^REFLEX: no K follows/,
    );
  });
});
