import { expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { columnOf } from "../../../src/call/column.js";
import { type WriteOptions, writeDelimited } from "../../../src/files/delimited/writeDelimited.js";

const written: [
  why: string,
  header: string[],
  unitsRow: string[] | undefined,
  columns: Cell[][],
  options: WriteOptions,
  text: string,
][] = [
  [
    "RFC 4180 section 2.1",
    ["f", "g"],
    undefined,
    [
      ["aaa", "zzz"],
      ["bbb", "yyy"],
    ],
    { newline: "\r\n" },
    "f,g\r\naaa,bbb\r\nzzz,yyy\r\n",
  ],
  ["RFC 4180 section 2.6", ["f"], undefined, [["b\r\nbb"]], { newline: "\r\n" }, 'f\r\n"b\r\nbb"\r\n'],
  ["RFC 4180 section 2.7", ["f"], undefined, [['b"bb']], {}, 'f\n"b""bb"\n'],
  [
    "units row, blanks",
    ["f", "g"],
    ["d", ""],
    [
      [1.5, null],
      [null, true],
    ],
    {},
    "f,g\nd,\n1.5,\n,TRUE\n",
  ],
  [
    "other delimiters are quoted too",
    ["f;g", "h"],
    undefined,
    [["a,b"], ["c\td"]],
    { delimiter: "|" },
    '"f;g"|h\n"a,b"|"c\td"\n',
  ],
  ["what would be a comment is quoted", ["#f", "g"], undefined, [["#1"], ["#2"]], {}, '"#f",g\n"#1",#2\n'],
  ["what would be a blank line is quoted", ["f"], undefined, [[null, 1]], {}, 'f\n""\n1\n'],
  ["so is a line of tabs", ["f", "g"], undefined, [[null], [null]], { delimiter: "\t" }, 'f\tg\n""\t\n'],
  ["byte order mark", ["f"], undefined, [[1]], { byteOrderMark: true }, "\uFEFFf\n1\n"],
  ["text is guarded", ["f"], undefined, [["=1"]], { guardText: (text) => text.replace("=", "'=") }, "f\n'=1\n"],
];

test.each(written)("%s", (_, header, unitsRow, cells, options, text) => {
  const columns = cells.map((column) => columnOf(column));
  const table = unitsRow === undefined ? { header, columns } : { header, unitsRow, columns };
  expect([...writeDelimited(table, options)].join("")).toBe(text);
});

test("headers and columns of unequal number are a mistake of the caller", () => {
  expect(() => [...writeDelimited({ header: ["f"], columns: [] })]).toThrow(RangeError);
});
