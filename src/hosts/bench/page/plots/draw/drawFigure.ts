import { type Axis, partOf, type Tick, ticksOf } from "./axis.js";
import type { ArrowLayer, Figure, Layer, LevelLayer, LineLayer, PointLayer } from "./figure.js";
import { drawLegend, legendHeight } from "./legend.js";
import type { Palette } from "./palette.js";
import type { Surface } from "./surface.js";
import { timeTicks } from "./timeTicks.js";

export interface Frame {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

export interface Chosen {
  /** Rows that are set apart, because they are selected in the table or by a brush. */
  readonly rows: { has(row: number): boolean };
  readonly any: boolean;
}

const letters = 12;
/** More points than this are small squares: a shape each would take too long. */
const mostShapes = 8_000;

export function frameOf(width: number, height: number, figure: Figure): Frame {
  const legend = legendHeight(figure.legend, width);
  return { left: 62, top: 10 + legend, width: Math.max(40, width - 78), height: Math.max(40, height - 54 - legend) };
}

/** Draws the axes and every layer within a size. */
export function drawFigure(
  surface: Surface,
  width: number,
  height: number,
  figure: Figure,
  palette: Palette,
  chosen: Chosen,
): void {
  const frame = frameOf(width, height, figure);
  surface.fill(0, 0, width, height, palette.ground);
  const bands = figure.layers.filter(({ draw }) => draw === "bands");
  for (const layer of bands) drawLayer(surface, frame, figure, layer, palette, chosen);
  drawAxes(surface, frame, figure, palette);
  surface.clip(frame.left, frame.top, frame.width, frame.height);
  for (const layer of figure.layers) {
    if (layer.draw !== "bands") drawLayer(surface, frame, figure, layer, palette, chosen);
  }
  surface.release();
  drawLegend(surface, figure.legend, width, palette);
}

export function placeX({ left, width }: Frame, { x }: Figure, value: number): number {
  return left + partOf(x, value) * width;
}

export function placeY({ top, height }: Frame, { y }: Figure, value: number): number {
  return top + (1 - partOf(y, value)) * height;
}

function drawAxes(surface: Surface, frame: Frame, figure: Figure, palette: Palette): void {
  const { left, top, width, height } = frame;
  const grid = { colour: palette.line, width: 1 };
  const words = { colour: palette.soft, size: letters };
  for (const { value, text } of ticksAcross(figure.x, Math.floor(width / 72))) {
    const x = placeX(frame, figure, value);
    if (x < left - 0.5 || x > left + width + 0.5) continue;
    surface.line([x, top, x, top + height], grid);
    surface.text(text, x, top + height + 16, { ...words, align: "middle" });
  }
  for (const { value, text } of ticksOf(figure.y, Math.floor(height / 32))) {
    const y = placeY(frame, figure, value);
    if (y < top - 0.5 || y > top + height + 0.5) continue;
    surface.line([left, y, left + width, y], grid);
    surface.text(text, left - 6, y + 4, { ...words, align: "end" });
  }
  surface.line([left, top, left, top + height, left + width, top + height], { colour: palette.soft, width: 1 });
  const ink = { colour: palette.ink, size: letters };
  surface.text(axisText(figure.x), left + width / 2, top + height + 36, { ...ink, align: "middle" });
  surface.text(axisText(figure.y), 14, top + height / 2, { ...ink, align: "middle", turned: true });
}

function ticksAcross(axis: Axis, most: number): Tick[] {
  return axis.times === undefined ? ticksOf(axis, most) : timeTicks(axis, most);
}

function axisText({ label, unit }: { readonly label: string; readonly unit: string }): string {
  return unit === "" ? label : `${label}  [${unit}]`;
}

function drawLayer(
  surface: Surface,
  frame: Frame,
  figure: Figure,
  layer: Layer,
  palette: Palette,
  chosen: Chosen,
): void {
  switch (layer.draw) {
    case "points":
      drawPoints(surface, frame, figure, layer, palette, chosen);
      break;
    case "line":
      surface.line(placed(frame, figure, layer), {
        colour: palette.colour(layer.colour),
        width: 1.5,
        dash: layer.dash ?? [],
      });
      break;
    case "level":
      drawLevel(surface, frame, figure, layer, palette);
      break;
    case "arrows":
      drawArrows(surface, frame, figure, layer, palette, chosen);
      break;
    case "bands":
      for (const [from, to] of layer.stretches) {
        const x = Math.max(frame.left, placeX(frame, figure, from));
        const end = Math.min(frame.left + frame.width, placeX(frame, figure, to));
        if (end > x) surface.fill(x, frame.top, end - x, frame.height, palette.sunk);
      }
  }
}

function placed(frame: Frame, figure: Figure, { x, y }: LineLayer): Float64Array {
  const points = new Float64Array(2 * x.length);
  for (let index = 0; index < x.length; index++) {
    points[2 * index] = placeX(frame, figure, x[index] as number);
    points[2 * index + 1] = placeY(frame, figure, y[index] as number);
  }
  return points;
}

function drawPoints(
  surface: Surface,
  frame: Frame,
  figure: Figure,
  layer: PointLayer,
  palette: Palette,
  chosen: Chosen,
): void {
  const { x, y, rows, paint, paints } = layer;
  const colours = paints.map(({ colour }) => palette.colour(colour));
  const small = x.length > mostShapes;
  drawErrors(surface, frame, figure, layer, palette);
  const front: number[] = [];
  for (let index = 0; index < x.length; index++) {
    if (chosen.any && chosen.rows.has(rows[index] as number)) {
      front.push(index);
      continue;
    }
    const at = [placeX(frame, figure, x[index] as number), placeY(frame, figure, y[index] as number)] as const;
    if (!Number.isFinite(at[0]) || !Number.isFinite(at[1])) continue;
    const which = paint?.[index] ?? 0;
    if (small) surface.fill(at[0] - 1, at[1] - 1, 2, 2, colours[which] as string);
    else surface.shape(paints[which]?.shape ?? "circle", at[0], at[1], 3.2, colours[which] as string);
  }
  for (const index of front) {
    const at = [placeX(frame, figure, x[index] as number), placeY(frame, figure, y[index] as number)] as const;
    if (!Number.isFinite(at[0]) || !Number.isFinite(at[1])) continue;
    const { shape } = paints[paint?.[index] ?? 0] ?? { shape: "circle" as const };
    surface.shape(shape, at[0], at[1], 4.6, palette.accent);
    surface.shape("circle", at[0], at[1], 8, palette.ink, true);
  }
}

function drawErrors(surface: Surface, frame: Frame, figure: Figure, layer: PointLayer, palette: Palette): void {
  const { x, y, xError, yError } = layer;
  if (x.length > mostShapes) return;
  const stroke = { colour: palette.soft, width: 1 };
  const bars: number[] = [];
  const inAxis = (value: number, isLog: boolean, least: number) => (isLog && value <= 0 ? least : value);
  for (let index = 0; index < x.length; index++) {
    const [across, up] = [x[index] as number, y[index] as number];
    if (!Number.isFinite(across) || !Number.isFinite(up)) continue;
    const [px, py] = [placeX(frame, figure, across), placeY(frame, figure, up)];
    const upper = yError?.[0][index];
    const lower = yError?.[1][index];
    if (upper !== undefined && lower !== undefined && upper + lower > 0) {
      const bottom = inAxis(up - lower, figure.y.isLog, figure.y.from);
      bars.push(px, placeY(frame, figure, up + upper), px, placeY(frame, figure, bottom), Number.NaN, Number.NaN);
    }
    const right = xError?.[0][index];
    const left = xError?.[1][index];
    if (right !== undefined && left !== undefined && right + left > 0) {
      const start = inAxis(across - left, figure.x.isLog, figure.x.from);
      bars.push(placeX(frame, figure, start), py, placeX(frame, figure, across + right), py, Number.NaN, Number.NaN);
    }
  }
  surface.line(bars, stroke);
}

function drawLevel(surface: Surface, frame: Frame, figure: Figure, layer: LevelLayer, palette: Palette): void {
  const { left, top, width, height } = frame;
  const stroke = { colour: palette.accent, width: 1.5, dash: [6, 4] };
  const words = { colour: palette.accent, size: letters };
  if (layer.along === "y") {
    const y = placeY(frame, figure, layer.value);
    surface.line([left, y, left + width, y], stroke);
    surface.text(layer.text, left + width - 6, y < top + 18 ? y + 14 : y - 5, { ...words, align: "end" });
  } else {
    const x = placeX(frame, figure, layer.value);
    surface.line([x, top, x, top + height], stroke);
    surface.text(layer.text, x + 5, top + 14, { ...words, align: "start" });
  }
}

function drawArrows(
  surface: Surface,
  frame: Frame,
  figure: Figure,
  { from, to, rows }: ArrowLayer,
  palette: Palette,
  chosen: Chosen,
): void {
  for (let index = 0; index < rows.length; index++) {
    const [x0, y0] = [placeX(frame, figure, from.x[index] as number), placeY(frame, figure, from.y[index] as number)];
    const [x1, y1] = [placeX(frame, figure, to.x[index] as number), placeY(frame, figure, to.y[index] as number)];
    if (![x0, y0, x1, y1].every(Number.isFinite)) continue;
    const colour = chosen.any && chosen.rows.has(rows[index] as number) ? palette.accent : palette.soft;
    surface.shape("circle", x0, y0, 2.5, colour, true);
    surface.line([x0, y0, x1, y1], { colour, width: 1.2 });
    const angle = Math.atan2(y1 - y0, x1 - x0);
    const wing = (turn: number) => [x1 - 7 * Math.cos(angle + turn), y1 - 7 * Math.sin(angle + turn)] as const;
    if (Math.hypot(x1 - x0, y1 - y0) > 3) surface.line([...wing(0.45), x1, y1, ...wing(-0.45)], { colour, width: 1.2 });
    surface.shape("circle", x1, y1, 2.5, colour);
  }
}
