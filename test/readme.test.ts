import { readFileSync, writeFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import { referenceTable } from "../src/catalog/referenceTable.js";
import {
  choiceTable,
  deviationTable,
  familyTable,
  leftOutTable,
} from "../src/sheet/worksheetFunctions/referenceTables.js";

const sections: readonly (readonly [file: string, name: string, rebuild: () => string])[] = [
  ["README.md", "functions", referenceTable],
  ["README.md", "families", familyTable],
  ["README.md", "choices", choiceTable],
  ["DEVELOPERS.md", "deviations", deviationTable],
  ["DEVELOPERS.md", "left out", leftOutTable],
];

/** The sections are never written by hand but by UPDATE_README=1 npx vitest run --config test/vitest.config.ts test/readme.test.ts. */
describe("the tables of the guides are those of the code", () => {
  test.each(sections)("%s: %s", (file, name, rebuild) => {
    const path = new URL(`../${file}`, import.meta.url);
    const section = new RegExp(`(<!-- ${name} -->\\n)[\\s\\S]*?(<!-- end ${name} -->)`);
    const text = readFileSync(path, "utf8");
    expect(text).toMatch(section);
    const rebuilt = text.replace(section, (_, start: string, end: string) => `${start}${rebuild()}\n${end}`);
    if (process.env.UPDATE_README) writeFileSync(path, rebuilt);
    expect(readFileSync(path, "utf8")).toBe(rebuilt);
  });
});
