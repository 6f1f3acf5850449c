import { readFileSync } from "node:fs";
import { afterAll, beforeAll, describe, expect, test } from "vitest";
import { readTable } from "../../kernel/table.js";
import { barycell } from "./barycell.js";
import { workFolder } from "./workFolder.js";

const file = new URL("../../published/planets.csv", import.meta.url);

/**
 * Columns of the file: B period, C eccentricity, D K, E star mass, F inclination, G and H the mass in jupiterMass or
 * earthMass, then the half units. A blank inclination means that the printed mass is the minimum mass.
 */
const inclination = 'IF(F2="","90 deg",F2)';
const mass = 'IF(G2="",H2&" earthMass",G2&" jupiterMass")';
const printed = '"m/s;d;solMass;1"';
const sets: readonly (readonly [header: string, formula: string])[] = [
  ["Minimum mass [jupiterMass]", `=BARY.MINMASS(D2,B2,E2,C2,${printed},R$1)`],
  ["Minimum mass [earthMass]", `=BARY.MINMASS(D2,B2,E2,C2,${printed},S$1)`],
  ["Planet mass [jupiterMass]", `=BARY.PLANETMASS(D2,B2,E2,${inclination},C2,"m/s;d;solMass;deg;1",T$1)`],
  ["Planet mass [earthMass]", `=BARY.PLANETMASS(D2,B2,E2,${inclination},C2,"m/s;d;solMass;deg;1",U$1)`],
  ["K of the printed mass [m/s]", `=BARY.REFLEX(B2,E2,${mass},C2,${inclination},"d;solMass;;;deg",V$1)`],
  ["K of the mass from K [m/s]", `=BARY.REFLEX(B2,E2,T2,C2,${inclination},"d;solMass;jupiterMass;;deg",W$1)`],
];

const folder = workFolder();
afterAll(folder.remove);

interface Planet {
  readonly name: string;
  readonly cell: (header: string) => number;
  readonly unit: "jupiterMass" | "earthMass";
  readonly isInclined: boolean;
}

let planets: Planet[] = [];
let ended: Awaited<ReturnType<typeof barycell>>;

beforeAll(async () => {
  const words = ["fill", "planets.csv", ...sets.flatMap(([header, formula]) => ["--set", header, formula])];
  folder.write("planets.csv", readFileSync(file));
  ended = await barycell([...words, "--out", "out.csv"], { folder: folder.path });
  planets = readTable(new URL(`file://${folder.path}/out.csv`)).map((row) => ({
    name: row.Planet as string,
    cell: (header) => Number(row[header]),
    unit: row["Mass [jupiterMass]"] === "" ? "earthMass" : "jupiterMass",
    isInclined: row["Inclination [deg]"] !== "",
  }));
});

/**
 * By what part of itself the mass moves when each printed value moves by half a unit of its last digit, all against
 * us: m sin i is near to proportional to K P^(1/3) M^(2/3) (1 - e^2)^(1/2); 1 % more covers the planet's own part in
 * the total mass, which is below 1 % in every row.
 */
function allowance({ cell, unit, isInclined }: Planet): number {
  const part = (name: string, of: string) => cell(`${name} half unit${of}`) / cell(`${name}${of}`);
  const e = cell("Eccentricity");
  const tilt = cell("Inclination [deg]") * (Math.PI / 180);
  const inputs =
    part("K", " [m/s]") +
    part("Period", " [d]") / 3 +
    (2 / 3) * part("Star mass", " [solMass]") +
    (e / (1 - e ** 2)) * cell("Eccentricity half unit") +
    (isInclined ? (cell("Inclination half unit [deg]") * (Math.PI / 180)) / Math.abs(Math.tan(tilt)) : 0);
  return 1.01 * inputs + part("Mass", ` [${unit}]`);
}

const off = (found: number, expected: number) => Math.abs(found / expected - 1);

describe("the published planets, filled", () => {
  test("all rows are answered, the file's own text is kept", () => {
    expect(ended.code).toBe(0);
    expect(ended.out).toBe("");
    expect(ended.note).toMatch(
      /^15 rows; 6 columns added \(R "Minimum mass \[jupiterMass\]", .*; no cell needs attention\.\n$/,
    );
    const before = readFileSync(file, "utf8").split("\n");
    const after = folder.read("out.csv").split("\n");
    expect(after.length).toBe(before.length);
    before.forEach((line, index) => {
      if (line === "" || line.startsWith("#")) expect(after[index]).toBe(line);
      else expect(after[index]!.startsWith(`${line},`)).toBe(true);
    });
  });

  test("the masses are the printed ones, within the rounding of what was printed", () => {
    expect(planets.length).toBe(15);
    for (const planet of planets) {
      const { name, cell, unit } = planet;
      expect(off(cell(`Planet mass [${unit}]`), cell(`Mass [${unit}]`)), name).toBeLessThanOrEqual(allowance(planet));
    }
  });

  test("where no inclination was printed the minimum mass is the mass, else it is sin i of it", () => {
    for (const { name, cell, isInclined } of planets) {
      const sine = isInclined ? Math.sin(cell("Inclination [deg]") * (Math.PI / 180)) : 1;
      for (const unit of ["jupiterMass", "earthMass"]) {
        const ratio = cell(`Minimum mass [${unit}]`) / cell(`Planet mass [${unit}]`);
        // Through the planet's own part in the total mass, at most 1 % here, the ratio is not sin i to the last digit.
        expect(off(ratio, sine), name).toBeLessThan(isInclined ? 0.01 * (1 - sine) + 1e-12 : 1e-12);
      }
    }
  });

  test("a jupiterMass is 317.828 earthMass", () => {
    // IAU 2015 Resolution B3: 1.2668653e17 / 3.986004e14.
    for (const { cell } of planets) {
      const ratio = cell("Planet mass [earthMass]") / cell("Planet mass [jupiterMass]");
      expect(off(ratio, 1.2668653e17 / 3.986004e14)).toBeLessThan(1e-14);
    }
  });

  test("the printed mass gives the printed K, and the mass from K gives K back", () => {
    for (const planet of planets) {
      const { name, cell } = planet;
      expect(off(cell("K of the printed mass [m/s]"), cell("K [m/s]")), name).toBeLessThanOrEqual(allowance(planet));
      expect(off(cell("K of the mass from K [m/s]"), cell("K [m/s]")), name).toBeLessThan(1e-13);
    }
  });
});
