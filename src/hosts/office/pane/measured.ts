import { html, type TemplateResult } from "lit-html";
import { type Cell, CellError } from "../../../call/cell.js";
import { measuredText } from "../../../sheet/display/measuredText.js";

/** A number, its unit set apart. */
export function withUnit(text: string, unit: string | undefined): TemplateResult {
  const stated = unit === undefined || unit === "1" || unit === "" ? "" : html` <span class="unit">${unit}</span>`;
  return html`<span class="number">${text}</span>${stated}`;
}

/** What a cell holds: a number in its unit, a text, or the message of an error. */
export function cellView([value = null, upper = null, lower = null]: readonly Cell[], unit: string | undefined) {
  if (value instanceof CellError) return errorView(value);
  if (typeof value === "number") return withUnit(measuredText(value, upper, lower), unit);
  return html`<span class="number">${value === null ? "blank" : String(value)}</span>`;
}

/** Errors are told by a mark as well as by their colour. */
export function errorView(error: CellError): TemplateResult {
  const message = error.message === error.code ? "" : error.message;
  return html`<span class="fault"><span class="mark" aria-hidden="true"></span><b>${error.code}</b> ${message}</span>`;
}
