import { readFileSync } from "node:fs";
import { describe, expect, test } from "vitest";
import type { Cell } from "../../../../src/call/cell.js";
import { columnOf } from "../../../../src/call/column.js";
import type { PlanAnswer, PlanReport, PlanWords } from "../../../../src/hosts/bench/protocol/plan.js";
import { usualPlanTexts } from "../../../../src/plan/usualPlanTexts.js";
import { bookOf } from "../../../../src/sheet/book/bookOf.js";
import { barycell } from "../../cli/barycell.js";
import { type OpenTable, openBook, openTable } from "./openTable.js";

const survey = new URL("../../cli/survey.csv", import.meta.url);
const lines = readFileSync(survey, "utf8").trim().split("\n").slice(1);
const cellOf = (text: string): Cell => (text === "" ? null : Number.isFinite(Number(text)) ? Number(text) : text);
const rows = lines.map((line, index) => line.split(",").map((text) => (index === 0 ? text : cellOf(text))));

const words: PlanWords = {
  ...usualPlanTexts,
  hours: "30",
  from: "2027-02-01",
  to: "2027-05-31",
  longitude: "-70.7345 deg",
  latitude: "-29.2584 deg",
  height: "2400 m",
  value: "Priority",
  columns: {},
  must: [],
  excluded: [],
};

async function planned(open: OpenTable, change: Partial<PlanWords> = {}): Promise<PlanReport> {
  const answer = await open.service.plan(0, { ...words, ...change });
  if (answer.is !== "plan") throw new Error(JSON.stringify(answer));
  return answer.plan;
}

async function problems(change: Partial<PlanWords>, open = openTable(rows)): Promise<string[]> {
  const answer: PlanAnswer = await open.service.plan(0, { ...words, ...change });
  if (answer.is !== "problems") throw new Error(answer.is);
  return answer.problems.map(({ word, message }) => `${word}: ${message}`);
}

describe("what a sheet offers to a plan", () => {
  test("its columns by their quantities, those that hold numbers, the one of worth", () => {
    const start = openTable(rows).service.planStart(0) as Exclude<
      ReturnType<OpenTable["service"]["planStart"]>,
      Promise<unknown>
    >;
    expect(start.columns.map(({ quantity, header }) => [quantity, header])).toEqual([
      ["RA", "RA [h]"],
      ["dec", "Dec [deg]"],
      ["period", "Period [d]"],
      ["reference time", "T0 [BJD_TDB]"],
      ["visits", "Visits"],
      ["exposure", "Exposure [s]"],
      ["overhead", "Overhead [s]"],
      ["telescope time", undefined],
      ["eccentricity", "e"],
      ["omega", "omega [deg]"],
    ]);
    expect(start.value).toBe("Priority");
    expect(start.values).not.toContain("T0 sigma [d]");
    expect(start.values).not.toContain("RA [h]");
    expect(start.site).toBeUndefined();
  });

  test("a site: from labels of another sheet, before these from names, before these from columns", async () => {
    const targets = { name: "Targets", columns: rows[0]!.map((_, at) => columnOf(rows.map((row) => row[at] ?? null))) };
    const labels = {
      name: "Setup",
      columns: [
        columnOf(["Setting", "Site longitude [deg]", "Site latitude", "Hill"]),
        columnOf(["Value", -70.5, "-29.25 deg", "2.4 km"]),
      ],
    };
    const open = openBook(bookOf([targets, labels]));
    expect(open.service.planStart(0)).toMatchObject({
      site: { longitude: "-70.5 deg", latitude: "-29.25 deg", height: "", foundIn: "the sheet Setup" },
    });
    for (const [name, text] of [
      ["longitude", "=Setup!B2"],
      ["site_latitude", "=Setup!B3"],
      ["height", "=Setup!B4"],
    ] as const) {
      await open.service.act({ do: "define name", name, text, sheet: 1 });
    }
    expect(open.service.planStart(0)).toMatchObject({ site: { height: "2.4 km", foundIn: "names of this book" } });
    const own = openTable([
      ["Star", "Longitude [deg]", "Latitude [deg]"],
      ["A", -70, -29],
    ]);
    expect(own.service.planStart(0)).toMatchObject({
      site: { longitude: "Longitude [deg]", latitude: "Latitude [deg]", foundIn: "columns of this sheet" },
    });
  });

  test("names of targets, without rows that are none", () => {
    expect(openTable(rows).service.targetNames(0, [0, 1, 3, 99])).toEqual(["Lantern 1 b", "Lantern 2 b"]);
  });
});

describe("a plan", () => {
  test("is that of the command line for the same table and options", async () => {
    const site = `${words.longitude}, ${words.latitude}, ${words.height}`;
    const options = ["--hours", "30", "--from", words.from, "--to", words.to, "--site", site, "--value", "Priority"];
    const { out } = await barycell(["plan", "-", ...options, "--json"], { input: readFileSync(survey, "utf8") });
    const told = JSON.parse(out);
    const open = openTable(rows);
    const plan = await planned(open);
    expect(plan.totals).toEqual({
      value: told.value,
      hours: told.hours,
      budget: 30,
      visits: told.visits.length,
      nights: told.nights,
      darkHours: told.darkHours,
    });
    expect(plan.chosen.map(({ name, value, hours }) => ({ name, value, hours }))).toEqual(told.chosen);
    const others = [...told.notChosen, ...told.leftOut].map(({ name }) => name);
    expect(plan.leftOut.map(({ name }) => name).sort()).toEqual(others.sort());

    const steps = open.session().history.versions.length;
    const outcome = await open.service.writePlan();
    expect(outcome).toMatchObject({ is: "done", select: { sheet: 1 } });
    expect(open.session().history.versions).toHaveLength(steps + 1);
    expect(open.state().sheets.map(({ name }) => name)).toEqual(["Targets", "Plan", "Plan summary"]);
    const headers = Object.keys(told.visits[0]);
    const written = told.visits.map((_: unknown, row: number) =>
      Object.fromEntries(headers.map((header, at) => [header, open.cell(`${"ABCDEFGHI"[at]}${row + 2}`, 1)])),
    );
    expect(headers.map((_, at) => open.cell(`${"ABCDEFGHI"[at]}1`, 1))).toEqual(headers);
    expect(written).toEqual(told.visits);
    expect(open.cell("B2", 2)).toBe("30");
    await open.service.undo();
    expect(open.state().sheets).toHaveLength(1);
    await open.service.writePlan();
    await open.service.writePlan();
    expect(
      open
        .state()
        .sheets.map(({ name }) => name)
        .slice(3),
    ).toEqual(["Plan 2", "Plan 2 summary"]);
  });

  test("tells each row that is left out, and why", async () => {
    const { leftOut } = await planned(openTable(rows), { excluded: ["Lantern 1 c"] });
    expect(leftOut.map(({ row, name, because }) => `${row} ${name}: ${because}`)).toEqual([
      "2 Lantern 1 c: it is excluded.",
      "3 Lantern 2 b: 0 of 20 visits; it can be visited in 15 nights only; look for more dates, or allow more visits a night.",
      "5 Lantern 4 b: its 17.5 h do not fit beside targets that are worth more together.",
      "6 Lantern 5 b: 0 of 10 visits; it never stands within the airmass limit in the dark for a whole exposure; look for other dates or a greater airmass.",
      "7 Lantern 6 b: period is blank; a duration is needed, for example 4.23 d.",
      "8 Quarry 1 b: 0 of 18 visits; its phase is lost, uncertain by 0.39 of a period at best; measure its times anew, or ask for any phase.",
      "9 Quarry 2 b: omega is blank; an angle is needed, for example 58 deg.",
    ]);
    const worthless = rows.map((row, at) => (at === 1 ? row.with(10, 0) : row));
    expect((await planned(openTable(worthless))).leftOut[0]).toEqual({
      row: 1,
      name: "Lantern 1 b",
      because: "it is worth 0, and what is worth nothing is not chosen.",
    });
  });

  test("says what to relax where the hours are too few", async () => {
    const answer = await openTable(rows).service.plan(0, {
      ...words,
      must: ["Lantern 4 b", "Lantern 3 b", "Lantern 1 b"],
    });
    expect(answer).toEqual({
      is: "infeasible",
      message:
        "the targets that have to be in need 31.5 h and the budget is 30 h; raise it to 31.5 h, or do without Lantern 4 b (17.5 h).",
    });
  });

  test("can be stopped, tells how far it is, and leaves nothing to write", async () => {
    const open = openTable(rows);
    const going = open.service.plan(0, { ...words, to: "2034-12-31" });
    open.service.cancel();
    expect(await going).toEqual({ is: "cancelled" });
    expect(await open.service.writePlan()).toEqual({
      is: "refused",
      message: "plan: there is no plan of this book yet; make one first.",
    });
    expect(open.events[0]).toMatchObject({ is: "progress", what: "planning" });
    expect(open.events.at(-1)).toEqual({ is: "idle" });
    expect(open.session().history.versions).toHaveLength(1);
  });

  test("takes columns that are named, for those that are not recognised", async () => {
    const renamed = rows.map((row, at) => (at === 0 ? row.with(7, "Pointings") : row));
    expect(await problems({}, openTable(renamed))).toEqual([
      'undefined: no column of visits was recognised; head it for example "visits", or say which column it is.',
    ]);
    const { chosen } = await planned(openTable(renamed), { columns: { visits: "Pointings" } });
    expect(chosen.map(({ visits }) => visits)).toEqual([12, 16, 24]);
  });
});

describe("what is wrong is told of its field", () => {
  test.each([
    [{ hours: "" }, "hours: the budget is blank; it is a number of hours above 0, for example 120."],
    [
      { from: "1 Feb" },
      'from: the first night is "1 Feb"; it is a date from 1972-01-01 to 2035-12-30, for example 2027-02-01.',
    ],
    [{ to: "2027-01-01" }, "to: the last night lies before the first night; give the first night first."],
    [
      { longitude: "-70" },
      'longitude: longitude is -70 with no unit; give its header (for example "Longitude [deg]") or type "-70 deg".',
    ],
    [
      { airmass: "0.5" },
      "airmass: the airmass limit is 0.5; it must be at least 1, because the zenith has the least air; for example 1.2.",
    ],
    [{ perNight: "half" }, 'perNight: the limit of visits a night is "half"; it is a number of visits, for example 1.'],
    [{ value: "" }, "value: choose the column that says what a target is worth."],
    [{ value: "Merit" }, 'value: no column is headed "Merit"; choose another.'],
    [{ columns: { visits: "N" } }, 'columns: visits is to be in "N", and no column is headed so; choose another.'],
    [
      { must: ["Lantern 9 b"] },
      'must: "Lantern 9 b" has to be in, but no target has that name; did you mean "Lantern 1 b"?',
    ],
    [
      { excluded: ["Lantern 9 b"] },
      'excluded: "Lantern 9 b" is excluded, but no target has that name; did you mean "Lantern 1 b"?',
    ],
  ] as readonly (readonly [Partial<PlanWords>, string])[])("%j", async (change, message) => {
    expect(await problems(change)).toEqual([message]);
  });
});

describe("data for plots", () => {
  test("hours in the order of worth", async () => {
    const answer = await openTable(rows).service.planHours(0, words);
    if (answer.is !== "hours") throw new Error(answer.message);
    // Priorities 5 5 5 4 4 3 2 of the rows that can be planned; hours are visits x (exposure + overhead), by hand.
    expect([...answer.rows]).toEqual([1, 6, 8, 4, 5, 2, 3]);
    const hours = [4, 10 / 3, 7.5, 10, 17.5, 16 / 3, 5];
    let total = 0;
    for (const [index, each] of hours.entries()) {
      total += each;
      expect(answer.totals[index]).toBeCloseTo(total, 10);
    }
    expect(answer).toMatchObject({ budget: 30, leftOut: 2, value: "Priority" });
  });

  test("dark hours night by night, and altitudes through a night", async () => {
    const open = openTable(rows);
    const seen = await open.service.planVisibility(0, [1, 6], words);
    if (seen.is !== "visibility") throw new Error(seen.message);
    expect(seen.nights).toHaveLength(120);
    expect(seen.targets.map(({ name, row }) => [name, row])).toEqual([
      ["Lantern 1 b", 1],
      ["Lantern 5 b", 6],
    ]);
    // At a declination of 75 deg and a latitude of -29 deg a star never rises.
    expect(Math.max(...seen.targets[1]!.hours)).toBe(0);
    const night = await open.service.planNight(0, [1], words, "");
    if (night.is !== "night") throw new Error(night.message);
    expect(night.date).toBe("2027-02-01");
    // Declination -29.2 deg passes 0.1 deg from the zenith of latitude -29.2584 deg; precession and refraction within 0.3 deg.
    expect(Math.max(...night.targets[0]!.altitudes)).toBeGreaterThan(88);
    // sec z = 2 at an altitude of 30 deg; the formula in use bends it by less than 0.2 deg.
    expect(night.lowest).toBeCloseTo(30, 0);
    const other = await open.service.planNight(0, [1], words, "2027-03-01");
    expect(other).toMatchObject({ is: "night", date: "2027-03-01" });
  });

  test("what is missing is told in words", async () => {
    const open = openTable(rows);
    expect(await open.service.planVisibility(0, [0], words)).toEqual({
      is: "missing",
      message: "Select cells in the rows of targets to see them here.",
    });
    expect(await open.service.planVisibility(0, [1], { ...words, latitude: "" })).toEqual({
      is: "missing",
      message: expect.stringMatching(/^The plan beside the table lacks something: Latitude is blank/),
    });
    expect(await open.service.planNight(0, [1], words, "soon")).toEqual({
      is: "missing",
      message: 'The night is "soon"; it is a date from 1972-01-01 to 2035-12-30, for example 2027-02-01.',
    });
    const bare = openTable([
      ["Star", "V [mag]"],
      ["A", 8],
    ]);
    expect(await bare.service.planNight(0, [1], words, "")).toEqual({
      is: "missing",
      message: "No columns of RA and dec were recognised; head them for example RA [h] and Dec [deg].",
    });
  });
});
