import { expect, test } from "vitest";
import { referenceTable } from "../../src/catalog/referenceTable.js";
import { signature } from "../../src/catalog/signature.js";
import { definitions } from "../../src/functions/definitions.js";

/** The cells of a line of a Markdown table (GitHub Flavored Markdown 0.29, section 4.10: `\|` is no border). */
function cellsOf(line: string): string[] {
  expect(line).toMatch(/^\| .* \|$/);
  return line
    .slice(2, -2)
    .split(/(?<!\\)\|/)
    .map((cell) => cell.trim().replaceAll("\\|", "|"));
}

const lines = referenceTable().split("\n");

test("a heading, a rule, and one line a definition, in their order", () => {
  const [heading, rule, ...rows] = lines.map(cellsOf);
  expect(heading).toEqual(["Call", "Answers", "Result"]);
  expect(rule).toEqual(["---", "---", "---"]);
  expect(rows.map(([call]) => call)).toEqual(definitions.map((definition) => `\`${signature(definition)}\``));
  expect(rows.map(([, answers]) => answers)).toEqual(definitions.map(({ question }) => question));
  for (const row of rows) {
    expect(row).toHaveLength(3);
    expect(row[2]).toMatch(/^[A-Z]/);
  }
});

test("no name stands twice", () => {
  const names = definitions.map(({ name }) => name);
  expect(new Set(names).size).toBe(names.length);
});
