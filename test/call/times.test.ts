import { describe, expect, test } from "vitest";
import { type Cell, CellError } from "../../src/call/cell.js";
import type { RowArgument } from "../../src/call/cellFunction.js";
import { cellsOf, columnOf } from "../../src/call/column.js";
import { argumentOf, call, column, errorFrom, functionNamed, type Given, headerRow, numberFrom } from "./door.js";

const place = ["197 deg", "-30 deg", "-70.7345 deg", "-29.2584 deg", "2400 m"] as const;

describe("instants", () => {
  test("the same instant by any zero gives the same phase", () => {
    const phases = [
      numberFrom("PHASE", "2459001.25 BJD_TDB", "4 d", "2459000.5 BJD_TDB"),
      numberFrom("PHASE", "9001.25 BJD_TDB-2450000", "4 d", "59000 BMJD_TDB"),
      numberFrom("PHASE", 59000.75, "4 d", 9000.5, "BMJD_TDB; ; BJD_TDB-2450000"),
      numberFrom("PHASE", "2459001.25 BJD_TDB", "96 h", "2459000.5 BJD_TDB"),
    ];
    expect(phases).toEqual([0.1875, 0.1875, 0.1875, 0.1875]);
  });

  test("a date, its Julian date and the worksheet's own number for it are one instant", () => {
    // 2010-03-05T06:00 is JD 2455260.75, MJD 55260.25 (USNO) and 40242.25 days from 1899-12-30.
    const speeds = [
      numberFrom("BARYSPEED", "2010-03-05T06:00:00", ...place),
      numberFrom("BARYSPEED", "2455260.75 JD_UTC", ...place),
      numberFrom("BARYSPEED", "55260.25 MJD_UTC", ...place),
      numberFrom("BARYSPEED", "2010-03-05T08:00:00+02:00", ...place),
      numberFrom("BARYSPEED", 40242.25, ...place, ...[undefined, undefined, undefined, undefined], "date serial;;;;;"),
    ];
    expect(new Set(speeds).size).toBe(1);
  });

  test("other clocks are converted: TT is 66.184 s and TAI 34 s ahead of UTC in 2010 (IERS)", () => {
    const utc = numberFrom("BARYTIME", "2010-03-05T06:00:00", ...place, undefined, "BJD_TDB-2455260");
    const tt = `${(0.75 + 66.184 / 86400).toFixed(14)} JD_TT-2455260`;
    const tai = `${(0.75 + 34 / 86400).toFixed(14)} JD_TAI-2455260`;
    expect(numberFrom("BARYTIME", tt, ...place, undefined, "BJD_TDB-2455260")).toBeCloseTo(utc, 11);
    expect(numberFrom("BARYTIME", tai, ...place, undefined, "BJD_TDB-2455260")).toBeCloseTo(utc, 11);
  });

  test("1e-9 d survives, in a text with all its digits and in a number from another zero", () => {
    const phase = (time: Given, headers?: string) =>
      numberFrom("PHASE", time, "1 d", "2459000 BJD_TDB", headers ?? undefined);
    expect(phase("2459000.1234567891234 BJD_TDB")).toBeCloseTo(0.1234567891234, 11);
    expect(phase(9000.12345678912, "BJD_TDB-2450000; ; ")).toBeCloseTo(0.12345678912, 11);
    expect(phase("2459000.1234567891234", "BJD_TDB; ; ")).toBeCloseTo(0.1234567891234, 11);
    // One double of a Julian date is good to 2.3e-10 d.
    expect(Math.abs(phase(2459000.123456789, "BJD_TDB; ; ") - 0.123456789)).toBeLessThan(2.4e-10);
  });
});

describe("right ascension and declination", () => {
  const utc = "2018-06-10T01:30:00";
  const site = ["-17.889 deg", "28.754 deg", "2387 m"] as const;
  const expected = numberFrom("BARYTIME", utc, "285.5 deg", "50.25 deg", ...site);
  test.each<[Given, Given, string]>([
    ["19:02:00", "50:15:00", ""],
    ["19h02m00s", "50d15m00s", ""],
    ["19 02 00", "+50 15 00", "; RA [h]; Dec [deg]"],
    [19 + 2 / 60, 50.25, "; RA [h]; Dec [deg]"],
    [19 + 2 / 60, 50.25, "; RAJ2000 [hourangle]; DEJ2000 [deg]"],
    ["19:02:00", "50:15:00", "; RA [h:m:s]; Dec [d:m:s]"],
    ["19.033333333333335 h", "50.25 deg", ""],
    ["19:02:00", "50:15:00", "; RA; Dec"],
  ])("%s %s under %s", (ra, dec, headers) => {
    const given = headers ? `${headers}; ; ; ` : undefined;
    expect(numberFrom("BARYTIME", utc, ra, dec, ...site, given)).toBe(expected);
  });

  test("an hour is an hour of time for anything else", () => {
    expect(errorFrom("BARYTIME", utc, "285.5 deg", 3, ...site, "; ; Dec [h]; ; ; ").message).toContain(
      "dec is 3 h by its header",
    );
    expect(errorFrom("BARYTIME", utc, "285.5 deg", "50:15:00", "1 h", "28.754 deg", "2387 m").message).toContain(
      'longitude is "1 h", a duration',
    );
  });

  test("letters win over the header, sixtieths alone do not", () => {
    expect(numberFrom("BARYTIME", utc, "19h02m00s", "50.25 deg", ...site, "; RA [deg]; ; ; ; ")).toBe(expected);
    expect(errorFrom("BARYTIME", utc, "19:02:00", "50.25 deg", ...site, "; RA [deg]; ; ; ; ")).toBeInstanceOf(
      CellError,
    );
  });
});

describe("uncertainties", () => {
  test("of an event grow with the periods that have passed", () => {
    // (0.0002^2 + (1000 * 3.8e-7)^2)^(1/2) = 4.29418211e-4 d (mpmath).
    const [[time, sigma]] = call(
      "EVENT",
      "transit",
      "2462999.9 BJD_TDB",
      "4 ± 3.8e-7 d",
      "2459000 ± 0.0002 BJD_TDB",
    ) as [[number, number]];
    expect(time).toBe(2463000);
    expect(Math.abs(sigma / 4.29418211e-4 - 1)).toBeLessThan(1e-7);
  });

  test("of a phase likewise, also just beside a whole turn", () => {
    for (const [time, expected] of [
      ["2463001 BJD_TDB", 0.25],
      ["2462999.9999 BJD_TDB", 0.999975],
      ["2463000.0001 BJD_TDB", 0.000025],
    ] as const) {
      const [[phase, sigma]] = call("PHASE", time, "4 ± 3.8e-7 d", "2459000 ± 0.0002 BJD_TDB") as [[number, number]];
      expect(phase).toBeCloseTo(expected, 9);
      expect(Math.abs(sigma / (4.29418211e-4 / 4) - 1)).toBeLessThan(1e-3);
    }
  });

  test("of the velocity after a thousand turns, by the exact derivatives of a circular orbit", () => {
    // V = gamma - K sin(2 pi (t - t0) / P): dV/dP = 2 pi K cos() (t - t0) / P^2, dV/dt0 = 2 pi K cos() / P.
    const [K, P, turns, part] = [3, 4, 1000, 0.1];
    const time = 2459000 + (turns + part) * P;
    const given = (period: string, reference: string) =>
      call("RVAT", `${time} BJD_TDB`, period, `${K} m/s`, reference, 0, undefined, "-30 km/s") as [[number, number]];
    const slope = (2 * Math.PI * K * Math.cos(2 * Math.PI * part)) / P;
    const [[velocity, ofPeriod]] = given("4(1)e-6 d".replace("4(1)e-6", "4.000000(1)"), "2459000 BJD_TDB");
    const [[, ofReference]] = given("4 d", "2459000 ± 0.001 BJD_TDB");
    expect(velocity).toBeCloseTo(-30000 - K * Math.sin(2 * Math.PI * part), 7);
    expect(Math.abs(ofPeriod / (slope * (turns + part) * 1e-6) - 1)).toBeLessThan(1e-6);
    expect(Math.abs(ofReference / (slope * 0.001) - 1)).toBeLessThan(1e-6);
  });

  test("of an anomaly near periastron of a long orbit", () => {
    // dnu/dt at periastron: 2 pi / P (1 + e)^(1/2) (1 - e)^(-3/2).
    const e = 0.9;
    const [[, sigma]] = call(
      "ANOMALY",
      "2459000 BJD_TDB",
      "1000 d",
      "2459000 ± 0.01 BJD_TDB",
      e,
      undefined,
      undefined,
      "rad",
    ) as [[number, number]];
    const exact = ((2 * Math.PI) / 1000) * Math.sqrt(1 + e) * (1 - e) ** -1.5 * 0.01;
    expect(Math.abs(sigma / exact - 1)).toBeLessThan(1e-6);
  });

  test("of a barycentric correction by that of the time: the turn of the Earth", () => {
    const at = (minutes: number) =>
      numberFrom("BARYSPEED", `2010-03-05T06:${String(minutes).padStart(2, "0")}:00`, ...place);
    const [[, sigma]] = call(
      "BARYSPEED",
      `2455260.7569444444(${Math.round((60 / 86400) * 1e10)}) JD_UTC`,
      ...place,
    ) as [[number, number]];
    // One minute at the rate between 06:09 and 06:11.
    expect(Math.abs(sigma / Math.abs((at(11) - at(9)) / 2) - 1)).toBeLessThan(1e-4);
  });
});

describe("several events", () => {
  const given = ["2459001 BJD_TDB", "4 d", "2459000 BJD_TDB"] as const;

  test("stand below each other, in the unit of the reference time", () => {
    expect(call("EVENT", "transit", ...given, undefined, undefined, 3).flat()).toEqual([2459004, 2459008, 2459012]);
    const quadratures = ["quadrature", ...given.slice(0, 2), "9000 BJD_TDB-2450000", undefined, undefined, 3];
    expect(call("EVENT", ...quadratures).flat()).toEqual([9003, 9005, 9007]);
    expect(functionNamed("EVENT").unitOf!(quadratures.map(argumentOf))).toBe("BJD_TDB-2450000");
  });

  test("with uncertainties that grow from row to row", () => {
    const rows = call("EVENT", "transit", given[0], "4 ± 0.001 d", given[2], undefined, undefined, 3) as number[][];
    expect(rows.map(([time]) => time)).toEqual([2459004, 2459008, 2459012]);
    rows.forEach(([, sigma], row) => {
      expect(sigma).toBeCloseTo(0.001 * (row + 1), 9);
    });
  });

  test("a column has one in each row, and filled down it is one a call", () => {
    const after = [2459001, 2459005, 2459013];
    const headers = "BJD_TDB; ; ";
    const rows = call("EVENT", "transit", column(after), "4 d", "2459000 BJD_TDB", undefined, undefined, 1, headers);
    expect(rows.flat()).toEqual([2459004, 2459008, 2459016]);
    const parameters: RowArgument[] = [
      { fixed: argumentOf("transit") },
      { perRow: [columnOf(after)] },
      { fixed: argumentOf("4 d") },
      { fixed: argumentOf("2459000 BJD_TDB") },
      { fixed: undefined },
      { fixed: undefined },
      { perRow: [columnOf([1, null, 2])] },
      { fixed: argumentOf(headers) },
    ];
    const [first, second, third] = cellsOf(functionNamed("EVENT").eachRow(3, parameters)).flat();
    expect([first, second]).toEqual([2459004, 2459008]);
    expect((third as CellError).message).toContain("gives 2 rows of results");
  });
});

describe("an omega that is blank", () => {
  const rv = (e: Given, omega: Given) =>
    call(
      "RVAT",
      "2459001 BJD_TDB",
      "4 d",
      "50 m/s",
      "2459000 BJD_TDB",
      e,
      omega,
      undefined,
      undefined,
      "; ; ; ; ; deg",
    );

  test("or 0 or left out will do for a circle", () => {
    for (const omega of [undefined, null, 0, "", "90 deg"]) expect(rv(0, omega)[0]![0]).toBeCloseTo(-50, 9);
  });

  test("spoils only the rows of eccentric orbits", () => {
    const cells = rv(column([0, 0.1, 0.1, null]), column([null, null, 58, 0])).flat();
    expect(cells.map((cell) => cell instanceof CellError)).toEqual([false, true, false, false]);
  });

  test("is 0 where it says so", () => {
    expect(rv(0.3, "0 deg")[0]![0]).toBeCloseTo(rv(0.3, "360 deg")[0]![0] as number, 12);
  });
});

test("a true 0 is typed with its unit", () => {
  const greenwich = ["2018-06-10T01:30:00", "285.5 deg", "0 deg", "0 deg", "51.5 deg", "0 m"] as const;
  expect(numberFrom("BARYTIME", ...greenwich)).toBeGreaterThan(2458279.5);
  expect(numberFrom("PHASE", "2450001 BJD_TDB", "4 d", "0 BJD_TDB-2450000")).toBe(0.25);
});

test("the headers of catalogues are read", () => {
  const headers = headerRow(
    "A$1",
    "BJD [BJD_TDB]",
    "RAJ2000 [deg]",
    "DEJ2000 [deg]",
    "lon [deg]",
    "lat [deg]",
    "elevation [m]",
  );
  const error = errorFrom("BARYTIME", 2459001.5, 197, -30, -70.7, -29.3, 2400, headers);
  expect(error.message).toContain("the clock of the site is needed");
});

describe("the uncertainty of an instant is a time that passes", () => {
  // sigma^2 = sigma_T0^2 + (1000 sigma_P)^2: 0.0002 d, 3.8e-7 d, computed with mpmath.
  const expected = 4.29418211e-4;
  const event = (sigma: Cell, headers: string) =>
    call(
      "EVENT",
      "transit",
      "2462996 BJD_TDB",
      [[4, 3.8e-7]],
      [[2459000, sigma]],
      undefined,
      undefined,
      undefined,
      headers,
    )[0] as [number, number];

  test.each([
    [0.0002, "after; P [d]; e_P [d]; T0 [BJD_TDB]; e_T0 [d]"],
    [0.0002 * 86400, "after; P [d]; e_P [d]; T0 [BJD_TDB]; e_T0 [s]"],
    [0.0002 * 1440, "after; P [d]; e_P [d]; T0 [BJD_TDB]; e_T0 [min]"],
    [0.0002, "after; P [d]; e_P [d]; T0 [BJD_TDB]; e_T0 [BJD_TDB]"],
    [0.0002, "after; P [d]; e_P [d]; T0 [BJD_TDB]; e_T0"],
    ["0.0002 d", "after; P [d]; e_P [d]; T0 [BJD_TDB]; e_T0"],
    [0.0002, "after; P [d]; T0 [BJD_TDB]"],
  ])("%s under %s", (sigma, headers) => {
    expect(Math.abs(event(sigma, headers)[1] / expected - 1)).toBeLessThan(1e-7);
  });

  test("so it converts with its instant", () => {
    expect(call("INTO", [[2459000.5, 1.2]], "T0 [BJD_TDB]; e_T0 [min]", "BJD_TDB-2450000")[0]).toEqual([
      9000.5,
      expect.closeTo(1.2 / 1440, 15),
    ]);
  });
});
