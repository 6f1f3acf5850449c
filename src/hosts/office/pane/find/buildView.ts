import { html, nothing, type TemplateResult } from "lit-html";
import { live } from "lit-html/directives/live.js";
import { CellError } from "../../../../call/cell.js";
import { isOptional, takesResult } from "../../../../functions/argumentNames.js";
import type { Definition, Input, WordInput } from "../../../../functions/definition.js";
import { areaText, readArea } from "../areaText.js";
import { cellView } from "../measured.js";
import { readField, takesHeader } from "./callFields.js";
import { callFormula } from "./callFormula.js";
import type { BuildState, FindActions } from "./findState.js";
import { callOf, targetOf } from "./targetOf.js";

export function buildView(definition: Definition, build: BuildState, actions: FindActions): TemplateResult {
  const inputs = definition.inputs as readonly Input[];
  return html`
    <section aria-labelledby="build" class="build" @keydown=${(event: KeyboardEvent) => {
      if (event.key === "Escape") actions.pick(undefined);
    }}>
      <h3 id="build">Build the call</h3>
      <p class="aside">${introduction(build)}</p>
      ${inputs.map((input, index) =>
        input.takes === "word" ? wordView(input, index, build, actions) : inputView(input, index, build, actions),
      )}
      ${takesResult(definition) ? resultView(definition, build, actions) : nothing} ${targetView(build, actions)}
      ${previewView(build)}
      ${build.warned ? html`<p class="caution" role="alert"><span class="mark" aria-hidden="true"></span>${build.warned} is not blank. Insert again to write over it.</p>` : nothing}
      <button type="button" class="main" @click=${actions.insert} ?disabled=${targetOf(build) === undefined}>
        ${build.warned ? "Insert and write over" : "Insert the formula"}
      </button>
    </section>
  `;
}

function introduction({ table }: BuildState): string {
  return table
    ? "Columns were chosen by their headers. To change one, go to its field and click the cell in the worksheet, or type a value with its unit."
    : "Go to a field and click a cell in the worksheet, or type a value with its unit.";
}

const following = "Follows the worksheet: click a cell there. Escape ends it.";
const typedHint = "Typed; clear the field to follow the worksheet.";

function inputView(input: Input, index: number, build: BuildState, actions: FindActions): TemplateResult {
  const { text, header } = build.fields.inputs[index]!;
  const id = `input-${index}`;
  const picking = build.picking === index;
  const field = readField(text, build.fields.sheet).is;
  const hasCells = field === "cells";
  const hint = picking
    ? hasCells || field === "left out"
      ? following
      : typedHint
    : headerHint(header, hasCells, build);
  return html`<div class="field ${picking ? "picking" : ""}">
    <label for=${id}>${input.name}${isOptional(input) ? html` <span class="aside">optional</span>` : nothing}</label>
    <div class="pair">
      <input
        id=${id}
        aria-describedby="${id}-hint"
        autocomplete="off"
        spellcheck="false"
        placeholder=${placeholderOf(input)}
        .value=${live(text)}
        @focus=${() => actions.pick(index)}
        @input=${(event: Event) => actions.setInput(index, { text: typed(event) })}
      />
      ${
        takesHeader(input) && hasCells
          ? html`<label class="beside" for="${id}-header">header</label>
              <input
                id="${id}-header"
                class="short"
                aria-label="header of ${input.name}"
                autocomplete="off"
                spellcheck="false"
                .value=${live(header)}
                @focus=${() => actions.pick(undefined)}
                @input=${(event: Event) => actions.setInput(index, { header: typed(event) })}
              />`
          : nothing
      }
    </div>
    <p class="hint" id="${id}-hint">${hint}</p>
  </div>`;
}

/** What the header says, so that a column chosen wrongly is seen at once. */
function headerHint(header: string, hasCells: boolean, { table, fields }: BuildState): string {
  const area = hasCells && table ? readArea(header, fields.sheet) : undefined;
  if (!area || !table || area.sheet !== table.used.area.sheet) return "";
  const { used } = table;
  const cell = used.values[area.row - used.area.row]?.[area.column - used.area.column] ?? null;
  return cell === null ? "" : String(cell);
}

function placeholderOf(input: Input): string {
  if (input.takes !== "quantity") return "";
  const { example, unit } = input.quantity;
  return input.fallbackText ?? (unit === "1" ? String(example) : `${example} ${unit}`);
}

function wordView(input: WordInput, index: number, build: BuildState, actions: FindActions): TemplateResult {
  const id = `input-${index}`;
  const { text } = build.fields.inputs[index]!;
  return html`<div class="field">
    <label for=${id}>${input.name}</label>
    <select
      id=${id}
      @focus=${() => actions.pick(undefined)}
      @change=${(event: Event) => actions.setInput(index, { text: typed(event) })}
    >
      ${input.required ? html`<option value="" .selected=${text === ""}>choose one</option>` : nothing}
      ${input.words.map(({ word, meaning }, at) => {
        const value = at === 0 && !input.required ? "" : word;
        return html`<option value=${value} .selected=${text === value}>${word}: ${meaning}</option>`;
      })}
    </select>
  </div>`;
}

function resultView(definition: Definition, build: BuildState, actions: FindActions): TemplateResult {
  const own = definition.form === "number" && definition.result.unit !== "1" ? definition.result.unit : "";
  return html`<div class="field">
    <label for="result">unit of the result</label>
    <input
      id="result"
      autocomplete="off"
      spellcheck="false"
      placeholder=${own || "a unit, such as km/s"}
      .value=${live(build.fields.result)}
      @focus=${() => actions.pick(undefined)}
      @input=${(event: Event) => actions.set({ result: typed(event) })}
    />
  </div>`;
}

function targetView(build: BuildState, actions: FindActions): TemplateResult {
  const target = targetOf(build);
  const picking = build.picking === "target";
  const header = target?.headerCell;
  const rows = build.table?.plan.rows ?? 0;
  return html`<div class="field ${picking ? "picking" : ""}">
      <label for="target">formula goes into</label>
      <input
        id="target"
        aria-describedby="target-hint"
        autocomplete="off"
        spellcheck="false"
        .value=${live(build.target)}
        @focus=${() => actions.pick("target")}
        @input=${(event: Event) => actions.set({ target: typed(event) })}
      />
      <p class="hint" id="target-hint">${picking ? following : target ? `fills ${areaText({ ...target.cell, rows: target.rows, columns: target.columns })}` : "an address such as G2 is needed"}</p>
    </div>
    ${rows > 1 ? checkbox(`fill it down over the ${rows} rows of the table`, build.fillsDown, (fillsDown) => actions.set({ fillsDown })) : nothing}
    ${header ? checkbox(`write the header ${target.headers[0] ? `"${target.headers[0]}" ` : ""}into ${areaText(header)}`, build.writesHeader, (writesHeader) => actions.set({ writesHeader })) : nothing}`;
}

function checkbox(label: string, checked: boolean, set: (checked: boolean) => void): TemplateResult {
  return html`<label class="check">
    <input type="checkbox" .checked=${live(checked)} @change=${(event: Event) => set((event.target as HTMLInputElement).checked)} />
    <span>${label}</span>
  </label>`;
}

function previewView(build: BuildState): TemplateResult {
  const { preview } = build;
  const isFault = preview?.cells[0] instanceof CellError;
  return html`<div class="preview ${isFault ? "isFault" : ""}">
    <p class="code" id="formula">${callFormula(callOf(build))}</p>
    <p class="answerLine" role="status" aria-label="First row">
      ${preview ? html`<span class="aside">first row</span> ${cellView(preview.cells, preview.unit)}` : nothing}
    </p>
  </div>`;
}

function typed(event: Event): string {
  return (event.target as HTMLInputElement | HTMLSelectElement).value;
}
