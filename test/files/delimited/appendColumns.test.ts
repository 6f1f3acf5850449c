import fc from "fast-check";
import { expect, test } from "vitest";
import { type Cell, CellError } from "../../../src/call/cell.js";
import { cellAt, columnOf } from "../../../src/call/column.js";
import { type AddedColumn, appendColumns } from "../../../src/files/delimited/appendColumns.js";
import { sentenceOfFinding } from "../../../src/files/delimited/sentenceOfFinding.js";
import { read } from "./tables.js";

const column = (header: string, unit: string | undefined, cells: Cell[]): AddedColumn => ({
  header,
  ...(unit === undefined ? {} : { unit }),
  column: columnOf(cells),
});

/** The original, what is added, and the whole file that must come out. */
const appended: [why: string, original: string, added: AddedColumn[], expected: string][] = [
  [
    "comments, blank lines, byte order mark and line endings stay",
    '\uFEFF# top\r\nname,P\r\n\r\nx , 4.20\r\n#mid\ny,"5"\r\n\r\n# end',
    [column("K", undefined, [1.5, null])],
    '\uFEFF# top\r\nname,P,K\r\n\r\nx , 4.20,1.5\r\n#mid\ny,"5",\r\n\r\n# end',
  ],
  [
    "a units row gets the unit, or a blank",
    "name;P\n-;d\nx;4\n",
    [column("K", "m/s", [1.5]), column("n", undefined, [3])],
    "name;P;K;n\n-;d;m/s;\nx;4;1.5;3\n",
  ],
  [
    "short rows are filled up, long rows move the added columns to the right of all",
    "a,b\n1\n2,3,4\n5,6\n",
    [column("K", undefined, [7, 8, 9])],
    "a,b,,K\n1,,,7\n2,3,4,8\n5,6,,9\n",
  ],
  ["no line break at the end", "a,b\n1,2", [column("K", undefined, [3])], "a,b,K\n1,2,3"],
  [
    "RFC 4180 section 2.6 and 2.7: new fields are quoted where they must be",
    "a,b\r1,2\r3,4\r",
    [column('K, "x"', undefined, ["u\nv", 'w"'])],
    'a,b,"K, ""x"""\r1,2,"u\nv"\r3,4,"w"""\r',
  ],
  ["a record of several lines", 'a,b\n"1\n2",3\n', [column("K", undefined, [4])], 'a,b,K\n"1\n2",3,4\n'],
  [
    "a quote that is never closed is closed",
    'a,b\n1,"2\n3,4\n',
    [column("K", undefined, [5])],
    'a,b,K\n1,"2\n3,4\n",5\n'.slice(0, -1),
  ],
  [
    "errors are their code, truth values are words, numbers their shortest text",
    "a,b\n1,2\n1,2\n1,2\n1,2\n",
    [column("K", undefined, [new CellError("#VALUE!", "t", "s"), true, 0.1 + 0.2, -0])],
    "a,b,K\n1,2,#VALUE!\n1,2,TRUE\n1,2,0.30000000000000004\n1,2,-0\n",
  ],
  ["nothing added, nothing changed", 'a,b\n1\n2,3,"', [], 'a,b\n1\n2,3,"'],
  ["header only", "a,b", [column("K", undefined, [])], "a,b,K"],
];

test.each(appended)("%s", (_, original, added, expected) => {
  expect([...appendColumns(read(original), added)].join("")).toBe(expected);
});

test("a finding says where added columns stand when a row is longer than the header", () => {
  expect(read("a,b\n2,3,4\n").findings.map(sentenceOfFinding).join()).toContain(
    "added columns stand to the right of that",
  );
});

test("text can be guarded as it is written, the original never", () => {
  const guardText = (text: string) => (text.startsWith("=") ? `'${text}` : text);
  const table = read("a,b\n=1+1,2\n");
  const added = [column("=K", undefined, ["=2+2"])];
  expect([...appendColumns(table, added, { guardText })].join("")).toBe("a,b,'=K\n=1+1,2,'=2+2\n");
});

test("a column of another length is a mistake of the caller", () => {
  expect(() => [...appendColumns(read("a,b\n1,2\n"), [column("K", undefined, [])])]).toThrow(RangeError);
});

/** The original, what is written anew (column, cells by row), and the file that must come out. */
const replaced: [why: string, original: string, index: number, cells: Record<number, Cell>, expected: string][] = [
  ["all else stays", '# c\na,b\n1.10,"x, y"\r\n2.0 , 3\n', 0, { 1: 7.5 }, '# c\na,b\n1.10,"x, y"\r\n7.5, 3\n'],
  ["beside quoted fields", 'a,b\n"1,""2""",3\n4,5\n', 1, { 0: 'w"' }, 'a,b\n"1,""2""","w"""\n4,5\n'],
  ["in a short record", "a,b,c\n1\n", 2, { 0: 2 }, "a,b,c\n1,,2\n"],
  ["a first cell is no comment", "a,b\nx,1\n", 0, { 0: "#1" }, 'a,b\n"#1",1\n'],
  ["a quote that is never closed is closed", 'a,b\n1,"2\n', 0, { 0: 3 }, 'a,b\n3,"2\n"'],
  ["odd quotes count as they were understood", 'a,b\n"x"y,z",1\n', 1, { 0: 2 }, 'a,b\n"x""y,z",2\n'],
];

test.each(replaced)("written anew: %s", (_, original, index, cells, expected) => {
  const table = read(original);
  const before = table.columns[index]!;
  const all = Array.from({ length: before.length }, (_, row) => cells[row] ?? null);
  const written = { index, column: columnOf(all), isReplaced: (row: number) => row in cells };
  expect([...appendColumns(table, [], { replaced: [written] })].join("")).toBe(expected);
});

test("every field but those written anew is read as before, whatever the file", () => {
  const field = fc.oneof(fc.stringMatching(/^[ab,;"\n #']{0,6}$/), fc.constantFrom("1", "2.50", "x"));
  const files = fc.array(fc.array(field, { minLength: 1, maxLength: 4 }), { minLength: 1, maxLength: 5 });
  fc.assert(
    fc.property(files, fc.nat(), fc.nat(), (rows, some, other) => {
      const quoted = rows.map((row) => row.map((text) => (/[",\n]/.test(text) ? `"${text.replaceAll('"', '""')}"` : text)).join(",")); // biome-ignore format: one line
      const table = read(`p,q,r\n${quoted.join("\n")}\n`, { delimiter: "," });
      if (table.rows === 0) return;
      const [row, index] = [some % table.rows, other % table.columns.length];
      const column = columnOf(Array.from({ length: table.rows }, () => 12345));
      const written = { index, column, isReplaced: (each: number) => each === row };
      const after = read([...appendColumns(table, [], { replaced: [written] })].join(""), { delimiter: "," });
      expect(after.rows).toBe(table.rows);
      table.columns.forEach((before, at) => {
        for (let each = 0; each < table.rows; each++) {
          const expected = each === row && at === index ? 12345 : cellAt(before, each);
          expect(cellAt(after.columns[at]!, each)).toEqual(expected);
        }
      });
    }),
    { numRuns: 300 },
  );
});
