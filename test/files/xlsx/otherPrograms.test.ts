import { execFile } from "node:child_process";
import { existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { promisify } from "node:util";
import fc from "fast-check";
import { readXlsx, writeXlsx } from "hucre/xlsx";
import Papa from "papaparse";
import { describe, expect, test } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import { ownFunctions } from "../../../src/files/xlsx/ownFunctions.js";
import { readWorkbook } from "../../../src/files/xlsx/readWorkbook.js";
import { writeWorkbook } from "../../../src/files/xlsx/writeWorkbook.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { cellOf } from "../../../src/sheet/book/cellOf.js";
import { change } from "../../../src/sheet/change.js";
import type { Entry } from "../../../src/sheet/edit/setCells.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";

const bookWith = (rows: readonly (readonly Entry[])[]) =>
  change(bookOf([{ name: "Targets", columns: [] }]), [setCells({ sheet: 0, row: 0, column: 0 }, rows)], ownFunctions);
const write = (rows: readonly (readonly Entry[])[]) => writeWorkbook({ book: bookWith(rows), sheets: [], notes: [] });

describe("a general library", () => {
  const number = fc.double({ noNaN: true, noDefaultInfinity: true }).map((each) => each + 0);
  const text = fc.string({ unit: fc.constantFrom(..."aé∞&<>\"' \n_x0041") , minLength: 1, maxLength: 9 }).filter((each) => each.trim() !== ""); // biome-ignore format: one arbitrary
  const rows = fc.array(fc.array(fc.oneof(number, text, fc.boolean()), { minLength: 3, maxLength: 3 }), { minLength: 1, maxLength: 6 }); // biome-ignore format: one arbitrary

  test("reads the same values from what is written here", async () => {
    await fc.assert(
      fc.asyncProperty(rows, async (each) => {
        expect((await readXlsx(await write(each))).sheets[0]?.rows).toEqual(each);
      }),
      { numRuns: 60 },
    );
  });

  test("writes what is read here with the same values", async () => {
    await fc.assert(
      fc.asyncProperty(rows, async (each) => {
        const { book } = await readWorkbook(await writeXlsx({ sheets: [{ name: "A", rows: each }] }));
        expect(each.map((row, index) => row.map((_, column) => cellOf(book, { sheet: 0, row: index, column })))).toEqual(each); // biome-ignore format: one comparison
      }),
      { numRuns: 60 },
    );
  });
});

const office = ["/usr/bin/soffice", "/usr/bin/libreoffice"].find((path) => existsSync(path));

describe.skipIf(office === undefined)("an office suite, where this machine has one", () => {
  const formula = (text: string): Entry => ({ formula: text });
  const values: Entry[][] = [
    ["name", "P [d]", "x", "007", "1e5"],
    ['a "b", c', 4.23, true, 1e-300, "=1+1"],
    ["é∞⊕ _x0041_", 0.1, -1e300, "1234567890123456789", "a\nb"],
    [formula("=B2*2"), formula("=SUM(B2:B3)"), formula("=1/0"), formula("=STDEV.S(B2:B3)"), formula('="x"&A2')],
    [formula("=B2:B3*2"), formula("=IF(B2>1,B3,0)"), formula("=ROUND(B2,1)"), formula("=@B3:B5"), formula("=XOR(TRUE,FALSE)")], // biome-ignore format: one row
    [null, formula('=BARY.INTO(2,"d","h")'), formula("=B6*2"), null, null],
  ];

  async function converted(rows: readonly (readonly Entry[])[]): Promise<string[][]> {
    const folder = mkdtempSync(join(tmpdir(), "barycell-office-"));
    try {
      writeFileSync(join(folder, "book.xlsx"), await write(rows));
      const profile = `-env:UserInstallation=file://${folder}/profile`;
      const filter = "csv:Text - txt - csv (StarCalc):44,34,76,1,,0,false,false,false";
      await promisify(execFile)(office as string, [profile, "--headless", "--convert-to", filter, "--outdir", folder, join(folder, "book.xlsx")], { timeout: 100_000 }); // biome-ignore format: one call
      return Papa.parse<string[]>(readFileSync(join(folder, "book.csv"), "utf8").trimEnd()).data;
    } finally {
      rmSync(folder, { recursive: true });
    }
  }

  test("shows the same values; only array formulas it calculates anew, and ours it does not know", async () => {
    const shown = await converted(values);
    const book = bookWith(values);
    for (let row = 0; row < values.length; row++) {
      for (let column = 0; column < 5; column++) {
        const at = cellOf(book, { sheet: 0, row, column });
        const text = shown[row]?.[column] ?? "";
        if (row === 5 && column === 1) {
          expect(text).toBe("#NAME?");
        } else {
          expectShown(text, at);
        }
      }
    }
  }, 120_000);
});

/** The suite writes 15 digits. */
function expectShown(text: string, cell: Cell): void {
  if (typeof cell === "number") {
    expect(Math.abs(Number(text) - cell)).toBeLessThanOrEqual(1e-14 * Math.abs(cell));
  } else {
    expect(text).toBe(cell === null ? "" : cell instanceof CellError ? cell.code : typeof cell === "boolean" ? (cell ? "TRUE" : "FALSE") : cell); // biome-ignore format: one value
  }
}
