import { readFileSync } from "node:fs";
import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";
import { afterAll, describe, expect, test } from "vitest";
import { ownFunctions } from "../../../src/files/xlsx/ownFunctions.js";
import { readWorkbookAsStored } from "../../../src/files/xlsx/readWorkbook.js";
import { writeWorkbook } from "../../../src/files/xlsx/writeWorkbook.js";
import { run } from "../../../src/hosts/cli/run.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { change } from "../../../src/sheet/change.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";
import { formulaAt, valueAt } from "../../sheet/grid.js";
import { workFolder } from "./workFolder.js";

const folder = workFolder();
afterAll(() => folder.remove());
const at = (name: string) => `${folder.path}/${name}`;

/** Runs a command line in this process: how it ended, and what it wrote. */
async function barycell(words: readonly string[], input?: Uint8Array) {
  let out = "";
  let note = "";
  const code = await run(words, {
    input: (async function* () {
      if (input !== undefined) yield input;
    })(),
    isScreen: false,
    note(text) {
      note += text;
    },
    async out(text) {
      out += text;
    },
  });
  return { code, out, note };
}

const rows = 3000;

async function targets(): Promise<Uint8Array> {
  const book = change(
    bookOf([{ name: "Targets", columns: [] }]),
    [
      setCells({ sheet: 0, row: 0, column: 0 }, [["P [d]", "twice", "h", "kept"], ...Array.from({ length: rows }, (_, row) => [row + 1])]), // biome-ignore format: one edit
      fillFormula({ sheet: 0, column: 1, from: 1, to: rows + 1 }, "=A2*2"),
      fillFormula({ sheet: 0, column: 2, from: 1, to: 3 }, '=BARY.INTO(A2,A$1,"h")'),
      setCells({ sheet: 0, row: 1, column: 3 }, [[{ formula: "=NOPE(A2)" }]]),
      setCells({ sheet: 0, row: 1, column: 4 }, [[{ formula: "=A2=1" }, { formula: '="x"&A2' }, { formula: "=H1" }]]),
    ],
    ownFunctions,
  );
  return writeWorkbook({ book, sheets: [], notes: [] });
}

/** The workbook with other values in its cells than its formulas give. */
async function tampered(replace: (xml: string) => string): Promise<Uint8Array> {
  const parts = unzipSync(await targets());
  const name = "xl/worksheets/sheet1.xml";
  return zipSync({ ...parts, [name]: strToU8(replace(strFromU8(parts[name] as Uint8Array))) });
}

describe("recalc", () => {
  test("finds nothing in a workbook whose values are those of its formulas", async () => {
    folder.write("good.xlsx", await targets());
    const { code, out, note } = await barycell(["recalc", at("good.xlsx")]);
    expect({ code, out }).toEqual({ code: 0, out: "" });
    expect(note).toBe(
      "3,006 formulas calculated; no value changed by more than rounding (1e-12).\n" +
        '1 formula cannot be calculated here; the values are kept. Targets!D2: NOPE: no function has this name; check the spelling, for example SUM or AVERAGE\n', // biome-ignore format: one message
    );
  });

  test("passes over rounding and over the 0 that others hold for a blank", async () => {
    const bytes = await tampered((xml) =>
      xml
        .replace("<v>48</v>", "<v>48.00000000000001</v>")
        .replace('<c r="G2"><f>H1</f>', '<c r="G2"><f>H1</f><v>0</v>'),
    );
    expect((await barycell(["recalc", "-"], bytes)).code).toBe(0);
    const { code, out } = await barycell(["recalc", "-", "--tolerance", "0"], bytes);
    // 1 day is 24 hours.
    expect({ code, out }).toEqual({ code: 4, out: 'Targets!C3: 48.00000000000001 -> 48 (-1.5e-16)  =BARY.INTO(A3,A$1,"h")\n' }); // biome-ignore format: one answer
  });

  test("says what changed, a filled column in one line", async () => {
    const bytes = await tampered((xml) =>
      xml
        .replace(/(<f t="shared" si="0"\/><v>)\d+/g, "$10")
        .replace('<c r="B10"><f t="shared" si="0"/><v>', '<c r="B10"><f t="shared" si="0"/><v>-1')
        .replace("<v>24</v>", "<v>12</v>")
        .replace('t="b"><f>A2=1</f><v>1<', 't="e"><f>A2=1</f><v>#N/A<')
        .replace("<v>x1<", "<v>y<"),
    );
    const { code, out, note } = await barycell(["recalc", "-"], bytes);
    expect(code).toBe(4);
    expect(out).toBe(
      "Targets!B3:B3001: 2,999 cells, most in B10: -10 -> 18 (+1.6)  =A3*2\n" +
        'Targets!C2: 12 -> 24 (+0.50)  =BARY.INTO(A2,A$1,"h")\n' +
        "Targets!E2: #N/A -> TRUE  =A2=1\n" +
        'Targets!F2: "y" -> "x1"  ="x"&A2\n',
    );
    expect(note).toMatch(/^3,006 formulas calculated; 3,002 values changed by more than rounding \(1e-12\)\.\n/);
  });

  test("gives every cell as JSON", async () => {
    const bytes = await tampered((xml) => xml.replace("<v>24</v>", "<v>12</v>").replace("<v>x1<", "<v>y<"));
    const { code, out } = await barycell(["recalc", "-", "--json"], bytes);
    expect(code).toBe(4);
    expect(JSON.parse(out)).toEqual({
      formulas: 3006,
      tolerance: 1e-12,
      kept: 1,
      notes: [],
      changed: 2,
      changes: [
        { sheet: "Targets", cell: "C2", formula: '=BARY.INTO(A2,A$1,"h")', before: 12, now: 24, relative: 0.5 },
        { sheet: "Targets", cell: "F2", formula: '="x"&A2', before: "y", now: "x1", relative: null },
      ],
    });
  });

  test("stays readable where every formula is another", async () => {
    const book = change(
      bookOf([{ name: "A", columns: [] }]),
      [
        setCells(
          { sheet: 0, row: 0, column: 0 },
          Array.from({ length: 200 }, (_, row) => [{ formula: `=${row}+1` }]),
        ),
      ],
      ownFunctions,
    );
    const parts = unzipSync(await writeWorkbook({ book, sheets: [], notes: [] }));
    const name = "xl/worksheets/sheet1.xml";
    const xml = strFromU8(parts[name] as Uint8Array).replace(/<v>/g, "<v>-");
    const { out } = await barycell(["recalc", "-"], zipSync({ ...parts, [name]: strToU8(xml) }));
    const lines = out.trimEnd().split("\n");
    expect(lines.length).toBe(41);
    expect(lines.at(-1)).toBe("... and 160 cells in 160 places more; --json lists all of them.");
  });

  test("writes the workbook with the new values, and keeps those it cannot calculate", async () => {
    folder.write("old.xlsx", await tampered((xml) => xml.replace("<v>24</v>", "<v>12</v>").replace('t="e"><f>NOPE(A2)</f><v>#NAME?<', "><f>NOPE(A2)</f><v>7<"))); // biome-ignore format: one file
    const { code } = await barycell(["recalc", at("old.xlsx"), "--out", at("new.xlsx")]);
    expect(code).toBe(4);
    const { book } = await readWorkbookAsStored(readFileSync(at("new.xlsx")));
    expect(valueAt(book, "C2")).toBe(24);
    expect([formulaAt(book, "D2"), valueAt(book, "D2")]).toEqual(["=NOPE(A2)", 7]);
    expect((await barycell(["recalc", at("new.xlsx")])).code).toBe(0);
  });

  test("says what it needs", async () => {
    folder.write("text.xlsx", "name,K\n");
    folder.write("same.xlsx", await targets());
    const said = async (...words: string[]) => {
      const { code, note } = await barycell(["recalc", ...words]);
      return `${code} ${note.replaceAll(folder.path, "").split("\n")[0]}`;
    };
    expect([
      await said(),
      await said(at("same.xlsx"), "--tolerance", "2"),
      await said(at("same.xlsx"), "--out", at("same.xlsx")),
      await said(at("none.xlsx")),
      await said(at("text.xlsx")),
    ]).toEqual([
      "2 barycell recalc: give one workbook, for example targets.xlsx, or - for standard input.",
      '2 barycell recalc: --tolerance is "2"; it is a ratio from 0 to below 1, for example 1e-9.',
      '2 barycell recalc: --out "/same.xlsx" is the workbook itself; name another file, or add --force to replace the workbook.',
      '3 barycell recalc: cannot read "/none.xlsx": there is no such file or folder; check the name.',
      "3 barycell recalc: /text.xlsx: The file is plain text and not a workbook; open it as a table of text (CSV, TSV), whatever its name says.",
    ]);
  });
});
