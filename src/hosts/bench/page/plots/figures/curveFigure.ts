import { dateText } from "../../../../../plan/dateText.js";
import type { CurveAnswer } from "../../../protocol/answers.js";
import { axisOver } from "../draw/axis.js";
import type { Figure } from "../draw/figure.js";

type Curve = Extract<CurveAnswer, { is: "curve" }>;

/** Velocity over one orbit and a half, so that both ends are seen joined. */
export function phaseFigure(curve: Curve): Figure {
  const { phases, velocities } = curve;
  const half = phases.findIndex((phase) => phase > 0.5);
  const x = Float64Array.from([...phases, ...phases.subarray(0, half).map((phase) => phase + 1)]);
  const y = Float64Array.from([...velocities, ...velocities.subarray(0, half)]);
  return {
    description: `Radial velocity of ${curve.title} over its orbit, between ${least(y)} and ${most(y)} ${curve.unit}`,
    x: { label: "Phase from the reference time", unit: "", isLog: false, from: 0, to: 1.5 },
    y: axisOver("Radial velocity", curve.unit, false, y),
    layers: [
      { draw: "level", along: "y", value: 0, text: "" },
      { draw: "line", x, y, colour: "ref-1" },
    ],
    legend: [],
    brush: undefined,
  };
}

/** Longer stretches than this are told in days: dates of so many years mean nothing [d]. */
const longestDates = 3_652_500;
const julianDateOfEpoch = 2451545;

/** The same over some orbits: from a date on [d from J2000.0] where a reference time is known, else from that time on. */
export function dateFigure(curve: Curve, orbits: number, date: number): Figure | undefined {
  const { phases, velocities, period, reference } = curve;
  if (period === undefined) return undefined;
  const isDated = reference !== undefined && orbits * period < longestDates;
  const zero = isDated ? reference.day - julianDateOfEpoch : 0;
  const from = isDated ? date : 0;
  const to = from + orbits * period;
  const x: number[] = [];
  const y: number[] = [];
  const first = Math.floor((from - zero) / period);
  for (let orbit = first; orbit <= first + orbits; orbit++) {
    for (let index = 0; index < phases.length; index++) {
      const time = zero + (orbit + (phases[index] as number)) * period;
      if (time < from - period / phases.length || time > to + period / phases.length) continue;
      x.push(time);
      y.push(velocities[index] as number);
    }
  }
  const label = isDated
    ? `Date (${reference.frame || "of the reference time's clock"})`
    : "Days since the reference time";
  return {
    description: `Radial velocity of ${curve.title} over ${orbits} orbits${isDated ? ` from ${dateText(date)} on` : ""}`,
    x: { label, unit: isDated ? "" : "d", isLog: false, from, to, ...(isDated ? { times: "dates" } : {}) },
    y: axisOver("Radial velocity", curve.unit, false, velocities),
    layers: [
      { draw: "level", along: "y", value: 0, text: "" },
      { draw: "line", x: Float64Array.from(x), y: Float64Array.from(y), colour: "ref-1" },
    ],
    legend: [],
    brush: undefined,
  };
}

function least(values: Float64Array): string {
  return values.reduce((a, b) => Math.min(a, b)).toPrecision(3);
}

function most(values: Float64Array): string {
  return values.reduce((a, b) => Math.max(a, b)).toPrecision(3);
}
