import { html, nothing } from "lit-html";
import type { FunctionEntry } from "../../../protocol/answers.js";
import type { Shell } from "../shell.js";

/** The functions by the question they answer; one can be put into the formula at once. */
export function functionsDialog({ page, dialogs, editor, attempt }: Shell): void {
  let all: readonly FunctionEntry[] = [];
  let found: readonly FunctionEntry[] = [];
  let words = "";
  let asked = 0;
  dialogs.open("Functions by question", ({ close, redraw }) => {
    const search = () => {
      asked += 1;
      const mine = asked;
      attempt(async () => {
        if (all.length === 0) all = await page.bench.functions();
        const own = all.filter((entry) => entry.own);
        const names = words.trim() === "" ? own.map(({ name }) => name) : await page.bench.searchFunctions(words);
        if (mine !== asked) return;
        found = names.flatMap((name) => all.find((entry) => entry.name === name) ?? []);
        redraw();
      });
    };
    if (asked === 0) search();
    const use = ({ name }: FunctionEntry) => {
      close();
      if (editor.editing()) editor.insert(`${name}(`);
      else {
        editor.beginInCell("=");
        editor.insert(`${name}(`);
      }
    };
    return html`<div class="field">
        <label for="question">What do you want to know?</label>
        <input id="question" type="text" placeholder="how fast does the star move" .value=${words} @input=${(
          event: Event,
        ) => {
          words = (event.target as HTMLInputElement).value;
          search();
        }} />
      </div>
      <p class="soft" role="status">${words && found.length === 0 ? "No function answers that; try other words, such as mass, shift or period." : ""}</p>
      <ul class="shell-functions">
        ${found.slice(0, 60).map(
          (entry) => html`<li>
            <details>
              <summary><b>${entry.name}</b> <span>${entry.question}</span></summary>
              <dl>
                ${entry.parameters.map(
                  ({ name, meaning, optional }) =>
                    html`<dt>${optional ? `${name} (optional)` : name}</dt><dd>${meaning}</dd>`,
                )}
                ${entry.result ? html`<dt>Result</dt><dd>${entry.result}</dd>` : nothing}
              </dl>
              <button type="button" @click=${() => use(entry)}>Put it into the cell</button>
            </details>
          </li>`,
        )}
      </ul>`;
  });
}
