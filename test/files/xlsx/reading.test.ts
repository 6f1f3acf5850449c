import { describe, expect, test } from "vitest";
import { ownFunctions } from "../../../src/files/xlsx/ownFunctions.js";
import { readWorkbook, readWorkbookAsStored } from "../../../src/files/xlsx/readWorkbook.js";
import { change } from "../../../src/sheet/change.js";
import type { Workbook } from "../../../src/sheet/display/workbook.js";
import { recalculate } from "../../../src/sheet/edit/recalculate.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";
import { formulaAt, messageAt, valueAt } from "../../sheet/grid.js";
import type { Parts } from "./packed.js";
import { packed } from "./packed.js";

const read = (parts: Parts): Promise<Workbook> => readWorkbook(packed(parts));
const stored = async (parts: Parts) => (await readWorkbookAsStored(packed(parts))).book;
const row = (cells: string, number = 1) => `<row r="${number}">${cells}</row>`;

// Cells: ECMA-376 part 1, sections 18.3.1.4 (c), 18.18.11 (ST_CellType), 22.9.2.19 (ST_Xstring), 18.4 (shared strings).
describe("values", () => {
  test.each<[string, string, unknown]>([
    ["a number", '<c r="A1"><v>4.23</v></c>', 4.23],
    ["17 digits", '<c r="A1"><v>0.30000000000000004</v></c>', 0.1 + 0.2],
    ["a small number", '<c r="A1" t="n"><v>1E-300</v></c>', 1e-300],
    ["an identifier stored as a number", '<c r="A1"><v>1234567890123456789</v></c>', "1234567890123456789"],
    ["a long integer that is a double", '<c r="A1"><v>-9129314004952892</v></c>', -9129314004952892],
    [
      "a long integer in the shortest form of its double",
      '<c r="A1"><v>1234567890123456800</v></c>',
      1234567890123456800,
    ],
    ["a number that begins with zeros", '<c r="A1"><v>007</v></c>', "007"],
    ["a shared text in several fonts", '<c r="A1" t="s"><v>1</v></c>', "K2-18 b"],
    ["a shared text with blanks", '<c r="A1" t="s"><v>0</v></c>', " a\nb "],
    ["an inline text", '<c r="A1" t="inlineStr"><is><t>x</t></is></c>', "x"],
    [
      "an inline text in several fonts",
      '<c r="A1" t="inlineStr"><is><r><t>x</t></r><r><rPr/><t>y</t></r><rPh sb="0" eb="1"><t>z</t></rPh></is></c>',
      "xy",
    ],
    ["a text of a formula", '<c r="A1" t="str"><f>"a"</f><v>a&amp;_x0041_&#10;</v></c>', "a&A\n"],
    ["an empty text", '<c r="A1" t="str"><v></v></c>', ""],
    ["no value", '<c r="A1" s="0"/>', null],
    ["a truth value", '<c r="A1" t="b"><v>1</v></c>', true],
    ["an error", '<c r="A1" t="e"><v>#DIV/0!</v></c>', "#DIV/0!"],
    ["an error of another program", '<c r="A1" t="e"><v>#SPILL!</v></c>', "#VALUE!"],
    // Serials of the 1900 date system: 45292 is 1 January 2024 (ECMA-376 part 1, section 18.17.4.1).
    ["a date of ISO 8601", '<c r="A1" t="d"><v>2024-01-01T06:00:00Z</v></c>', 45292.25],
    ["a cell without an address", "<c><v>5</v></c>", 5],
    ["CDATA and a comment", '<c r="A1" t="str"><v><![CDATA[<b>]]><!-- no -->&#x263A;</v></c>', "<b>☺"],
    [
      "a prefix",
      '<x:c xmlns:x="http://schemas.openxmlformats.org/spreadsheetml/2006/main" r="A1"><x:v>1</x:v></x:c>',
      1,
    ],
  ])("%s", async (_, cells, value) => {
    const strings = '<si><t xml:space="preserve"> a\r\nb </t></si><si><r><rPr><b/></rPr><t>K2-</t></r><r><t>18 b</t></r><rPh sb="0" eb="2"><t>no</t></rPh></si>'; // biome-ignore format: one part
    expect(valueAt(await stored({ data: row(cells), strings }), "A1")).toStrictEqual(value);
  });

  test("a date counts from 1904 where the file says so, a time and a number do not", async () => {
    const styles = '<cellXfs><xf numFmtId="0"/><xf numFmtId="14"/><xf numFmtId="21"/></cellXfs>';
    const data = row('<c r="A1" s="1"><v>43830</v></c><c r="B1" s="2"><v>0.5</v></c><c r="C1"><v>43830</v></c>');
    const book = await stored({ data, styles, properties: '<workbookPr date1904="1"/>' });
    // 1 January 2024 is 43830 in the one system and 45292 in the other.
    expect(["A1", "B1", "C1"].map((address) => valueAt(book, address))).toEqual([45292, 0.5, 43830]);
  });

  test("a part in UTF-16", async () => {
    const text = "\uFEFF<sst><si><t>Ω</t></si></sst>";
    const part = new Uint8Array(Uint16Array.from(text, (each) => each.charCodeAt(0)).buffer);
    const book = await stored({ data: row('<c r="A1" t="s"><v>0</v></c>'), parts: { "xl/sharedStrings.xml": part } });
    expect(valueAt(book, "A1")).toBe("Ω");
  });
});

// Formulas: ECMA-376 part 1, section 18.3.1.40; prefixes: [MS-XLSX] section 2.2.3.
describe("formulas", () => {
  test.each<[string, string, string]>([
    ["plain", "<f>B1*2</f>", "=B1*2"],
    [
      "our function as the add-in has it stored",
      '<f t="array" ref="A1">_xldudf_BARY_INTO(B1,"d","h")</f>',
      '=BARY.INTO(B1,"d","h")',
    ],
    ["our function as typed", '<f>BARY.INTO(B1,"d","h")</f>', '=BARY.INTO(B1,"d","h")'],
    [
      "younger functions",
      "<f>_xlfn.STDEV.S(B1:B3)+_xlfn.XLOOKUP(1,B1:B3,B1:B3)</f>",
      "=STDEV.S(B1:B3)+XLOOKUP(1,B1:B3,B1:B3)",
    ],
    ["twice prefixed", '<f t="array" ref="A1:A3">_xlfn._xlws.SORT(B1:B3)</f>', "=SORT(B1:B3)"],
    ["a name within a formula", "<f>_xlfn.LET(_xlpm.x,2,_xlpm.x*B1)</f>", "=LET(x,2,x*B1)"],
    ["all cells that a formula filled", '<f t="array" ref="A1:A3">_xlfn.ANCHORARRAY(B1)*2</f>', "=B1#*2"],
    ["one cell of a range", "<f>_xlfn.SINGLE(B1:B3)+_xlfn.SINGLE((B1:B3))</f>", "=@B1:B3+@(B1:B3)"],
    // A formula stored plainly takes one cell of a range where one value is wanted (common practice, no source).
    ["a range where one value is wanted", "<f>B1:B3*2+SUM(B1:B3)</f>", "=@B1:B3*2+SUM(B1:B3)"],
    ["a range within a product of arrays", "<f>SUMPRODUCT((B1:B3&gt;1)*C1:C3)</f>", "=SUMPRODUCT((B1:B3>1)*C1:C3)"],
    ["an old array formula", '<f t="array" ref="A1">SUM(B1:B3*C1:C3)</f>', "=SUM(B1:B3*C1:C3)"],
    ["prefixes within a text", '<f>"_xlfn.SINGLE("&amp;B1</f>', '="_xlfn.SINGLE("&B1'],
  ])("%s", async (_, formula, text) => {
    const book = await stored({ data: row(`<c r="A1">${formula}<v>1</v></c>`) });
    expect(formulaAt(book, "A1")).toBe(text);
    expect(valueAt(book, "A1")).toBe(1);
  });

  test("shared down and across keep their relative references", async () => {
    const first =
      '<c r="B1"><f t="shared" ref="B1:C2" si="0">A1*$A$1</f><v>1</v></c><c r="C1"><f t="shared" si="0"/><v>2</v></c>';
    const second = '<c r="B2"><f t="shared" si="0"/><v>3</v></c><c r="C2"><f t="shared" si="0"/><v>4</v></c>';
    const book = await stored({ data: row(first) + row(second, 2) });
    expect(["B1", "C1", "B2", "C2"].map((each) => formulaAt(book, each))).toEqual(["=A1*$A$1", "=B1*$A$1", "=A2*$A$1", "=B2*$A$1"]); // biome-ignore format: one list
  });

  test("without a value are calculated, and what depends on them", async () => {
    const data = row('<c r="A1"><v>2</v></c><c r="B1"><f>A1*3</f></c><c r="C1"><f>B1+1</f><v>0</v></c><c r="D1"><f>A1</f><v>9</v></c>'); // biome-ignore format: one row
    const { book } = await read({ data });
    expect(["B1", "C1", "D1"].map((each) => valueAt(book, each))).toEqual([6, 7, 9]);
    expect(valueAt(await stored({ data }), "B1")).toBe(null);
  });

  test("are all calculated where the file asks for it, but for those that cannot be", async () => {
    const data = row(
      '<c r="A1"><v>2</v></c><c r="B1"><f>A1*3</f><v>0</v></c><c r="C1"><f>[1]Sheet1!A1</f><v>8</v></c>',
    );
    const rest = '<externalReferences><externalReference/></externalReferences><calcPr fullCalcOnLoad="1"/>';
    const { book, notes } = await read({ data, rest });
    expect(notes).toEqual(["Formulas refer to other files, which are not read; they keep the values that they had."]);
    expect(["B1", "C1"].map((each) => valueAt(book, each))).toEqual([6, 8]);
  });

  test("that fill cells own them; where cells overlap they are calculated anew", async () => {
    const array = (address: string, area: string) => `<c r="${address}"><f t="array" ref="${area}">_xlfn.SEQUENCE(1,2)</f><v>1</v></c>`; // biome-ignore format: one cell
    const { book } = await read({ data: row(`${array("A1", "A1:B1")}<c r="B1"><v>2</v></c>${array("C1", "C1:D1")}${array("D1", "D1:E1")}<c r="E1"><v>2</v></c>`) }); // biome-ignore format: one row
    expect(["A1", "B1", "C1", "D1", "E1"].map((each) => valueAt(book, each))).toEqual([1, 2, "#VALUE!", 1, 2]);
    const again = change(book, [recalculate()], ownFunctions);
    expect(["A1", "B1", "C1", "D1", "E1"].map((each) => valueAt(again, each))).toEqual([1, 2, "#VALUE!", 1, 2]);
  });

  test("that found no room are known to wait for it", async () => {
    const data = row('<c r="A1" t="e" cm="1"><f t="array" ref="A1">_xlfn.SEQUENCE(1,2)</f><v>#VALUE!</v></c><c r="B1"><v>7</v></c>'); // biome-ignore format: one row
    const { book } = await read({ data });
    expect(messageAt(book, "A1")).toMatch(/B1 is in the way/);
    const cleared = change(book, [setCells({ sheet: 0, row: 0, column: 1 }, [[null]])], ownFunctions);
    expect(["A1", "B1"].map((each) => valueAt(cleared, each))).toEqual([1, 2]);
  });

  test("with an error say why when they are asked", async () => {
    const data = row('<c r="A1" t="e"><f>BARY.INTO(2,,"h")</f><v>#VALUE!</v></c><c r="B1" t="e"><f>A1*2</f><v>#VALUE!</v></c><c r="C1" t="e"><v>#N/A</v></c>'); // biome-ignore format: one row
    const book = await stored({ data });
    expect(messageAt(book, "A1")).toMatch(/^INTO: .*2/);
    expect(messageAt(book, "B1")).toBe(messageAt(book, "A1"));
    expect(messageAt(book, "C1")).toBe(
      "the file holds #N/A in this cell; calculate it anew, or type what belongs here",
    );
  });
});

// Tables: ECMA-376 part 1, section 18.5.1; references to them: section 18.17.6.6 and common practice.
describe("references to tables", () => {
  const table = (name: string, area: string, extra = "") => `<table name="x" displayName="${name}" ref="${area}"${extra}><tableColumns count="3"><tableColumn name="P [d]"/><tableColumn name="K"/><tableColumn name="e_x000a_f"/></tableColumns></table>`; // biome-ignore format: one part
  const parts = {
    "xl/worksheets/_rels/sheet1.xml.rels": `<Relationships><Relationship Id="a" Type="x/table" Target="../tables/table1.xml"/></Relationships>`,
    "xl/tables/table1.xml": table("Planets", "B2:D9", ' totalsRowCount="1"'),
  };

  test.each([
    ["SUM(Planets[K])", "=SUM($C$3:$C$8)"],
    ["Planets[[#This Row],[P '[d']]]*2", "=$B5*2"],
    ["SUM(Planets[[#This Row],[P '[d']]:[K]])", "=SUM($B5:$C5)"],
    ["SUM(Planets[])+SUM(planets)", "=SUM($B$3:$D$8)+SUM($B$3:$D$8)"],
    ["COUNTA(Planets[#All])", "=COUNTA($B$2:$D$9)"],
    ["COUNTA(Planets[#Headers])", "=COUNTA($B$2:$D$2)"],
    ["Planets[[#Totals],[K]]", "=$C$9"],
    ["SUM(Planets[gone])", "=SUM(#REF!)"],
    ['Others[K]&amp;"Planets[K]"', '=Others[K]&"Planets[K]"'],
  ])("%s", async (text, formula) => {
    const data = row(`<c r="F5"><f>${text}</f><v>1</v></c>`, 5) + row(`<c r="F6"><f>${text}</f><v>1</v></c>`, 6);
    const book = await stored({ data, parts });
    expect(formulaAt(book, "F5")).toBe(formula);
    expect(formulaAt(book, "F6")).toBe(formula.replace(/(\$[A-Z])5/g, "$16"));
  });
});

describe("names", () => {
  test("are read; those of programs themselves are not; one meaning a name", async () => {
    const rest = `<definedNames><definedName name="star_mass">Targets!$B$1</definedName>
      <definedName name="_xlnm.Print_Area" localSheetId="0">Targets!$A$1</definedName>
      <definedName name="star_mass" localSheetId="0">Targets!$C$1</definedName>
      <definedName name="moves">Targets!A1</definedName><definedName name="light">299792.458</definedName></definedNames>`;
    const data = row('<c r="A1"><f>star_mass*light+0</f></c><c r="B1"><v>2</v></c><c r="D1"><f>moves</f></c>');
    const { book, notes } = await read({ data, rest });
    expect(book.names.map(({ name }) => name)).toEqual(["star_mass", "moves", "light"]);
    expect(valueAt(book, "A1")).toBe(599584.916);
    expect(messageAt(book, "D1")).toBe("moves: the name stands for other cells in each cell that uses it, which is not supported; use the cells themselves"); // biome-ignore format: one message
    expect(notes).toEqual(["The name star_mass stands for other cells on some sheet; only its first meaning is kept."]);
  });
});

// Number formats: ECMA-376 part 1, sections 18.8.30 and 18.8.31.
describe("how cells are shown", () => {
  test.each<[string, object, boolean]>([
    ["0.00", { kind: "fixed", decimals: 2, grouped: false }, false],
    ["#,##0", { kind: "fixed", decimals: 0, grouped: true }, false],
    ["#,##0.0_);[Red]\\(#,##0.0\\)", { kind: "fixed", decimals: 1, grouped: true }, true],
    ['0.000" m/s"', { kind: "fixed", decimals: 3, grouped: false }, true],
    ["0%", { kind: "percent", decimals: 0 }, false],
    ["0.00E+00", { kind: "scientific", digits: 3 }, false],
    ["yyyy-mm-dd", { kind: "date" }, false],
    ["[$-409]d\\-mmm\\-yy;@", { kind: "date" }, true],
    ["dd/mm/yyyy hh:mm", { kind: "date-time", decimals: 0 }, true],
    ["mmm-yy", { kind: "date" }, true],
    ["h:mm AM/PM", { kind: "time", decimals: 0 }, true],
    ["hh:mm:ss.000", { kind: "time", decimals: 3 }, false],
    ["[h]:mm:ss", { kind: "general" }, true],
    ["# ?/?", { kind: "general" }, true],
    ["@", { kind: "general" }, true],
    ['"d"0', { kind: "fixed", decimals: 0, grouped: false }, true],
  ])("%s", async (code, format, isKept) => {
    const escaped = code.replaceAll('"', "&quot;");
    const styles = `<numFmts count="1"><numFmt numFmtId="170" formatCode="${escaped}"/></numFmts><cellXfs><xf numFmtId="0"/><xf numFmtId="170"/></cellXfs>`;
    const { sheets } = await read({ data: row('<c r="A1" s="1"><v>1</v></c>'), styles });
    expect(sheets[0]?.columns[0]?.formats).toEqual([{ from: 0, to: 1, format, code: isKept ? code : undefined }]);
  });

  test("widths, hidden columns, frozen rows; what is not kept is said", async () => {
    const head = '<sheetViews><sheetView><pane xSplit="1" ySplit="2" state="frozen"/></sheetView></sheetViews><cols><col min="1" max="2" width="12.5" customWidth="1"/><col min="3" max="16384" hidden="1" width="9"/></cols>'; // biome-ignore format: one part
    const tail = '<mergeCells><mergeCell ref="A1:B1"/></mergeCells><conditionalFormatting><cfRule type="x"/></conditionalFormatting><drawing/><tableParts><tablePart/></tableParts>'; // biome-ignore format: one part
    const { sheets, notes } = await read({ head, tail, data: row('<c r="C1"><v>1</v></c>') });
    const column = { width: 12.5, hidden: false, formats: [] };
    expect(sheets).toEqual([{ hidden: false, frozenRows: 2, frozenColumns: 1, columns: [column, column, { width: 9, hidden: true, formats: [] }] }]); // biome-ignore format: one value
    expect(notes).toEqual([
      "The sheet Targets has merged cells (their first cell keeps the value), conditional formats, charts and pictures and tables (their cells and formulas stay), which are not kept.",
    ]);
  });
});

describe("under watch", () => {
  const data = Array.from({ length: 20_000 }, (_, index) => row(`<c><v>${index}</v></c><c><f>A${index + 1}*2</f></c>`, index + 1)).join(""); // biome-ignore format: one sheet

  test("tells how far it has come, and stops when it is told to", async () => {
    const seen: number[] = [];
    const book = await readWorkbook(packed({ data }), { onProgress: (done, total) => void seen.push(done / total) });
    expect(valueAt(book?.book as NonNullable<typeof book>["book"], "B20000")).toBe(39998);
    expect(seen.length).toBeGreaterThan(0);
    expect(seen.every((each) => each >= 0 && each <= 1)).toBe(true);
    expect(await readWorkbook(packed({ data }), { isCancelled: () => true })).toBeUndefined();
  });
});
