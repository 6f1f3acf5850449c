import fc from "fast-check";
import { expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { cellAt, columnOf } from "../../../src/call/column.js";
import { cellOfField } from "../../../src/files/cell/cellOfField.js";
import { appendColumns } from "../../../src/files/delimited/appendColumns.js";
import { asidesOf } from "../../../src/files/delimited/asidesOf.js";
import { DelimitedReader } from "../../../src/files/delimited/delimitedReader.js";
import type { DelimitedTable } from "../../../src/files/delimited/delimitedTable.js";
import { delimiters, lineEndOf } from "../../../src/files/delimited/dialect.js";
import { recordText } from "../../../src/files/delimited/recordText.js";
import { sentenceOfFinding } from "../../../src/files/delimited/sentenceOfFinding.js";
import { writeDelimited } from "../../../src/files/delimited/writeDelimited.js";
import { FileProblem } from "../../../src/files/fileProblem.js";
import { isUnit, read, rowsOf } from "./tables.js";

const token = fc.constantFrom(
  "a",
  "é",
  "1.5",
  "007",
  ",",
  ";",
  "\t",
  "|",
  '"',
  '""',
  " ",
  "#",
  "d",
  "-",
  "\n",
  "\r\n",
  "=",
);
const anyToken = fc.oneof(
  { weight: 12, arbitrary: token },
  { weight: 1, arbitrary: fc.constantFrom("\r", "\uFEFF", "\0") },
);
const joined = (tokens: string[]) => tokens.join("");
const garbage = fc.oneof(fc.array(anyToken, { maxLength: 60 }).map(joined), fc.string({ unit: "binary" }));
const delimiter = fc.constantFrom(...delimiters);

const text = fc
  .oneof(fc.array(token, { maxLength: 8 }).map(joined), fc.string(), fc.string({ unit: "grapheme" }))
  .filter((value) => !value.includes("\0"));
/** Text that is not another kind of cell in disguise: a file has no other way to tell "1.5" from 1.5. */
const plainText = text.filter((value) => cellOfField(value) === value);
const cell: fc.Arbitrary<Cell> = fc.oneof(
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.boolean(),
  fc.constant(null),
  plainText,
);
const cellTable = fc
  .record({ width: fc.integer({ min: 1, max: 5 }), rows: fc.integer({ min: 0, max: 6 }) })
  .chain(({ width, rows }) =>
    fc.record({
      header: fc.array(
        text.map((value) => value.trim()),
        { minLength: width, maxLength: width },
      ),
      columns: fc.array(fc.array(cell, { minLength: rows, maxLength: rows }), { minLength: width, maxLength: width }),
    }),
  );

/** The table, or undefined where the file is refused; anything else thrown is a failure. */
function readOrRefuse(file: string): DelimitedTable | undefined {
  try {
    return read(file);
  } catch (problem) {
    if (problem instanceof FileProblem) {
      return undefined;
    }
    throw problem;
  }
}

test("cells written and read again are the same cells, dialect found from the text", () => {
  const options = fc.record({
    delimiter,
    newline: fc.constantFrom("\n", "\r\n", "\r"),
    byteOrderMark: fc.boolean(),
  } as const);
  fc.assert(
    fc.property(cellTable, options, ({ header, columns }, how) => {
      const file = [...writeDelimited({ header, columns: columns.map((cells) => columnOf(cells)) }, how)].join("");
      const table = read(file, { unitsRow: false });
      expect(table.header).toEqual(header);
      expect(table.columns.map((column, index) => columns[index]?.map((_, row) => cellAt(column, row)))).toEqual(
        columns,
      );
      expect(table.dialect.byteOrderMark).toBe(how.byteOrderMark);
    }),
    { numRuns: 1000 },
  );
});

test("whatever the text, it is read or refused, and nothing of it is lost", () => {
  fc.assert(
    fc.property(garbage, (file) => {
      const table = readOrRefuse(file);
      if (table === undefined) {
        return;
      }
      expect([...appendColumns(table, [])].join("")).toBe(file);
      const mark = table.dialect.byteOrderMark ? 1 : 0;
      expect(table.source.blocks.join("")).toBe(file.slice(mark));
      for (const finding of table.findings) {
        expect(sentenceOfFinding(finding).length).toBeLessThanOrEqual(250);
      }
      const lines = file.slice(mark).split(lineEndOf(table.dialect.newline));
      for (const aside of asidesOf(table.source, table.dialect.newline)) {
        expect([aside.text, `${aside.text}\r`]).toContain(lines[aside.line - 1]);
        expect(aside.kind === "comment" || aside.text.trim() === "").toBe(true);
      }
    }),
    { numRuns: 1000 },
  );
});

test("with columns added each line begins as it did, and the file reads as the old cells beside the new", () => {
  fc.assert(
    fc.property(
      garbage,
      plainText.filter((value) => !/[\r\n]/.test(value)),
      (file, added) => {
        const table = readOrRefuse(file);
        if (table === undefined) {
          return;
        }
        const cells: Cell[] = Array.from({ length: table.rows }, (_, row) => (row % 2 === 0 ? added : row / 4));
        const output = [...appendColumns(table, [{ header: "K", unit: "m/s", column: columnOf(cells) }])].join("");
        const lineEnd = lineEndOf(table.dialect.newline);
        const before = file.split(lineEnd);
        const after = output.split(lineEnd);
        expect(after).toHaveLength(before.length);
        before.forEach((line, index) => {
          expect(after[index]?.startsWith(line.replace(/\r$/, ""))).toBe(true);
        });
        const again = read(output, { ...table.dialect, unitsRow: table.unitsRow !== undefined });
        expect(again.header).toEqual([...table.header, "K"]);
        expect(again.unitsRow).toEqual(table.unitsRow && [...table.unitsRow, "m/s"]);
        expect(rowsOf(again)).toEqual(rowsOf(table).map((row, index) => [...row, cells[index]]));
      },
    ),
    { numRuns: 1000 },
  );
});

test("a table does not depend on how its text was cut into pieces and blocks", () => {
  const file = fc.array(token, { minLength: 1, maxLength: 80 }).map(joined);
  const sizes = fc.tuple(fc.integer({ min: 1, max: 9 }), fc.integer({ min: 1, max: 30 }));
  fc.assert(
    fc.property(file, delimiter, sizes, (whole, given, [piece, block]) => {
      const options = { isUnit, delimiter: given };
      const atOnce = contentOf(new DelimitedReader(options), [whole]);
      const inPieces = contentOf(new DelimitedReader(options, block), pieces(whole, piece));
      expect(inPieces).toEqual(atOnce);
    }),
    { numRuns: 1000 },
  );
});

/** All a table says, or why there is none. */
function contentOf(reader: DelimitedReader, parts: readonly string[]): unknown {
  try {
    parts.forEach((part) => {
      reader.push(part);
    });
    const table = reader.finish();
    const records = Array.from({ length: table.rows }, (_, row) => recordText(table, row));
    return { ...table, dialect: undefined, source: undefined, records, asides: [...asidesOf(table.source, "\n")] };
  } catch (problem) {
    return (problem as FileProblem).message;
  }
}

function pieces(whole: string, size: number): string[] {
  return Array.from({ length: Math.ceil(whole.length / size) }, (_, index) =>
    whole.slice(index * size, (index + 1) * size),
  );
}
