import { describe, expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { blockOf, columnOf } from "../../../src/call/column.js";
import { readTableFile } from "../../../src/files/table/readTableFile.js";
import { sentenceOfTableFinding, type TableFinding } from "../../../src/files/table/tableFinding.js";
import { workbookOfTable } from "../../../src/files/table/workbookOfTable.js";
import { writeWorkbook } from "../../../src/files/xlsx/writeWorkbook.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { read, readPieces, refusal, rowsOf, sentencesOf } from "./read.js";

describe("the kind of a file is found from its content", () => {
  test.each([
    ["a,b\n1,2\n", "delimited"],
    ["\uFEFF# %ECSV 1.0\n# ---\n# datatype:\n# - {name: a, datatype: int8}\na\n1\n", "ecsv"],
    ["# %ECSVish\na,b\n", "delimited"],
    ["<x>,b\n1,2\n", "delimited"],
    ["Title: x\na,b\n", "delimited"],
    ["|a|b\n|1|2\n", "delimited"],
  ])("%j", (text, format) => {
    expect(read(text).format).toBe(format);
    expect(read(new TextEncoder().encode(text)).format).toBe(format);
  });

  // First bytes as the formats' own standards give them.
  test.each([
    ["d0cf11e0a1b11ae1", "a workbook in the old binary form"],
    ["1f8b0800", "packed with gzip"],
    ["425a6839", "packed with bzip2"],
    ["fd377a585a00", "packed with xz"],
    ["28b52ffd", "packed with Zstandard"],
    ["377abcaf271c", "a 7z archive"],
    ["255044462d312e37", "a PDF"],
    ["53494d504c4520203d202020", "a FITS file"],
    ["894844460d0a1a0a", "an HDF5 file"],
    ["50415231", "a Parquet file"],
    ["53514c69746520666f726d6174203300", "a database"],
    ["89504e470d0a1a0a", "a picture"],
    ["ffd8ffe0", "a picture"],
    ["474946383961", "a picture"],
  ])("bytes %s are refused as what they are", (hex, what) => {
    const bytes = Uint8Array.from([...Buffer.from(hex, "hex"), 0, 1, 2, 3]);
    const message = refusal(bytes);
    expect(message).toMatch(new RegExp(`^The file is ${what}, which is not read; .{10,120}\\.$`));
    for (const size of [1, 3]) {
      const pieces = Array.from({ length: Math.ceil(bytes.length / size) }, (_, index) =>
        bytes.subarray(index * size, (index + 1) * size),
      );
      expect(() => {
        readPieces(pieces);
      }).toThrow(message);
    }
  });

  test("unknown bytes are refused where they stop being text", () => {
    expect(refusal(Uint8Array.of(1, 2, 0, 4))).toContain("The file is not text: byte 2 is zero");
  });
});

describe("a long file", () => {
  const lines = Array.from({ length: 50_000 }, (_, row) => `${row},${row / 8}\n`);
  async function* pieces() {
    yield "a,b\n";
    for (let at = 0; at < lines.length; at += 1000) yield new TextEncoder().encode(lines.slice(at, at + 1000).join(""));
  }

  test("tells its progress and is read whole", async () => {
    const told: number[] = [];
    const table = await readTableFile(pieces(), { progress: ({ rows }) => void told.push(rows) });
    expect(rowsOf(table)).toEqual(lines.map((_, row) => [row, row / 8]));
    expect(told).toHaveLength(51);
    expect(told.every((rows, index) => index === 0 || rows >= told[index - 1]!)).toBe(true);
    expect(told.at(-1)).toBeGreaterThan(1000);
  });

  test("is left when that is wished", async () => {
    const stop = new AbortController();
    const reading = readTableFile(pieces(), {
      signal: stop.signal,
      progress: ({ taken }) => void (taken > 50_000 && stop.abort(new Error("enough"))),
    });
    await expect(reading).rejects.toThrow("enough");
  });
});

describe("sentences of findings", () => {
  const long = "x".repeat(300);
  const findings: readonly TableFinding[] = [
    { kind: "several-tables", read: long, others: Array.from({ length: 9 }, () => long) },
    { kind: "service-error", text: long },
    { kind: "overflow" },
    { kind: "array-column", name: long, shape: "double[2]" },
    { kind: "unit-aside", name: long, unit: long },
    { kind: "beyond-limits", name: long, limits: "[0/1]", count: 1e6, row: 1e6, value: -1.2345678901234567e-100 },
    { kind: "outside-columns", count: 1e6, line: 1e6, text: long },
    { kind: "across-columns", count: 1e6, line: 1e6, text: long },
    { kind: "field-count", count: 1e6, row: 1e6, fields: 1e6, expected: 16384 },
    { kind: "row-count", rows: 1e6, stated: 1e15 },
  ];
  test.each(findings)("$kind is at most 250 characters", (finding) => {
    const sentence = sentenceOfTableFinding(finding);
    expect(sentence.length).toBeLessThanOrEqual(250);
    expect(sentence).toMatch(/^[A-Z0-9].*\.$/);
  });

  test("a unit that cannot stand in a header", () => {
    expect(sentenceOfTableFinding({ kind: "unit-aside", name: "h", unit: "[x" })).toBe(
      'The unit "[x" of column "h" cannot stand in a header; write it in square brackets by hand.',
    );
  });
});

describe("more columns than a table may have", () => {
  const many = Array.from({ length: 16_385 }, (_, index) => index);
  test.each([
    [
      "ECSV",
      `# %ECSV 1.0\n# ---\n# datatype:\n${many.map((index) => `# - {name: a${index}, datatype: int8}\n`).join("")}a\n`,
    ],
    ["VOTable", `<VOTABLE><TABLE>${'<FIELD name="a" datatype="int"/>'.repeat(many.length)}<DATA><TABLEDATA>`],
    ["IPAC", `${"|a".repeat(many.length)}|\n${"|i".repeat(many.length)}|\n1\n`],
  ])("are refused: %s", (_, text) => {
    expect(refusal(text)).toBe("The file describes 16,385 columns, more than the 16,384 a table may have.");
  });
});

describe("a workbook comes through the same door", () => {
  const sheet = (name: string, rows: Cell[][]) => ({ name, columns: blockOf(rows).columns });
  const bytesOf = (...sheets: ReturnType<typeof sheet>[]) =>
    writeWorkbook({ book: bookOf(sheets), sheets: [], notes: [] });
  async function* pieces(bytes: Uint8Array, size: number) {
    for (let at = 0; at < bytes.length; at += size) yield bytes.subarray(at, at + size);
  }
  const planets = sheet("Planets", [["Invented", null, null], ["Name", "P", "e"], [null, "d", null], ["007", 4.25, 0], ["x", null, 0.5]]); // biome-ignore format: a row a line
  const stars = sheet("Stars", [
    ["Star", "Mass [solMass]"],
    ["y", 1.5],
  ]);

  test("the first sheet with a table, or the one asked for", async () => {
    const bytes = await bytesOf(sheet("Empty", [[null]]), planets, stars);
    for (const size of [1, 5, 100_000]) {
      const table = await readTableFile(pieces(bytes, size));
      expect([table.format, table.name, table.header, table.unitsRow, table.remarks]).toEqual([
        "workbook",
        "Planets",
        ["Name", "P", "e"],
        ["", "d", ""],
        ["Invented"],
      ]);
      expect(rowsOf(table)).toEqual([["007", 4.25, 0], ["x", null, 0.5]]); // biome-ignore format: a row a line
      expect(sentencesOf(table)).toEqual([
        'The file holds 2 tables; "Planets" was read. The others are "Stars"; name one to read it instead.',
      ]);
    }
    for (const table of ["Stars", "3"]) {
      expect((await readTableFile(pieces(bytes, 1000), { table })).header).toEqual(["Star", "Mass [solMass]"]);
    }
    await expect(readTableFile(pieces(bytes, 1000), { table: "Moons" })).rejects.toThrow(
      'The workbook has no sheet "Moons"; it has "Empty", "Planets", "Stars".',
    );
    await expect(readTableFile(pieces(bytes, 1000), { table: "Empty" })).rejects.toThrow(
      "The workbook's sheet has no row of column names; put one above the data.",
    );
  });

  test("what is written to one reads back", async () => {
    const table = {
      header: ["a", "b"],
      unitsRow: ["d", ""],
      columns: [columnOf([1, null, -0]), columnOf(["=1+1", true, null])],
      name: "x/y [z]",
    };
    const again = await readTableFile(pieces(await writeWorkbook(workbookOfTable(table)), 1000));
    expect([again.name, again.header, again.unitsRow]).toEqual(["x y  z", ["a", "b"], ["d", ""]]);
    expect(rowsOf(again)).toEqual(rowsOf({ rows: 3, columns: table.columns }));
  });
});
