import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { describe, expect, test } from "vitest";
import { cellAt } from "../../../src/call/column.js";
import { FileProblem } from "../../../src/files/fileProblem.js";
import { ownFunctions } from "../../../src/files/xlsx/ownFunctions.js";
import { readWorkbook } from "../../../src/files/xlsx/readWorkbook.js";
import { writeWorkbook } from "../../../src/files/xlsx/writeWorkbook.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { change } from "../../../src/sheet/change.js";
import type { Workbook } from "../../../src/sheet/display/workbook.js";
import { plainWorkbookColumn, plainWorkbookSheet } from "../../../src/sheet/display/workbook.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { defineName } from "../../../src/sheet/edit/names.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";
import { randomNumbers } from "../../bench/timing.js";
import { packageProblems } from "./packageProblems.js";

const count = 10_000;
const random = randomNumbers(Number(process.env.BARYCELL_SEED ?? 376));
const below = (most: number): number => Math.floor(random() * most);

async function original(): Promise<Uint8Array> {
  const book = change(
    bookOf([
      { name: "Targets", columns: [] },
      { name: "B & C", columns: [] },
    ]),
    [
      setCells({ sheet: 0, row: 0, column: 0 }, [["name", "P [d]", "x"], ["a\n", 4.23, true], ["_x0041_", 1e-300, { formula: "=1/0" }]]), // biome-ignore format: one edit
      fillFormula({ sheet: 0, column: 3, from: 1, to: 5 }, "=B2*2"),
      setCells({ sheet: 1, row: 0, column: 0 }, [
        [{ formula: "=Targets!B2:B3*2" }, { formula: '=BARY.INTO(2,"d","h")' }],
      ]),
      defineName("light", "=299792.458", 0),
    ],
    ownFunctions,
  );
  const formats = [{ from: 1, to: 3, format: { kind: "date" } as const, code: undefined }];
  const shown = {
    ...plainWorkbookSheet,
    frozenRows: 1,
    columns: [plainWorkbookColumn, { width: 12, hidden: true, formats }],
  };
  return writeWorkbook({ book, sheets: [shown, plainWorkbookSheet], notes: [] });
}

const scraps = ["<", ">", '"', "&", "&#0;", "</c>", "<c>", "<v>", "<f>", "]]>", "<!--", "1e999", "-1", "A1:XFD1048576", "XFD1048576", "t=\"s\"", "t=\"shared\" si=\"0\"", "__proto__", "\u0000", "999999999", "é", "=", "NaN", "<!DOCTYPE a>", "ref=\"A1:B9\" t=\"array\""]; // biome-ignore format: one list

function mutatedText(text: string): string {
  const at = below(text.length);
  const length = 1 + below(12);
  switch (below(5)) {
    case 0:
      return text.slice(0, at) + text.slice(at + length);
    case 1:
      return text.slice(0, at) + text.slice(at, at + length * 8) + text.slice(at);
    case 2:
      return text.slice(0, at) + scraps[below(scraps.length)] + text.slice(at);
    case 3:
      return text.slice(0, at) + String(below(1e6)) + text.slice(at + 1);
    default: {
      // Something at one place is put at another.
      const from = below(text.length);
      return text.slice(0, at) + text.slice(from, from + length * 3) + text.slice(at + length);
    }
  }
}

function mutated(bytes: Uint8Array, parts: readonly (readonly [string, string])[]): Uint8Array {
  if (below(4) === 0) {
    const copy = bytes.slice(0, below(8) === 0 ? below(bytes.length) : bytes.length);
    for (let flips = 1 + below(4); flips > 0 && copy.length > 0; flips--) {
      copy[below(copy.length)] = below(256);
    }
    return copy;
  }
  const changing = below(parts.length);
  const files = parts.map(([name, text], index): [string, Uint8Array] => {
    let changed = text;
    for (let times = index === changing ? 1 + below(3) : 0; times > 0; times--) {
      changed = mutatedText(changed);
    }
    return [name, strToU8(changed)];
  });
  return zipSync(Object.fromEntries(files), { level: 0 });
}

/** What every column of a book promises: numbers are finite, and what is none stands beside. */
function expectWhole({ book, sheets }: Workbook): void {
  expect(sheets.length).toBe(book.sheets.length);
  for (const { columns } of book.sheets) {
    for (const { cells } of columns) {
      expect(cells.chunks.reduce((sum, { length }) => sum + length, 0)).toBe(cells.length);
      for (const chunk of cells.chunks) {
        for (let row = 0; row < Math.min(chunk.length, 100); row++) {
          const cell = cellAt(chunk, row);
          expect(typeof cell !== "number" || Number.isFinite(cell)).toBe(true);
        }
      }
    }
  }
}

describe(`${count} changed files`, () => {
  test("are read whole or refused with a sentence, never with another exception", async () => {
    const bytes = await original();
    const parts = Object.entries(unzipSync(bytes)).map(([name, content]) => [name, strFromU8(content)] as const);
    const outcomes = { read: 0, refused: 0 };
    for (let index = 0; index < count; index++) {
      const file = mutated(bytes, parts);
      const workbook = await readWorkbook(file).catch((error: unknown) => {
        if (!(error instanceof FileProblem) || error.message.length > 250) {
          throw new Error(`file ${index}: ${error instanceof Error ? error.stack : String(error)}`);
        }
        return undefined;
      });
      outcomes[workbook === undefined ? "refused" : "read"]++;
      if (workbook !== undefined) {
        expectWhole(workbook);
        if (index % 25 === 0) {
          expect(packageProblems(await writeWorkbook(workbook))).toEqual([]);
        }
      }
    }
    // Both outcomes are common, or the changes are not the right ones.
    expect(Math.min(outcomes.read, outcomes.refused)).toBeGreaterThan(count / 10);
  });
});
