import { expect, test } from "vitest";
import { type Cell, CellError } from "../../../src/call/cell.js";
import { columnOf } from "../../../src/call/column.js";
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
