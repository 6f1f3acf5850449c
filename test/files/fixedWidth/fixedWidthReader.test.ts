import { describe, expect, test } from "vitest";
import { read, rowsOf, sentencesOf } from "../table/read.js";

/** Common practice, no source: how programs print tables that say where their columns stand. */
describe("a fixed-width table", () => {
  const rows = [
    ["HD 1", 4.25, "007"],
    ["x", null, "A 2"],
  ];

  test.each([
    [
      "a rule under the names",
      "# a remark\nName  Period     Id\n---- -------  -----\nHD 1    4.25    007\nx              A 2\n",
    ],
    [
      "a frame",
      "==== ======= =====\nName Period  Id\n==== ======= =====\nHD 1 4.25    007\nx            A 2\n==== ======= =====\n",
    ],
    ["bars", "| Name | Period |  Id |\n| HD 1 |   4.25 | 007 |\n| x    |        | A 2 |\n"],
    [
      "bars and a rule",
      "| Name | Period | Id  |\n|------|-------:|-----|\n| HD 1 |   4.25 | 007 |\n| x    |        | A 2 |\n",
    ],
    [
      "crosses",
      "+------+--------+-----+\n| Name | Period | Id  |\n+------+--------+-----+\n| HD 1 | 4.25   | 007 |\n| x    |        | A 2 |\n+------+--------+-----+\n",
    ],
  ])("%s", (_, text) => {
    const file = read(text);
    expect([file.format, file.header, rowsOf(file), file.findings]).toEqual([
      "fixed-width",
      ["Name", "Period", "Id"],
      rows,
      [],
    ]);
  });

  test("units under the names, above the rule or below it", () => {
    for (const head of ["Name P\n     d\n---- ---\n", "Name P\n---- ---\n     d\n"]) {
      const file = read(`${head}x    4.2\n`);
      expect([file.header, file.unitsRow, rowsOf(file)]).toEqual([["Name", "P"], ["", "d"], [["x", 4.2]]]);
    }
  });

  test("a word across two columns is cut where they meet, and told", () => {
    const file = read("a   b\n--- ---\n1   2\nlong word\n");
    expect(rowsOf(file)).toEqual([[1, 2], ["long", "word"]]); // biome-ignore format: a row a line
    expect(sentencesOf(read("a   b\n--- ---\n1   2\nlonger word\n"))).toEqual([
      '1 line has a word across the place where two columns meet, first line 4, near "longer word"; it was cut there: check those rows.',
    ]);
  });

  test.each(["a,b\n--,--\n", "a\tb\n--\t--\n", "name\n----\nx\n", "a b\n1 2\n"])("%j is delimited text", (text) => {
    expect(read(text).format).toBe("delimited");
  });
});
