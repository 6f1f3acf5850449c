import { describe, expect, test } from "vitest";
import type { Cell } from "../../../../src/call/cell.js";
import { calculateAll } from "../../../../src/files/bookFile/calculateAll.js";
import { FileProblem } from "../../../../src/files/fileProblem.js";
import { demoBook } from "../../../../src/hosts/bench/worker/demo/demoBook.js";
import { exportAs } from "../../../../src/hosts/bench/worker/files/exportAs.js";
import type { OpenWatch, ReadFile } from "../../../../src/hosts/bench/worker/files/opener.js";
import { openFile } from "../../../../src/hosts/bench/worker/files/openFile.js";
import { functions } from "../../../../src/hosts/bench/worker/functions.js";
import type { Book } from "../../../../src/sheet/book/book.js";
import { cellOf } from "../../../../src/sheet/book/cellOf.js";
import { usedColumns, usedRows } from "../../../../src/sheet/book/usedRows.js";
import { change } from "../../../../src/sheet/change.js";
import { changes } from "../../../../src/sheet/history/changes.js";

const watch = (): OpenWatch => ({ signal: new AbortController().signal, progress: () => undefined });
const open = (name: string, ...parts: BlobPart[]): Promise<ReadFile> => openFile(name, new Blob(parts), watch());

function rowsOf(book: Book, sheet = 0): Cell[][] {
  return Array.from({ length: usedRows(book, sheet) }, (_, row) =>
    Array.from({ length: usedColumns(book, sheet) }, (_, column) => cellOf(book, { sheet, row, column })),
  );
}

describe("a table opens", () => {
  test("with its header in the first row, numbers as numbers, the rest as it stood", async () => {
    const { document, findings } = await open("my targets.csv", 'Target,Period [d],Id\n"A, b",4.50,007\nC,,1e3\n');
    expect(document.title).toBe("my targets");
    expect(document.history).toEqual(["opened my targets.csv: 2 rows, 3 columns"]);
    expect(rowsOf(document.book)).toEqual([
      ["Target", "Period [d]", "Id"],
      ["A, b", 4.5, "007"],
      ["C", null, 1000],
    ]);
    expect(findings).toEqual([]);
  });

  test("tabs, a row of units and comments", async () => {
    const { document, findings } = await open("t.tsv", "# made by hand\nName\tPeriod\n\td\nA\t3\n");
    expect(rowsOf(document.book)).toEqual([
      ["Name", "Period"],
      [null, "d"],
      ["A", 3],
    ]);
    expect(findings).toEqual(['A line of comment above the header was left aside: "# made by hand".']);
  });

  test("with one column", async () => {
    const { document, findings } = await open("one.csv", "Period [d]\n1\n2\n");
    expect(rowsOf(document.book)).toEqual([["Period [d]"], [1], [2]]);
    expect(findings).toHaveLength(1);
    expect(findings[0]).toMatch(/single column/);
  });

  test("longer than a chunk of cells, whole and in order", async () => {
    const lines = Array.from({ length: 30_000 }, (_, row) => `T${row},${row / 8}`);
    const { document } = await open("long.csv", `Target,Period [d]\n${lines.join("\n")}\n`);
    expect(usedRows(document.book, 0)).toBe(30_001);
    for (const row of [1, 8191, 8192, 16_384, 30_000]) {
      expect(cellOf(document.book, { sheet: 0, row, column: 1 })).toBe((row - 1) / 8);
    }
  });
});

describe("what is no table is refused by what is in it, with a sentence", () => {
  test.each([
    [
      "targets.csv",
      "MZ\x90\0\x03",
      "targets.csv: The file is a program, which is not read; do not open it, and ask for the table itself.",
    ],
    [
      "paper.csv",
      "%PDF-1.7\n",
      "paper.csv: The file is a PDF, which is not read; ask for the table itself, as a workbook (.xlsx), CSV or VOTable.",
    ],
    ["x.txt", "a,b\n1,\0\n", "x.txt: The file is not text: byte 6 is zero, as in a binary file"],
    ["empty.csv", "", "empty.csv: The file is empty; a table needs a first row of column names."],
  ])("%s", async (name, content, message) => {
    const told = await open(name, new Uint8Array([...content].map((each) => each.charCodeAt(0)))).then(
      () => "read",
      (error) => (error instanceof FileProblem ? error.message : `fault: ${error}`),
    );
    expect(told.startsWith(message)).toBe(true);
    expect(told.length).toBeLessThanOrEqual(250);
  });

  test("two gigabytes are refused before they are read", async () => {
    let asked = 0;
    const content = {
      size: 2_000_000_000,
      slice: (from: number, to: number) => {
        asked = Math.max(asked, to);
        return new Blob(["a,b\n".repeat(1024)]).slice(from, to);
      },
      stream: () => {
        throw new Error("it was read");
      },
    } as unknown as Blob;
    await expect(openFile("big.csv", content, watch())).rejects.toThrow(
      "big.csv: It has 2,000 MB; 400 MB are read at most, and a sheet holds 1,048,575 rows. Cut it into parts, or leave out columns that are not needed.",
    );
    expect(asked).toBeLessThanOrEqual(4096);
  });

  test("more rows than a sheet holds", async () => {
    const block = "1\n".repeat(100_000);
    await expect(open("rows.csv", "a\n", ...Array(12).fill(block))).rejects.toThrow(
      "rows.csv: It has more than the 1,048,575 rows that a sheet holds below its headers; cut it into parts and open each.",
    );
  });

  test("a long name is told by both its ends", async () => {
    const name = `${"a".repeat(300)}.csv`;
    const error: Error = await open(name, "").catch((thrown) => thrown);
    expect(error.message).toMatch(/^a{24}…a{11}\.csv: The file is empty/);
  });
});

test("reading stops when it is told to", async () => {
  const stop = new AbortController();
  let pieces = 0;
  const content = new Blob(["a\n", "1\n".repeat(900_000)]);
  const reading = openFile("x.csv", content, {
    signal: stop.signal,
    progress() {
      if (++pieces === 1) stop.abort();
    },
  });
  await expect(reading).rejects.toMatchObject({ name: "AbortError" });
  expect(pieces).toBe(1);
});

describe("what is saved as a file", () => {
  test("a book opens again as it was", async () => {
    const demo = demoBook();
    const { name, type, bytes } = await exportAs(demo, "book", 0);
    expect([name, type]).toEqual(["Demo survey.barycell", "application/json"]);
    const { document } = await open("renamed.csv", bytes as BlobPart);
    const calculated = change(document.book, [calculateAll(document.book)], functions);
    expect([...changes(demo.book, calculated)]).toEqual([]);
    expect(document.presentation).toEqual(demo.presentation);
  });

  test("a sheet as CSV and TSV opens with the same values", async () => {
    const demo = demoBook();
    for (const format of ["csv", "tsv"] as const) {
      const { name, bytes } = await exportAs(demo, format, 1);
      expect(name).toBe(`Demo survey - Assumptions.${format}`);
      const { document } = await open(name, bytes as BlobPart);
      expect(rowsOf(document.book)).toEqual(rowsOf(demo.book, 1));
    }
  });

  test("an empty sheet is an empty table, and a title makes a name that any system takes", async () => {
    const empty = { ...demoBook(), title: 'A/B: "c"?', book: { sheets: [{ name: "S", columns: [] }], names: [] } };
    expect((await exportAs(empty, "csv", 0)).name).toBe("A_B_ _c__.csv");
    for (const format of ["ecsv", "votable", "xlsx"] as const) {
      expect((await exportAs(empty, format, 0)).bytes.length).toBeGreaterThan(0);
    }
  });
});
