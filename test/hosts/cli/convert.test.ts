import { existsSync } from "node:fs";
import { afterAll, describe, expect, test } from "vitest";
import { barycell } from "./barycell.js";
import { workFolder } from "./workFolder.js";

const folder = workFolder();
afterAll(() => folder.remove());
const convert = (...words: string[]) => barycell(["convert", ...words], { folder: folder.path });

const csv = 'Name,P [d],Mass [Mjup],id\n"=1+1",4.25,0.47,007\n\u03b1,,1,1234567890123456789\n';
folder.write("in.csv", csv);

describe("convert", () => {
  test("to every form and back gives the same table", async () => {
    for (const name of ["a.ecsv", "a.xml", "a.vot", "a.tsv", "a.xlsx"]) {
      expect(await convert("in.csv", name)).toEqual({ code: 0, out: "", note: "" });
      const back = await convert(name, "-", "--to", "csv");
      expect({ name, ...back, note: "" }).toEqual({
        name,
        code: 0,
        note: "",
        // Units come back as VOUnits writes them where the form holds them apart, and formulas with their apostrophe.
        out: csv
          .replace("=1+1", "'=1+1")
          .replace('"', "")
          .replace('"', "")
          .replace("Mjup", /tsv|xlsx/.test(name) ? "Mjup" : "jupiterMass"),
      });
    }
  });

  test("BINARY2 by its name, standard input and output", async () => {
    const { code, out } = await barycell(["convert", "-", "-", "--to", "votable-binary2"], { input: csv });
    expect(code).toBe(0);
    expect(out).toContain('<BINARY2><STREAM encoding="base64">');
    const back = await barycell(["convert", "-", "-", "--to=tsv", "--units=row"], { input: out });
    expect(back.out).toBe(
      "Name\tP\tMass\tid\n\td\tjupiterMass\t\n'=1+1\t4.25\t0.47\t007\n\u03b1\t\t1\t1234567890123456789\n",
    );
  });

  test.each([
    ["header", "P [d],v [m/s]\n4.25,2\n"],
    ["row", "P,v\nd,m/s\n4.25,2\n"],
  ])("--units %s", async (units, out) => {
    for (const input of ["P,v\nd,m/s\n4.25,2\n", "P (days),v [m s-1]\n4.25,2\n"]) {
      expect(await barycell(["convert", "-", "-", "--to", "csv", "--units", units], { input })).toEqual({
        code: 0,
        out,
        note: "",
      });
    }
  });

  test("what the new form cannot hold, and what is odd about the file, are told", async () => {
    const input =
      "# %ECSV 1.0\n# ---\n# datatype:\n# - {name: id, datatype: string, description: d}\n# - {name: v, datatype: string, subtype: json}\nid v\n12 [1]\n";
    const { code, note } = await barycell(["convert", "-", "-", "--to", "csv"], { input });
    expect({ code, note }).toEqual({
      code: 0,
      note: [
        'Column "v" holds several values a cell (json); they were read as text.',
        "Delimited text has no place for what is said of 1 column (descriptions, UCDs); ECSV and VOTable keep them.",
        'Column "id" has 1 text that reads as another kind of cell in delimited text, first "12"; ECSV and VOTable keep it as text.',
        "",
      ].join("\n"),
    });
  });

  test("a file of another kind is refused, and nothing is written", async () => {
    folder.write("table.csv", Uint8Array.from([0x1f, 0x8b, 8, 0, 0, 0, 0, 0, 0, 3, 1, 2, 3, 4, 5, 6, 7]));
    expect(await convert("table.csv", "b.ecsv")).toEqual({
      code: 3,
      out: "",
      note: "barycell convert: table.csv: The file is packed with gzip, which is not read; unpack it first.\n",
    });
    expect(existsSync(`${folder.path}/b.ecsv`)).toBe(false);
  });

  test.each([
    [[], "give the table and where to write it, for example planets.xml planets.csv."],
    [
      ["in.csv", "a.txt"],
      '"a.txt" does not tell which form to write; add --to with one of csv, tsv, ecsv, votable, votable-binary2, xlsx.',
    ],
    [
      ["in.csv", "a.csv", "--to", "fits"],
      '--to is "fits"; it is one of csv, tsv, ecsv, votable, votable-binary2, xlsx.',
    ],
    [["in.csv", "a.csv", "--units", "below"], '--units is "below"; it is row, header or ecsv.'],
    [
      ["in.csv", "a.xml", "--units", "row"],
      "--units row does not go with votable, which has a place of its own for units; leave it out.",
    ],
    [["in.csv", "in.csv"], 'OUT "in.csv" is the input itself; name another file, or add --force to replace the input.'],
  ])("%j cannot be understood", async (words, message) => {
    const note = `barycell convert: ${message}\nbarycell convert --help tells more.\n`;
    expect(await convert(...words)).toEqual({ code: 2, out: "", note });
  });
});

describe("fill reads and writes the other forms too", () => {
  const set = ["--set", "P2 [h]", '=BARY.INTO(B2,B$1,"h")'];

  test("a table of another form comes out in its own", async () => {
    await convert("in.csv", "c.xml");
    const { code, out } = await barycell(["fill", "c.xml", ...set], { folder: folder.path });
    expect(code).toBe(0);
    expect(out).toContain('<FIELD name="P2" datatype="double" unit="h"/>');
    expect(out).toContain("<TD>007</TD><TD>102</TD></TR>");
  });

  test("or in that of the output's name; delimited text keeps its own", async () => {
    const { code } = await barycell(["fill", "in.csv", ...set, "--out", "d.ecsv"], { folder: folder.path });
    expect(code).toBe(0);
    expect(folder.read("d.ecsv")).toContain('# - {name: "P2", unit: "h", datatype: float64}');
    const { out } = await barycell(["fill", "in.csv", ...set], { folder: folder.path });
    expect(out.split("\n")[1]).toBe('"=1+1",4.25,0.47,007,102');
  });

  test("a text that could be taken for a formula has an apostrophe in a column that is added", async () => {
    const { out } = await barycell(["fill", "in.csv", "--set", "T", '="="&D2'], { folder: folder.path });
    expect(out.split("\n")[1]).toBe('"=1+1",4.25,0.47,007,\'=007');
  });
});
