import { describe, expect, test } from "vitest";
import type { Axis } from "../../../../src/hosts/bench/page/plots/draw/axis.js";
import { drawFigure, frameOf } from "../../../../src/hosts/bench/page/plots/draw/drawFigure.js";
import type { LineLayer } from "../../../../src/hosts/bench/page/plots/draw/figure.js";
import { paletteFrom } from "../../../../src/hosts/bench/page/plots/draw/palette.js";
import { svgSurface } from "../../../../src/hosts/bench/page/plots/draw/svgSurface.js";
import { timeTicks } from "../../../../src/hosts/bench/page/plots/draw/timeTicks.js";
import { dateFigure } from "../../../../src/hosts/bench/page/plots/figures/curveFigure.js";
import { hoursFigure } from "../../../../src/hosts/bench/page/plots/figures/hoursFigure.js";
import { nightFigure } from "../../../../src/hosts/bench/page/plots/figures/nightFigure.js";
import { visibilityFigure } from "../../../../src/hosts/bench/page/plots/figures/visibilityFigure.js";

// 2027-01-01 0 h is JD 2461406.5 and J2000.0 is JD 2451545.0 (Fliegel & Van Flandern 1968, CACM 11, 657).
const newYear = 9861.5;
const axis = (from: number, to: number, times: "dates" | "clock"): Axis => ({
  label: "",
  unit: "",
  isLog: false,
  from,
  to,
  times,
});

describe("ticks of time", () => {
  test.each([
    [
      "half a year",
      newYear - 5,
      newYear + 175,
      9,
      "dates",
      "2027-01-01 2027-02-01 2027-03-01 2027-04-01 2027-05-01 2027-06-01",
    ],
    [
      "a week",
      newYear,
      newYear + 6,
      9,
      "dates",
      "2027-01-01 2027-01-02 2027-01-03 2027-01-04 2027-01-05 2027-01-06 2027-01-07",
    ],
    ["a day", newYear, newYear + 1, 4, "dates", "01-01 00 h|01-01 12 h|01-02 00 h"],
    ["a century", newYear, newYear + 36525, 7, "dates", "2040-01-01 2060-01-01 2080-01-01 2100-01-01 2120-01-01"],
    ["a night", newYear + 0.1, newYear + 0.3, 8, "clock", "03:00 04:00 05:00 06:00 07:00"],
  ] as const)("over %s", (_, from, to, most, times, expected) => {
    const ticks = timeTicks(axis(from, to, times), most).map(({ text }) => text);
    expect(ticks).toEqual(expected.split(expected.includes("|") ? "|" : " "));
  });
});

test("hours: each target where the sum with all before it stands, the budget across", () => {
  const totals = Float64Array.of(4, 10, 40);
  const figure = hoursFigure(
    {
      is: "hours",
      value: "Priority",
      rows: Int32Array.of(3, 1, 2),
      values: Float64Array.of(5, 4, 3),
      totals,
      budget: 30,
      leftOut: 0,
    },
    false,
  );
  expect(figure.description).toBe("Hours that the targets of greatest Priority need together: 2 of 3 within 30 h");
  expect([...(figure.brush?.x ?? [])]).toEqual([1, 2, 3]);
  expect([...(figure.brush?.rows ?? [])]).toEqual([3, 1, 2]);
  expect(figure.layers.find(({ draw }) => draw === "level")).toMatchObject({ along: "y", value: 30 });
});

const nights = Float64Array.of(newYear, newYear + 1);
const seen = (name: string, ...hours: number[]) => ({ name, row: 1, hours: Float64Array.from(hours) });

test("visibility: planets of one star share a line, others have their own dashes", () => {
  const { legend, layers, description } = visibilityFigure({
    is: "visibility",
    airmass: 2,
    nights,
    targets: [seen("A b", 1, 2), seen("A c", 1, 2), seen("B b", 0, 3)],
    problems: [],
  });
  expect(legend.map(({ text }) => text)).toEqual(["A b, A c", "B b"]);
  const [one, other] = layers as LineLayer[];
  expect([one?.colour, one?.dash]).not.toEqual([other?.colour, other?.dash]);
  expect(one?.dash).not.toEqual(other?.dash);
  expect(description).toContain("B b at most 3.0 h");
});

test("a night: dark hours as a band, the limit as a level, the Moon beside the targets; the same in a file", () => {
  const times = Float64Array.of(newYear, newYear + 0.25, newYear + 0.5);
  const figure = nightFigure({
    is: "night",
    date: "2026-12-31",
    airmass: 2,
    lowest: 30,
    times,
    dark: [[newYear + 0.1, newYear + 0.4]],
    targets: [{ name: "A b", row: 1, altitudes: Float64Array.of(10, 62, 80) }],
    moon: Float64Array.of(-5, 3, 20),
    problems: [],
  });
  expect(figure.description).toBe("Altitudes through the night of 2026-12-31: A b up to 62 deg in the dark");
  expect(figure.layers.map(({ draw }) => draw)).toEqual(["bands", "line", "line", "level"]);
  const surface = svgSurface(500, 300, "sans-serif");
  const palette = paletteFrom(() => "#102030");
  drawFigure(surface, 500, 300, figure, palette, { rows: new Set(), any: false });
  for (const words of ["A b", "Moon", "airmass 2", "03:00", "UTC, night of 2026-12-31", "Altitude  [deg]"]) {
    expect(surface.document()).toContain(`>${words}<`);
  }
});

test("a legend that is too wide for one line takes another", () => {
  const wide = visibilityFigure({
    is: "visibility",
    airmass: 2,
    nights,
    targets: Array.from({ length: 6 }, (_, index) => seen(`A target of a long name ${index}`, index, 1)),
    problems: [],
  });
  expect(frameOf(400, 300, wide).top).toBeGreaterThan(frameOf(1400, 300, wide).top);
});

test("velocity over dates begins at the plan's first night, in phase with the reference time", () => {
  const phases = Float64Array.from({ length: 401 }, (_, index) => index / 400);
  // A circle seen from the transit on: the star recedes less, then more: -K sin(2 pi phase).
  const velocities = phases.map((phase) => -3 * Math.sin(2 * Math.PI * phase));
  const curve = {
    is: "curve",
    title: "A b",
    unit: "m/s",
    amplitude: 3,
    phases,
    velocities,
    period: 10,
    // Transit 2.5 periods before the new year of 2027.
    reference: { day: 2461406.5 - 25, frame: "BJD_TDB" },
    assumed: [],
  } as const;
  const figure = dateFigure(curve, 4, newYear)!;
  expect(figure.x).toMatchObject({ label: "Date (BJD_TDB)", from: newYear, to: newYear + 40, times: "dates" });
  const { x, y } = figure.layers.find(({ draw }) => draw === "line") as LineLayer;
  // A quarter of a period after phase 0.5 the velocity is at its highest.
  const highest = x[y.indexOf(Math.max(...y))]!;
  expect((highest - newYear) % 10).toBeCloseTo(2.5, 1);
  expect(x[0]).toBeGreaterThanOrEqual(newYear - 0.05);
  expect(x.at(-1)).toBeLessThanOrEqual(newYear + 40.05);
  const { x: days } = dateFigure({ ...curve, reference: undefined }, 4, newYear)!;
  expect(days).toMatchObject({ label: "Days since the reference time", unit: "d", from: 0, to: 40 });
});
