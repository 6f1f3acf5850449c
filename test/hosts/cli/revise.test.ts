import { createHash } from "node:crypto";
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
import { expectGolden } from "./golden.js";
import { workFolder } from "./workFolder.js";

const folder = workFolder();
afterAll(() => folder.remove());
const at = (name: string) => `${folder.path}/${name}`;

/** Runs a command line in this process: how it ended, and what it wrote. */
async function barycell(words: readonly string[], input?: string) {
  let out = "";
  let note = "";
  const code = await run(words, {
    input: (async function* () {
      if (input !== undefined) yield new TextEncoder().encode(input);
    })(),
    isScreen: false,
    note(text) {
      note += text;
    },
    async out(text) {
      out += text;
    },
  });
  return { code, out, note: note.replaceAll(`${folder.path}/`, "/") };
}

const targets = `# kept as it is
Target,P [d],Mstar [solMass],Mstar err [solMass],m [jupiterMass],Note
"HD 1, A",4.230,1.10,0.05,0.470,first
HD 2,100.0,0.80,0.04,1.00,"a, b"
HD 3,3000,0.30,0.02,5.0,
`;
const newer = `Target,Mstar [solMass],Mstar err [solMass]
hd 2,0.9,0.03
"HD 1, A",1.1,0.05
HIP 3,0.33,0.02
`;
folder.write("targets.csv", targets);
folder.write("new.csv", newer);
const k = ["--set", "K [m/s]", "=BARY.REFLEX(B2,C2:D2,E2,,,B$1:E$1,G$1)", "--set", "visits", "=(30/G2)^2"];
const usual = ["revise", at("targets.csv"), "--with", at("new.csv"), "--key", "Target", "--alias", "HD 3=HIP 3", ...k];

/** Dates are of the moment. */
const undated = (text: string) => text.replace(/\d{4}-\d\d-\d\dT[\d:.]+Z/g, "DATE");

describe("revise, of a table", () => {
  test("reports in Markdown, with the digest of the file", async () => {
    const { code, out, note } = await barycell([...usual, "--condition", "K >= 50 m/s"]);
    expect({ code, note }).toEqual({ code: 0, note: "" });
    expect(out).toContain(createHash("sha256").update(newer).digest("hex"));
    expectGolden("reviseReport", undated(out));
  });

  test("writes the table with every other character as it was", async () => {
    const report = ["--report", at("report.md"), "--out", at("out.csv")];
    expect(await barycell([...usual, ...report])).toEqual({ code: 0, out: "", note: "" });
    const lines = folder.read("out.csv").split("\n");
    expect(lines.slice(0, 3)).toEqual(["# kept as it is", "Target,P [d],Mstar [solMass],Mstar err [solMass],m [jupiterMass],Note,K [m/s],K sigma [m/s],visits", expect.stringMatching(/^"HD 1, A",4\.230,1\.10,0\.05,0\.470,first,55\.\d+,/)]); // biome-ignore format: one value
    expect(lines[3]).toMatch(/^HD 2,100\.0,0\.9,0\.03,1\.00,"a, b",/);
    expect(lines[4]).toMatch(/^HD 3,3000,0\.33,0\.02,5\.0,,/);
    expect(folder.read("report.md")).toMatch(/^# Revision\n/);
    expect(folder.read("targets.csv")).toBe(targets);
    // What was written is what fill gives for the revised table.
    folder.write("bare.csv", lines.map((line) => line.replace(/(,[^,]*){3}$/, "")).join("\n").replace(/^# kept.*\n/, "")); // biome-ignore format: one call
    const filled = await barycell(["fill", at("bare.csv"), ...k]);
    expect(filled.out.trimEnd()).toBe(lines.slice(1).join("\n").trimEnd());
  });

  test("a second time changes nothing", async () => {
    await barycell([...usual.slice(0, -6), "--out", at("once.csv")]);
    const { code, out } = await barycell(["revise", at("once.csv"), ...usual.slice(2)]);
    expect(code).toBe(0);
    expect(out).toContain('"Mstar \\[solMass\\]": 0 values change.');
    expect(out).toContain("## Changes\n\nNone.\n");
  });

  test("in another form", async () => {
    await barycell([...usual, "--out", at("out.ecsv")]);
    expect(folder.read("out.ecsv")).toMatch(/^# %ECSV/);
    expect(folder.read("out.ecsv")).toContain("\nHD 3,3000,0.33,0.02,5,,");
  });

  test("with a row of units under its header", async () => {
    folder.write("units.csv", "Target;P;Mstar;m\n-;d;solMass;jupiterMass\nA;4.23;1.1;0.47\nB;100;0.8;1\n");
    folder.write("kilo.csv", "Target,Mstar [kg]\nA,2.386e30\n");
    const set = ["--set", "K [m/s]", "=BARY.REFLEX(B3,C3,D3,,,B$2:D$2,E$2)", "--out", at("units2.csv")];
    const words = ["revise", at("units.csv"), "--with", at("kilo.csv"), "--key", "Target", ...set];
    const { code, out } = await barycell([...words, "--condition", "K < 1 km/s"]);
    expect(code).toBe(0);
    expect(out).toContain("| K \\[m/s\\] | 1 |");
    expect(out).toContain('"Mstar \\[solMass\\]" was converted from kg to solMass.');
    // 2.386e30 kg over the mass of the Sun, 1.98841e30 kg (nominal GM of IAU 2015 B3 over G of CODATA 2018), is 1.19996.
    expect(folder.read("units2.csv")).toMatch(/^Target;P;Mstar;m;K \[m\/s\]\n-;d;solMass;jupiterMass;m\/s\nA;4.23;1.1999\d+;0.47;52.2\d+\nB;100;0.8;1;50.7\d+\n$/); // biome-ignore format: one value
  });

  test("answers in JSON", async () => {
    const { code, out } = await barycell([...usual, "--json", "--condition", "K >= 50 m/s"]);
    expect(code).toBe(0);
    const answer = JSON.parse(out);
    expect(answer.matched).toEqual({ exact: 1, folded: 1, aliased: 1, onlyInTable: 0, onlyInRevision: 0, ambiguous: 0 }); // biome-ignore format: one value
    expect(answer.ledger).toMatchObject({ kind: "barycell-ledger", version: 1, sheet: "Table", unshared: null });
    expect(answer.ledger.source.file).toBe("new.csv");
    expect(answer.ledger.entries.map((entry: { header: string; key: string }) => `${entry.header} ${entry.key}`).sort()).toEqual(["K [m/s] HD 2", "K [m/s] HD 3", "Mstar [solMass] HD 2", "Mstar [solMass] HD 3", "Mstar err [solMass] HD 2", "visits HD 2", "visits HD 3"]); // biome-ignore format: one value
  });

  test("a dry run writes no file; a crossing can end with 5", async () => {
    const before = folder.names();
    const words = ["--out", at("dry.csv"), "--report", at("dry.md"), "--dry-run"];
    const { code, out } = await barycell([...usual, ...words, "--fail-on-crossing", "--condition", "K >= 50 m/s"]);
    // K of HD 2 goes with (M + m)^(-2/3) from 50.77 m/s to 46.94 m/s (Lovis & Fischer 2010, eq. 14, from 0.8 to 0.9).
    expect(code).toBe(5);
    expect(out).toContain("| lost | HD 2 | 50.77 | 46.94 |");
    expect(folder.names()).toEqual(before);
    expect((await barycell([...usual, "--dry-run", "--fail-on-crossing", "--condition", "K >= 1 m/s"])).code).toBe(0);
  });

  test("either table comes from standard input", async () => {
    const words = ["--key", "Target"];
    expect((await barycell(["revise", "-", "--with", at("new.csv"), ...words], targets)).code).toBe(0);
    expect((await barycell(["revise", at("targets.csv"), "--with", "-", ...words], newer)).code).toBe(0);
  });
});

describe("revise, of a workbook", () => {
  test("keeps its formulas and calculates them", async () => {
    const book = change(
      bookOf([{ name: "Targets", columns: [] }]),
      [
        setCells({ sheet: 0, row: 0, column: 0 }, [["Target", "Mstar [solMass]", "twice [solMass]"], ["A", 1], ["B", 2]]), // biome-ignore format: one edit
        fillFormula({ sheet: 0, column: 2, from: 1, to: 3 }, "=B2*2"),
      ],
      ownFunctions,
    );
    folder.write("book.xlsx", await writeWorkbook({ book, sheets: [], notes: [] }));
    folder.write("masses.csv", "Target,Mstar [solMass]\nB,2.5\n");
    const words = ["revise", at("book.xlsx"), "--with", at("masses.csv"), "--key", "Target"];
    const { code, out, note } = await barycell([...words, "--out", at("revised.xlsx")]);
    expect({ code, note }).toEqual({ code: 0, note: "" });
    expect(out).toContain("| B | twice \\[solMass\\] | 4 | 5 | +1 | +25 |  | Mstar \\[solMass\\] |  |");
    const { book: written } = await readWorkbookAsStored(readFileSync(at("revised.xlsx")));
    const notes = await barycell([...words, ...k]);
    expect(notes).toMatchObject({ code: 2, out: "" });
    expect(notes.note).toContain(
      "barycell revise: a workbook has its own formulas; --set goes with tables of other forms.",
    );
    expect([valueAt(written, "C2"), valueAt(written, "C3"), formulaAt(written, "C3")]).toEqual([2, 5, "=B3*2"]);
  });
});

test("revise tells of a workbook whose values are not those of its formulas", async () => {
  const parts = unzipSync(new Uint8Array(readFileSync(at("book.xlsx"))));
  const name = "xl/worksheets/sheet1.xml";
  const xml = strFromU8(parts[name] as Uint8Array).replace(/(<c r="C3"(?:(?!<c ).)*<v>)4</s, (_, cell) => `${cell}40<`);
  folder.write("stale.xlsx", zipSync({ ...parts, [name]: strToU8(xml) }));
  const { code, out, note } = await barycell([
    "revise",
    at("stale.xlsx"),
    "--with",
    at("masses.csv"),
    "--key",
    "Target",
  ]);
  expect({ code, note }).toEqual({
    code: 0,
    note: "1 value in the workbook was not what its formulas give; the ledger begins with what they give. barycell recalc lists them.\n",
  });
  expect(out).toContain("| B | twice \\[solMass\\] | 4 | 5 | +1 | +25 |");
});

describe("revise, where something is wrong", () => {
  folder.write("empty.csv", "");
  folder.write("headers.csv", "Target,Mstar [solMass]\n");
  folder.write("named.csv", "Name,Mstar [solMass]\nHD 2,1\n");
  folder.write("others.csv", "Target,Mstar [solMass]\nX,1\n");
  folder.write("kinds.csv", "Target,Mstar [d]\nHD 2,1\n");
  folder.write("twice.csv", "Target,Mstar [solMass]\nHD 2,1\nHD 2,2\nX,1\n");
  const words = (name: string, ...more: string[]) => ["revise", at("targets.csv"), "--with", at(name), "--key", "Target", ...more]; // biome-ignore format: one line

  test.each<readonly [readonly string[], number, string]>([
    [
      ["revise", at("targets.csv")],
      2,
      'barycell revise: give one table, the revised one and the column that names the rows: targets.csv --with new.csv --key "Target".',
    ],
    [
      ["revise", "-", "--with", "-", "--key", "Target"],
      2,
      "barycell revise: only one of the tables can come from standard input.",
    ],
    [words("new.csv", "--show", "0"), 2, 'barycell revise: --show is "0"; it is a number of changes, for example 20.'],
    [
      words("new.csv", "--alias", "HD 3"),
      2,
      'barycell revise: --alias is "HD 3"; write OLD=NEW, for example "HD 1=HIP 1234".',
    ],
    [
      words("new.csv", "--condition", "K >= 1"),
      2,
      'barycell revise: the condition "K >= 1" names "K", which is no column; the table has "Target", "P [d]", "Mstar [solMass]" and 3 more.',
    ],
    [
      words("new.csv", "--out", at("targets.csv")),
      2,
      'barycell revise: --out "/targets.csv" is the table itself; name another file, or add --force to replace the table.',
    ],
    [
      words("new.csv", "--report", at("new.csv")),
      2,
      'barycell revise: --report "/new.csv" is read or written already; name another file.',
    ],
    [
      words("new.csv", "--report", at("x.csv"), "--out", at("x.csv")),
      2,
      'barycell revise: --report "/x.csv" is read or written already; name another file.',
    ],
    [
      words("new.csv", "--out", at("new.csv"), "--force"),
      2,
      'barycell revise: --out "/new.csv" is read or written already; name another file.',
    ],
    [
      words("none.csv"),
      3,
      'barycell revise: cannot read "/none.csv": there is no such file or folder; check the name.',
    ],
    [
      ["revise", at("none.csv"), "--with", at("new.csv"), "--key", "Target"],
      3,
      'barycell revise: cannot read "/none.csv": there is no such file or folder; check the name.',
    ],
    [words("empty.csv"), 3, "barycell revise: /empty.csv: The file is empty"],
    [words("headers.csv"), 2, "barycell revise: the revision has no rows."],
    [words("named.csv"), 2, 'barycell revise: the revision has no column "Target"; it has "Name", "Mstar".'],
    [
      words("others.csv"),
      2,
      'barycell revise: no row of the revision is in the table; the first is "X" in the revision and "HD 1, A" in the table. Name the column that both share, or give aliases.',
    ],
  ])("%j", async (line, code, first) => {
    const answer = await barycell(line);
    expect({ code: answer.code, out: answer.out }).toEqual({ code, out: "" });
    expect(answer.note).toContain(first);
  });

  test("wrong kinds are left aside, and end with 1 where nothing is left", async () => {
    const { code, out } = await barycell(words("kinds.csv"));
    expect(code).toBe(1);
    expect(out).toContain("No column of the revision goes with one of the table.");
    expect(out).toContain("holds a duration and");
  });

  test("repeated keys and keys of one side are told", async () => {
    const { code, out } = await barycell(words("twice.csv"));
    expect(code).toBe(0);
    expect(out).toContain(
      '- 1 key of the revision stands in several rows that differ: "HD 2"; none of them was taken.',
    );
    expect(out).toContain('- 1 row of the revision is not in the table and was left aside: "X".');
    expect(out).toContain('- 2 rows of the table are not in the revision and stay as before: "HD 1, A", "HD 3".');
  });
});
