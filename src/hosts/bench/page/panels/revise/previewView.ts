import { html, nothing, type TemplateResult } from "lit-html";
import type { Place } from "../../../../../sheet/book/book.js";
import type { PreviewChange, RevisionPreview } from "../../../protocol/revise.js";
import { partText, sigmaText } from "./moveText.js";

export interface PreviewActions {
  goTo(place: Place): void;
  apply(): void;
}

/** What a revision would change, before it is done. */
export function previewView(
  preview: RevisionPreview,
  isOld: boolean,
  isRunning: boolean,
  { goTo, apply }: PreviewActions,
): TemplateResult {
  const { columns, cells, findings, matched, sheetName, file } = preview;
  const most = (change: PreviewChange | undefined, text: string) =>
    change
      ? html`${text}<br /><button type="button" class="quiet panel-link" @click=${() => goTo(change.place)}>${change.key}</button>`
      : nothing;
  return html`<section class="revise-preview" aria-labelledby="revise-preview">
    <h3 id="revise-preview" tabindex="-1">What would change in ${sheetName}</h3>
    <p>${matched} ${columns.length === 0 ? "No column of the file goes with one of the table." : nothing}</p>
    ${
      columns.length > 0
        ? html`<div class="panel-across" role="group" aria-label="Columns that would change" tabindex="0"><table class="panel-movements">
            <thead><tr><th scope="col">Column</th><th scope="col">Values</th><th scope="col">Uncert.</th><th scope="col">Largest, in σ</th><th scope="col">Largest, in %</th></tr></thead>
            <tbody>
              ${columns.map(
                ({ header, from, convertedFrom, values, uncertainties, bySigma, byPart }) => html`<tr>
                  <th scope="row">${header}${from ? html`<br /><span class="soft">from ${from}</span>` : nothing}${convertedFrom && !from ? html`<br /><span class="soft">converted from ${convertedFrom}</span>` : nothing}</th>
                  <td class="number">${values.toLocaleString("en")}</td>
                  <td class="number">${uncertainties.toLocaleString("en")}</td>
                  <td class="number">${most(bySigma, sigmaText(bySigma?.sigmas))}</td>
                  <td class="number">${most(byPart, partText(byPart?.relative))}</td>
                </tr>`,
              )}
            </tbody>
          </table></div>`
        : nothing
    }
    ${findings.length > 0 ? html`<ul class="revise-findings">${findings.map((finding) => html`<li>${finding}</li>`)}</ul>` : nothing}
    ${isOld ? html`<p class="panel-fault">The book or the sheet in view has changed since; show again what would change.</p>` : nothing}
    <div class="panel-actions">
      ${
        cells === 0
          ? html`<p>Nothing would change, so there is nothing to apply.</p>`
          : html`<button type="button" class="main" ?disabled=${isOld || isRunning} @click=${apply}>Apply ${cells.toLocaleString("en")} ${cells === 1 ? "change" : "changes"} from ${file}</button>`
      }
    </div>
  </section>`;
}
