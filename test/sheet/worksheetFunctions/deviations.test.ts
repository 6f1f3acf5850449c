import { describe, expect, it } from "vitest";
import { deviations } from "../../../src/sheet/worksheetFunctions/deviations.js";
import { findWorksheetFunction } from "../../../src/sheet/worksheetFunctions/findWorksheetFunction.js";
import { libraryResult, ourResult } from "./library.js";

describe("the table of deviations", () => {
  it.each(deviations.map((each) => [each.call, each] as const))("%s", (call, each) => {
    expect(libraryResult(call)).toBe(each.library);
    expect(ourResult(call)).toBe(each.here);
    expect(each.here).not.toBe(each.library);
    expect(findWorksheetFunction(each.name)).toBeDefined();
  });
});
