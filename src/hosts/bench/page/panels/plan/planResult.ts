import { html, nothing, type TemplateResult } from "lit-html";
import type { PlanReport } from "../../../protocol/plan.js";

/** More rows than this are told by their number. */
const mostShown = 200;

export interface ResultActions {
  goTo(row: number): void;
  write(): void;
  showWritten(): void;
}

export interface ResultState {
  readonly plan: PlanReport;
  readonly isOld: boolean;
  /** What was said when it was written to a sheet. */
  readonly written: string;
}

/** What was chosen and laid, and what was left out and why. */
export function planResult({ plan, isOld, written }: ResultState, actions: ResultActions): TemplateResult {
  const { sentences, chosen, leftOut } = plan;
  const link = (row: number, name: string) =>
    html`<button type="button" class="quiet panel-link" @click=${() => actions.goTo(row)}>${name}</button>`;
  return html`<div class="plan-result">
    <h3>The plan</h3>
    ${isOld ? html`<p class="soft">The book has changed since; make the plan again to follow it.</p>` : nothing}
    ${sentences.map((sentence) => html`<p>${sentence}</p>`)}
    <div class="panel-actions">
      <button type="button" @click=${actions.write}>Write the visits to a sheet</button>
      ${written ? html`<span>${written} <button type="button" class="quiet" @click=${actions.showWritten}>Show them</button></span>` : nothing}
    </div>
    ${
      leftOut.length > 0
        ? html`<h3>Left out, and why</h3>
          <ul class="plan-left">
            ${leftOut.slice(0, mostShown).map(({ row, name, because }) => html`<li>${link(row, name)} <span>${because}</span></li>`)}
          </ul>
          ${more(leftOut.length)}`
        : nothing
    }
    ${
      chosen.length > 0
        ? html`<h3>In the plan</h3>
          <table class="plan-chosen">
            <thead><tr><th scope="col">Target</th><th scope="col" class="number">Worth</th><th scope="col" class="number">Hours</th><th scope="col" class="number">Visits</th></tr></thead>
            <tbody>
              ${chosen.slice(0, mostShown).map(
                ({ row, name, value, hours, visits, lacks }) => html`<tr>
                    <th scope="row">${link(row, name)}</th>
                    <td class="number">${Number(value.toPrecision(6))}</td>
                    <td class="number">${hours.toFixed(1)}</td>
                    <td class="number">${visits}</td>
                  </tr>
                  ${lacks ? html`<tr><td colspan="4"><span class="mark" aria-hidden="true"></span>${lacks}</td></tr>` : nothing}`,
              )}
            </tbody>
          </table>
          ${more(chosen.length)}`
        : nothing
    }
  </div>`;
}

function more(count: number): TemplateResult | typeof nothing {
  if (count <= mostShown) return nothing;
  return html`<p class="soft">The first ${mostShown} of ${count.toLocaleString("en")} are shown; the sheet of the summary tells all.</p>`;
}
