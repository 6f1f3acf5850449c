import { beforeAll, describe, expect, test } from "vitest";
import type { Cell } from "../../../../src/call/cell.js";
import { demoBook } from "../../../../src/hosts/bench/worker/demo/demoBook.js";
import { columnStatesOf } from "../../../../src/hosts/bench/worker/state/columnStates.js";
import { usualPlanTexts } from "../../../../src/plan/usualPlanTexts.js";
import type { Book } from "../../../../src/sheet/book/book.js";
import { cellOf } from "../../../../src/sheet/book/cellOf.js";
import { listProblems } from "../../../../src/sheet/book/listProblems.js";
import { readColumn } from "../../../../src/sheet/book/readColumn.js";
import { usedColumns, usedRows } from "../../../../src/sheet/book/usedRows.js";
import { checkTable } from "../../../../src/table/checkTable.js";
import { openBook } from "../worker/openTable.js";

let book: Book;

beforeAll(() => {
  book = demoBook().book;
});

const header = (column: number): string => String(cellOf(book, { sheet: 0, row: 0, column }));
const columnNamed = (name: string): number => [...Array(36).keys()].findIndex((column) => header(column) === name);
const at = (row: number, name: string): Cell => cellOf(book, { sheet: 0, row, column: columnNamed(name) });
const rowOf = (planet: string): number =>
  [...Array(61).keys()].findIndex((row) => cellOf(book, { sheet: 0, row, column: 0 }) === planet);

test("sixty planets, seventeen derived columns, and what they assume on a sheet of its own", () => {
  expect([usedRows(book, 0), usedColumns(book, 0)]).toEqual([61, 36]);
  expect(book.sheets.map(({ name }) => name)).toEqual(["Survey", "Assumptions"]);
  expect(columnStatesOf(book, 0).filter(({ derived }) => derived)).toHaveLength(17);
  const planets = Array.from({ length: 60 }, (_, row) => cellOf(book, { sheet: 0, row: row + 1, column: 0 }));
  expect(new Set(planets).size).toBe(60);
});

test("K is that of the formula of the trade, worked out here with a Jupiter on a year's orbit at 28.4329 m/s", () => {
  // Lovis & Fischer 2010, in Exoplanets (ed. Seager), eq. 14; 317.828 earthMass in a jupiterMass: IAU 2015 Resolution B3.
  let compared = 0;
  for (let row = 1; row <= 60; row++) {
    const [period, star, planet, inclination, k] = [
      "Period [d]",
      "Star mass [solMass]",
      "Planet mass [earthMass]",
      "Inclination [deg]",
      "K [m/s]",
    ].map((name) => at(row, name));
    const e = at(row, "Eccentricity") ?? 0;
    if ([period, star, planet, inclination, k, e].some((cell) => typeof cell !== "number")) continue;
    const [P, M, m, i] = [period, star, planet, inclination] as [number, number, number, number];
    const total = M + m / 332_946;
    const sine = Math.sin((i * Math.PI) / 180);
    const expected =
      ((28.4329 * (m / 317.828) * sine) / Math.sqrt(1 - (e as number) ** 2)) *
      total ** (-2 / 3) *
      (P / 365.25) ** (-1 / 3);
    expect(Math.abs((k as number) / expected - 1)).toBeLessThan(1e-4);
    compared++;
  }
  expect(compared).toBeGreaterThan(50);
});

test("every header of it is understood, for its mistakes are in the cells", () => {
  for (const sheet of [0, 1]) {
    expect(columnStatesOf(book, sheet).filter(({ reading }) => reading.is === "problem")).toEqual([]);
  }
});

test("planets of one star stand in one place, within reach of the site, and times come with uncertainties", () => {
  const places = new Map<string, string>();
  for (let row = 1; row <= 60; row++) {
    const star = String(at(row, "Planet")).slice(0, -2);
    const place = `${at(row, "RA [h]")} ${at(row, "Dec [deg]")}`;
    expect(place).toMatch(/^([01]\d|2[0-3]):[0-5]\d:[0-5]\d\.\d [+-][0-7]\d:[0-5]\d:[0-5]\d$/);
    expect(places.get(star) ?? place).toBe(place);
    places.set(star, place);
    for (const name of ["T0 [BJD_TDB]", "T0 sigma [d]", "Period sigma [d]", "Priority", "Exposure [s]"]) {
      expect(at(row, name)).toBeTypeOf("number");
    }
  }
  expect(new Set(places.values()).size).toBe(places.size);
});

test("noise, visits and hours are those of their formulas, with what K leaves uncertain", () => {
  let compared = 0;
  for (let row = 1; row <= 60; row++) {
    const [V, exposure, k, kSigma] = ["Star V [mag]", "Exposure [s]", "K [m/s]", "K sigma [m/s]"].map((name) =>
      at(row, name),
    ) as [number, number, Cell, number];
    if (typeof k !== "number") continue;
    // Photon noise falls with the root of the light: Bouchy, Pepe & Queloz 2001, A&A 374, 733; the floor in quadrature.
    const noise = Math.hypot(0.45 * 10 ** (0.2 * (V - 8)) * Math.sqrt(900 / exposure), 0.3);
    expect(at(row, "Noise [m/s]")).toBeCloseTo(noise, 10);
    // By hand, with the systemic velocity unknown: a visits at one quadrature and b at the other give
    // sigma_K^2 = sigma^2 (a + b) / (4 a b), so that an odd number is worth 1/N less than N; at least 4.
    const exact = (10 * noise) ** 2 / k ** 2;
    let visits = 4;
    while (visits - (visits % 2) / visits < exact) visits++;
    expect(at(row, "Visits")).toBe(visits);
    if (exact > 4) {
      // First order: N goes with K^-2.
      const sigma = at(row, "Visits sigma") as number;
      expect(Math.abs(sigma / ((2 * exact * kSigma) / k) - 1)).toBeLessThan(1e-3);
    }
    expect(at(row, "Hours [h]")).toBeCloseTo((visits * (exposure + 180)) / 3600 / 0.8, 9);
    const share = (at(row, "Hours sigma [h]") as number) / (at(row, "Visits sigma") as number);
    expect(share).toBeCloseTo((exposure + 180) / 3600 / 0.8, 9);
    compared++;
  }
  expect(compared).toBe(56);
});

test("a plan with what is usual has targets, keeps the hours, and loses the one phase that was lost on purpose", async () => {
  const { service } = openBook(book);
  const start = await service.planStart(0);
  expect(start.columns.filter(({ header }) => header === undefined)).toEqual([]);
  expect(start).toMatchObject({ value: "Priority", site: { foundIn: "the sheet Assumptions", latitude: "-25.3 deg" } });
  const { longitude, latitude, height } = start.site!;
  const site = { longitude, latitude, height };
  const dates = { from: "2027-01-01", to: "2027-06-30" };
  const words = {
    ...usualPlanTexts,
    ...site,
    ...dates,
    hours: "60",
    value: "Priority",
    columns: {},
    must: [],
    excluded: [],
  };
  const answer = await service.plan(0, words);
  if (answer.is !== "plan") throw new Error(JSON.stringify(answer));
  const { chosen, leftOut, totals } = answer.plan;
  expect(chosen.length).toBeGreaterThan(20);
  expect(chosen.length + leftOut.length).toBe(60);
  expect(totals.hours).toBeLessThanOrEqual(60);
  expect(chosen.reduce((sum, { hours }) => sum + hours, 0)).toBeLessThanOrEqual(60);
  const lost = leftOut.filter(({ because }) => because.includes("its phase is lost")).map(({ name }) => name);
  expect(lost).toEqual(["Quarry 4 b"]);
});

describe("what is wrong on purpose", () => {
  test("is told by the formulas, each once a column", () => {
    const problems = listProblems(book).filter(({ address }) => /!N\d/.test(address));
    expect(problems.map(({ address, message }) => `${address} ${message}`)).toEqual([
      'Survey!N31 REFLEX: planet mass is "1.09 MJ"; "MJ" has more than one meaning; write "jupiterMass" (Jupiter mass) or "10**6J" (megajoule).',
      "Survey!N33 REFLEX: eccentricity is 1.08; it must be below 1, because only bound orbits repeat; for example 0.05.",
      "Survey!N47 REFLEX: star mass is blank; a mass is needed, for example 1.1 solMass.",
      'Survey!N56 REFLEX: period is "about 18", not a number; a duration is needed, for example 4.23 d.',
    ]);
    expect(at(rowOf("Millrace 5 b"), "Minimum mass sigma [earthMass]")).toMatchObject({ code: "#N/A" });
  });

  test("is found by the check of the table", () => {
    const columns = [...Array(11).keys()].map((column) => ({
      header: header(column),
      column: readColumn(book, { sheet: 0, column, from: 1, to: 61 }),
    }));
    const found = checkTable(columns).flatMap(({ header: of, findings }) =>
      findings.map((finding) => `${of}: ${finding.about} ${"row" in finding ? finding.row + 2 : ""}`),
    );
    expect(found).toEqual([
      "Period [d]: mixed 56",
      "Planet mass [earthMass]: mixed 31",
      "Eccentricity: out of range 33",
    ]);
  });

  test("a Jupiter mass among Earth masses shows where the measured mass is set against it", () => {
    const ratio = columnNamed("Measured over table");
    const far: [Cell, number][] = [];
    for (let row = 1; row <= 60; row++) {
      const value = cellOf(book, { sheet: 0, row, column: ratio });
      if (typeof value === "number" && (value > 2 || value < 0.5)) far.push([at(row, "Planet"), value]);
    }
    expect(far.map(([planet]) => planet)).toEqual(["Lantern 10 b"]);
    // 317.8 earthMass in a jupiterMass, within the uncertainty of the K that was measured.
    expect(Math.abs((far[0]?.[1] ?? 0) / 317.8 - 1)).toBeLessThan(0.08);
  });

  test("masses that carry their own unit, and blank eccentricities, are no mistakes", () => {
    expect(at(rowOf("Lantern 3 c"), "Planet mass [earthMass]")).toBe("1.136 jupiterMass");
    expect(at(rowOf("Lantern 3 c"), "K [m/s]")).toBeTypeOf("number");
    expect(at(rowOf("Anvil 5 b"), "Eccentricity")).toBeNull();
    expect(at(rowOf("Anvil 5 b"), "K [m/s]")).toBeTypeOf("number");
  });
});
