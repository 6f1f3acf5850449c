import { expect, test } from "vitest";
import type { Finding } from "../../../src/files/delimited/finding.js";
import { sentenceOfFinding } from "../../../src/files/delimited/sentenceOfFinding.js";
import { read } from "./tables.js";

/** The text of a file, what is found in it, and the sentence; places counted by hand. */
const found: [text: string, findings: Finding[], sentences: string[]][] = [
  ["a,b\n1,2\n", [], []],
  [
    "# c\na,b\n1,2\n\n3\n4,5\n6\n",
    [{ kind: "short-rows", count: 2, first: { row: 2, line: 5 }, fields: 1, expected: 2 }],
    ["Line 5 (row 2) has 1 field where the header has 2, and so on in 2 rows in all; the missing cells are blank."],
  ],
  [
    'a,b\n"1\n\n",2\n3,4,5,6\n',
    [{ kind: "long-rows", count: 1, first: { row: 2, line: 5 }, fields: 4, expected: 2, columns: 4 }],
    [
      "Line 5 (row 2) has 4 fields where the header has 2; columns C to D have no header, added columns stand to the right of that. Is a delimiter inside a text without quotes?",
    ],
  ],
  [
    "a,b\n1,2,\n3,4,\n",
    [{ kind: "long-rows", count: 2, first: { row: 1, line: 2 }, fields: 3, expected: 2, columns: 3 }],
    [
      "Line 2 (row 1) has 3 fields where the header has 2, and so on in 2 rows in all; column C has no header, added columns stand to the right of that. Is a delimiter inside a text without quotes?",
    ],
  ],
  [
    "a,b,c\n-,d\n1,2,3\n",
    [{ kind: "short-rows", count: 1, first: { row: 0, line: 2 }, fields: 2, expected: 3 }],
    ["Line 2 (above the first row) has 2 fields where the header has 3; the missing cells are blank."],
  ],
  [
    'a,b\n1,"2" x\n3,"4\n5,6\n',
    [{ kind: "unclosed-quote", first: { row: 1, line: 2 } }],
    [
      "Line 2 (row 1) opens a quote that is never closed; all that follows was read as one field. Close the quote, or write it twice within quotes.",
    ],
  ],
  [
    'a,b\n"1"x",2\n',
    [{ kind: "stray-quotes", count: 1, first: { row: 1, line: 2 } }],
    [
      "Line 2 (row 1) has text after a closing quote; the quotes were kept as part of the text. Write a quote within quotes twice.",
    ],
  ],
  [
    "K,,K,b, ,K\n1,2,3,4,5,6\n",
    [
      { kind: "duplicate-header", header: "K", columns: [0, 2, 5] },
      { kind: "empty-headers", columns: [1, 4] },
    ],
    [
      'The header "K" stands over columns A, C and F; refer to them by their letters, or rename all but one.',
      "Columns B and E have no header; refer to them by their letters, or name them in the file.",
    ],
  ],
  [
    "1.5,2\n3,4\n",
    [{ kind: "numbers-as-header", header: "1.5" }],
    ['The first row ("1.5" ...) was taken as the header but holds numbers only; put a row of column names above it.'],
  ],
  [
    "name\n",
    [{ kind: "one-column" }, { kind: "no-rows" }],
    [
      "The table has a single column; if there should be more, name the character between them: comma, semicolon, tab or bar.",
      "The table has a header and no rows.",
    ],
  ],
];

test.each(found)("%j", (text, findings, sentences) => {
  const table = read(text);
  expect(table.findings).toEqual(findings);
  expect(table.findings.map(sentenceOfFinding)).toEqual(sentences);
});

test("sentences stay within 250 characters whatever the file holds", () => {
  const header = "x".repeat(1000);
  const table = read(`${`${header},`.repeat(9_000)}\n${"1,".repeat(16_000)}\n1\n`);
  const sentences = table.findings.map(sentenceOfFinding);
  expect(table.findings.map(({ kind }) => kind)).toEqual([
    "duplicate-header",
    "empty-headers",
    "short-rows",
    "long-rows",
  ]);
  expect(Math.max(...sentences.map(({ length }) => length))).toBeLessThanOrEqual(250);
});
