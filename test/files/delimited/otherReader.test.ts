import { spawnSync } from "node:child_process";
import fc from "fast-check";
import { expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { columnOf } from "../../../src/call/column.js";
import { cellOfField } from "../../../src/files/cell/cellOfField.js";
import { delimiters } from "../../../src/files/delimited/dialect.js";
import { writeDelimited } from "../../../src/files/delimited/writeDelimited.js";
import { read, rowsOf } from "./tables.js";

/** The csv module of Python's standard library: an independent reader and writer of delimited text. */
const readScript = `
import csv, io, json, sys
files = json.load(sys.stdin)
json.dump([list(csv.reader(io.StringIO(text, newline=""), delimiter=delimiter)) for text, delimiter in files], sys.stdout)
`;
const writeScript = `
import csv, io, json, sys
def written(rows, delimiter, quoting):
    out = io.StringIO(newline="")
    csv.writer(out, delimiter=delimiter, quoting=quoting).writerows(rows)
    return out.getvalue()
json.dump([written(rows, delimiter, quoting) for rows, delimiter, quoting in json.load(sys.stdin)], sys.stdout)
`;

const hasPython = spawnSync("python3", ["-c", "import csv"]).status === 0;

function python<Result>(script: string, input: unknown): Result {
  const run = spawnSync("python3", ["-c", script], {
    input: JSON.stringify(input),
    encoding: "utf8",
    maxBuffer: 1 << 28,
  });
  expect(run.stderr).toBe("");
  return JSON.parse(run.stdout);
}

const piece = fc.constantFrom("a", "é", "1.5", ",", ";", "\t", "|", '"', " ", "#", "\n", "\r\n", "\r", "=");
const field = fc.array(piece, { maxLength: 6 }).map((pieces) => pieces.join(""));
const rowsOfFields = fc
  .integer({ min: 1, max: 4 })
  .chain((width) => fc.array(fc.array(field, { minLength: width, maxLength: width }), { minLength: 1, maxLength: 5 }));
const files = fc.sample(fc.tuple(rowsOfFields, fc.constantFrom(...delimiters)), { numRuns: 400, seed: 4180 });

test.skipIf(!hasPython)("the other reader finds the texts we wrote", () => {
  const texts = files.map(([rows, delimiter]) => {
    const [header, ...data] = rows as [string[], ...string[][]];
    const columns = header.map((_, column) => columnOf(data.map((row): Cell => row[column] as string)));
    return [
      [...writeDelimited({ header, columns }, { guardText: (text) => text, delimiter })].join(""),
      delimiter,
    ] as const;
  });
  expect(python(readScript, texts)).toEqual(files.map(([rows]) => rows));
});

/** A line the other writer leaves bare though it is blank or begins like one of our comments. */
const bare = (rows: readonly string[][]) =>
  rows.some(([first, ...rest]) => first?.startsWith("#") || rest.length === 0);

test.skipIf(!hasPython)("we find the cells the other writer wrote, quoting where needed or everywhere", () => {
  const needed = files.filter(([rows]) => !bare(rows)).map(([rows, delimiter]) => [rows, delimiter, 0] as const);
  const everywhere = files.map(([rows, delimiter]) => [rows, delimiter, 1] as const);
  const tables = [...needed, ...everywhere];
  const texts = python<string[]>(writeScript, tables);
  expect(needed.length).toBeGreaterThan(100);
  tables.forEach(([rows, delimiter], index) => {
    const table = read(texts[index] as string, { delimiter, unitsRow: false });
    const [header, ...data] = rows as [string[], ...string[][]];
    expect(table.header).toEqual(header.map((field) => field.trim()));
    expect(rowsOf(table)).toEqual(data.map((row) => row.map(cellOfField)));
  });
});
