import { expect, test } from "vitest";
import { columnOf } from "../../../src/call/column.js";
import { writeEcsv } from "../../../src/files/ecsv/writeEcsv.js";
import { FileProblem } from "../../../src/files/fileProblem.js";
import type { TableFile } from "../../../src/files/table/tableFile.js";
import { sentenceOfTableFinding } from "../../../src/files/table/tableFinding.js";
import { writeVotable } from "../../../src/files/votable/writeVotable.js";
import { read, readPieces } from "./read.js";

const table = {
  header: ["Name", "P [d]", "n", "ok", "t [BJD_TDB]"],
  columns: [
    columnOf(["a <b> & c", null, "d,e", '"', "\u03b1"]),
    columnOf([1.5, -0, null, 1e-7, 12345.678]),
    columnOf([1, 2, 3, null, 5]),
    columnOf([true, null, false, true, false]),
    columnOf([2451545.25, null, 2450000, 1, 2]),
  ],
  notes: [{ name: "Name", unit: undefined, description: "its name", ucd: "meta.id" }],
  remarks: ["one", "two"],
};

const machineReadable = `Title: x
${"=".repeat(80)}
Byte-by-byte Description of file: d.txt
${"-".repeat(80)}
 Bytes Format Units Label Explanations
${"-".repeat(80)}
 1- 4 A4 --- Name Name
 6-10 F5.2 d Per [0/9]?=-9 Period
     12 I1 --- n ? Number
${"-".repeat(80)}
Note (1): x
${"-".repeat(80)}
abcd  1.25 3
efgh -9.00
ijkl 12.00 1
`;

const files: Readonly<Record<string, string>> = {
  ecsv: [...writeEcsv(table)].join(""),
  "ecsv with blanks": [...writeEcsv(table)]
    .join("")
    .replace("# delimiter: ','\n", "")
    .replaceAll(/^([^#].*)$/gm, (line) => line.replaceAll(",", " ")),
  votable: [...writeVotable(table)].join(""),
  "votable BINARY2": [...writeVotable(table, "BINARY2")].join(""),
  "machine-readable": machineReadable,
  ipac:
    "\\x = 1\n| a  |   b |c |\n|char|double|i |\n|    | d   |  |\n|null|null |0 |\n".replace("|double|", "|doubl|") +
    " x    1.5   3\n null null  0\n yy  22.5   4\n",
  "fixed-width": "| Name | P   |\n|------|-----|\n| a    | 1.5 |\n| b c  | 2   |\n",
  delimited: '# x\nName,P [d],n\n,d,\n"a, ""b""",1.5,1\nc,,2\n\nd;e,x,3,4\n',
};

/** The same random numbers in every run: a linear congruence (Numerical Recipes, 3rd ed., ranqd1). */
function randomNumbers(seed: number): (below: number) => number {
  let state = seed >>> 0;
  return (below) => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return Math.floor((state / 4294967296) * below);
  };
}

const insertions = [
  "\0",
  "<",
  ">",
  "&",
  "&#x0;",
  "]]>",
  "<!--",
  "<![CDATA[",
  "<!DOCTYPE x [",
  "</TD>",
  "<TR>",
  "\r",
  "\n",
  '"',
  "'",
  "|",
  "----",
  "====",
  "{",
  "}",
  "[",
  "*a",
  "&a ",
  "!!x ",
  ": ",
  "# ",
  "1e999",
  "9".repeat(40),
  "__proto__",
  "\u{10ffff}",
  "\ud800",
  "\uFEFF",
  "\t",
  ",",
  "=",
  "\\",
  " ".repeat(50),
];

function mutated(bytes: Uint8Array, random: (below: number) => number): Uint8Array {
  let changed = Buffer.from(bytes);
  for (let count = 1 + random(4); count > 0; count--) {
    const at = random(changed.length + 1);
    const length = random(8) === 0 ? random(changed.length) : random(6);
    const piece = [
      () => Buffer.alloc(0),
      () => Buffer.from(insertions[random(insertions.length)]!),
      () => Buffer.from([random(256)]),
      () => changed.subarray(random(changed.length + 1)).subarray(0, length),
    ][random(4)]!();
    changed = Buffer.concat([
      changed.subarray(0, at),
      piece,
      changed.subarray(random(2) === 0 ? at : Math.min(at + length, changed.length)),
    ]);
  }
  return changed;
}

/** What a table must be, whatever it was read from. */
function expectGood({ header, columns, rows, notes, unitsRow, findings }: TableFile): void {
  const good =
    header.length === columns.length &&
    notes.length === columns.length &&
    (unitsRow === undefined || unitsRow.length === columns.length) &&
    header.every((text) => typeof text === "string") &&
    columns.every(({ length, numbers, others }) => {
      if (length !== rows || numbers.length !== rows) return false;
      return numbers.every((number, row) => Number.isFinite(number) || others?.[row] !== undefined);
    }) &&
    findings.every((finding) => sentenceOfTableFinding(finding).length <= 250);
  if (!good) expect({ header, columns, rows, notes, unitsRow, findings }).toBe("a good table");
}

/** Mutants a form: enough that each kind of change meets each part of the file. */
const mutants = 10_000;

test.each(Object.entries(files))("a damaged file is a table or is refused in a sentence: %s", (_, text) => {
  const bytes = new TextEncoder().encode(text);
  expectGood(read(bytes));
  const random = randomNumbers(text.length);
  let refused = 0;
  for (let run = 0; run < mutants; run++) {
    const file = mutated(bytes, random);
    try {
      expectGood(read(file));
    } catch (problem) {
      if (!(problem instanceof FileProblem))
        throw new Error(`mutant ${run}: ${JSON.stringify(Buffer.from(file).toString("latin1"))}`, { cause: problem });
      refused++;
      expect(problem.message.length).toBeLessThanOrEqual(250);
    }
  }
  expect(refused).toBeGreaterThan(0);
  expect(refused).toBeLessThan(mutants);
});

test.each(Object.entries(files))("a table does not depend on how its bytes were cut: %s", (_, text) => {
  const bytes = new TextEncoder().encode(text);
  const { delimited: whole, ...table } = read(bytes);
  for (const size of [1, 2, 5, 33]) {
    const pieces = Array.from({ length: Math.ceil(bytes.length / size) }, (_, index) =>
      bytes.subarray(index * size, (index + 1) * size),
    );
    const { delimited, ...cut } = readPieces(pieces);
    expect(cut).toEqual(table);
    expect(delimited?.source.blocks.join("")).toBe(whole?.source.blocks.join(""));
  }
});

test("a hundred thousand columns, elements or brackets end in a sentence too", () => {
  const many = 100_000;
  const texts = [
    `<VOTABLE><RESOURCE>${"<RESOURCE>".repeat(many)}`,
    `<VOTABLE><RESOURCE><TABLE>${'<FIELD name="a" datatype="int"/>'.repeat(many)}<DATA><TABLEDATA>${"<TR>".repeat(many)}`,
    `<VOTABLE><RESOURCE><TABLE><FIELD name="a" datatype="double" arraysize="999999999999"/><DATA><BINARY><STREAM encoding="base64">${"A".repeat(many)}</STREAM></BINARY></DATA></TABLE></RESOURCE></VOTABLE>`,
    `<VOTABLE><RESOURCE><TABLE><FIELD name="a" datatype="double" arraysize="0"/><DATA><BINARY><STREAM encoding="base64">AAAA</STREAM></BINARY></DATA></TABLE></RESOURCE></VOTABLE>`,
    `# %ECSV 1.0\n# ---\n# datatype:\n# - {name: a, datatype: ${"{a: ".repeat(many)}\na\n`,
  ];
  for (const text of texts) expect(() => read(text)).toThrow(FileProblem);
});
