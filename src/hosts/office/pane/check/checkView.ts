import { html, nothing, type TemplateResult } from "lit-html";
import type { RecognisedColumn } from "../../../../table/recogniseColumn.js";
import type { CheckActions, CheckedColumn, CheckState } from "./checkState.js";

export function checkView(state: CheckState, actions: CheckActions): TemplateResult {
  return html`
    <div class="headline">
      <h2>${state.is === "checked" ? state.area : "Check this table"}</h2>
      <button type="button" class="quiet" @click=${actions.again}>Check again</button>
    </div>
    ${bodyView(state, actions)}
  `;
}

function bodyView(state: CheckState, actions: CheckActions): TemplateResult {
  if (state.is === "reading") return html`<p class="aside" role="status">Reading the sheet.</p>`;
  if (state.is === "no table") {
    return html`<p role="status">No row of headers was found on this sheet. Name each column in one row, with its unit in square brackets, for example "Period [d]".</p>`;
  }
  const flagged = state.columns.filter(({ findings }) => findings.length > 0);
  const findings = flagged.reduce((sum, column) => sum + column.findings.length, 0);
  return html`
    <p role="status">${summary(findings, state.columns.length, state.rows)}</p>
    ${
      flagged.length > 0
        ? html`<h3>To look at</h3>
            <ul class="findings">
              ${flagged.flatMap(({ findings }) =>
                findings.map(
                  ({ sentence, cell }) => html`<li>
                    <button type="button" class="finding" @click=${() => actions.goTo(cell)}>
                      <span class="mark" aria-hidden="true"></span><span>${sentence}</span>
                    </button>
                  </li>`,
                ),
              )}
            </ul>`
        : nothing
    }
    <h3>What was understood</h3>
    <table class="understood">
      <thead>
        <tr><th scope="col">Column</th><th scope="col">Quantity</th><th scope="col">Unit</th></tr>
      </thead>
      <tbody>
        ${state.columns.map(columnView)}
      </tbody>
    </table>
  `;
}

function summary(findings: number, columns: number, rows: number): string {
  const size = `${counted(columns, "column")}, ${counted(rows, "row")}`;
  return findings === 0 ? `${size}: nothing to look at.` : `${size}: ${counted(findings, "thing")} to look at.`;
}

function columnView({ check, address, findings }: CheckedColumn): TemplateResult {
  const { recognised, numbers, texts, blanks } = check;
  const counts = [numbers && counted(numbers, "number"), texts && counted(texts, "text"), blanks && `${blanks} blank`];
  return html`<tr class=${findings.length > 0 ? "flagged" : ""}>
    <th scope="row">
      ${findings.length > 0 ? html`<span class="mark" aria-hidden="true"></span>` : nothing}${recognised.name}
      <span class="aside">${address}: ${counts.filter(Boolean).join(", ") || "no cells"}</span>
    </th>
    <td>${quantityText(recognised)}</td>
    <td>${recognised.unit && recognised.unit.text !== "1" ? html`<span class="unit">${recognised.unit.text}</span>` : html`<span class="aside">no unit</span>`}</td>
  </tr>`;
}

function quantityText({ quantity, isUncertainty, unit }: RecognisedColumn): TemplateResult {
  if (quantity) return html`${isUncertainty ? "uncertainty of " : ""}${quantity.name}`;
  if (isUncertainty) return html`an uncertainty`;
  return unit && unit.text !== "1" ? html`${unit.kind}` : html`<span class="aside">not a known quantity</span>`;
}

function counted(count: number, noun: string): string {
  return `${count.toLocaleString("en")} ${noun}${count === 1 ? "" : "s"}`;
}
