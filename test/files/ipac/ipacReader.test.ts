import { describe, expect, test } from "vitest";
import { read, refusal, rowsOf, sentencesOf } from "../table/read.js";

/** IPAC Table Format Definition (IRSA/IPAC); invented data. */
const table = String.raw`\fixlen = T
\ invented
|  Name |   Period|  id                |Mass       |flag|
|  char |   double|  l                 |r          |i   |
|       |   d     |                    |jupiterMass|    |
|  null |   -99   |                    |null       |    |
  A b      4.25     1234567890123456789 0.5         1
  007      -99      5                   null
  null     1e-7     6                   -0          3
`;

describe("an IPAC table", () => {
  test("units stand in the header, types and nulls are as declared, keywords are kept", () => {
    const file = read(table);
    expect(file.format).toBe("ipac");
    expect(file.header).toEqual(["Name", "Period [d]", "id", "Mass [jupiterMass]", "flag"]);
    expect(file.remarks).toEqual(["fixlen = T", "invented"]);
    expect(rowsOf(file)).toEqual([
      ["A b", 4.25, "1234567890123456789", 0.5, 1],
      ["007", null, "5", null, null],
      [null, 1e-7, "6", -0, 3],
    ]);
    expect(file.findings).toEqual([]);
  });

  test("without types every column is text; without keywords types tell it from delimited text", () => {
    expect(rowsOf(read("\\\n|a |b |\n 1  2\n"))).toEqual([["1", "2"]]);
    expect(read("|a |b |\n|i |r |\n 1  2\n").format).toBe("ipac");
    expect(read("|a |b |\n|1 |x |\n").format).toBe("fixed-width");
  });

  test("a value under a bar is not lost, and told", () => {
    const file = read("|a  |b  |\n|int|int|\n 1   2\n 10021\n");
    expect(rowsOf(file)).toEqual([[1, 2], [100, 21]]); // biome-ignore format: a row a line
    expect(sentencesOf(file)).toEqual([
      '1 line has a word across the place where two columns meet, first line 4, near "10021"; it was cut there: check those rows.',
    ]);
  });

  test.each([
    [
      "bars that do not line up",
      "|a  |b  |\n|int|int|\n|x |y    |\n",
      "the bars of line 3 do not stand under those of the first",
    ],
  ])("%s are refused", (_, text, reason) => {
    expect(refusal(text)).toBe(`The file looks like an IPAC table, but ${reason}; copy it again from where it came.`);
  });
});
