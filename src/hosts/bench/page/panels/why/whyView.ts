import { html, nothing, type TemplateResult } from "lit-html";
import type { Place } from "../../../../../sheet/book/book.js";
import type { Distribution, WhyCall, WhyCell, WhyInput } from "../../../protocol/answers.js";
import { distributionView } from "./distributionView.js";
import { mathView } from "./mathView.js";

export interface WhyActions {
  draw(): void;
  goTo(place: Place): void;
}

/** A cell of the same row that a formula fills. */
export interface WorkedOut {
  readonly name: string;
  readonly address: string;
  readonly place: Place;
}

export function whyView(
  cell: WhyCell | undefined,
  workedOut: readonly WorkedOut[] | undefined,
  distribution: Distribution | "drawing" | undefined,
  actions: WhyActions,
): TemplateResult {
  if (!cell) return html`<p class="soft">Select a cell to see where its value comes from.</p>`;
  return html`<div class="panel-headline">
      <h3 class="panel-address">${cell.address}</h3>
      ${cell.changedBy ? html`<span class="soft">last changed by: ${cell.changedBy}</span>` : nothing}
    </div>
    ${answerView(cell)} ${cell.formula ? html`<p class="code panel-formula">${cell.formula}</p>` : nothing}
    ${
      cell.filledFrom
        ? html`<p class="soft">Filled by the formula in ${link(cell.filledFrom.address, cell.filledFrom.place, actions)}.</p>`
        : nothing
    }
    ${cell.call ? callView(cell, cell.call, distribution, actions) : readsView(cell, actions)}
    ${workedOut ? workedOutView(workedOut, actions) : nothing}`;
}

/** The way from what was typed to what comes of it, for whoever sees a table the first time. */
function workedOutView(cells: readonly WorkedOut[], actions: WhyActions): TemplateResult {
  if (cells.length === 0) {
    return html`<p class="soft">Nothing is worked out in this table yet. Name a free column in row 1, for example K [m/s]; below it type = and what you want to know.</p>`;
  }
  return html`<h3>Worked out in this row</h3>
    <p class="soft">Go to one to see why it has its value; type over an input, and what follows from it changes.</p>
    <ul class="panel-inputs">
      ${cells.map(
        ({ name, address, place }) =>
          html`<li><span class="panel-name">${link(address, place, actions)}</span><span>${name}</span></li>`,
      )}
    </ul>`;
}

function answerView({ value, exact, unit, error, formula, call }: WhyCell): TemplateResult {
  if (error !== undefined)
    return html`<p class="panel-fault"><span class="mark" aria-hidden="true"></span><b>${value}</b> ${error}</p>`;
  if (value === "" && formula === undefined) {
    return html`<p class="soft">This cell is blank. Type a value, or = and a question.</p>`;
  }
  const shown = call?.result ?? value;
  return html`<p class="panel-answer"><span class="number">${shown}</span>${unit ? html` <span class="unit">${unit}</span>` : nothing}</p>
    ${exact !== shown && exact !== "" ? html`<p class="soft">exactly <span class="number">${exact}</span></p>` : nothing}
    ${formula === undefined ? html`<p class="soft">Typed or loaded; no formula stands here.</p>` : nothing}`;
}

function callView(
  cell: WhyCell,
  call: WhyCall,
  distribution: Distribution | "drawing" | undefined,
  actions: WhyActions,
): TemplateResult {
  const shared = call.inputs.filter(({ share }) => share !== undefined);
  return html`${call.part ? html`<p class="soft">The call of ${call.name} is a part of this formula; its own result is told here.</p>` : nothing}
    <p>${call.question}</p>
    <h3>Inputs as they were read</h3>
    <ul class="panel-inputs">${call.inputs.map((input) => inputView(input, actions))}</ul>
    ${shared.length > 0 ? sharesView(shared) : nothing}
    ${call.canDraw ? distributionPart(cell, distribution, actions) : nothing}
    <h3>How</h3>
    ${mathView(call.formulaMath, call.formula)}
    <p class="soft">${call.source}</p>
    ${call.note ? html`<p class="soft">${call.note}</p>` : nothing}`;
}

function inputView(input: WhyInput, actions: WhyActions): TemplateResult {
  const { name, cell, address, place, read, base, header, assumed, problem } = input;
  return html`<li>
    <span class="panel-name">${name}${address && place ? html` ${link(address, place, actions)}` : address ? html` <span class="soft">${address}</span>` : nothing}</span>
    <span class="panel-read number">${problem ? html`<span class="mark" aria-hidden="true"></span>` : nothing}${
      read ?? (assumed !== undefined ? `left out: ${assumed}` : cell === "" ? "blank" : cell)
    }</span>
    ${base ? html`<span class="soft number">${base}</span>` : nothing}
    ${header ? html`<span class="soft">header ${header}</span>` : nothing}
  </li>`;
}

function sharesView(shared: readonly WhyInput[]): TemplateResult {
  const sorted = [...shared].sort((a, b) => (b.share as number) - (a.share as number));
  return html`<h3>Whose uncertainty it is</h3>
    <ul class="panel-shares">
      ${sorted.map(({ name, share }) => {
        const part = share as number;
        return html`<li>
          <span>${name}</span><span class="number">${percentText(part)}</span>
          <svg class="panel-bar" aria-hidden="true" viewBox="0 0 100 6" preserveAspectRatio="none"><rect class="panel-bar-ground" width="100" height="6" /><rect class="panel-bar-part" width=${100 * part} height="6" /></svg>
        </li>`;
      })}
    </ul>
    <p class="soft">Parts of the variance at first order; the inputs count as independent.</p>`;
}

function distributionPart(
  cell: WhyCell,
  distribution: Distribution | "drawing" | undefined,
  actions: WhyActions,
): TemplateResult {
  return html`<h3>Drawn from the uncertainties</h3>
    ${
      distribution === undefined
        ? html`<p class="soft">10,000 draws of the inputs show where the first order is not enough.</p>
          <button type="button" @click=${actions.draw}>Draw the distribution of ${cell.address}</button>`
        : distribution === "drawing"
          ? html`<p role="status">Drawing…</p>`
          : distributionView(distribution)
    }`;
}

function readsView({ reads }: WhyCell, actions: WhyActions): TemplateResult {
  if (reads.length === 0) return html``;
  return html`<h3>It reads</h3>
    <ul class="panel-inputs">
      ${reads.map(
        ({ address, place, text }) => html`<li>
          <span class="panel-name">${link(address, place, actions)}</span><span class="panel-read number">${text === "" ? "blank" : text}</span>
        </li>`,
      )}
    </ul>`;
}

function link(address: string, place: Place, actions: WhyActions): TemplateResult {
  return html`<button type="button" class="quiet panel-link" @click=${() => actions.goTo(place)}>${address}</button>`;
}

function percentText(share: number): string {
  const text = (100 * share).toFixed(1);
  return share > 0 && text === "0.0" ? "below 0.1 %" : `${text} %`;
}
