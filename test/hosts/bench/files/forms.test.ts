import { describe, expect, test } from "vitest";
import type { Cell } from "../../../../src/call/cell.js";
import { calculateAll } from "../../../../src/files/bookFile/calculateAll.js";
import { writeWorkbook } from "../../../../src/files/xlsx/writeWorkbook.js";
import { demoBook } from "../../../../src/hosts/bench/worker/demo/demoBook.js";
import { changedValues } from "../../../../src/hosts/bench/worker/files/changedValues.js";
import { exportAs } from "../../../../src/hosts/bench/worker/files/exportAs.js";
import type { ReadFile } from "../../../../src/hosts/bench/worker/files/opener.js";
import { openFile } from "../../../../src/hosts/bench/worker/files/openFile.js";
import { functions } from "../../../../src/hosts/bench/worker/functions.js";
import type { Book } from "../../../../src/sheet/book/book.js";
import { cellOf } from "../../../../src/sheet/book/cellOf.js";
import { formulaOf } from "../../../../src/sheet/book/formulaOf.js";
import { usedColumns, usedRows } from "../../../../src/sheet/book/usedRows.js";
import { change } from "../../../../src/sheet/change.js";
import { changes } from "../../../../src/sheet/history/changes.js";
import { presentColumns } from "../../../../src/sheet/presentation/presentColumns.js";
import { recogniseColumn } from "../../../../src/table/recogniseColumn.js";
import { packed } from "../../../files/xlsx/packed.js";

const open = (name: string, ...parts: BlobPart[]): Promise<ReadFile> =>
  openFile(name, new Blob(parts), { signal: new AbortController().signal, progress: () => undefined });

function rowsOf(book: Book, sheet = 0): Cell[][] {
  return Array.from({ length: usedRows(book, sheet) }, (_, row) =>
    Array.from({ length: usedColumns(book, sheet) }, (_, column) => cellOf(book, { sheet, row, column })),
  );
}

const textOf = ({ bytes }: { bytes: Uint8Array }) => new TextDecoder().decode(bytes);

/** IVOA VOTable 1.4, section 4; invented data. */
const votable = `<?xml version="1.0"?>
<VOTABLE version="1.4" xmlns="http://www.ivoa.net/xml/VOTable/v1.3"><RESOURCE>
<TABLE name="planets"><DESCRIPTION>Planets nobody has seen</DESCRIPTION>
<FIELD name="Name" datatype="char" arraysize="*"/>
<FIELD name="P1" datatype="double" unit="d" ucd="time.period"><DESCRIPTION>from the fit</DESCRIPTION></FIELD>
<FIELD name="dP" datatype="double" unit="d" ucd="time.period;stat.error"/>
<DATA><TABLEDATA><TR><TD>007</TD><TD>4.25</TD><TD>1E-3</TD></TR></TABLEDATA></DATA></TABLE></RESOURCE></VOTABLE>`;

describe("a form of files opens by what is in it, whatever its name is", () => {
  // Each after its standard: ECSV 1.0 (APE 6), VOTable 1.4 (IVOA), CDS Standards for Astronomical Catalogues 2.0, the
  // IPAC Table Format Definition; fixed width as programs print it (common practice, no source). Invented data.
  test.each<[string, string, readonly (readonly Cell[])[]]>([
    [
      "ECSV",
      "# %ECSV 1.0\n# ---\n# datatype:\n# - {name: Name, datatype: string}\n# - {name: P, unit: d, datatype: float64}\nName P\n007 4.25\n",
      [
        ["Name", "P [d]"],
        ["007", 4.25],
      ],
    ],
    [
      "VOTable",
      votable,
      [
        ["Name", "P1 (period) [d]", "dP (period) sigma [d]"],
        ["007", 4.25, 1e-3],
      ],
    ],
    [
      "machine-readable table",
      `Title: T
================================================================================
Byte-by-byte Description of file: datafile1.txt
--------------------------------------------------------------------------------
   Bytes Format Units    Label   Explanations
--------------------------------------------------------------------------------
   1-  3 A3     ---      Name    Name of the star
   5-  8 F4.2   d        Per     Orbital period
--------------------------------------------------------------------------------
007 4.25
`,
      [
        ["Name", "Per [d]"],
        ["007", 4.25],
      ],
    ],
    [
      "IPAC table",
      "|Name  |Period|\n|char  |double|\n|      |d     |\n 007    4.25  \n",
      [
        ["Name", "Period [d]"],
        ["007", 4.25],
      ],
    ],
    [
      "fixed-width table",
      "Name  Period\n----  ------\nHD 1  4.25  \n",
      [
        ["Name", "Period"],
        ["HD 1", 4.25],
      ],
    ],
  ])("%s", async (form, text, rows) => {
    const { document } = await open("targets.csv", text);
    expect(rowsOf(document.book)).toEqual(rows);
    expect(document.history[0]).toBe(`opened targets.csv (${form}): 1 row, ${rows[0]!.length} columns`);
  });

  test("a column that its UCD tells is one that its header tells afterwards", async () => {
    const { document } = await open("x.vot", votable);
    const [, period, error] = rowsOf(document.book)[0]!.map((header) => recogniseColumn(String(header)));
    expect([period?.quantity?.name, period?.isUncertainty]).toEqual(["period", false]);
    expect([error?.quantity?.name, error?.isUncertainty]).toEqual(["period", true]);
  });

  test("descriptions and UCDs stand in a sheet of their own, and go back into files that hold them", async () => {
    const { document, findings } = await open("x.vot", votable);
    expect(findings).toEqual(["What the file says of its columns and of itself stands in the sheet Notes."]);
    expect(rowsOf(document.book, 1)).toEqual([
      ["Column", "Name in the file", "Unit in the file", "Description", "UCD", "Remarks on the table"],
      ["Name", "Name", null, null, null, "Planets nobody has seen"],
      ["P1 (period) [d]", "P1", "d", "from the fit", "time.period", null],
      ["dP (period) sigma [d]", "dP", "d", null, "time.period;stat.error", null],
    ]);
    const written = textOf(await exportAs(document, "votable", 0));
    expect(written).toContain('<FIELD name="P1" datatype="double" unit="d" ucd="time.period">');
    expect(written).toContain("<DESCRIPTION>from the fit</DESCRIPTION>");
    expect(written).toContain('<FIELD name="dP" datatype="double" unit="d" ucd="time.period;stat.error"');
    const ecsv = textOf(await exportAs(document, "ecsv", 0));
    expect(ecsv).toContain(
      '# - {name: "P1", unit: "d", datatype: float64, description: "from the fit", meta: {ucd: "time.period"}}',
    );
  });
});

/** A workbook as another program writes it (ECMA-376 part 1, sections 18.2 to 18.8); invented data. */
const workbook = packed({
  head: '<sheetViews><sheetView workbookViewId="0"><pane xSplit="1" ySplit="1" topLeftCell="B2" state="frozen"/></sheetView></sheetViews><cols><col min="1" max="1" width="20.7109375" customWidth="1"/><col min="3" max="3" width="9.140625" hidden="1"/></cols>',
  data: [
    '<row r="1"><c r="A1" t="inlineStr"><is><t>Name</t></is></c><c r="B1" t="inlineStr"><is><t>P [d]</t></is></c><c r="C1" t="inlineStr"><is><t>Twice</t></is></c><c r="D1" t="inlineStr"><is><t>Other</t></is></c></row>',
    '<row r="2"><c r="A2" t="inlineStr"><is><t>007</t></is></c><c r="B2" s="1"><v>4.25</v></c><c r="C2"><f>B2*scale</f><v>8.5</v></c><c r="D2"><f>[1]Sheet1!A1+1</f><v>41</v></c></row>',
    '<row r="3"><c r="A3" t="inlineStr"><is><t>A</t></is></c><c r="B3" s="1"><v>1.5</v></c><c r="C3"><f>B3*scale</f><v>3.25</v></c><c r="D3"><f>[1]Sheet1!A2+1</f><v>42</v></c></row>',
    '<row r="4"><c r="A4" t="inlineStr"><is><t>B</t></is></c><c r="B4" s="2"><v>2</v></c></row>',
  ].join(""),
  styles:
    '<numFmts count="1"><numFmt numFmtId="164" formatCode="0.000"/></numFmts><cellXfs count="3"><xf numFmtId="0"/><xf numFmtId="164" applyNumberFormat="1"/><xf numFmtId="11" applyNumberFormat="1"/></cellXfs>',
  rest: '<definedNames><definedName name="scale">2</definedName></definedNames>',
});

describe("a workbook", () => {
  test("opens whole: formulas, names, widths, hidden and frozen columns, the commonest format", async () => {
    const { document, findings, calculated } = await open("targets.txt", workbook as BlobPart);
    expect(document.title).toBe("targets");
    expect(formulaOf(document.book, { sheet: 0, row: 2, column: 2 })).toBe("=B3*scale");
    expect(document.book.names.map(({ name }) => name)).toEqual(["scale"]);
    // 20.7109375 characters are 145 pixels where a digit has 7 (ECMA-376 part 1, section 18.3.1.13).
    expect(document.presentation).toEqual([
      {
        frozenColumns: 1,
        columns: [
          { width: 145 },
          { format: { kind: "fixed", decimals: 3, grouped: false } },
          { width: 64, hidden: true },
        ],
      },
    ]);
    expect(rowsOf(document.book)[1]).toEqual(["007", 4.25, 8.5, 41]);
    expect(formulaOf(document.book, { sheet: 0, row: 1, column: 3 })).toBeUndefined();
    expect(findings.slice(-2)).toEqual([
      expect.stringMatching(
        /^2 formulas cannot be calculated here; what the file says they gave is kept as values \(first Targets!D2: =.*Sheet1!A1\+1\)\.$/,
      ),
      "Number formats differ from row to row on the sheet Targets; the commonest is taken for the whole column: B (fixed 3).",
    ]);
    const anew = change(document.book, [calculateAll(document.book)], functions);
    expect(changedValues(calculated!, anew)).toBe(
      "Calculated anew, 1 cell has another value than the file says, first Targets!C3: 3.25 there, 3 here.",
    );
  });

  test("that was made here comes back as it was seen", async () => {
    const demo = demoBook();
    const presentation = presentColumns(demo.presentation, 0, [1, 3], (column) => ({
      ...column,
      hidden: true,
      width: 97,
    }));
    const { name, bytes, told } = await exportAs({ ...demo, presentation }, "xlsx", 1);
    expect([name, told]).toEqual(["Demo survey.xlsx", []]);
    const { document, findings } = await open(name, bytes as BlobPart);
    expect(findings).toEqual([]);
    expect([...changes(demo.book, change(document.book, [calculateAll(document.book)], functions))]).toEqual([]);
    const shown = (whole: typeof presentation) =>
      whole.map(({ frozenColumns, columns }) => ({
        frozenColumns,
        columns: Array.from(columns, (column) => ({
          width: column?.width,
          hidden: column?.hidden,
          format: column?.format?.kind === "general" ? undefined : column?.format,
        })),
      }));
    expect(shown(document.presentation)).toEqual(shown(presentation));
    const again = await exportAs(document, "xlsx", 0);
    expect(Buffer.from(again.bytes).equals(Buffer.from(bytes))).toBe(true);
  });

  test("every width in pixels and every format comes back", async () => {
    const formats = [
      { kind: "fixed", decimals: 2, grouped: true },
      { kind: "significant", digits: 3 },
      { kind: "plus-minus", digits: "PDG" },
      { kind: "brackets", digits: 2 },
      { kind: "date-time", decimals: 1 },
      { kind: "percent", decimals: 1 },
    ] as const;
    const { book } = (await open("x.csv", `${"a,b,c,d,e,f"}\n1,2,3,4,5,6\n`)).document;
    const columns = formats.map((format, index) => ({ format, width: 41 + 13 * index }));
    const document = { ...demoBook(), book, presentation: [{ frozenColumns: 2, columns }] };
    const { bytes } = await exportAs(document, "xlsx", 0);
    expect((await open("x.xlsx", bytes as BlobPart)).document.presentation).toEqual(document.presentation);
  });

  test("formats that say more than is shown here are told, and are shown as the nearest", async () => {
    const file = packed({
      data: `<row r="1"><c r="A1" t="inlineStr"><is><t>K</t></is></c></row><row r="2"><c r="A2" s="1"><v>12.5</v></c></row>`,
      styles: `<numFmts count="1"><numFmt numFmtId="164" formatCode="0.0&quot; m/s&quot;"/></numFmts><cellXfs count="2"><xf numFmtId="0"/><xf numFmtId="164" applyNumberFormat="1"/></cellXfs>`,
    });
    const { document, findings } = await open("x.xlsx", file as BlobPart);
    expect(findings).toEqual([
      "Number formats of the sheet Targets say more than is shown here (words, colours, other forms of dates); the nearest is taken: A (fixed 1).",
    ]);
    expect(document.presentation[0]?.columns[0]?.format).toEqual({ kind: "fixed", decimals: 1, grouped: false });
  });

  test("hidden sheets and titles above the column names are told", async () => {
    const { book } = (await open("x.csv", "Survey 12,,\nName,P [d],K [m/s]\nA,1,2\n")).document;
    const bytes = await writeWorkbook({
      book: { ...book, sheets: [...book.sheets, { name: "Log", columns: [] }] },
      sheets: [
        { hidden: false, frozenRows: 0, frozenColumns: 0, columns: [] },
        { hidden: true, frozenRows: 0, frozenColumns: 0, columns: [] },
      ],
      notes: [],
    });
    expect((await open("x.xlsx", bytes as BlobPart)).findings).toEqual([
      "The sheet Log was hidden; here every sheet is shown.",
      "The column names of the sheet Table seem to stand in row 2; here they are read from row 1: delete row 1 if that is so.",
    ]);
  });
});

describe("what a file cannot hold is told when it is saved", () => {
  test.each(["csv", "ecsv", "votable"] as const)("formulas in %s", async (format) => {
    const { told } = await exportAs(demoBook(), format, 0);
    expect(told[0]).toMatch(
      /^[\d,]+ formulas are written as their values; a workbook or a Barycell book keeps formulas\.$/,
    );
  });

  test("numbers beside texts in ECSV; nothing where nothing is lost", async () => {
    const { document } = await open("x.csv", "a\n1\nx\n");
    expect((await exportAs(document, "ecsv", 0)).told).toEqual([
      'Column "a" holds numbers and other cells; such a file has one type a column, so its numbers are written as text.',
    ]);
    expect((await exportAs(document, "csv", 0)).told).toEqual([]);
  });

  test("marks in a workbook", async () => {
    const table = { keys: [], columns: [] };
    const document = { ...demoBook(), marks: [{ id: "1", name: "m", at: 0, sheet: "Targets", table }] };
    expect((await exportAs(document, "xlsx", 0)).told).toEqual([
      "Marks are kept in the Barycell book alone, not in a workbook.",
    ]);
  });
});

test("a workbook stops being read when it is told to", async () => {
  const { bytes } = await exportAs(demoBook(), "xlsx", 0);
  const stop = new AbortController();
  stop.abort();
  const reading = openFile("x.xlsx", new Blob([bytes as BlobPart]), { signal: stop.signal, progress: () => undefined });
  await expect(reading).rejects.toMatchObject({ name: "AbortError" });
});
