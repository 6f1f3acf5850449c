import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { type Cell, CellError } from "../../../src/call/cell.js";
import { columnOf } from "../../../src/call/column.js";
import { cellOfField } from "../../../src/files/cell/cellOfField.js";
import { guardFormula, unguardFormula } from "../../../src/files/cell/guardFormula.js";
import { delimitedOfTable } from "../../../src/files/delimited/delimitedOfTable.js";
import { writeDelimited } from "../../../src/files/delimited/writeDelimited.js";
import { writeEcsv } from "../../../src/files/ecsv/writeEcsv.js";
import { yamlText } from "../../../src/files/ecsv/yamlText.js";
import type { DescribedTable } from "../../../src/files/table/describedTable.js";
import { writtenTable } from "../../../src/files/table/writtenColumn.js";
import { writeVotable } from "../../../src/files/votable/writeVotable.js";
import { read, rowsOf } from "./read.js";
import { describedTables } from "./tables.js";

const rowsBefore = (table: DescribedTable) => rowsOf({ rows: table.columns[0]!.length, columns: table.columns });

/** Everything but the texts as they are; vitest's toEqual tells -0 from 0. */
function expectSame(file: string, table: DescribedTable): void {
  const again = read(file);
  expect(again.header).toEqual(table.header);
  expect(rowsOf(again)).toEqual(rowsBefore(table));
  expect(again.notes.map(({ description }) => description)).toEqual(table.notes!.map((notes) => notes?.description));
  expect([again.name, again.remarks]).toEqual([table.name, table.remarks]);
}

const runs = { numRuns: 400 };

describe("what is written reads back the same, to the bit", () => {
  test("ECSV 1.0", () => {
    fc.assert(
      fc.property(describedTables(), (table) => expectSame([...writeEcsv(table)].join(""), table)),
      runs,
    );
  });

  test("VOTable 1.4, TABLEDATA", () => {
    fc.assert(
      fc.property(describedTables(), (table) => expectSame([...writeVotable(table)].join(""), table)),
      runs,
    );
  });

  test("VOTable 1.4, BINARY2, empty texts and all", () => {
    fc.assert(
      fc.property(describedTables({ emptyTexts: true }), (table) =>
        expectSame([...writeVotable(table, "BINARY2")].join(""), table),
      ),
      runs,
    );
  });

  test("delimited text, where its texts are like no other cell", () => {
    fc.assert(
      fc.property(describedTables(), fc.constantFrom(",", "\t"), (table, delimiter) => {
        const { table: delimited, losses } = delimitedOfTable(table);
        fc.pre(!losses.some((loss) => loss.includes("another kind of cell")));
        const again = read([...writeDelimited(delimited, { delimiter, guardText: guardFormula })].join(""), {
          delimiter,
          unitsRow: false,
        });
        expect(again.header).toEqual(table.header);
        expect(rowsOf(again)).toEqual(rowsBefore(table));
      }),
      runs,
    );
  });
});

describe("a text that a program could take for a formula", () => {
  // OWASP, CSV Injection: the characters that begin one.
  test.each(["=1+1", "+1", "-1+2", "@SUM(A1)", "\tx", "\r=x", "'=1", "''@x"])(
    "%j is written with an apostrophe and read without",
    (text) => {
      expect(guardFormula(text)).toBe(`'${text}`);
      expect(cellOfField(guardFormula(text))).toBe(text);
    },
  );

  test.each(["-", "--", "---", "a=b", "'quoted'", "", "1-2"])("%j is written as it is", (text) => {
    expect(guardFormula(text)).toBe(text);
  });

  test("whatever the text, reading gives it back", () => {
    fc.assert(
      fc.property(
        fc
          .array(fc.constantFrom("'", "=", "+", "-", "@", "\t", "a", "1"), { maxLength: 6 })
          .map((parts) => parts.join("")),
        (text) => {
          expect(unguardFormula(guardFormula(text))).toBe(text);
          if (/^[=+@\t\r]|^-.{3}/.test(text)) expect(guardFormula(text)[0]).toBe("'");
        },
      ),
    );
  });
});

describe("what a described form cannot hold is told", () => {
  const table = (cells: Cell[], header = "x [d]") => ({
    header: [header, header],
    columns: [columnOf(cells), columnOf(cells)],
  });

  test.each<[string, Cell[], string, string]>([
    [
      "mixed cells",
      [1, "soon"],
      "x",
      'Column "x" holds numbers and other cells; such a file has one type a column, so its numbers are written as text.',
    ],
    ["errors", [1, new CellError("#N/A", "t", "m")], "x", 'Column "x" has 1 error, which is written as blank.'],
    [
      "a name for two",
      [1],
      "x",
      'Column 2 is written as "x (2)": such a file wants a name of its own for each column.',
    ],
    ["no name", [1], "", 'Column 1 is written as "column 1": such a file wants a name of its own for each column.'],
  ])("%s", (_, cells, header, sentence) => {
    expect(writtenTable(table(cells, header)).losses).toContain(sentence);
  });

  test.each<[string, DescribedTable, string]>([
    [
      "notes",
      {
        header: ["x"],
        columns: [columnOf([1])],
        notes: [{ name: "x", unit: undefined, description: "d", ucd: undefined }],
        remarks: ["r"],
      },
      "Delimited text has no place for what is said of 1 column (descriptions, UCDs) and 1 remark on the table; ECSV and VOTable keep them.",
    ],
    [
      "texts like numbers",
      { header: ["id"], columns: [columnOf(["12", "x"])] },
      'Column "id" has 1 text that reads as another kind of cell in delimited text, first "12"; ECSV and VOTable keep it as text.',
    ],
    [
      "a row of units with one that is not known",
      { header: ["x"], unitsRow: ["sloth"], columns: [columnOf([1])] },
      'The row of units holds "sloth", which is not a known unit: whoever reads the file must say that the row is one (--units-row yes).',
    ],
  ])("by delimited text: %s", (_, described, sentence) => {
    expect(delimitedOfTable(described).losses).toEqual([sentence]);
  });

  test("a negative zero makes whole numbers doubles, and stays", () => {
    const signed = { header: ["x"], columns: [columnOf([1, -0])] };
    for (const pieces of [writeEcsv(signed), writeVotable(signed), writeVotable(signed, "BINARY2")]) {
      expect(rowsOf(read([...pieces].join("")))).toEqual([[1], [-0]]);
    }
  });

  test("what YAML takes for a line break or a mark is escaped in its texts", () => {
    // YAML 1.1, sections 5.1 and 5.4: characters that are not printable, line breaks, the byte order mark.
    expect(yamlText('a"\\\n\u007f\u0085\u2028\u2029\ufeff\u{1d6fc}')).toBe(
      '"a\\"\\\\\\n\\u007f\\u0085\\u2028\\u2029\\ufeff\u{1d6fc}"',
    );
  });

  test("infinities keep a column of numbers one", () => {
    const infinite = { header: ["x"], columns: [columnOf([1, "-Inf", null, "+Inf"])] };
    expect([...writeVotable(infinite)].join("")).toContain('datatype="double"');
    expect(rowsOf(read([...writeVotable(infinite, "BINARY2")].join("")))).toEqual([[1], ["-Inf"], [null], ["+Inf"]]);
    expect(rowsOf(read([...writeEcsv(infinite)].join("")))).toEqual([[1], ["-Inf"], [null], ["+Inf"]]);
  });

  test("units that VOUnits does not list are quoted in VOTable, and dates have a time system", () => {
    const text = [
      ...writeVotable({
        header: ["m [jupiterMass]", "t [BJD_TDB]", "f [sloth]", "v [jupiterMass/yr]"],
        columns: [1, 2, 3, 4].map((value) => columnOf([value])),
      }),
    ].join("");
    expect(text).toContain(`unit="'jupiterMass'" ucd="phys.mass"`);
    expect(text).toContain(
      '<TIMESYS ID="time_system_2" timescale="TDB" refposition="BARYCENTER" timeorigin="JD-origin"/>',
    );
    expect(text).toContain('unit="d" ucd="time.epoch" ref="time_system_2"');
    expect(text).toContain('unit="sloth"');
    expect(text).toContain(`unit="'jupiterMass'/yr"`);
  });

  test("an uncertainty that only its UCD tells keeps its name", () => {
    const file =
      '<VOTABLE><RESOURCE><TABLE><FIELD name="dM" datatype="double" unit="solMass" ucd="phys.mass;stat.error"/><DATA><TABLEDATA/></DATA></TABLE></RESOURCE></VOTABLE>';
    expect(read(file).header).toEqual(["dM sigma [solMass]"]);
    expect([...writeVotable(read(file))].join("")).toContain(
      '<FIELD name="dM" datatype="double" unit="solMass" ucd="phys.mass;stat.error"/>',
    );
  });
});
