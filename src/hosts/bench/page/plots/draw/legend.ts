import type { LegendEntry } from "./figure.js";
import type { Palette } from "./palette.js";
import type { Surface } from "./surface.js";

const letters = 12;
const left = 66;
const lineHeight = 18;

/** Where the entries stand, line by line, and how high they are together. */
function placesOf(legend: readonly LegendEntry[], width: number): { places: [number, number][]; height: number } {
  let [x, y] = [left, 11];
  const places = legend.map(({ text }): [number, number] => {
    const wide = 30 + 6.6 * text.length;
    if (x > left && x + wide > width) [x, y] = [left, y + lineHeight];
    const place: [number, number] = [x, y];
    x += wide;
    return place;
  });
  return { places, height: legend.length === 0 ? 0 : y + lineHeight - 11 };
}

export function legendHeight(legend: readonly LegendEntry[], width: number): number {
  return placesOf(legend, width).height;
}

export function drawLegend(surface: Surface, legend: readonly LegendEntry[], width: number, palette: Palette): void {
  const { places } = placesOf(legend, width);
  for (const [index, { text, paint, dash }] of legend.entries()) {
    const [x, y] = places[index] as [number, number];
    const colour = palette.colour(paint.colour);
    if (dash) surface.line([x - 9, y, x + 5, y], { colour, width: 2, dash });
    else surface.shape(paint.shape, x, y, 4, colour);
    surface.text(text, x + 9, y + 4, { colour: palette.ink, size: letters, align: "start" });
  }
}
