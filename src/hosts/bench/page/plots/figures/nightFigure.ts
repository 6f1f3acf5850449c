import type { PlanNight } from "../../../protocol/plan.js";
import type { Figure, LegendEntry, LineLayer } from "../draw/figure.js";
import { namedLines } from "./lineStyles.js";

type Night = Extract<PlanNight, { is: "night" }>;

/** What is seen of the day before and after the darkness [d]. */
const margin = 1 / 16;

/** Altitudes through one night, with its darkness and the airmass limit. */
export function nightFigure({ date, airmass, lowest, times, dark, targets, moon }: Night): Figure {
  const { layers, legend } = namedLines(targets.map(({ name, altitudes }) => ({ name, x: times, y: altitudes })));
  const moonLine: LineLayer = { draw: "line", x: times, y: moon, colour: "soft", dash: [1, 4] };
  const moonEntry: LegendEntry = { text: "Moon", paint: { colour: "soft", shape: "circle" }, dash: [1, 4] };
  const [first, last] = [dark[0]?.[0], dark.at(-1)?.[1]];
  const from = first === undefined ? (times[0] as number) : first - margin;
  const to = last === undefined ? (times.at(-1) as number) : last + margin;
  return {
    description: `Altitudes through the night of ${date}${dark.length === 0 ? ", which has no dark hours" : ""}: ${targets
      .map(({ name, altitudes }) => `${name} ${highestIn(times, altitudes, dark)}`)
      .join(", ")}`,
    x: { label: `UTC, night of ${date}`, unit: "", isLog: false, from, to, times: "clock" },
    y: { label: "Altitude", unit: "deg", isLog: false, from: 0, to: 90 },
    layers: [
      { draw: "bands", stretches: dark },
      moonLine,
      ...layers,
      { draw: "level", along: "y", value: lowest, text: `airmass ${airmass}` },
    ],
    legend: [...legend, moonEntry],
    brush: undefined,
  };
}

function highestIn(times: Float64Array, altitudes: Float64Array, dark: Night["dark"]): string {
  const within = altitudes.filter((_, index) =>
    dark.some(([from, to]) => (times[index] as number) >= from && (times[index] as number) <= to),
  );
  const highest = within.reduce((a, b) => Math.max(a, b), Number.NEGATIVE_INFINITY);
  return highest > 0 ? `up to ${highest.toFixed(0)} deg in the dark` : "not up in the dark";
}
