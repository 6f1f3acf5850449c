import { describe, expect, test } from "vitest";
import { barycell } from "./barycell.js";
import { expectGolden } from "./golden.js";

/** Rows of cells, one a line of the text. */
const rowsOf = (text: string) =>
  text
    .trim()
    .split("\n")
    .map((line) => line.split(","));

const table = `Row,P [d],M [solMass],m [jupiterMass],e,v [km/s]
good,4.23,1.1,0.47,0.01,10
e is 1,4.23,1.1,0.47,1,10
no mass,4.23,1.1,0,0.01,10
blank star,4.23,,0.47,0.01,10
negative,-4.23,1.1,0.47,0.01,10
a word,soon,1.1,0.47,0.01,10
a comma,"4,23",1.1,0.47,0.01,10
unknown unit,4.23,1.1,0.47 Mjupp,0.01,10
two meanings,4.23,1.1,0.47 MJ,0.01,10
wrong kind,4.23,1.1,0.47 d,0.01,10
as fast as light,4.23,1.1,0.47,0.01,299792.458
own unit,4.23 d,1.1 Msun,0.47 Mjup,0.01,10 km/s
good,4.23,1.1,0.47,0.01,10
`;

describe.concurrent("inputs in another order than their headers", () => {
  test("are refused, though every header states a unit that fits a number", async () => {
    const words = ["--set", "K [m/s]", "=BARY.REFLEX(C2,B2,D2,E2,,B$1:E$1,G$1)"];
    const { out, note } = await barycell(["fill", "-", ...words], { input: table });
    expect(rowsOf(out.replace('"4,23"', "4.23"))[1]!.at(-1)).toBe("#VALUE!");
    expect(note).toContain(
      'REFLEX: period was given the header B$1 "P [d]", but its own column is headed C$1 "M [solMass]"; give inputs and headers in the same order.',
    );
  });
});

describe.concurrent("a bad row", () => {
  test("spoils itself alone, and what is derived from it", async () => {
    const words = [
      ...["--set", "K [m/s]", "=BARY.REFLEX(B2,C2,D2,E2,,B$1:E$1,G$1)"],
      ...["--set", "z", "=BARY.SHIFT(F2,,F$1)"],
      ...["--set", "twice", "=2*G2"],
    ];
    const { code, out, note } = await barycell(["fill", "-", ...words], { input: table });
    expect(code).toBe(0);
    const rows = rowsOf(out.replace('"4,23"', "4.23"));
    const [amplitude, shift, twice] = rows[1]!.slice(6) as [string, string, string];
    expect(rows[0]!.slice(6)).toEqual(["K [m/s]", "z", "twice"]);
    // Lovis & Fischer 2010, eq. 14, coefficient from memory; 10 km/s over c, to second order (Einstein 1905).
    const expected = (28.4329 / Math.sqrt(1 - 0.01 ** 2)) * 0.47 * 1.1 ** (-2 / 3) * (4.23 / 365.25) ** (-1 / 3);
    expect(Math.abs(Number(amplitude) / expected - 1)).toBeLessThan(1e-3);
    const beta = 10 / 299792.458;
    expect(Math.abs(Number(shift) / (beta + beta ** 2 / 2) - 1)).toBeLessThan(1e-8);
    expect(Number(twice)).toBe(2 * Number(amplitude));
    const good = [amplitude, shift, twice];
    const bad = (error: string) => [error, shift, error];
    expect(rows.slice(1).map(([name, ...cells]) => [name, ...cells.slice(5)])).toEqual([
      ["good", ...good],
      ["e is 1", ...bad("#VALUE!")],
      ["no mass", ...bad("#VALUE!")],
      ["blank star", ...bad("#N/A")],
      ["negative", ...bad("#VALUE!")],
      ["a word", ...bad("#VALUE!")],
      ["a comma", ...bad("#VALUE!")],
      ["unknown unit", ...bad("#VALUE!")],
      ["two meanings", ...bad("#VALUE!")],
      ["wrong kind", ...bad("#VALUE!")],
      ["as fast as light", amplitude, "#VALUE!", twice],
      ["own unit", ...good],
      ["good", ...good],
    ]);
    // An error passed on is listed once, where it came from: 9 of K, as many of what is derived, 1 of the shift.
    expect(note).toContain("; 19 cells need attention.\n");
    expect(note).not.toMatch(/^ {2}I/m);
    expectGolden("fillBadRows", note);
  });

  test("a header that is wrong spoils its column, and is told once for each formula", async () => {
    const input = "P,P [d],m [Mjupp],m [MJ],m [d],m\n4.23,4.23,0.47,0.47,0.47,0.47\n5,5,1,1,1,1\n";
    const mass = (cell: string, headers: string) => `=BARY.STARSPEED(B2,"1.1 solMass",${cell},${headers})`;
    const words = [
      ...["--set", "no unit in the header", '=BARY.STARSPEED(A2,"1.1 solMass","1 Mjup",A$1:C$1)'],
      ...["--set", "unknown unit", mass("C2", '"d;;m [Mjupp]"')],
      ...["--set", "two meanings", mass("D2", '"d;;m [MJ]"')],
      ...["--set", "another kind", mass("E2", '"d;;m [d]"')],
      ...["--set", "no headers", '=BARY.STARSPEED(B2,"1.1 solMass",F2)'],
      ...["--set", "too few headers", mass("F2", "B$1")],
      ...["--set", "v [kg]", mass("F2", '"d;;jupiterMass",M$1')],
      ...["--set", "v [m/ss]", mass("F2", '"d;;jupiterMass",N$1')],
    ];
    const { code, out, note } = await barycell(["fill", "-", ...words], { input });
    expect(code).toBe(0);
    for (const row of rowsOf(out).slice(1)) expect(row.slice(6)).toEqual(Array(8).fill("#VALUE!"));
    expect(note).toMatch(/; 16 cells need attention\.\n/);
    expectGolden("fillBadHeaders", note);
  });
});

describe.concurrent("a circle", () => {
  const input = "x\n1\n2\n";

  test("of a formula that reads its own cell", async () => {
    const { out, note } = await barycell(["fill", "-", "--set", "y", "=B2+1"], { input });
    expect(out).toBe("x,y\n1,#VALUE!\n2,#VALUE!\n");
    expect(note).toMatch(/; 2 cells need attention\.\n {2}B2 and 1 more cell: #VALUE! .*B2 -> B2/);
  });

  test("of two columns: neither keeps a number", async () => {
    const words = ["--set", "y", "=C2+1", "--set", "z", "=B2+1"];
    const { out, note } = await barycell(["fill", "-", ...words], { input });
    expect(out).toBe("x,y,z\n1,#VALUE!,#VALUE!\n2,#VALUE!,#VALUE!\n");
    expect(note).toMatch(/; 4 cells need attention\.\n {2}B2 and 3 more cells: #VALUE! .*B2 -> C2 -> B2/);
  });
});

test("a formula meant for the row of units is doubted aloud", async () => {
  const input = "Star,P\n,d\nA,2\nB,3\n";
  const { note } = await barycell(["fill", "-", "--set", "t [h]", "=BARY.INTO(B2,B$2,C$2)"], { input });
  expectGolden("fillRowOfUnits", note);
});
