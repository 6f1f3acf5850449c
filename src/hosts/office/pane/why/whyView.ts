import { html, nothing, type TemplateResult } from "lit-html";
import { CellError } from "../../../../call/cell.js";
import type { CellReading } from "../../../../call/readCell.js";
import { type CallStory, isUnread, type ToldInput } from "../../../../call/tellCall.js";
import { resultText } from "../../../../catalog/describeFunction.js";
import { displayNumber } from "../../../../sheet/display/displayNumber.js";
import { measuredText } from "../../../../sheet/display/measuredText.js";
import { general } from "../../../../sheet/display/numberFormat.js";
import { cellView, errorView, withUnit } from "../measured.js";
import type { CellStory } from "./tellCell.js";

export function whyView(cell: CellStory, again: () => void): TemplateResult {
  return html`
    <div class="headline">
      <h2>${cell.address}</h2>
      <button type="button" class="quiet" @click=${again}>Read again</button>
    </div>
    <div role="status">${storyView(cell)}</div>
  `;
}

function storyView(cell: CellStory): TemplateResult {
  switch (cell.is) {
    case "empty":
      return html`<p class="aside">This cell is blank. Select a cell with a BARY formula to see where its value comes from.</p>`;
    case "value":
      return html`<p>This cell holds ${cellView([cell.value], undefined)}, typed there. Select a cell with a BARY formula to see where its value comes from.</p>`;
    case "other formula":
      return html`<p class="code">${cell.formula}</p>
        <p>No BARY function is in this formula.</p>
        ${cell.value instanceof CellError ? html`<p>${errorView(cell.value)}</p>` : nothing}`;
    case "hidden argument":
      return html`<p class="code">${cell.formula}</p>
        <p>An input of ${cell.name} is worked out within the formula, or is a very large range. Put it into a cell of its own, and the whole story can be told.</p>
        ${cell.value instanceof CellError ? html`<p>${errorView(cell.value)}</p>` : nothing}`;
    case "call":
      return callView(cell);
  }
}

function callView({ formula, story, whole, source }: Extract<CellStory, { is: "call" }>): TemplateResult {
  const { definition, inputs, result, upper, lower, unit } = story;
  const shared = inputs.filter(({ share }) => share !== undefined);
  return html`
    <p class="code">${formula}</p>
    ${source ? html`<p class="aside">Filled by the formula in ${source}.</p>` : nothing}
    ${whole ? nothing : html`<p class="aside">The call is a part of this formula; its own result is told here.</p>`}
    <p class="answerLine ${result instanceof CellError ? "isFault" : ""}">${cellView([result, upper, lower], unit)}</p>
    ${typeof result === "number" ? html`<p class="aside exact">exactly <span class="number">${displayNumber(result, general)}</span></p>` : nothing}
    <h3>Inputs as they were read</h3>
    <ul class="inputs">
      ${inputs.map((input, index) => inputView(input, isUnread(story, index)))}
    </ul>
    ${shared.length > 0 ? sharesView(story, shared) : nothing}
    <h3>How</h3>
    <dl class="facts">
      <dt>Question</dt>
      <dd>${definition.question}</dd>
      <dt>Result</dt>
      <dd>${resultText(definition)}</dd>
      <dt>Formula</dt>
      <dd class="formula">${definition.formula}</dd>
      <dt>Source</dt>
      <dd>${definition.source}</dd>
      ${definition.note ? html`<dt>Note</dt><dd>${definition.note}</dd>` : nothing}
    </dl>
  `;
}

function inputView({ name, cell, header, assumed, reading, base }: ToldInput, unread: boolean): TemplateResult {
  return html`<li>
    <span class="name">${name}</span>
    <span class="read">${unread ? html`<span class="mark" aria-hidden="true"></span>` : nothing}${
      reading
        ? withUnit(readText(reading), reading.unit.text)
        : assumed !== undefined
          ? html`left out: ${assumed}`
          : cellView([cell], undefined)
    }</span>
    ${base && reading?.unit.text !== "1" ? html`<span class="aside">${withUnit(displayNumber(base.value, { kind: "significant", digits: 9 }), base.unit)}</span>` : nothing}
    ${header?.text ? html`<span class="aside">${header.address ? `${header.address}: ` : "header "}${header.text}</span>` : nothing}
  </li>`;
}

/** A number without uncertainty is shown with the digits that it has. */
function readText({ value, upper, lower }: CellReading): string {
  return upper === undefined ? displayNumber(value, general) : measuredText(value, upper, lower ?? null);
}

function sharesView({ upper }: CallStory, shared: readonly ToldInput[]): TemplateResult {
  const sorted = [...shared].sort((a, b) => b.share! - a.share!);
  const most = sorted[0]!;
  return html`<h3>Whose uncertainty it is</h3>
    <p>Most of it comes from <b>${most.name}</b>${typeof upper === "number" ? "" : ", as far as it is known"}.</p>
    <ul class="shares">
      ${sorted.map(
        ({ name, share }) => html`<li>
          <span class="name">${name}</span> <span class="number">${percent(share!)}</span>
          <svg class="bar" aria-hidden="true" height="8" width="100%"><rect class="ground" width="100%" height="8" /><rect class="part" width="${100 * share!}%" height="8" /></svg>
        </li>`,
      )}
    </ul>
    <p class="aside">Parts of the variance; the inputs count as independent.</p>`;
}

function percent(share: number): string {
  const text = (100 * share).toFixed(1);
  return share > 0 && text === "0.0" ? "below 0.1 %" : `${text} %`;
}
