import { html, nothing, type TemplateResult } from "lit-html";
import type { ComparisonReport, MarkState } from "../../../protocol/answers.js";
import { faultText } from "../../createPage.js";
import type { Page } from "../../page.js";
import type { Panel } from "../../panel.js";
import { goTo } from "../goTo.js";

/** More rows than this are told by their number; the sheet of the comparison holds them all. */
const mostShown = 200;

/** Marks the table as it is, and tells what moved since. */
export function comparePanel(page: Page, redraw: () => void, enterTyped: () => Promise<boolean>): Panel {
  let marks: readonly MarkState[] = [];
  let chosen: string | undefined;
  let report: ComparisonReport | undefined;
  let isShown = false;
  let asked = 0;

  const attempt = (work: () => Promise<void>) => {
    work().catch((fault: unknown) => page.trouble(faultText(fault)));
  };

  async function load(): Promise<void> {
    if (!isShown) return;
    asked += 1;
    const mine = asked;
    const all = await page.bench.marks();
    const mark = all.find(({ id }) => id === chosen) ?? all[0];
    const answer = mark && (await page.bench.compare(mark.id));
    if (mine !== asked) return;
    marks = all;
    chosen = mark?.id;
    report = answer;
    redraw();
  }

  async function mark(): Promise<void> {
    if (!(await enterTyped())) return;
    const taken = await page.bench.mark(page.sheet());
    chosen = taken.id;
    page.announce(`${page.sheetState().name} is marked. Revise what you like; what moves is told here.`);
    await load();
  }

  async function forget(): Promise<void> {
    if (chosen === undefined) return;
    await page.bench.forget(chosen);
    chosen = undefined;
    await load();
  }

  async function write(): Promise<void> {
    if (chosen === undefined || !(await enterTyped())) return;
    const outcome = await page.bench.writeComparison(chosen);
    if (outcome.is === "refused") page.trouble(outcome.message);
    else page.announce("The comparison is in a sheet of its own.");
  }

  return {
    id: "compare",
    title: "Mark and compare",
    keys: "Alt+M",
    view: () => html`<p class="soft">Mark the table, change masses or anything else, and see what moved and by how many of its own uncertainties.</p>
      <div class="panel-actions">
        <button type="button" class=${marks.length === 0 ? "main" : ""} @click=${() => attempt(mark)}>Mark the table as it is now</button>
      </div>
      ${
        marks.length > 0
          ? html`<div class="field">
              <label for="compare-mark">Compared with</label>
              <select id="compare-mark" @change=${(event: Event) => {
                chosen = (event.target as HTMLSelectElement).value;
                attempt(load);
              }}>
                ${marks.map(({ id, name, at, sheet }) => html`<option value=${id} ?selected=${id === chosen}>${sheet}, ${name || "mark"} of ${new Date(at).toLocaleString("sv")}</option>`)}
              </select>
            </div>`
          : nothing
      }
      ${
        report
          ? reportView(
              page,
              report,
              () => attempt(write),
              () => attempt(forget),
            )
          : nothing
      }`,
    shown() {
      isShown = true;
      attempt(load);
    },
    hidden() {
      isShown = false;
    },
    changed(change) {
      if (change === "state") attempt(load);
    },
  };
}

function reportView(page: Page, report: ComparisonReport, write: () => void, forget: () => void): TemplateResult {
  const { movements, sentence } = report;
  return html`<p role="status">${sentence}</p>
    ${
      movements.length > 0
        ? html`<div class="panel-across" role="group" aria-label="What moved" tabindex="0"><table class="panel-movements">
            <thead><tr><th scope="col">Row</th><th scope="col">Column</th><th scope="col">Moved</th><th scope="col">Before</th><th scope="col">Now</th></tr></thead>
            <tbody>
              ${movements.slice(0, mostShown).map(
                ({ place, key, header, before, after, sigmas, relative, change }) => html`<tr>
                  <th scope="row"><button type="button" class="quiet panel-link" ?disabled=${!place} @click=${() => goTo(page, place)}>${key}</button></th>
                  <td>${header}</td>
                  <td class="number">${movedText(sigmas, relative, change)}</td>
                  <td class="number">${before}</td>
                  <td class="number">${after}</td>
                </tr>`,
              )}
            </tbody>
          </table></div>
          ${movements.length > mostShown ? html`<p class="soft">The ${mostShown} largest of ${movements.length.toLocaleString("en")} are shown; the sheet holds all.</p>` : nothing}`
        : nothing
    }
    <div class="panel-actions">
      <button type="button" ?disabled=${movements.length === 0} @click=${write}>Write it to a sheet</button>
      <button type="button" class="quiet" @click=${forget}>Forget this mark</button>
    </div>`;
}

function movedText(sigmas: number | undefined, relative: number | undefined, change: string): string {
  if (sigmas !== undefined) return `${signed(sigmas, 2)} σ`;
  if (relative !== undefined) return `${signed(100 * relative, 2)} %`;
  return change;
}

function signed(value: number, digits: number): string {
  const text = Math.abs(value) >= 1000 ? Math.abs(value).toExponential(1) : Math.abs(value).toFixed(digits);
  return `${value < 0 ? "−" : "+"}${text}`;
}
