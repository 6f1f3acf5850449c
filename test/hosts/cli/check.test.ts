import { describe, expect, test } from "vitest";
import { barycell } from "./barycell.js";
import { expectGolden } from "./golden.js";

const check = (input: string, ...words: string[]) => barycell(["check", "-", ...words], { input });

const good = "Name,P [d],P_err [d],Mass [Mjup],e\nHD 1,4.23,0.01,0.47,0.01\nx,,,1,\n";
const bad = `<VOTABLE version="1.4"><RESOURCE><TABLE name="invented"><FIELD name="col1" datatype="double" unit="d" ucd="time.period"><DESCRIPTION>How long</DESCRIPTION></FIELD>
<FIELD name="Mass" datatype="double" unit="'sloth'"/><FIELD name="e" datatype="double"/><FIELD name="s" datatype="double" arraysize="2"/><DATA><TABLEDATA>
<TR><TD>4.2</TD><TD>1</TD><TD>1.5</TD><TD>1 2</TD></TR></TABLEDATA></DATA></TABLE></RESOURCE></VOTABLE>`;

describe("check", () => {
  test("a table with nothing to look at", async () => {
    const { code, out, note } = await check(good);
    expect({ code, note }).toEqual({ code: 0, note: "" });
    expectGolden("checkGood", out);
  });

  test("a table with something to look at exits 1", async () => {
    const { code, out, note } = await check(bad);
    expect({ code, note }).toEqual({ code: 1, note: "" });
    expectGolden("checkBad", out);
  });

  test("the same as JSON", async () => {
    const { code, out } = await check(bad, "--json");
    expect(code).toBe(1);
    const answer = JSON.parse(out);
    expect(answer).toMatchObject({ format: "votable", name: "invented", rows: 1 });
    expect(answer.columns[0]).toEqual({
      column: "A",
      header: "col1 [d]",
      name: "col1",
      quantity: "period",
      uncertainty: false,
      unit: "d",
      ucd: "time.period",
      description: "How long",
      numbers: 1,
      texts: 0,
      blanks: 0,
    });
    expect(
      answer.findings.map(({ column, about }: { column: string | null; about: string }) => [column, about]),
    ).toEqual([
      [null, "array-column"],
      ["B", "unit problem"],
      ["C", "out of range"],
    ]);
    expect(JSON.parse((await check(good, "--json")).out).findings).toEqual([]);
  });

  test("one table of several, and one that is not there", async () => {
    const two = bad.replace(
      "</TABLE>",
      '</TABLE><TABLE name="two"><FIELD name="n" datatype="int"/><DATA><TABLEDATA/></DATA></TABLE>',
    );
    expect(JSON.parse((await check(two, "--json", "--table", "two")).out)).toMatchObject({ name: "two", rows: 0 });
    expect(await check(two, "--table", "three")).toEqual({
      code: 3,
      out: "",
      note: 'barycell check: -: The VOTable holds no table "three"; it holds "invented", "two".\n',
    });
  });

  test("no table, or two", async () => {
    for (const words of [["check"], ["check", "a", "b"]]) {
      const note =
        "barycell check: give one table, for example targets.csv, or - for standard input.\nbarycell check --help tells more.\n";
      expect(await barycell(words)).toEqual({ code: 2, out: "", note });
    }
  });
});
