import { html, nothing, type TemplateResult } from "lit-html";
import type { Place } from "../../../../../sheet/book/book.js";
import type {
  LedgerCondition,
  LedgerCrossing,
  LedgerForm,
  LedgerLine,
  LedgerSummary,
  LedgerView,
} from "../../../protocol/revise.js";
import { partText, sigmaText } from "./moveText.js";

export interface LedgerActions {
  goTo(place: Place): void;
  choose(id: string): void;
  write(form: LedgerForm): void;
  draw(): void;
}

/** What a revision moved, and the earlier ones to choose among. */
export function ledgerList(
  ledger: LedgerView,
  ledgers: readonly LedgerSummary[],
  actions: LedgerActions,
): TemplateResult {
  const { moved, derived, inputs, unshared, changes, entries, conditions } = ledger;
  return html`<section class="revise-ledger" aria-labelledby="revise-ledger">
    <h3 id="revise-ledger" tabindex="-1">What a revision moved</h3>
    ${
      ledgers.length > 1
        ? html`<div class="field"><label for="revise-ledgers">Ledger of</label>
            <select id="revise-ledgers" @change=${(event: Event) => actions.choose((event.target as HTMLSelectElement).value)}>
              ${ledgers.map((each) => html`<option value=${each.id} ?selected=${each.id === ledger.id}>${titleOf(each)}</option>`)}
            </select></div>`
        : html`<p>${titleOf(ledger)}</p>`
    }
    <p>Revised: ${inputs.map(({ input, cells }) => `${input} in ${cells.toLocaleString("en")} ${cells === 1 ? "cell" : "cells"}`).join("; ") || "nothing that is still told apart"}.</p>
    ${unshared ? html`<p>Changes are not shared out among inputs, because ${unshared}.</p>` : nothing}
    ${conditions.map((condition) => conditionView(condition, actions))}
    ${moved.length > 0 ? movedTable(moved, actions) : html`<p>No number that formulas work out moved.</p>`}
    ${moved.length < derived ? html`<p class="soft">The ${moved.length} most important of ${derived.toLocaleString("en")} are shown; the sheet holds them all.</p>` : nothing}
    ${entries < changes ? html`<p class="soft">${entries.toLocaleString("en")} of ${changes.toLocaleString("en")} changes are kept with the book${ledger.isWhole ? "; until the page is closed, the sheet and JSON hold all" : ""}.</p>` : nothing}
    <div class="panel-actions">
      <button type="button" @click=${() => actions.write("sheet")}>Write it to a sheet</button>
      <button type="button" @click=${() => actions.write("markdown")}>Save Markdown</button>
      <button type="button" @click=${() => actions.write("json")}>Save JSON</button>
      ${ledger.isWhole ? html`<button type="button" class="quiet" @click=${actions.draw}>Plot it</button>` : nothing}
    </div>
  </section>`;
}

function titleOf({ file, date, sheet }: LedgerSummary): string {
  return `${file} into ${sheet}, ${new Date(date).toLocaleString("sv")}`;
}

function movedTable(moved: readonly LedgerLine[], { goTo }: LedgerActions): TemplateResult {
  return html`<div class="panel-across" role="group" aria-label="What moved, the most important first" tabindex="0"><table class="panel-movements">
    <thead><tr><th scope="col">Moved</th><th scope="col" class="number">By</th><th scope="col">Most by</th><th scope="col" class="number">Before</th><th scope="col" class="number">Now</th></tr></thead>
    <tbody>
      ${moved.map(
        ({ place, key, header, before, after, change, sigmas, relative, movedBy, parts }) => html`<tr>
          <th scope="row">${link(key, place, goTo)}<br />${header}</th>
          <td class="number">${sigmaText(sigmas) || partText(relative) || change}</td>
          <td class="revise-by">${movedBy ?? ""}${parts.map((part) => html`<div class="soft">${part}</div>`)}</td>
          <td class="number">${before}</td>
          <td class="number">${after}</td>
        </tr>`,
      )}
    </tbody>
  </table></div>`;
}

function conditionView(
  { condition, before, after, gained, lost }: LedgerCondition,
  { goTo }: LedgerActions,
): TemplateResult {
  const crossed = (words: string, crossings: readonly LedgerCrossing[]) =>
    crossings.length > 0
      ? html`<p>${words}</p>
          <ul class="revise-crossings">
            ${crossings.map(({ place, key, before: was, after: is }) => html`<li>${link(key, place, goTo)} <span class="soft">${was} to ${is}</span></li>`)}
          </ul>`
      : nothing;
  return html`<div class="revise-condition">
    <p><strong>${condition}</strong>: ${before.toLocaleString("en")} ${before === 1 ? "row" : "rows"} before, ${after.toLocaleString("en")} now${gained.length + lost.length === 0 ? "; none crossed it" : ""}.</p>
    ${crossed("Gained", gained)} ${crossed("Lost", lost)}
  </div>`;
}

function link(key: string, place: Place | undefined, goTo: (place: Place) => void): TemplateResult {
  return html`<button type="button" class="quiet panel-link" ?disabled=${!place} @click=${() => place && goTo(place)}>${key}</button>`;
}
