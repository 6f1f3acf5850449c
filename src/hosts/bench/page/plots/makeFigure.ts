import type { PlotColumn } from "../../protocol/answers.js";
import type { Page } from "../page.js";
import { columnsFigure } from "./figures/columnsFigure.js";
import { dateFigure, phaseFigure } from "./figures/curveFigure.js";
import type { Made } from "./made.js";
import { firstNight, makePlanFigure } from "./makePlanFigure.js";
import { makeRevisionFigure } from "./makeRevisionFigure.js";
import type { PlotSettings } from "./plotSettings.js";

const orbitsShown = 4;

/** The figure that the settings ask for, from the book as it is. */
export async function makeFigure(page: Page, settings: PlotSettings): Promise<Made> {
  switch (settings.kind) {
    case "columns":
      return columnsPlot(page, settings);
    case "signal":
      return signalPlot(page, settings);
    case "revision":
      return makeRevisionFigure(page, settings);
    case "hours":
    case "visibility":
    case "night":
      return makePlanFigure(page, settings.kind, settings);
    default:
      return curvePlot(page, settings.kind);
  }
}

async function columnsPlot(page: Page, settings: PlotSettings): Promise<Made> {
  const [x, y] = [columnNamed(page, settings.x), columnNamed(page, settings.y)];
  if (x === undefined || y === undefined) return { missing: "Choose a column for each axis." };
  return drawn(page, settings, x, y, levelOf(settings.level));
}

/** Semi-amplitude against period, both logarithmic, with the floor of the instrument. */
async function signalPlot(page: Page, settings: PlotSettings): Promise<Made> {
  const columns = await page.bench.columnsOf(page.sheet());
  const [x, y] = [columns.period, columns.semiAmplitude];
  if (x === undefined || y === undefined) {
    const lacks = x === undefined ? "a period, such as Period [d]" : "a semi-amplitude, such as K [m/s]";
    return { missing: `This plot needs a column with ${lacks}.` };
  }
  const floor = levelOf(settings.level);
  const level = floor && { ...floor, text: `floor of the instrument ${floor.text}` };
  return drawn(page, { ...settings, xLog: true, yLog: true }, x, y, level);
}

async function drawn(
  page: Page,
  settings: PlotSettings,
  x: number,
  y: number,
  level: { readonly value: number; readonly text: string } | undefined,
): Promise<Made> {
  const colour = settings.colour === "" ? undefined : columnNamed(page, settings.colour);
  const wanted = [x, y, ...(colour === undefined ? [] : [colour])];
  const columns = await Promise.all(wanted.map((column) => page.bench.plotColumn(page.sheet(), column)));
  const [across, up, painted] = columns as [PlotColumn, PlotColumn, PlotColumn | undefined];
  const { xLog, yLog, errors } = settings;
  return { figure: columnsFigure({ x: across, y: up, colour: painted, xLog, yLog, errors, level }) };
}

async function curvePlot(page: Page, kind: "phase" | "dates"): Promise<Made> {
  const curve = await page.bench.curve(page.sheet(), page.selection().active.row);
  if (curve.is === "missing") return { missing: curve.message };
  const figure = kind === "phase" ? phaseFigure(curve) : dateFigure(curve, orbitsShown, firstNight(page));
  return figure ? { figure } : { missing: "Dates need a column with the period." };
}

function columnNamed(page: Page, header: string): number | undefined {
  const at = page.sheetState().columnStates.findIndex((state) => headerText(state) === header);
  return at < 0 ? undefined : at;
}

export function headerText({ name, unit }: { readonly name: string; readonly unit: string }): string {
  return unit === "" ? name : `${name} [${unit}]`;
}

function levelOf(text: string): { readonly value: number; readonly text: string } | undefined {
  const value = Number(text);
  return text.trim() !== "" && Number.isFinite(value) ? { value, text: text.trim() } : undefined;
}
