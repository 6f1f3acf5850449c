import { html, nothing, type TemplateResult } from "lit-html";
import { resultText } from "../../../../catalog/describeFunction.js";
import { describeInput } from "../../../../catalog/describeInput.js";
import { exampleCall } from "../../../../catalog/exampleCall.js";
import { isOptional } from "../../../../functions/argumentNames.js";
import type { Definition, Example, Input } from "../../../../functions/definition.js";
import { cellView } from "../measured.js";

/** What a function answers, takes and gives, by which formula, and an example worked out now. */
export function functionView(definition: Definition): TemplateResult {
  const inputs = definition.inputs as readonly Input[];
  return html`
    <h2 id="chosen" tabindex="-1">${definition.question}</h2>
    <p class="name">BARY.${definition.name}</p>
    <details>
      <summary>Inputs, formula and source</summary>
      <dl class="facts">
        ${inputs.map(
          (
            input,
          ) => html`<dt>${input.name}${isOptional(input) ? html` <span class="aside">optional</span>` : nothing}</dt>
            <dd>${describeInput(input)}${unitOf(input)}</dd>`,
        )}
        <dt>Result</dt>
        <dd>${resultText(definition)}</dd>
        <dt>Formula</dt>
        <dd class="formula">${definition.formula}</dd>
        <dt>Source</dt>
        <dd>${definition.source}</dd>
        ${definition.note ? html`<dt>Note</dt><dd>${definition.note}</dd>` : nothing}
      </dl>
    </details>
    <section aria-labelledby="example">
      <h3 id="example">Worked example</h3>
      ${exampleView(definition, definition.examples[0])}
    </section>
  `;
}

function unitOf(input: Input) {
  if (input.takes !== "quantity" || input.quantity.unit === "1") return nothing;
  return html`; for example <span class="number">${input.quantity.example}</span> <span class="unit">${input.quantity.unit}</span>`;
}

function exampleView(definition: Definition, example: Example): TemplateResult {
  const { formula, value, unit } = exampleCall(definition, example);
  return html`<p class="code">${formula}</p>
    <p class="example">gives ${cellView([value], unit)}</p>
    <p class="aside">Known: ${example.gives} (${example.because}).</p>`;
}
