import { readFileSync, writeFileSync } from "node:fs";
import { expect, it } from "vitest";
import { referenceTable } from "../src/catalog/referenceTable.js";

const path = new URL("../README.md", import.meta.url);
const section = /(<!-- functions -->\n)[\s\S]*?(<!-- end -->)/;

/** The section is written, never by hand, by UPDATE_README=1 npx vitest run test/readme.test.ts. */
it("the README's reference table is that of the definitions", () => {
  const text = readFileSync(path, "utf8");
  const rebuilt = text.replace(section, (_, start: string, end: string) => `${start}${referenceTable()}\n${end}`);
  if (process.env.UPDATE_README) writeFileSync(path, rebuilt);
  expect(text).toMatch(section);
  expect(readFileSync(path, "utf8")).toBe(rebuilt);
});
