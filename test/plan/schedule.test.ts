import fc from "fast-check";
import { describe, expect, test } from "vitest";
import { airmass } from "../../src/kernel/night/airmass.js";
import { altitude, altitudeOf } from "../../src/kernel/night/altitude.js";
import { noonBefore } from "../../src/kernel/night/darkness.js";
import { hoursUp } from "../../src/kernel/night/hoursUp.js";
import { moonPosition } from "../../src/kernel/night/moon.js";
import { moonDistance } from "../../src/kernel/night/moonDistance.js";
import { newOrientation, orientationAt } from "../../src/kernel/night/starOfDate.js";
import { sunDirection } from "../../src/kernel/night/sun.js";
import { barycentricSpeed } from "../../src/kernel/sky/barycentricSpeed.js";
import { barycentricTime } from "../../src/kernel/sky/barycentricTime.js";
import { dateText, isoText } from "../../src/plan/dateText.js";
import type { Limits } from "../../src/plan/limits.js";
import { nightsBetween } from "../../src/plan/nights.js";
import { nightTimeline } from "../../src/plan/nightTimeline.js";
import type { PlannedTarget } from "../../src/plan/plannedTarget.js";
import { quadraturePhases } from "../../src/plan/quadraturePhases.js";
import { type ScheduleRequest, scheduleSteps } from "../../src/plan/schedule.js";
import { tellSchedule, tellShortfall } from "../../src/plan/tellSchedule.js";
import { visibility } from "../../src/plan/visibility.js";
import { runAll, runInSlices, runWatched } from "../../src/plan/watch.js";

const deg = Math.PI / 180;
const schedule = (request: ScheduleRequest) => runAll(scheduleSteps(request));
const site = { longitude: -70.7345 * deg, latitude: -29.2584 * deg, height: 2400 };
/** 2027-02-01. */
const start = 9892.5;
const limits: Limits = {
  airmass: 2,
  sunBelow: -18 * deg,
  phaseWidth: 0.1,
  moonDistance: 0,
  perNight: 1,
  gap: 0,
};

function target(change: Partial<PlannedTarget> = {}): PlannedTarget {
  return {
    name: "Lantern 1 b",
    rightAscension: 150 * deg,
    declination: -30 * deg,
    period: 3.0821,
    periodError: 0,
    reference: 9000,
    referenceError: 0,
    visits: 10,
    exposure: 900 / 86400,
    overhead: 300 / 86400,
    phases: [0.25, 0.75],
    value: 1,
    ...change,
  };
}

const anyTarget: fc.Arbitrary<PlannedTarget> = fc.record({
  name: fc.constant("T"),
  rightAscension: fc.double({ min: 0, max: 2 * Math.PI, noNaN: true }),
  declination: fc.double({ min: -1.5, max: 1.5, noNaN: true }),
  period: fc.double({ min: 0.4, max: 60, noNaN: true }),
  periodError: fc.constantFrom(0, 1e-5, 1e-4),
  reference: fc.double({ min: 6000, max: 9500, noNaN: true }),
  referenceError: fc.constantFrom(0, 0.001, 0.02),
  visits: fc.integer({ min: 1, max: 12 }),
  exposure: fc.integer({ min: 60, max: 5400 }).map((seconds) => seconds / 86400),
  overhead: fc.integer({ min: 0, max: 900 }).map((seconds) => seconds / 86400),
  phases: fc.constantFrom([], [0.25, 0.75], [0.98]),
  value: fc.integer({ min: 0, max: 5 }),
});
const anyRequest: fc.Arbitrary<ScheduleRequest> = fc
  .record({
    targets: fc.array(anyTarget, { minLength: 1, maxLength: 12 }),
    site: fc.constantFrom(
      site,
      { longitude: 18.5 * deg, latitude: 69.6 * deg, height: 100 },
      {
        longitude: 204.5 * deg,
        latitude: 19.8 * deg,
        height: 4145,
      },
    ),
    from: fc.integer({ min: 9893, max: 10200 }).map((day) => day + 0.5),
    to: fc.constant(0),
    limits: fc.record({
      airmass: fc.constantFrom(1.3, 2, 3),
      sunBelow: fc.constantFrom(-18 * deg, -12 * deg),
      phaseWidth: fc.constantFrom(0.05, 0.1),
      moonDistance: fc.constantFrom(0, 30 * deg, 60 * deg),
      perNight: fc.constantFrom(1, 2, 3),
      gap: fc.constantFrom(0, 0.1, 1.5),
    }),
  })
  .map((request) => ({ ...request, to: request.from + 14 }));

const orientation = newOrientation();
const sun = new Float64Array(3);

function sunAltitude(time: number, { longitude, latitude }: ScheduleRequest["site"]): number {
  orientationAt(time, orientation);
  sunDirection(time, sun);
  return altitudeOf(sun, orientation.sidereal + longitude, latitude);
}

function moonAltitude(time: number, { longitude, latitude }: ScheduleRequest["site"]): number {
  const moon = new Float64Array(3);
  orientationAt(time, orientation);
  moonPosition(time, moon);
  return altitudeOf(moon, orientation.sidereal + longitude, latitude);
}

/** The kernels are tested against astropy; here they tell whether what was laid keeps what was asked. */
describe("no schedule breaks a limit", () => {
  test("whatever is asked", () => {
    let laid = 0;
    fc.assert(
      fc.property(anyRequest, (request) => {
        const { targets, limits, site, from, to } = request;
        const { visits, hours, shortfalls } = schedule(request);
        laid += visits.length;
        const perNight = new Map<string, number>();
        const perTarget = targets.map(() => 0);
        const lastEnd = targets.map(() => Number.NEGATIVE_INFINITY);
        let busyUntil = Number.NEGATIVE_INFINITY;
        for (const visit of visits) {
          const one = targets[visit.target]!;
          const place = [one.rightAscension, one.declination, site.longitude, site.latitude] as const;
          // One after the other, with the overhead after each, on whole minutes of the clock.
          expect(visit.from).toBeGreaterThanOrEqual(busyUntil - 1e-8);
          busyUntil = visit.from + one.exposure + one.overhead;
          expect(visit.to - visit.from).toBeCloseTo(one.exposure, 9);
          expect(isoText(visit.from)).toMatch(/:00$/);
          // In its night, one of those asked for.
          const noon = noonBefore(visit.night, site.longitude);
          expect(visit.from >= noon && visit.to <= noon + 1).toBe(true);
          expect(visit.night >= from && visit.night <= to).toBe(true);
          // A thousandth of a degree for what the sky turns within the table of sidereal time.
          const slack = 0.001 * deg;
          for (const time of [visit.from, (visit.from + visit.to) / 2, visit.to]) {
            expect(sunAltitude(time, site)).toBeLessThanOrEqual(limits.sunBelow + slack);
            const lower = altitude(time, ...place) - slack;
            expect(airmass(time, ...place)).toBeLessThanOrEqual(limits.airmass * (1 + slack / Math.tan(lower) + 1e-9));
            if (limits.moonDistance > 0 && moonAltitude(time, site) > 1 * deg) {
              expect(moonDistance(time, ...place)).toBeGreaterThanOrEqual(limits.moonDistance - slack);
            }
          }
          const middle = (visit.from + visit.to) / 2;
          const at = barycentricTime(middle, ...place, site.height);
          const turns = (at - one.reference) / one.period;
          const error = Math.hypot(one.referenceError, turns * one.periodError) / one.period;
          expect(Math.abs(visit.phase - (turns - Math.floor(turns)))).toBeLessThan(1e-9);
          expect(visit.phaseError).toBeCloseTo(error, 12);
          if (one.phases.length > 0) {
            const apart = one.phases.map((wanted) => Math.abs(((visit.phase - wanted + 1.5) % 1) - 0.5));
            expect(Math.min(...apart) + error).toBeLessThanOrEqual(limits.phaseWidth + 1e-9);
          }
          expect(visit.airmass).toBeCloseTo(airmass(middle, ...place), 3);
          expect(visit.moonDistance).toBeCloseTo(moonDistance(middle, ...place), 4);
          expect(visit.barycentricSpeed).toBeCloseTo(barycentricSpeed(middle, ...place, site.height), 6);
          const key = `${visit.target} ${visit.night}`;
          perNight.set(key, (perNight.get(key) ?? 0) + 1);
          perTarget[visit.target]!++;
          expect(visit.from - lastEnd[visit.target]!).toBeGreaterThanOrEqual(limits.gap - 1e-8);
          lastEnd[visit.target] = busyUntil;
        }
        expect(Math.max(0, ...perNight.values())).toBeLessThanOrEqual(limits.perNight);
        targets.forEach(({ visits: wanted }, index) => {
          const shortfall = shortfalls.find((one) => one.target === index);
          expect(perTarget[index]).toBe(shortfall ? shortfall.laid : wanted);
          expect(perTarget[index]! <= wanted).toBe(true);
        });
        const needed = visits.reduce(
          (sum, { target }) => sum + targets[target]!.exposure + targets[target]!.overhead,
          0,
        );
        expect(hours).toBeCloseTo(needed * 24, 9);
      }),
      { numRuns: 60 },
    );
    // That something was laid at all.
    expect(laid).toBeGreaterThan(200);
  });

  test("the same request gives the same schedule, in slices too", async () => {
    await fc.assert(
      fc.asyncProperty(anyRequest, async (request) => {
        const found = schedule(request);
        expect(schedule(request)).toEqual(found);
        expect(await runInSlices(scheduleSteps(request), {})).toEqual(found);
      }),
      { numRuns: 5 },
    );
  });
});

describe("a schedule", () => {
  const request = { targets: [target()], site, from: start, to: start + 59, limits };

  test("has all visits of a target that is up every night, half at each phase", () => {
    const { visits, shortfalls, nights, hours } = schedule(request);
    expect(visits).toHaveLength(10);
    expect({ shortfalls, nights }).toEqual({ shortfalls: [], nights: 60 });
    // 10 x 20 min.
    expect(hours).toBeCloseTo(10 / 3, 12);
    expect(visits.filter(({ phase }) => phase < 0.5)).toHaveLength(5);
  });

  test("gives time to the target that can wait least", () => {
    // Both want the same stretch of the only night; the second has visits for no other.
    const long = { exposure: 0.2, overhead: 0, visits: 1, phases: [] };
    const two = [target({ ...long, value: 9, visits: 1 }), target({ ...long, value: 1, visits: 2 })];
    const { visits } = schedule({ ...request, targets: two, to: start, limits });
    expect(visits.map(({ target }) => target)).toEqual([1]);
  });

  test("and else to the one that is worth more, then to the earlier", () => {
    const long = { exposure: 0.2, overhead: 0, visits: 1, phases: [] };
    const once = { ...request, to: start, limits };
    const worth = schedule({ ...once, targets: [target({ ...long, value: 1 }), target({ ...long, value: 2 })] });
    expect(worth.visits.map(({ target }) => target)).toEqual([1]);
    const equal = schedule({ ...once, targets: [target(long), target(long)] });
    expect(equal.visits.map(({ target }) => target)).toEqual([0]);
    expect(tellSchedule(equal, 2)).toMatch(/^1 visit in 4.8 h; 1 night with \d\.\d+ h of darkness; 1 of 2 targets/);
  });

  test("tells how far it is and stops when it is told to", async () => {
    const seen: number[] = [];
    runWatched(scheduleSteps(request), { onProgress: (done, total) => seen.push(done / total) });
    expect(seen).toHaveLength(120);
    expect(seen.at(-1)).toBe(1);
    expect(seen).toEqual([...seen].sort((a, b) => a - b));
    let asked = 0;
    expect(runWatched(scheduleSteps(request), { isCancelled: () => ++asked > 3 })).toBeUndefined();
    expect(asked).toBe(4);
    expect(await runInSlices(scheduleSteps(request), { isCancelled: () => true })).toBeUndefined();
  });

  test("of dates the wrong way round, or without targets, is empty", () => {
    expect(schedule({ ...request, to: start - 1 })).toMatchObject({ visits: [], nights: 0 });
    expect(schedule({ ...request, targets: [] })).toMatchObject({ visits: [], shortfalls: [] });
  });
});

describe("what was left out is told with its reason", () => {
  const request = { targets: [target()], site, from: start, to: start + 29, limits };
  const told = (targets: readonly PlannedTarget[], change: Partial<Limits> = {}, nights = 29) =>
    schedule({ ...request, targets, to: start + nights, limits: { ...limits, ...change } }).shortfalls.map(
      tellShortfall,
    );

  test("never up", () => {
    expect(told([target({ declination: 80 * deg })])).toEqual([
      "Lantern 1 b: 0 of 10 visits; it never stands within the airmass limit in the dark for a whole exposure; look for other dates or a greater airmass.",
    ]);
  });

  test("phase lost", () => {
    // 893 d after the reference, 290 periods: 290 x 0.01 d / 3.0821 d = 0.94.
    expect(told([target({ periodError: 0.01 })])).toEqual([
      "Lantern 1 b: 0 of 10 visits; its phase is lost, uncertain by 0.94 of a period at best; measure its times anew, or ask for any phase.",
    ]);
  });

  test("no phase", () => {
    // A period of 1000 d moves by 0.03 in phase in 30 nights: from 0.89 on.
    expect(told([target({ period: 1000 })])).toEqual([
      "Lantern 1 b: 0 of 10 visits; no phase that is wanted falls into its dark hours; look for other dates, or allow a greater width.",
    ]);
  });

  test("few nights", () => {
    expect(told([target({ phases: [] })], {}, 3)).toEqual([
      "Lantern 1 b: 4 of 10 visits; it can be visited in 4 nights only; look for more dates, or allow more visits a night.",
    ]);
  });

  test("the Moon", () => {
    // Full moon of 2027-02-20 passes near RA 150 deg; 120 deg keeps half the month away.
    const [line] = told([target({ declination: 10 * deg, visits: 28, phases: [] })], { moonDistance: 120 * deg });
    expect(line).toMatch(
      /^Lantern 1 b: \d+ of 28 visits; the Moon was too near in \d+ nights; allow a smaller distance\.$/,
    );
  });

  test("others took its time", () => {
    const long = { exposure: 0.2, overhead: 0, visits: 3, phases: [] };
    const two = [target({ ...long, value: 2 }), target({ ...long, name: "Quarry 1 b", visits: 3 })];
    expect(told(two, {}, 3)).toEqual([
      "Lantern 1 b: 2 of 3 visits; others took its time, 4 nights would do; plan fewer targets, or more dates.",
      "Quarry 1 b: 2 of 3 visits; others took its time, 4 nights would do; plan fewer targets, or more dates.",
    ]);
  });
});

describe("what plots show", () => {
  const nights = nightsBetween(start, start + 9, site, -18 * deg);
  const places = [
    { name: "A", rightAscension: 150 * deg, declination: -30 * deg },
    { name: "B", rightAscension: 20 * deg, declination: 80 * deg },
  ];

  test("hours in the dark, night by night, are those of HOURSUP", () => {
    const rows = visibility(places, nights, site, 30 * deg);
    expect(rows.map(({ length }) => length)).toEqual([10, 10]);
    expect([...rows[1]!]).toEqual(Array(10).fill(0));
    nights.forEach(({ date }, index) => {
      const hours = hoursUp(date, 150 * deg, -30 * deg, site.longitude, site.latitude, 30 * deg, -18 * deg) / 3600;
      expect(rows[0]![index]).toBeCloseTo(hours, 9);
    });
  });

  test("altitudes through a night, from noon to noon", () => {
    const { times, altitudes, moon, dark } = nightTimeline(places, nights[0]!, site);
    expect(times).toHaveLength(145);
    expect(times[144]! - times[0]!).toBeCloseTo(1, 9);
    expect(dark).toHaveLength(1);
    times.forEach((time, index) => {
      const exact = altitude(time, 150 * deg, -30 * deg, site.longitude, site.latitude);
      expect(Math.abs(altitudes[0]![index]! - exact)).toBeLessThan(1e-5);
    });
    expect(Math.max(...moon)).toBeGreaterThan(0);
    expect(Math.min(...moon)).toBeLessThan(0);
  });
});

test("dates and times as text", () => {
  // J2000.0 is 2000-01-01 12:00.
  expect(isoText(0)).toBe("2000-01-01T12:00:00");
  expect(isoText(start)).toBe("2027-02-01T00:00:00");
  expect(dateText(start + 27.999)).toBe("2027-02-28");
});

test("the quadratures of an orbit, as phases after its transit", () => {
  expect(quadraturePhases(0, Number.NaN)).toEqual([0.25, 0.75]);
  expect(quadraturePhases(1e-12, 1)).toEqual([expect.closeTo(0.25, 11), expect.closeTo(0.75, 11)]);
  // e = 0.013, omega = 58 deg: minimum at 0.248647413999, maximum at 0.755665932776, computed with mpmath.
  const [low, high] = quadraturePhases(0.013, 58 * deg) as [number, number];
  expect(low).toBeCloseTo(0.248647413999, 11);
  expect(high).toBeCloseTo(0.755665932776, 11);
});
