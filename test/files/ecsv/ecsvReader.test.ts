import { describe, expect, test } from "vitest";
import { read, refusal, rowsOf, sentencesOf } from "../table/read.js";

/** Astropy Proposal for Enhancement 6 (ECSV), version 1.0; the tables are invented. */
function ecsv(columns: readonly string[], body: string, more: readonly string[] = []): string {
  const head = ["%ECSV 1.0", "---", "datatype:", ...columns.map((column) => `- {${column}}`), ...more];
  return `${head.map((line) => `# ${line}\n`).join("")}${body}`;
}

const planets = ecsv(
  [
    "name: Name, datatype: string, description: 'Star: its name'",
    "name: P, unit: d, datatype: float64, description: Orbital period, meta: {ucd: time.period}",
    "name: M, unit: M_jup, datatype: float32",
    "name: g, unit: dex(cm / s2), datatype: float64",
    "name: n, datatype: int64",
    "name: ok, datatype: bool",
  ],
  'Name P M g n ok\n"A 1" 4.25 0.5 4.4 12 True\n"say ""b""" 1e-7 "" nan 9007199254740993 False\n"" inf -0.0 4 -3 ""\n',
  ["meta: !!omap", "- {name: Invented}", "- comments: [first, second]"],
);

describe("ECSV 1.0", () => {
  test("units, descriptions and UCDs stand in the header and beside it", () => {
    const table = read(planets);
    expect(table.format).toBe("ecsv");
    expect(table.header).toEqual(["Name", "P [d]", "M [jupiterMass]", "g [log(cm/s**2)]", "n", "ok"]);
    expect(table.notes[0]).toMatchObject({ name: "Name", description: "Star: its name", ucd: undefined });
    expect(table.notes[1]).toMatchObject({ name: "P", unit: "d", description: "Orbital period", ucd: "time.period" });
    expect([table.name, table.remarks]).toEqual(["Invented", ["first", "second"]]);
  });

  test("cells are of the declared types; blanks and nan are blank; a long integer makes its column text", () => {
    expect(rowsOf(read(planets))).toEqual([
      ["A 1", 4.25, 0.5, 4.4, "12", true],
      ['say "b"', 1e-7, null, null, "9007199254740993", false],
      [null, "inf", -0, 4, "-3", null],
    ]);
  });

  test("the comma delimiter, and blanks around fields of the other", () => {
    const comma = ecsv(["name: a, datatype: string", "name: b, datatype: int32"], 'a,b\n"x, y",1\n,2\n', [
      "delimiter: ','",
    ]);
    expect(rowsOf(read(comma))).toEqual([["x, y", 1], [null, 2]]); // biome-ignore format: a row a line
    const spaced = ecsv(
      ["name: a, datatype: string", "name: b, datatype: int32"],
      " a   b\n007   1 \n\n# no row\n  x 2\r\n",
    );
    expect(rowsOf(read(spaced))).toEqual([["007", 1], ["x", 2]]); // biome-ignore format: a row a line
  });

  test("a quoted field may hold line breaks", () => {
    const text = ecsv(["name: a, datatype: string", "name: b, datatype: int32"], 'a b\n"one\ntwo" 1\n"open 2\n');
    expect(rowsOf(read(text))).toEqual([["one\ntwo", 1], ['"open', 2]]); // biome-ignore format: a row a line
  });

  test("scalars of the header are texts, whatever YAML would make of them", () => {
    const names = ["no", "1e5", "null", "2024-01-01", "__proto__", "constructor"];
    const text = ecsv(
      names.map((name) => `name: ${name}, datatype: float64`),
      `${names.join(" ")}\n1 2 3 4 5 6\n`,
    );
    expect(read(text).header).toEqual(names);
    expect(({} as Record<string, unknown>).datatype).toBeUndefined();
  });

  test("tags make no objects, and what stands under them is told as it is", () => {
    const text = ecsv(["name: t, datatype: string, subtype: json"], "t\n[1,2]\n", [
      "meta: !!omap",
      "- __serialized_columns__:",
      "    t: !!python/object/apply:os.system {args: [no]}",
      "- keep: !astropy.units.Unit {unit: d}",
    ]);
    expect(rowsOf(read(text))).toEqual([["[1,2]"]]);
    expect(sentencesOf(read(text))).toEqual(['Column "t" holds several values a cell (json); they were read as text.']);
  });

  test("a unit that is not known stays as it was written", () => {
    const table = read(
      ecsv(["name: f, unit: sloths / d, datatype: float64", "name: h, unit: '[x', datatype: float64"], "f h\n1 2\n"),
    );
    expect(table.header).toEqual(["f [sloths / d]", "h [[x]"]);
    expect(table.notes.map(({ unit }) => unit)).toEqual(["sloths / d", "[x"]);
  });

  test("rows of another length are told", () => {
    const text = ecsv(["name: a, datatype: int8", "name: b, datatype: int8"], "a b\n1 2\n3\n4 5 6\n");
    expect(rowsOf(read(text))).toEqual([[1, 2], [3, null], [4, 5]]); // biome-ignore format: a row a line
    expect(sentencesOf(read(text))).toEqual([
      "2 rows have another number of fields than the 2 columns, first row 2 with 1; what is missing is blank, what is too much was left aside.",
    ]);
  });
});

describe("what is no ECSV is refused in a sentence", () => {
  const bomb = Array.from(
    { length: 12 },
    (_, level) => `a${level}: &a${level} [${`*a${level - 1}, `.repeat(level ? 9 : 0)}x]`,
  );
  test.each([
    ["no columns", "# %ECSV 1.0\n# ---\n# meta: {}\na\n1\n", 'its header has no list of columns under "datatype"'],
    ["broken YAML", "# %ECSV 1.0\n# ---\n# datatype: [\na\n1\n", "its header is no YAML"],
    ["no name", ecsv(["datatype: int8"], "a\n1\n"), "its header gives column 1 no name or no datatype"],
    [
      "a delimiter",
      ecsv(["name: a, datatype: int8"], "a\n1\n", ["delimiter: ';'"]),
      "its delimiter is neither a space nor a comma",
    ],
    ["nothing below", ecsv(["name: a, datatype: int8"], ""), "its header is not followed by a line of column names"],
    [
      "other names",
      ecsv(["name: a, datatype: int8"], "b\n1\n"),
      'describes column 1 as "a" and its line of names has "b" there',
    ],
    [
      "aliases without end",
      ecsv(["name: a, datatype: int8"], "a\n1\n", [...bomb, "meta: {x: *a11}"]),
      "its header repeats parts of itself too often or too deep",
    ],
    ["brackets without end", `# %ECSV 1.0\n# ---\n# datatype: ${"[".repeat(50_000)}\na\n`, "its header is no YAML"],
    [
      "a header without end",
      `# %ECSV 1.0\n${`# ${"x".repeat(1000)}\n`.repeat(4300)}a\n`,
      "its header is longer than any description of a table",
    ],
  ])("%s", (_, text, reason) => {
    const message = refusal(text);
    expect(message).toContain(
      `The file begins as ECSV, but ${reason.startsWith("describes") ? "its header " : ""}${reason}`,
    );
    expect(message.length).toBeLessThanOrEqual(250);
  });
});
