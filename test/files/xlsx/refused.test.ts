import { readFileSync, writeFileSync } from "node:fs";
import { strToU8, zipSync } from "fflate";
import { describe, expect, test } from "vitest";
import { FileProblem } from "../../../src/files/fileProblem.js";
import { readWorkbook } from "../../../src/files/xlsx/readWorkbook.js";
import { packed } from "./packed.js";

async function problemOf(bytes: Uint8Array): Promise<string> {
  const problem = await readWorkbook(bytes).then(
    () => "none",
    (error: unknown) => error,
  );
  if (!(problem instanceof FileProblem)) {
    throw problem;
  }
  expect(problem.message.length).toBeLessThanOrEqual(250);
  return `${problem.kind}: ${problem.message}`;
}

const utf16 = (text: string) => [...text].flatMap((each) => [each.charCodeAt(0), 0]);
const compound = [0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1];
const bytes = (first: readonly number[], text = "") => Uint8Array.from([...first, ...strToU8(text)]);
const zipped = (files: Record<string, string>) =>
  zipSync(Object.fromEntries(Object.entries(files).map(([name, text]) => [name, strToU8(text)])));
const good = packed({ data: '<row r="1"><c r="A1"><v>1</v></c></row>' });
const withSheet = (xml: string) => packed({ parts: { "xl/worksheets/sheet1.xml": xml } });
const changed = (at: number, value: number) => Uint8Array.from(good, (byte, index) => (index === at ? value : byte));

/** A part that unpacks to zeros, a thousand times its size. */
const zeros = new Uint8Array(100_000_000);
const relationships = `<Relationships><Relationship Id="a" Type="x/officeDocument" Target="xl/workbook.bin"/></Relationships>`;
const entities = '<!DOCTYPE a [<!ENTITY a "aaaaaaaaaa"><!ENTITY b "&a;&a;&a;&a;&a;&a;">]>';

// What the first bytes are: the formats' own descriptions ([MS-CFB], ISO 32000, RFC 1952 ...), from memory.
const files: readonly (readonly [what: string, file: () => Uint8Array])[] = [
  ["nothing", () => new Uint8Array()],
  ["a workbook under a password", () => bytes([...compound, ...utf16("EncryptionInfo EncryptedPackage")])],
  ["an old workbook", () => bytes([...compound, ...utf16("Root Entry Workbook")])],
  ["an older workbook", () => bytes([0x09, 0x08, 0x10, 0, 0, 6, 5, 0])],
  ["a program", () => bytes([0x4d, 0x5a, 0x90, 0])],
  ["a PDF", () => bytes([], "%PDF-1.7")],
  ["CSV", () => bytes([], "name,K [m/s]\nx,1\n")],
  ["a web page", () => bytes([], "\n<html><table><tr><td>1")],
  ["XML", () => bytes([], '<?xml version="1.0"?><Workbook>')],
  ["gzip", () => bytes([0x1f, 0x8b, 8])],
  ["bytes", () => bytes([1, 2, 0, 3])],
  ["an OpenDocument sheet", () => zipped({ mimetype: "x", "content.xml": "<x/>" })],
  ["a zip archive", () => zipped({ "a.csv": "1" })],
  ["a binary workbook", () => zipped({ "_rels/.rels": relationships, "xl/workbook.bin": "x" })],
  ["a text document", () => zipped({ "_rels/.rels": relationships.replace("xl/workbook.bin", "word/document.xml") })],
  ["a workbook that is cut off", () => good.subarray(0, good.length - 100)],
  ["the beginning of a workbook", () => good.subarray(0, 40)],
  ["a workbook with a changed byte", () => changed(60, (good[60] as number) ^ 0xff)],
  ["a workbook whose part is missing", () => packed({ parts: { "xl/_rels/workbook.xml.rels": "<Relationships/>" } })],
  ["XML that breaks off", () => withSheet("<worksheet><sheetData><row>")],
  ["XML that is not nested", () => withSheet("<worksheet><a></b></worksheet>")],
  ["entities that multiply", () => withSheet(`${entities}<worksheet><sheetData>&b;</sheetData></worksheet>`)],
  ["an unknown entity", () => withSheet("<worksheet>&nbsp;</worksheet>")],
  ["an attribute without quotes", () => withSheet("<worksheet><cols><col min=1/></cols></worksheet>")],
  ["elements without end", () => withSheet("<a>".repeat(300))],
  ["a number that is none", () => packed({ data: '<row r="1"><c r="A1"><v>abc</v></c></row>' })],
  ["a text that is not there", () => packed({ data: '<row r="1"><c r="A1" t="s"><v>7</v></c></row>' })],
  ["a cell outside the sheet", () => packed({ data: '<row r="1"><c r="XFE1"><v>1</v></c></row>' })],
  ["a row outside the sheet", () => packed({ data: '<row r="1048577"/>' })],
  ["a cell twice", () => packed({ data: '<row r="1"><c r="A1"><v>1</v></c><c r="A1"><v>2</v></c></row>' })],
  ["rows out of order", () => packed({ data: '<row r="2"/><row r="1"/>' })],
  ["a part of zeros", () => packed({ parts: { "xl/worksheets/sheet1.xml": zeros } })],
  ["a part larger than it says", () => lying(good)],
  [
    "two sheets of one name",
    () =>
      packed({
        parts: {
          "xl/workbook.xml": '<workbook><sheets><sheet name="A" id="r9"/><sheet name="a" id="r9"/></sheets></workbook>',
        },
      }),
  ],
];

/** The same file with every size in its list set to 1. */
function lying(file: Uint8Array): Uint8Array {
  const copy = file.slice();
  const view = new DataView(copy.buffer);
  for (let at = 0; at + 46 < copy.length; at++) {
    if (view.getUint32(at, true) === 0x02014b50) {
      view.setUint32(at + 24, 1, true);
    }
  }
  return copy;
}

describe("what is no workbook, or none that is whole", () => {
  test("gets a sentence on what it is and what to do", async () => {
    let text = "";
    for (const [what, file] of files) {
      text += `${what}\n  ${await problemOf(file())}\n`;
    }
    // BARYCELL_WRITE_GOLDEN=1 writes the sentences anew; the difference is to be read before it is committed.
    const path = new URL("refused.txt", import.meta.url);
    if (process.env.BARYCELL_WRITE_GOLDEN === "1") {
      writeFileSync(path, text);
    }
    expect(text).toBe(readFileSync(path, "utf8"));
  });

  test("a part of a thousand times its size is refused before it is unpacked", async () => {
    const file = packed({ parts: { "xl/worksheets/sheet1.xml": zeros } });
    const before = process.memoryUsage().arrayBuffers;
    const start = performance.now();
    expect(await problemOf(file)).toMatch(/^too-large: /);
    expect(performance.now() - start).toBeLessThan(1000);
    expect(process.memoryUsage().arrayBuffers - before).toBeLessThan(50_000_000);
  });

  test("names that lead out of the file mean nothing", async () => {
    const outside = { "../../etc/x.xml": "<x/>", "/abs.xml": "<x/>", "__proto__/x": "<x/>", constructor: "<x/>" };
    const { book } = await readWorkbook(packed({ data: '<row r="1"/>', parts: outside }));
    expect(book.sheets.length).toBe(1);
    expect(({} as { x?: unknown }).x).toBeUndefined();
  });

  test("names and texts that are names of a prototype are names and texts", async () => {
    const data = '<row r="1" __proto__="1"><c r="A1" t="inlineStr" constructor="x"><is><t>__proto__</t></is></c></row>';
    const rest = '<definedNames><definedName name="__proto__">1</definedName><definedName name="constructor">2</definedName></definedNames>'; // biome-ignore format: one part
    const { book } = await readWorkbook(packed({ data, rest }));
    expect(book.names.map(({ name }) => name)).toEqual(["__proto__", "constructor"]);
  });

  test("a far cell in every column takes little memory", async () => {
    const { columnLetters } = await import("../../../src/sheet/book/address.js");
    const cells = Array.from({ length: 16_384 }, (_, column) => `<c r="${columnLetters(column)}1048576"><v>1</v></c>`);
    const before = process.memoryUsage();
    const { book } = await readWorkbook(packed({ data: `<row r="1048576">${cells.join("")}</row>` }));
    const after = process.memoryUsage();
    expect(book.sheets[0]?.columns.length).toBe(16_384);
    expect(after.heapUsed + after.arrayBuffers - before.heapUsed - before.arrayBuffers).toBeLessThan(200_000_000);
  });
});
