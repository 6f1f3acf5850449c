import { html, nothing, type TemplateResult } from "lit-html";
import { displayNumber } from "../../../../sheet/display/displayNumber.js";
import type { Comparison, Movement } from "../../../../table/compareTables.js";
import { kindOfChange } from "../../../../table/kindOfChange.js";
import { columnsText, type Mark } from "../../../../table/mark.js";
import { readHeader } from "../../../../units/readHeader.js";
import { cellView } from "../measured.js";
import type { CompareActions, CompareState } from "./compareState.js";

/** The pane shows the largest; the sheet holds all. */
const mostShown = 200;

export function compareView(state: CompareState, actions: CompareActions): TemplateResult {
  const { marks, chosen, problem } = state;
  return html`
    <h2>Mark and compare</h2>
    <p class="aside">A mark remembers what the formulas of this sheet give now. Change a mass, a unit, anything; then see what moved.</p>
    <button type="button" class="main" @click=${actions.mark}>Mark the present values</button>
    ${problem ? html`<p class="caution" role="alert"><span class="mark" aria-hidden="true"></span>${problem}</p>` : nothing}
    ${chosen && marks ? markView(marks, chosen, state, actions) : nothing}
  `;
}

function markView(
  marks: readonly Mark[],
  chosen: Mark,
  { comparison, forgetting }: CompareState,
  actions: CompareActions,
): TemplateResult {
  return html`
    <div class="field">
      <label for="mark">compare with the mark of</label>
      <select id="mark" @change=${(event: Event) => actions.choose(marks[(event.target as HTMLSelectElement).selectedIndex]!)}>
        ${marks.map((mark) => html`<option .selected=${mark === chosen}>${timeText(mark)}, ${mark.sheet}: ${columnsText(mark)}</option>`)}
      </select>
    </div>
    <div class="row">
      <button type="button" @click=${actions.compare}>Compare with now</button>
      <button type="button" class="quiet" @click=${actions.forget}>${forgetting ? "Forget it for good" : "Forget this mark"}</button>
    </div>
    <div role="status">${comparison ? summaryView(comparison) : nothing}</div>
    ${comparison && comparison.movements.length > 0 ? movementsView(comparison, actions) : nothing}
  `;
}

function summaryView({ movements, onlyBefore, onlyAfter }: Comparison): TemplateResult {
  const count = movements.length === 1 ? "1 value moved." : `${movements.length.toLocaleString("en")} values moved.`;
  return html`<p><b>${movements.length === 0 ? "Nothing moved." : count}</b></p>
    ${onlyBefore.length > 0 ? html`<p class="caution"><span class="mark" aria-hidden="true"></span>No longer there, so not compared: ${onlyBefore.join(", ")}.</p>` : nothing}
    ${onlyAfter.length > 0 ? html`<p class="aside">New since the mark: ${onlyAfter.join(", ")}.</p>` : nothing}`;
}

function movementsView({ movements }: Comparison, actions: CompareActions): TemplateResult {
  const rest = movements.length - mostShown;
  return html`
    <ul class="movements">
      ${movements.slice(0, mostShown).map((movement) => movementView(movement, actions))}
    </ul>
    ${rest > 0 ? html`<p class="aside">and ${rest.toLocaleString("en")} more, smaller ones; the sheet holds all.</p>` : nothing}
    <button type="button" @click=${actions.writeSheet}>Write all to a new sheet</button>
  `;
}

function movementView(movement: Movement, actions: CompareActions): TemplateResult {
  const { key, header, before, after, change, relative, sigmas } = movement;
  const { name, unit } = readHeader(header);
  return html`<li>
    <button type="button" class="movement" @click=${() => actions.goTo(movement)}>
      <span class="of"><b>${key}</b> <span class="name">${name || header}</span></span>
      <span class="values">${cellView([before], undefined)} <span class="to">to</span> ${cellView([after], unit?.text)}</span>
      <span class="sizes">${
        change === undefined
          ? html`<span class="size whole">${kindOfChange(movement)}</span>`
          : html`<span class="size number">${signed(change, 4)}</span>
              <span class="size number">${relative === undefined ? "from 0" : `${signed(100 * relative, 3)} %`}</span>
              <span class="size number">${sigmas === undefined ? "no \u03c3" : `${signed(sigmas, 3)} \u03c3`}</span>`
      }</span>
    </button>
  </li>`;
}

function signed(value: number, digits: number): string {
  const text = displayNumber(Math.abs(value), { kind: "significant", digits });
  return `${value < 0 ? "\u2212" : "+"}${text}`;
}

function timeText({ taken }: Mark): string {
  return `${taken.slice(0, 10)} ${taken.slice(11, 16)} UTC`;
}
