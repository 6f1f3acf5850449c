import type { PlotColumn } from "../../../protocol/answers.js";
import { axisOver } from "../draw/axis.js";
import type { Figure, LegendEntry, Paint, PointLayer } from "../draw/figure.js";
import { rampSteps } from "../draw/palette.js";
import { shapes } from "../draw/surface.js";

export interface ColumnsPlot {
  readonly x: PlotColumn;
  readonly y: PlotColumn;
  readonly colour: PlotColumn | undefined;
  readonly xLog: boolean;
  readonly yLog: boolean;
  readonly errors: boolean;
  /** A value of y that is drawn across, with what it says. */
  readonly level: { readonly value: number; readonly text: string } | undefined;
}

const onePaint: readonly Paint[] = [{ colour: "ref-1", shape: "circle" }];

/** One column against another. */
export function columnsFigure({ x, y, colour, xLog, yLog, errors, level }: ColumnsPlot): Figure {
  const { paint, paints, legend } = colour ? paintsOf(colour) : { paint: undefined, paints: onePaint, legend: [] };
  const points: PointLayer = {
    draw: "points",
    x: x.values,
    y: y.values,
    xError: errors ? errorsOf(x) : undefined,
    yError: errors ? errorsOf(y) : undefined,
    rows: y.rows,
    paint,
    paints,
  };
  const yValues = level ? [...finite(y.values), level.value] : y.values;
  return {
    description: `${y.name} against ${x.name}, ${count(points)} points`,
    x: axisOver(x.name, x.unit, xLog, x.values),
    y: axisOver(y.name, y.unit, yLog, yValues),
    layers: level ? [points, { draw: "level", along: "y", ...level }] : [points],
    legend,
    brush: points,
  };
}

function errorsOf({ upper, lower }: PlotColumn): readonly [Float64Array, Float64Array] | undefined {
  return upper && [upper, lower ?? upper];
}

function paintsOf(column: PlotColumn): {
  readonly paint: Uint8Array;
  readonly paints: readonly Paint[];
  readonly legend: readonly LegendEntry[];
} {
  return column.words ? paintsOfWords(column.words) : paintsOfNumbers(column);
}

/** The most frequent words have a colour and a shape each, the others share the last. */
function paintsOfWords(words: readonly string[]) {
  const counts = new Map<string, number>();
  for (const word of words) counts.set(word, (counts.get(word) ?? 0) + 1);
  const frequent = [...counts].sort((a, b) => b[1] - a[1] || (a[0] < b[0] ? -1 : 1)).map(([word]) => word);
  const named = frequent.length > shapes.length ? frequent.slice(0, shapes.length - 1) : frequent;
  const paints = shapes.map((shape, index): Paint => ({ colour: `ref-${index as 0 | 1 | 2 | 3 | 4 | 5}`, shape }));
  const paint = Uint8Array.from(words, (word) => {
    const at = named.indexOf(word);
    return at < 0 ? shapes.length - 1 : at;
  });
  const legend = named.map((word, index) => ({ text: word || "blank", paint: paints[index] as Paint }));
  const others = frequent.length > named.length ? [{ text: "others", paint: paints.at(-1) as Paint }] : [];
  return { paint, paints, legend: [...legend, ...others] };
}

/** Steps between two colours, from the least to the most. */
function paintsOfNumbers({ name, unit, values }: PlotColumn) {
  const axis = axisOver("", "", false, values);
  const paints: Paint[] = Array.from({ length: rampSteps }, (_, step) => ({ colour: `ramp-${step}`, shape: "circle" }));
  paints.push({ colour: "soft", shape: "cross" });
  const [least, most] = rangeOf(values);
  const paint = Uint8Array.from(values, (value) =>
    Number.isFinite(value) && most > least
      ? Math.min(rampSteps - 1, Math.floor(((value - least) / (most - least)) * rampSteps))
      : Number.isFinite(value)
        ? 0
        : rampSteps,
  );
  const of = unit === "" ? "" : ` ${unit}`;
  const legend: LegendEntry[] = Number.isFinite(axis.from)
    ? [
        { text: `${name} ${figures(least)}${of}`, paint: paints[0] as Paint },
        { text: `to ${figures(most)}${of}`, paint: paints[rampSteps - 1] as Paint },
      ]
    : [];
  return { paint, paints, legend };
}

function rangeOf(values: Float64Array): [number, number] {
  let [least, most] = [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY];
  for (const value of values) {
    if (!Number.isFinite(value)) continue;
    least = Math.min(least, value);
    most = Math.max(most, value);
  }
  return [least, most];
}

function* finite(values: Float64Array): Generator<number> {
  for (const value of values) if (Number.isFinite(value)) yield value;
}

function count({ x, y }: PointLayer): number {
  let points = 0;
  for (let index = 0; index < x.length; index++) {
    if (Number.isFinite(x[index]) && Number.isFinite(y[index])) points++;
  }
  return points;
}

function figures(value: number): string {
  return Number.isFinite(value) ? String(Number(value.toPrecision(3))) : "";
}
