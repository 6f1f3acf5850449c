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
    y: axisOver("Radial velocity of the star", curve.unit, false, y),
    layers: [
      { draw: "level", along: "y", value: 0, text: "" },
      { draw: "line", x, y, colour: "ref-1" },
    ],
    legend: [],
    brush: undefined,
  };
}

/** The same over dates: some orbits from a day on. */
export function dateFigure(curve: Curve, orbits: number): Figure | undefined {
  const { phases, velocities, period, reference } = curve;
  if (period === undefined) return undefined;
  const x: number[] = [];
  const y: number[] = [];
  for (let orbit = 0; orbit < orbits; orbit++) {
    for (let index = 0; index < phases.length; index++) {
      x.push((orbit + (phases[index] as number)) * period);
      y.push(velocities[index] as number);
    }
  }
  const label = reference ? `Days since the reference time (${reference.frame})` : "Days since the reference time";
  return {
    description: `Radial velocity of ${curve.title} over ${orbits} orbits`,
    x: axisOver(label, "d", false, x),
    y: axisOver("Radial velocity of the star", curve.unit, false, y),
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
