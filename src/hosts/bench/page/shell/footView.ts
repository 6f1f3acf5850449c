import { html, nothing, type TemplateResult } from "lit-html";
import type { Summary } from "../../protocol/answers.js";
import type { Page } from "../page.js";
import { isFiltered } from "./isFiltered.js";

export interface Progress {
  readonly what: string;
  readonly done: number;
  readonly total: number;
}

export interface FootActions {
  nextProblem(): void;
  cancel(): void;
  showAll(): void;
}

/** What is selected, in numbers; what needs attention; work that goes on. */
export function footView(
  page: Page,
  summary: Summary | undefined,
  progress: Progress | undefined,
  actions: FootActions,
): TemplateResult {
  const { problems } = page.state();
  const { rows, visibleRows } = page.sheetState();
  return html`<p class="shell-summary number">${summary ? summaryText(summary) : ""}</p>
    ${
      isFiltered(page)
        ? html`<p>${Math.max(0, visibleRows - 1).toLocaleString("en")} of ${Math.max(0, rows - 1).toLocaleString("en")} rows are shown <button type="button" class="quiet" @click=${actions.showAll}>Show all rows</button></p>`
        : nothing
    }
    ${
      progress
        ? html`<p class="shell-progress"><label>${progress.what} <progress max=${Math.max(1, progress.total)} .value=${progress.done}></progress></label>
          <button type="button" class="quiet" @click=${actions.cancel}>Stop</button></p>`
        : nothing
    }
    ${
      problems > 0
        ? html`<button type="button" class="quiet shell-problems" @click=${actions.nextProblem}><span class="mark" aria-hidden="true"></span>${problems.toLocaleString("en")} ${problems === 1 ? "cell needs" : "cells need"} attention</button>`
        : nothing
    }`;
}

function summaryText({ filled, numbers, errors, sum, mean, least, most, unit }: Summary): string {
  if (filled < 2) return "";
  const of = unit === "" ? "" : ` ${unit}`;
  const parts = [`${filled.toLocaleString("en")} cells`];
  if (errors > 0) parts.push(`${errors.toLocaleString("en")} without an answer`);
  if (numbers > 1) {
    parts.push(`${figures(least)} to ${figures(most)}${of}`, `mean ${figures(mean)}${of}`, `sum ${figures(sum)}${of}`);
  }
  return parts.join("  ·  ");
}

function figures(value: number): string {
  const size = Math.abs(value);
  return value === 0 || (size >= 1e-3 && size < 1e7) ? String(Number(value.toPrecision(6))) : value.toExponential(4);
}
