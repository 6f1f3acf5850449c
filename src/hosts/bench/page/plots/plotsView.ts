import { html, nothing, type TemplateResult } from "lit-html";
import type { Page } from "../page.js";
import { headerText } from "./makeFigure.js";
import { kindsOfPlan, type PlotKind, type PlotSettings } from "./plotSettings.js";

const kindWords: Readonly<Record<PlotKind, string>> = {
  signal: "Signal against period",
  columns: "Any two columns",
  phase: "Velocity over the orbit of the selected row",
  dates: "Velocity over dates of the selected row",
  hours: "Hours against targets",
  visibility: "Dark hours of the selected rows over the plan's nights",
  night: "One night of the selected rows",
  revision: "What a revision moved",
};

export interface PlotActions {
  set(change: Partial<PlotSettings>): void;
  save(type: "svg" | "png"): void;
  showMarked(): void;
  /** Opens the panel that says where and when is planned. */
  showPlan(): void;
  unmark(): void;
}

export interface PlotTold {
  /** What keeps it from being drawn. */
  readonly missing: string;
  /** What to know beside it. */
  readonly note: string;
}

/** What the plot shows, in words that can be changed. */
export function plotsView(
  page: Page,
  settings: PlotSettings,
  { missing, note }: PlotTold,
  actions: PlotActions,
): TemplateResult {
  const { kind } = settings;
  const isColumns = kind === "columns";
  const hasAxes = isColumns || kind === "revision";
  const isOfPlan = kindsOfPlan.includes(kind);
  const hasPoints = isColumns || kind === "signal";
  const marked = page.marked().size;
  return html`<div class="plot-controls">
      ${choice("plot-kind", "Plot", Object.entries(kindWords), kind, (value) => actions.set({ kind: value as PlotKind }))}
      ${
        hasAxes
          ? html`${columnChoice(page, "plot-y", "of", settings.y, (y) => actions.set({ y }))}
            ${columnChoice(page, "plot-x", "against", settings.x, (x) => actions.set({ x }))}
            ${box("log across", settings.xLog, (xLog) => actions.set({ xLog }))}
            ${box("log up", settings.yLog, (yLog) => actions.set({ yLog }))}`
          : nothing
      }
      ${
        hasPoints
          ? html`${columnChoice(page, "plot-colour", "coloured by", settings.colour, (colour) => actions.set({ colour }), "nothing")}
            ${box("uncertainties", settings.errors, (errors) => actions.set({ errors }))}
            <span class="plot-level"><label for="plot-level">${kind === "signal" ? "floor" : "line at"}</label>
              <input id="plot-level" type="text" inputmode="decimal" .value=${settings.level} @change=${(event: Event) => actions.set({ level: (event.target as HTMLInputElement).value })} /></span>`
          : nothing
      }
      ${kind === "hours" ? box("log up", settings.yLog, (yLog) => actions.set({ yLog })) : nothing}
      ${
        kind === "night"
          ? html`<span class="plot-level plot-night"><label for="plot-night">of</label>
              <input id="plot-night" type="text" placeholder="first night" aria-label="Date of the night's evening; the first of the plan where it is blank" .value=${settings.night} @change=${(event: Event) => actions.set({ night: (event.target as HTMLInputElement).value })} /></span>`
          : nothing
      }
      <span class="plot-save">
        <button type="button" class="quiet" @click=${() => actions.save("svg")}>Save SVG</button>
        <button type="button" class="quiet" @click=${() => actions.save("png")}>Save PNG</button>
      </span>
    </div>
    ${
      marked > 0
        ? html`<p class="plot-marked" role="status">${marked} ${marked === 1 ? "row is" : "rows are"} marked.
            <button type="button" class="quiet" @click=${actions.showMarked}>Show only these</button>
            <button type="button" class="quiet" @click=${actions.unmark}>Unmark</button></p>`
        : nothing
    }
    ${
      missing
        ? html`<p class="plot-missing">${missing}${isOfPlan ? html` <button type="button" class="quiet" @click=${actions.showPlan}>Show the plan</button>` : nothing}</p>`
        : nothing
    }
    ${note ? html`<p class="plot-missing" role="status">${note}</p>` : nothing}`;
}

function columnChoice(
  page: Page,
  id: string,
  label: string,
  value: string,
  set: (value: string) => void,
  none = "choose a column",
): TemplateResult {
  const headers = page
    .sheetState()
    .columnStates.map(headerText)
    .filter((header) => header !== "");
  const entries = headers.map((header): [string, string] => [header, header]);
  return choice(id, label, [["", none], ...entries], value, set);
}

function choice(
  id: string,
  label: string,
  entries: readonly (readonly [string, string])[],
  value: string,
  set: (value: string) => void,
): TemplateResult {
  return html`<span class="plot-choice"><label for=${id}>${label}</label>
    <select id=${id} @change=${(event: Event) => set((event.target as HTMLSelectElement).value)}>
      ${entries.map(([key, words]) => html`<option value=${key} ?selected=${key === value}>${words}</option>`)}
    </select></span>`;
}

function box(words: string, value: boolean, set: (value: boolean) => void): TemplateResult {
  return html`<label class="shell-check"><input type="checkbox" .checked=${value} @change=${(event: Event) => set((event.target as HTMLInputElement).checked)} /> ${words}</label>`;
}
