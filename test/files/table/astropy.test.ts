import { spawnSync } from "node:child_process";
import { readFileSync } from "node:fs";
import { fileURLToPath } from "node:url";
import { afterAll, describe, expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { columnOf } from "../../../src/call/column.js";
import { writeEcsv } from "../../../src/files/ecsv/writeEcsv.js";
import { writeVotable } from "../../../src/files/votable/writeVotable.js";
import { workFolder } from "../../hosts/cli/workFolder.js";
import { read, rowsOf } from "./read.js";

const python = "/usr/bin/python3";
const script = fileURLToPath(new URL("otherLibrary.py", import.meta.url));
const isThere = spawnSync(python, ["-c", "import astropy"]).status === 0;
if (!isThere) process.stderr.write(`tables against astropy: skipped, ${python} has no astropy\n`);

interface OtherColumn {
  readonly name: string;
  readonly unit: string;
  readonly cells: readonly (string | boolean | null)[];
}

function otherProgram(...words: string[]): OtherColumn[] {
  const { stdout, stderr, status } = spawnSync(python, [script, ...words], { encoding: "utf8" });
  if (status !== 0) throw new Error(stderr);
  return JSON.parse(stdout) as OtherColumn[];
}

/** A double as Python's float.hex has it: every bit of it. */
function hex(value: number): string {
  const bits = new DataView(new ArrayBuffer(8));
  bits.setFloat64(0, value);
  return bits.getBigUint64(0).toString(16).padStart(16, "0");
}

function ofHex(text: string): number {
  const [, sign, whole, fraction = "", exponent] = /^(-?)0x(\d)\.?([0-9a-f]*)p([+-]\d+)$/.exec(text)!;
  const mantissa = Number(`0x${whole}${fraction}`) / 16 ** fraction.length;
  return (sign ? -1 : 1) * mantissa * 2 ** Number(exponent);
}

/** The other program tells numbers in base 16; a column of long integers is text here. */
function sameCells(ours: readonly Cell[], theirs: OtherColumn["cells"]): void {
  const isText = ours.some((cell) => typeof cell === "string");
  const expected = theirs.map((cell) => {
    if (typeof cell !== "string" || !/^-?0x/.test(cell)) return cell;
    return isText ? String(ofHex(cell)) : hex(ofHex(cell));
  });
  expect(ours.map((cell) => (typeof cell === "number" ? hex(cell) : cell))).toEqual(expected);
}

describe.skipIf(!isThere)("astropy (its own releases of ECSV 1.0, VOTable 1.4, MRT and IPAC)", () => {
  const folder = workFolder();
  afterAll(() => folder.remove());
  const written = isThere ? otherProgram("write", folder.path) : [];
  const columnsOf = (name: string) => {
    const table = read(readFileSync(`${folder.path}/${name}`));
    const rows = rowsOf(table);
    return { table, columns: table.columns.map((_, index) => rows.map((row) => row[index]!)) };
  };

  test.each([
    ["space.ecsv", "ecsv"],
    ["comma.ecsv", "ecsv"],
    ["tabledata.xml", "votable"],
    ["binary.xml", "votable"],
    ["binary2.xml", "votable"],
    ["table.mrt", "machine-readable"],
    ["table.ipac", "ipac"],
  ])("we read what it writes: %s", (name, format) => {
    const { table, columns } = columnsOf(name);
    expect(table.format).toBe(format);
    expect(table.header).toEqual(["Name", "P [d]", "M [jupiterMass]", "e_M [jupiterMass]", "id", "v [km/s]"]);
    columns.forEach((cells, index) => {
      const theirs = written[index]!.cells.map((cell) =>
        name === "table.mrt" && cell === "\u03b1 Cen" ? "alf Cen" : cell,
      );
      // BINARY has no way to say that a double is masked but nan, which both sides take for blank.
      sameCells(cells, theirs);
    });
  });

  test.each(["rule.txt", "bars.txt", "frame.rst", "table.csv", "table.tsv"])(
    "we read what it writes without types: %s",
    (name) => {
      const { table, columns } = columnsOf(name);
      expect(table.header).toEqual(["Name", "P", "M", "e_M", "id", "v"]);
      for (const [index, cells] of columns.entries()) if (index !== 4) sameCells(cells, written[index]!.cells);
      expect(columns[4]).toEqual(["1234567890123456789", 2, 3, 4]);
    },
  );

  const ours = {
    header: ["Name", "P [d]", "M [jupiterMass]", "n", "ok", "g [log(cm/s**2)]"],
    columns: [
      columnOf(["HD 1", 'a,"b" c', "\u03b1 Cen", "  x", "007", "=1+1"]),
      columnOf([1.5, 5e-324, 1 / 3, -0, Number.MAX_VALUE, null]),
      columnOf([0.47, null, 1, 2, 3, 4]),
      columnOf([1, -2, 9007199254740991, null, 5, 6]),
      columnOf([true, false, null, true, false, true]),
      columnOf([4.4, 4.5, null, 4.25, 1e-7, 3]),
    ],
  };
  const rows = rowsOf({ rows: 6, columns: ours.columns });

  test.each([
    ["votable", "out.xml", () => writeVotable(ours)],
    ["votable", "out2.xml", () => writeVotable(ours, "BINARY2")],
    ["ascii.ecsv", "out.ecsv", () => writeEcsv(ours)],
  ] as const)("it reads what we write: %s, %s", (format, name, write) => {
    folder.write(name, [...write()].join(""));
    const theirs = otherProgram("read", format, `${folder.path}/${name}`);
    expect(theirs.map((column) => column.name)).toEqual(["Name", "P", "M", "n", "ok", "g"]);
    // It keeps a logarithm as VOUnits writes it without understanding it.
    const logarithm = format === "votable" ? "log(cm/s**2)" : "dex(cm/s2)";
    const units = theirs.map(({ unit }) => unit.replaceAll(" ", ""));
    expect(units).toEqual(["", "d", "jupiterMass", "", "", logarithm]);
    theirs.forEach(({ cells }, index) => {
      // Its readers of texts take blanks around them away.
      const own = rows.map((row) => row[index]!).map((cell) => (cell === "  x" && name !== "out2.xml" ? "x" : cell));
      sameCells(own, cells);
    });
  });
});
