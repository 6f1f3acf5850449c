import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { expect, test } from "vitest";
import { ownFunctions } from "../../../src/files/xlsx/ownFunctions.js";
import { writeWorkbook } from "../../../src/files/xlsx/writeWorkbook.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { change } from "../../../src/sheet/change.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";
import { packageProblems } from "./packageProblems.js";

const sheet = "xl/worksheets/sheet1.xml";

// Faults that worksheet programs refuse a file for; each must be seen, or the checks of written files are worth nothing.
test.each<[string, string, RegExp, string]>([
  ["a style that is not there", sheet, /<c r="A1"/, '<c r="A1" s="9"'],
  ["a text that is not there", sheet, /<v>0<\/v>/, "<v>99</v>"],
  ["cell metadata that is not there", sheet, /cm="1"/, 'cm="2"'],
  ["an array formula without metadata", sheet, / cm="1"/, ""],
  ["elements out of order", sheet, /(<sheetFormatPr[^>]*>)(<sheetData>.*<\/sheetData>)/, "$2$1"],
  ["cells out of order", sheet, /r="A1"/, 'r="C1"'],
  ["rows out of order", sheet, /<row r="2"/, '<row r="1"'],
  ["a formula with its sign", sheet, /<f>/, "<f>="],
  ["a wrong count of texts", "xl/sharedStrings.xml", / count="\d+"/, ' count="7"'],
  ["a wrong count of styles", "xl/styles.xml", /<cellXfs count="1"/, '<cellXfs count="2"'],
  ["a part without a type", "[Content_Types].xml", /<Override PartName="\/xl\/styles[^>]*>/, ""],
  ["a sheet without its part", "xl/workbook.xml", /r:id="rId1"/, 'r:id="rId9"'],
  ["a relationship that leads nowhere", "xl/_rels/workbook.xml.rels", /metadata\.xml/, "meta.xml"],
])("%s is noticed", async (_, name, fault, instead) => {
  const rows = [["a", 1], [{ formula: "=B1*2" }, { formula: "=B1:B1*{1,2}" }]]; // biome-ignore format: a row a line
  const book = change(bookOf([{ name: "A", columns: [] }]), [setCells({ sheet: 0, row: 0, column: 0 }, rows)], ownFunctions); // biome-ignore format: one call
  const bytes = await writeWorkbook({ book, sheets: [], notes: [] });
  expect(packageProblems(bytes)).toEqual([]);
  const parts = unzipSync(bytes);
  const xml = strFromU8(parts[name] as Uint8Array);
  expect(xml).toMatch(fault);
  const planted = zipSync({ ...parts, [name]: strToU8(xml.replace(fault, instead)) });
  expect(packageProblems(planted).length).toBeGreaterThan(0);
});
