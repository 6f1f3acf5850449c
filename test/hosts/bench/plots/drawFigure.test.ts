import { SaxesParser } from "saxes";
import { expect, test } from "vitest";
import { drawFigure, frameOf, placeX, placeY } from "../../../../src/hosts/bench/page/plots/draw/drawFigure.js";
import { paletteFrom } from "../../../../src/hosts/bench/page/plots/draw/palette.js";
import { svgSurface } from "../../../../src/hosts/bench/page/plots/draw/svgSurface.js";
import { columnsFigure } from "../../../../src/hosts/bench/page/plots/figures/columnsFigure.js";
import type { PlotColumn } from "../../../../src/hosts/bench/protocol/answers.js";

const column = (name: string, unit: string, values: readonly number[], sigmas?: readonly number[]): PlotColumn => ({
  header: `${name} [${unit}]`,
  name,
  unit,
  rows: Int32Array.from(values, (_, index) => index + 1),
  values: Float64Array.from(values),
  upper: sigmas && Float64Array.from(sigmas),
  lower: sigmas && Float64Array.from(sigmas),
  words: undefined,
});

const words: PlotColumn = { ...column("Class", "", [0, 0, 0]), words: ["quiet", "active", "quiet"] };
const palette = paletteFrom(() => "#102030");

const figure = columnsFigure({
  x: column("Period", "d", [1, 10, 100]),
  y: column("K", "m/s", [10, Number.NaN, 0.1], [1, 1, 0.2]),
  colour: words,
  xLog: true,
  yLog: true,
  errors: true,
  level: { value: 0.5, text: "floor <0.5> & below" },
});

test("a file of a figure is well-formed, holds its words, and draws what has both values", () => {
  const surface = svgSurface(400, 300, "sans-serif");
  drawFigure(surface, 400, 300, figure, palette, { rows: new Set([3]), any: true });
  const elements: string[] = [];
  const texts: string[] = [];
  const parser = new SaxesParser();
  parser.on("opentag", ({ name }) => elements.push(name));
  parser.on("text", (text) => text.trim() && texts.push(text));
  parser.write(surface.document()).close();
  expect(texts).toEqual(expect.arrayContaining(["Period  [d]", "K  [m/s]", "quiet", "active", "floor <0.5> & below"]));
  // The point of row 1, and the point of row 3 with its ring; row 2 has no K. Two more stand in the legend.
  expect(elements.filter((name) => name === "circle")).toHaveLength(4);
  expect(elements.filter((name) => name === "rect" || name === "circle")).not.toHaveLength(0);
});

test("points lie where their values are", () => {
  const frame = frameOf(400, 300, figure);
  const [low, middle, high] = [1, 10, 100].map((period) => placeX(frame, figure, period)) as [number, number, number];
  expect(middle - low).toBeCloseTo(high - middle, 9);
  expect(placeY(frame, figure, 10)).toBeLessThan(placeY(frame, figure, 0.1));
});

test("the same words have the same colour and shape", () => {
  expect([...(figure.brush?.paint ?? [])]).toEqual([0, 1, 0]);
  expect(figure.legend.map(({ paint }) => paint.shape)).toEqual(["circle", "square"]);
});
