import { render } from "lit-html";
import { faultText } from "../createPage.js";
import { download } from "../download.js";
import type { Page } from "../page.js";
import { onWords } from "../panels/plan/planWords.js";
import { showOnly } from "../shell/showOnly.js";
import { brush } from "./brush.js";
import { canvasSurface } from "./draw/canvasSurface.js";
import { type Chosen, drawFigure, type Frame, frameOf } from "./draw/drawFigure.js";
import type { Figure } from "./draw/figure.js";
import { paletteOf } from "./draw/palette.js";
import { svgSurface } from "./draw/svgSurface.js";
import { makeFigure } from "./makeFigure.js";
import { keepSettings, kindsOfPlan, kindsOfRows, onPlotAsked, readSettings } from "./plotSettings.js";
import { plotsView } from "./plotsView.js";

/** [ms] */
const restAfterEdit = 200;

export interface StartedPlots {
  shown(isShown: boolean): void;
}

/** Draws the plot beside the table and keeps it as the table is. */
export function startPlots(section: HTMLElement, page: Page): StartedPlots {
  const controls = document.createElement("div");
  const area = document.createElement("div");
  area.className = "plot-area";
  const canvas = document.createElement("canvas");
  canvas.className = "plot-canvas";
  canvas.setAttribute("role", "img");
  const box = document.createElement("div");
  box.className = "plot-brush";
  box.hidden = true;
  const tip = document.createElement("div");
  tip.className = "plot-tip";
  tip.hidden = true;
  area.append(canvas, box, tip);
  section.append(controls, area);

  let settings = readSettings();
  let figure: Figure | undefined;
  let told = { missing: "", note: "" };
  let isShown = false;
  let asked = 0;
  let isQueued = false;
  let waiting: ReturnType<typeof setTimeout> | undefined;

  function drawControls(): void {
    const showPlan = () => page.prefer({ panel: "plan" });
    const actions = { set, save, showMarked, showPlan, unmark: () => page.markRows([]) };
    render(plotsView(page, settings, told, actions), controls);
  }

  function set(change: Partial<typeof settings>): void {
    settings = { ...settings, ...change };
    keepSettings(settings);
    void make();
  }

  async function make(): Promise<void> {
    if (!isShown) return;
    asked += 1;
    const mine = asked;
    try {
      const made = await makeFigure(page, settings);
      if (mine !== asked) return;
      figure = "figure" in made ? made.figure : undefined;
      told = "missing" in made ? { missing: made.missing, note: "" } : { missing: "", note: made.note ?? "" };
    } catch (fault) {
      page.trouble(faultText(fault));
    }
    drawControls();
    drawSoon();
  }

  /** A plan reads whole tables: the cells that an edit changed come first. */
  function makeSoon(): void {
    clearTimeout(waiting);
    waiting = setTimeout(() => void make(), restAfterEdit);
  }

  const size = () => ({ width: Math.max(120, area.clientWidth), height: Math.max(100, area.clientHeight) });
  const frame = (): Frame | undefined => figure && frameOf(size().width, size().height, figure);
  const font = () => getComputedStyle(section).fontFamily;

  function drawSoon(): void {
    if (isQueued) return;
    isQueued = true;
    requestAnimationFrame(() => {
      isQueued = false;
      draw();
    });
  }

  function draw(): void {
    if (!isShown) return;
    canvas.hidden = figure === undefined;
    if (!figure) return;
    const { width, height } = size();
    const sharp = devicePixelRatio || 1;
    canvas.width = Math.round(width * sharp);
    canvas.height = Math.round(height * sharp);
    canvas.style.width = `${width}px`;
    canvas.style.height = `${height}px`;
    canvas.setAttribute("aria-label", figure.description);
    const context = canvas.getContext("2d");
    if (!context) return;
    context.scale(sharp, sharp);
    drawFigure(canvasSurface(context, font()), width, height, figure, paletteOf(section), chosenRows());
  }

  /** Rows that a brush marked; without them those selected in the table. */
  function chosenRows(): Chosen {
    const marked = page.marked();
    if (marked.size > 0) return { rows: marked, any: true };
    const { top, bottom } = page.selection().area;
    const isWhole = top === 0 && bottom >= page.sheetState().rows - 1;
    return { rows: { has: (row) => row >= top && row <= bottom }, any: !isWhole };
  }

  function showMarked(): void {
    showOnly(page).then(
      (outcome) => {
        if (outcome.is === "refused") page.trouble(outcome.message);
      },
      (fault: unknown) => page.trouble(faultText(fault)),
    );
  }

  function save(type: "svg" | "png"): void {
    if (!figure) return;
    const { width, height } = size();
    const name = `${page.state().title} plot.${type}`;
    if (type === "svg") {
      const surface = svgSurface(width, height, font());
      drawFigure(surface, width, height, figure, paletteOf(section), chosenRows());
      download(name, new Blob([surface.document()], { type: "image/svg+xml" }));
      return;
    }
    const picture = document.createElement("canvas");
    picture.width = 2 * width;
    picture.height = 2 * height;
    const context = picture.getContext("2d");
    if (!context) return;
    context.scale(2, 2);
    drawFigure(canvasSurface(context, font()), width, height, figure, paletteOf(section), chosenRows());
    picture.toBlob((blob) => blob && download(name, blob), "image/png");
  }

  function hovered(row: number | undefined, at: { readonly x: number; readonly y: number }): void {
    tip.hidden = row === undefined;
    if (row === undefined) return;
    const name = page.cells.cellAt(page.cells.viewRow(row), 0)?.text;
    tip.textContent = name ? `${name}, row ${row + 1}` : `row ${row + 1}`;
    tip.style.left = `${Math.min(at.x + 12, size().width - 160)}px`;
    tip.style.top = `${Math.max(0, at.y - 28)}px`;
  }

  function brushed(rows: readonly number[]): void {
    page.markRows(rows);
    const [row] = rows;
    if (rows.length !== 1 || row === undefined) return;
    const { column } = page.selection().active;
    const sheet = page.sheet();
    page.select({ sheet, top: row, left: column, bottom: row, right: column });
  }

  brush(canvas, box, { figure: () => figure, frame, brushed, hovered });
  new ResizeObserver(drawSoon).observe(area);
  matchMedia("(prefers-color-scheme: dark)").addEventListener("change", drawSoon);
  page.onChange((change) => {
    const isOfRow = kindsOfRows.includes(settings.kind);
    const isAboutRows = change === "selection" || change === "marked";
    if (change === "state" && kindsOfPlan.includes(settings.kind)) makeSoon();
    else if (change === "state" || change === "sheet" || (isAboutRows && isOfRow)) void make();
    else if (isShown) {
      if (change === "marked") drawControls();
      drawSoon();
    }
  });

  onPlotAsked(set);
  onWords(() => {
    if (kindsOfPlan.includes(settings.kind)) void make();
  });

  return {
    shown(wanted) {
      isShown = wanted;
      if (wanted) void make();
    },
  };
}
