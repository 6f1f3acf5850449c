import { describe, expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { asidesOf } from "../../../src/files/delimited/asidesOf.js";
import type { DelimitedOptions } from "../../../src/files/delimited/delimitedReader.js";
import type { Dialect } from "../../../src/files/delimited/dialect.js";
import { readDelimited } from "../../../src/files/delimited/readDelimited.js";
import { recordText } from "../../../src/files/delimited/recordText.js";
import { FileProblem } from "../../../src/files/fileProblem.js";
import { isUnit, read, rowsOf } from "./tables.js";

/** The header, then the data rows. */
const tables: [text: string, header: string[], rows: Cell[][], source: string][] = [
  [
    "f,g,h\r\naaa,bbb,ccc\r\nzzz,yyy,xxx\r\n",
    ["f", "g", "h"],
    [
      ["aaa", "bbb", "ccc"],
      ["zzz", "yyy", "xxx"],
    ],
    "RFC 4180 section 2.1",
  ],
  [
    "f,g,h\r\naaa,bbb,ccc\r\nzzz,yyy,xxx",
    ["f", "g", "h"],
    [
      ["aaa", "bbb", "ccc"],
      ["zzz", "yyy", "xxx"],
    ],
    "RFC 4180 section 2.2",
  ],
  [
    'f,g,h\r\n"aaa","bbb","ccc"\r\nzzz,yyy,xxx',
    ["f", "g", "h"],
    [
      ["aaa", "bbb", "ccc"],
      ["zzz", "yyy", "xxx"],
    ],
    "RFC 4180 section 2.5",
  ],
  [
    'f,g,h\r\n"aaa","b\r\nbb","ccc"\r\nzzz,yyy,xxx',
    ["f", "g", "h"],
    [
      ["aaa", "b\r\nbb", "ccc"],
      ["zzz", "yyy", "xxx"],
    ],
    "RFC 4180 section 2.6",
  ],
  ['f,g,h\r\n"aaa","b""bb","ccc"', ["f", "g", "h"], [["aaa", 'b"bb', "ccc"]], "RFC 4180 section 2.7"],
  ["\uFEFFname,P\nx,1\n", ["name", "P"], [["x", 1]], "byte order mark"],
  [
    "name;P\nx;1,5\ny;2,5\n",
    ["name", "P"],
    [
      ["x", "1,5"],
      ["y", "2,5"],
    ],
    "semicolons with decimal commas",
  ],
  ["name\tP\nx, y\t1\n", ["name", "P"], [["x, y", 1]], "tabs"],
  ["name|P\nx|1\n", ["name", "P"], [["x", 1]], "bars"],
  [
    "name,P\rx,1\ry,2\r",
    ["name", "P"],
    [
      ["x", 1],
      ["y", 2],
    ],
    "carriage returns",
  ],
  [
    "name,P\r\nx,1\ny,2\r\n",
    ["name", "P"],
    [
      ["x", 1],
      ["y", 2],
    ],
    "mixed line endings",
  ],
  [
    'a,b\r\n1,"x\r"\r\n2,"y""\r"\r\n',
    ["a", "b"],
    [
      [1, "x\r"],
      [2, 'y"\r'],
    ],
    "a quoted carriage return is the field's own",
  ],
  ['a,b\r\n1,x"\r\n', ["a", "b"], [[1, 'x"']], "a quote within an unquoted field is text"],
  [
    'a,b\n1,""\n2,\n',
    ["a", "b"],
    [
      [1, null],
      [2, null],
    ],
    "an empty field is blank, quoted or not",
  ],
  ['a,b\n"1.5"," 2 "\n', ["a", "b"], [[1.5, 2]], "quotes do not make text of a number"],
  [
    "# one\n#two\na,b\n#three\n1,2\n\n  \n3,4\n# four",
    ["a", "b"],
    [
      [1, 2],
      [3, 4],
    ],
    "comments and blank lines",
  ],
  [
    "a,b\n1\n2,3,4\n5,6\n",
    ["a", "b", ""],
    [
      [1, null, null],
      [2, 3, 4],
      [5, 6, null],
    ],
    "ragged rows keep every field",
  ],
  [" a , b\n1,2\n", ["a", "b"], [[1, 2]], "blanks around a header"],
  ['name\n"Peg, 51"\nx\n', ["name"], [["Peg, 51"], ["x"]], "one column"],
  ["name\nPeg, 51\nx\n", ["name"], [["Peg, 51"], ["x"]], "one column with a comma now and then"],
  [
    "a\tb\n\t\n1\t2\n",
    ["a", "b"],
    [
      [null, null],
      [1, 2],
    ],
    "a row of blank cells is a row",
  ],
  ["a,b\n", ["a", "b"], [], "header only"],
];

test.each(tables)("%j", (text, header, rows) => {
  const table = read(text);
  expect(table.header).toEqual(header);
  expect(rowsOf(table)).toEqual(rows);
});

test("the raw text of every row is at hand", () => {
  const table = read('a,b\r\n 1, "x"\r\n\r\n"2\r\n", y\r\n3');
  expect([0, 1, 2].map((row) => recordText(table, row))).toEqual([' 1, "x"', '"2\r\n", y', "3"]);
});

test("comments and blank lines keep their place", () => {
  const table = read('# one\r\n\r\na,b\r\n#three\r\n"1\r\n",2\r\n \r\n3,4\r\n# four');
  expect(table.preamble).toEqual(["# one"]);
  expect([...asidesOf(table.source, table.dialect.newline)]).toEqual([
    { kind: "comment", text: "# one", line: 1, beforeRecord: 0 },
    { kind: "blank", text: "", line: 2, beforeRecord: 0 },
    { kind: "comment", text: "#three", line: 4, beforeRecord: 1 },
    { kind: "blank", text: " ", line: 7, beforeRecord: 2 },
    { kind: "comment", text: "# four", line: 9, beforeRecord: 3 },
  ]);
});

const dialects: [text: string, dialect: Partial<Dialect>][] = [
  ["a,b\r\n1,2\r\n", { delimiter: ",", newline: "\r\n", byteOrderMark: false }],
  ["\uFEFFa;b\n1;2\n", { delimiter: ";", newline: "\n", byteOrderMark: true }],
  ["a\tb\r1\t2\r", { delimiter: "\t", newline: "\r" }],
  ['a,"b;c;d;e"\n1,"2;3;4;5"\n', { delimiter: "," }],
  ["Name, first;P;K\n51 Peg;4,23;55,9\nx;1,0;2\n", { delimiter: ";" }],
  ["Name, alias, other, last;P\n51 Peg;4.23\nx;1\n", { delimiter: ";" }],
  ["# a;b;c;d\nx,y\n1,2\n", { delimiter: "," }],
  ["name,note\nx,a;b;c\ny,d;e;f\n", { delimiter: "," }],
  ["title\n1;2\n3;4\n5;6\n", { delimiter: ";" }],
];

test.each(dialects)("the dialect of %j is %j", (text, dialect) => {
  expect(read(text).dialect).toMatchObject(dialect);
});

test("a delimiter that is given is used", () => {
  expect(read("a,b;c\n1,2;3\n", { delimiter: ";" }).header).toEqual(["a,b", "c"]);
});

const unitsRows: [text: string, options: Partial<DelimitedOptions>, unitsRow: string[] | undefined, rows: number][] = [
  ["name,P,K\n,d,m/s\nx,4.2,55\n", {}, ["", "d", "m/s"], 1],
  ["name,P,K\n-, d ,-\nx,4.2,55\n", {}, ["-", "d", "-"], 1],
  ["name,P\n# in days\n\n-,d\nx,4\n", {}, ["-", "d"], 1],
  ["name,P\nx,d\ny,4\n", {}, undefined, 2],
  ["name,P\n1,1\n", {}, undefined, 1],
  ["name,P\n-,-\n", {}, undefined, 1],
  ["name,P\n,d\n", { unitsRow: false }, undefined, 1],
  ["name,P\nx,furlong\ny,4\n", { unitsRow: true }, ["x", "furlong"], 1],
  ["name,P,K\n-,d\nx,4,55\n", {}, ["-", "d", ""], 1],
  ["name,P\n", { unitsRow: true }, undefined, 0],
];

test.each(unitsRows)("units row of %j with %j", (text, options, unitsRow, rows) => {
  const table = read(text, options);
  expect(table.unitsRow).toEqual(unitsRow);
  expect(table.rows).toBe(rows);
});

describe("what is no table is refused in a sentence", () => {
  const refused: [text: string, kind: string, says: RegExp][] = [
    ["", "empty", /is empty/],
    ["\uFEFF", "empty", /is empty/],
    ["\n \r\n# only a comment\n", "no-header", /only blank lines and comments/],
    [`a${",b".repeat(999_999)}\n`, "too-many-columns", /The first row has 1,000,000 columns, more than the 16,384/],
    [`a,b\n1,2\n${"1,".repeat(20_000)}`, "too-many-columns", /row after the first 2 has 20,001 columns/],
    ["a,b\n1,\0\n", "binary", /character 7 is zero/],
  ];

  test.each(refused)("%#: %s", (text, kind, says) => {
    let problem: unknown;
    try {
      read(text);
    } catch (thrown) {
      problem = thrown;
    }
    expect(problem).toBeInstanceOf(FileProblem);
    expect(problem).toMatchObject({ kind, message: expect.stringMatching(says) });
    expect((problem as FileProblem).message.length).toBeLessThanOrEqual(250);
  });
});

test("a field of several megabytes, in small pieces", async () => {
  const long = `x\n"${"y".repeat(3_000_000)}`;
  const text = `a,b\n1,"${long.replaceAll('"', '""')}"\n2,z\n`;
  async function* pieces() {
    for (let at = 0; at < text.length; at += 10_000) {
      yield Buffer.from(text.slice(at, at + 10_000));
    }
  }
  expect(rowsOf(await readDelimited(pieces(), { isUnit }))).toEqual([
    [1, long],
    [2, "z"],
  ]);
});

test("progress counts rows and bytes, up to all of them", async () => {
  const line = "1.5,2.5\n";
  const bytes = Buffer.from(`a,b\n${line.repeat(200_000)}`);
  const seen: number[] = [];
  const table = await readDelimited([bytes.subarray(0, 600_000), bytes.subarray(600_000)], {
    isUnit,
    progress: ({ rows, taken }) => void seen.push(rows, taken),
  });
  expect(table.rows).toBe(200_000);
  expect(seen).toHaveLength(4);
  expect(seen[0]).toBe(Math.floor((600_000 - 4) / line.length));
  expect(seen[3]).toBe(bytes.length);
});

test("an aborted reading rejects with the signal's reason", async () => {
  const abort = new AbortController();
  const reason = new Error("closed");
  const reading = readDelimited(["a,b\n", "1,2\n", "3,4\n"], {
    isUnit,
    signal: abort.signal,
    progress: () => abort.abort(reason),
  });
  await expect(reading).rejects.toBe(reason);
});

test("bytes in UTF-16 are read and said to be so", async () => {
  const table = await readDelimited([Buffer.from("\uFEFFname,P\nAlgol é,2.867\n", "utf16le")], { isUnit });
  expect(rowsOf(table)).toEqual([["Algol é", 2.867]]);
  expect(table.dialect).toMatchObject({ encoding: "utf-16le", byteOrderMark: true });
  expect(table.findings).toEqual([{ kind: "other-encoding", encoding: "utf-16le" }]);
});
