import { describe, expect, test } from "vitest";
import type { Cell } from "../../src/call/cell.js";
import { cellAt, columnOf } from "../../src/call/column.js";
import { night } from "../../src/functions/quantities.js";
import { type Plan, type PlanRequest, planSteps } from "../../src/plan/plan.js";
import { type PlanTable, type PlanWish, planTable } from "../../src/plan/planTable.js";
import { readOption } from "../../src/plan/readOption.js";
import { readSite } from "../../src/plan/readSite.js";
import { tellPlan } from "../../src/plan/tellPlan.js";
import { visitTable } from "../../src/plan/visitTable.js";
import { runAll, runWatched } from "../../src/plan/watch.js";
import type { TableColumn } from "../../src/table/checkTable.js";

const deg = Math.PI / 180;
const header =
  "Target,RA [h],Dec [deg],Period [d],Period sigma [d],T0 [BJD_TDB],T0 sigma [d],Visits,Exposure [s],Overhead [s],Priority,e,omega [deg]";
/** An invented survey. */
const lines = [
  "Lantern 1 b,10:01:30,-29:12:00,3.0821,0.00002,2460310.412,0.001,12,900,300,5,0.012,90",
  "Lantern 1 c,10:01:30,-29:12:00,41.7,0.002,2460322.05,0.004,16,900,300,3,0.11,40",
  "Lantern 3 b,14:30:00,-5:10:00,8.944,0.0001,2460111.871,0.002,24,1200,300,4,,",
  "Lantern 4 b,16:45:10,12:00:00,1.2207,0.00001,2460200.1,0.0005,30,1800,300,4,0,",
  "Lantern 5 b,3:20:00,75:00:00,19.32,0.001,2460101.3,0.01,10,900,300,5,0.2,10",
  "Lantern 6 b,12:00:00,-40:00:00,,0.1,2460101.3,0.01,10,900,300,5,0.2,10",
  "Quarry 2 b,7:30:00,-20:00:00,5.365,0.0002,2460300.25,0.001,14,900,300,1,0.3,",
];
const cellOf = (text: string): Cell => (text === "" ? null : Number.isFinite(Number(text)) ? Number(text) : text);

function tableOf(head: string, rows: readonly string[]): TableColumn[] {
  return head.split(",").map((header, index) => ({
    header,
    column: columnOf(rows.map((row) => cellOf(row.split(",")[index]!))),
  }));
}

const wish: PlanWish = { value: "Priority", named: new Map(), phases: "quadrature", efficiency: 1 };
const survey = tableOf(header, lines);

function read(table: readonly TableColumn[] = survey, change: Partial<PlanWish> = {}): PlanTable {
  const found = planTable(table, { ...wish, ...change });
  if ("problem" in found) throw new Error(found.problem);
  return found;
}

function problemOf(table: readonly TableColumn[], change: Partial<PlanWish> = {}): string {
  const found = planTable(table, { ...wish, ...change });
  return "problem" in found ? found.problem : "no problem";
}

const request = (change: Partial<PlanRequest> = {}): PlanRequest => ({
  table: read(),
  budget: 30,
  must: [],
  excluded: [],
  site: { longitude: -70.7345 * deg, latitude: -29.2584 * deg, height: 2400 },
  // 2027-02-01 to 2027-05-31.
  from: 9892.5,
  to: 10011.5,
  limits: { airmass: 2, sunBelow: -18 * deg, phaseWidth: 0.1, moonDistance: 0, perNight: 1, gap: 0 },
  ...change,
});
const plan = (change: Partial<PlanRequest> = {}) => runAll(planSteps(request(change)));

describe("a table of targets", () => {
  test("is read by the quantities of its columns", () => {
    const { rows, notes } = read();
    const [first] = rows;
    expect(first).toMatchObject({ name: "Lantern 1 b", value: 5, row: 0 });
    // 12 x 20 min; 10 h 1 min 30 s = 150.375 deg; 2460310.412 - 2451545.
    expect(first!.hours).toBeCloseTo(4, 12);
    expect(first!.planned).toMatchObject({
      visits: 12,
      periodError: expect.closeTo(0.00002, 15),
      referenceError: 0.001,
    });
    expect(first!.planned.rightAscension / deg).toBeCloseTo(150.375, 10);
    expect(first!.planned.declination / deg).toBeCloseTo(-29.2, 10);
    expect(first!.planned.period).toBeCloseTo(3.0821, 12);
    expect(first!.planned.reference).toBeCloseTo(8765.412, 8);
    expect(first!.planned.exposure * 86400).toBeCloseTo(900, 9);
    expect(notes).toEqual(["Hours are visits times exposure and overhead."]);
  });

  test("a circle has its quadratures at 1/4 and 3/4, and needs no omega", () => {
    expect(read().rows.find(({ name }) => name === "Lantern 3 b")!.planned.phases).toEqual([0.25, 0.75]);
  });

  test("rows that cannot be planned are told with their reason", () => {
    expect(read().leftOut).toEqual([
      { row: 5, name: "Lantern 6 b", because: "period is blank; a duration is needed, for example 4.23 d." },
      { row: 6, name: "Quarry 2 b", because: "omega is blank; an angle is needed, for example 58 deg." },
    ]);
    const spoilt = tableOf(header, [
      "A,10:01:30,-29:12:00,3.0821,0,2460310.412,0.001,12,900,300,high,0,",
      "B,10:01:30,-29:12:00,3.0821,0,2460310.412,0.001,12,900,300,,0,",
      "C,10:01:30,-95,3.0821,0,2460310.412,0.001,12,900,300,1,0,",
      ",10:01:30,-29:12:00,3.0821,0,2460310.412,0.001,0,900,300,1,0,",
      ",,,,,,,,,,,,",
    ]);
    expect(read(spoilt).leftOut.map(({ name, because }) => `${name}: ${because}`)).toEqual([
      'A: its value, in the column "Priority", is "high", not a number; give a number.',
      'B: its value, in the column "Priority", is blank; give a number.',
      "C: dec is -95 deg; it must be at least -90 deg, because the celestial poles stand at 90 deg; for example -30 deg.",
      "row 4: visits is 0; it must be at least 1, because less than one visit is none; for example 24.",
    ]);
  });

  test("of any phase needs no ephemeris, and what it has is told where it can be read", () => {
    expect(read(survey, { phases: [] }).leftOut).toEqual([]);
    const bare = tableOf("Star,RA [deg],Dec [deg],Visits,Exposure [min],Worth", ["X,10,-20,3,10,1"]);
    const { rows, notes } = read(bare, { phases: [], value: "Worth" });
    expect(rows[0]!.planned).toMatchObject({ visits: 3, phases: [] });
    expect(notes).toContain("No column of overhead was recognised; it counts as 0.");
  });

  test("a reference time of another clock is refused", () => {
    const utc = tableOf(header.replace("BJD_TDB", "JD_UTC"), lines.slice(0, 1));
    expect(read(utc).leftOut[0]!.because).toBe(
      "reference time is in JD_UTC; BJD_TDB is needed; BARYTIME turns JD_UTC into it.",
    );
  });

  test("hours of its own go before those of the visits, which cost more where time is lost", () => {
    const own = tableOf(`${header},Hours [h]`, [`${lines[0]},7.5`]);
    expect(read(own).rows[0]!.hours).toBeCloseTo(7.5, 12);
    expect(read(survey, { efficiency: 0.8 }).rows[0]!.hours).toBeCloseTo(5, 12);
  });

  test("columns can be named", () => {
    const odd = tableOf(header.replace("Period [d]", "Cycle [d]").replace("Target", "Label"), lines.slice(0, 1));
    expect(problemOf(odd)).toBe(
      'no column of period was recognised; head it for example "period [d]", or say which column it is.',
    );
    expect(read(odd, { named: new Map([["period", "Cycle [d]"]]), name: "Label" }).rows[0]!.name).toBe("Lantern 1 b");
  });

  test.each([
    [{ value: "Prioritty" }, 'no column is headed "Prioritty"; did you mean "Priority"?'],
    [{ name: "Label" }, /^no column is headed "Label"; there are "Target", "RA \[h\]", /],
    [{ named: new Map([["perod", "Cycle"]]) }, 'a plan reads no column of "perod"; did you mean "period"?'],
    [{ named: new Map([["period", "P [d]"]]) }, /^no column is headed "P \[d\]"; /],
    [{ named: new Map([["mass", "Mp"]]) }, /^a plan reads no column of "mass"; it reads RA, dec, period, /],
  ])("%j is told", (change, problem) => {
    expect(problemOf(survey, change)).toMatch(problem);
  });
});

describe("a site", () => {
  test("is typed, or stands in columns of the table", () => {
    const typed = readSite("-70.7345 deg, -29.2584 deg, 2400 m", []);
    expect(typed).toEqual({
      longitude: expect.closeTo(-70.7345 * deg, 14),
      latitude: expect.closeTo(-29.2584 * deg, 14),
      height: 2400,
    });
    expect(readSite("-70.7345 deg, -29.2584 deg", [])).toMatchObject({ height: 0 });
    const columns = tableOf("Lon [deg],Lat [deg],Height [km]", ["-70.7345,-29.2584,2.4", "-70.7345,-29.2584,2.4"]);
    expect(readSite("Lon [deg], Lat [deg], Height [km]", columns)).toEqual(typed);
  });

  test.each([
    [
      "-70.7345 deg",
      'the site is "-70.7345 deg"; longitude, latitude and height are needed, for example "-70.7345 deg, -29.2584 deg, 2400 m".',
    ],
    [
      "-70.7345, -29.2584 deg",
      'of the site, longitude is -70.7345 with no unit; give its header (for example "Longitude [deg]") or type "-70.7345 deg".',
    ],
    [
      "10 deg, 95 deg, 0 m",
      "of the site, latitude is 95 deg; it must be at most 90 deg, because the poles stand at 90 deg; for example -29.2584 deg.",
    ],
    [
      "L [deg], 10 deg",
      'of the site, longitude in the column "L [deg]" differs between rows 1 and 2; plan the targets of one site at a time.',
    ],
  ])("%s is told", (text, problem) => {
    expect(readSite(text, tableOf("L [deg]", ["10", "20"]))).toEqual({ problem });
  });

  test("an option is read like a cell", () => {
    expect(readOption(night, "2027-02-01")).toBe(9892.5);
  });
});

describe("a plan", () => {
  test("told in sentences", () => {
    expect(tellPlan(plan() as Plan)).toEqual([
      "3 of 5 targets chosen, worth 12, for 19.33 h of 30 h.",
      "Not chosen: Lantern 4 b (17.5 h).",
      "Not offered to the choice, because their visits do not fit into these dates:",
      "  Lantern 5 b: 0 of 10 visits; it never stands within the airmass limit in the dark for a whole exposure; look for other dates or a greater airmass.",
      expect.stringMatching(
        /^52 visits in 19\.33 h; 120 nights with \d+\.\d+ h of darkness; 3 of 3 targets have all their visits\.$/,
      ),
      "Row 6, Lantern 6 b, cannot be planned: period is blank; a duration is needed, for example 4.23 d.",
      "Row 7, Quarry 2 b, cannot be planned: omega is blank; an angle is needed, for example 58 deg.",
      "Hours are visits times exposure and overhead.",
    ]);
  });

  test("as a table whose headers state the units", () => {
    const { header, columns } = visitTable(plan() as Plan);
    expect(header).toEqual([
      "Target",
      "Night",
      "Start",
      "Exposure [s]",
      "Phase",
      "Phase error",
      "Airmass",
      "Moon distance [deg]",
      "Barycentric correction [m/s]",
    ]);
    expect(columns.map(({ length }) => length)).toEqual(Array(9).fill(52));
    const starts = Array.from({ length: 52 }, (_, row) => String(cellAt(columns[2]!, row)));
    expect(starts).toEqual([...starts].sort());
    expect(new Set(starts).size).toBe(52);
    expect(starts[0]).toMatch(/^2027-02-0\dT\d\d:\d\d:00$/);
    expect(cellAt(columns[3]!, 0)).toBe(900);
  });

  test("keeps what has to be in, reachable or not, and what must not", () => {
    const found = plan({ must: ["Lantern 5 b"], excluded: ["Lantern 1 b", "Lantern 6 b"] }) as Plan;
    expect(found.chosen.map(({ name }) => name)).toContain("Lantern 5 b");
    expect(found.chosen.map(({ name }) => name)).not.toContain("Lantern 1 b");
    expect(found.schedule.shortfalls.map(({ name }) => name)).toEqual(["Lantern 5 b"]);
  });

  test.each([
    [
      { must: ["Lantern 4 b"], budget: 12 },
      "hours",
      "the targets that have to be in need 17.5 h and the budget is 12 h; raise it to 17.5 h, or do without Lantern 4 b (17.5 h).",
    ],
    [
      { must: ["Lantern 1 bb"] },
      "names",
      '"Lantern 1 bb" has to be in, but no target has that name; did you mean "Lantern 1 b"?',
    ],
    [
      { must: ["Lantern 6 b"] },
      "names",
      '"Lantern 6 b" has to be in, but cannot be planned: period is blank; a duration is needed, for example 4.23 d.',
    ],
    [{ excluded: ["Zenith"] }, "names", '"Zenith" is excluded, but no target has that name; write it as in the table.'],
    [
      { must: ["Lantern 1 b"], excluded: ["Lantern 1 b"] },
      "names",
      '"Lantern 1 b" has to be in and is excluded; take back one of the two.',
    ],
  ])("%j cannot be granted", (change, about, problem) => {
    expect(plan(change)).toEqual({ about, problem });
  });

  test("stops when it is told to", () => {
    expect(runWatched(planSteps(request()), { isCancelled: () => true })).toBeUndefined();
  });
});
