import { html, nothing } from "lit-html";
import type { Shell } from "../shell.js";

/** Columns that tables of this trade usually have, with their usual units. */
const usual = [
  "Target",
  "Period [d]",
  "Star mass [solMass]",
  "Planet mass [jupiterMass]",
  "Eccentricity",
  "Inclination [deg]",
  "V [mag]",
  "K [m/s]",
];

/** An empty table: asks what columns there are, each with its unit. */
export function newTableDialog({ page, dialogs, attempt }: Shell): void {
  let title = "Targets";
  let headers = usual.slice(0, 4).join("\n");
  let problem: string | undefined;
  dialogs.open("New table", ({ close, redraw }) => {
    const lines = () =>
      headers
        .split("\n")
        .map((line) => line.trim())
        .filter(Boolean);
    const make = () => {
      const columns = lines();
      if (columns.length === 0) problem = "Name at least one column, for example Period [d].";
      else {
        close();
        attempt(async () => {
          const opened = await page.bench.newBook(title.trim() || "Targets", columns);
          if (opened.is === "refused") page.trouble(opened.message);
        });
      }
      redraw();
    };
    const has = (header: string) => lines().includes(header);
    const toggle = (header: string) => {
      const all = lines();
      headers = (has(header) ? all.filter((line) => line !== header) : [...all, header]).join("\n");
      redraw();
    };
    return html`<div class="field">
        <label for="new-title">Title</label>
        <input id="new-title" type="text" .value=${title} @input=${(event: Event) => {
          title = (event.target as HTMLInputElement).value;
        }} />
      </div>
      <fieldset class="shell-picks">
        <legend>Which columns do you have?</legend>
        ${usual.map(
          (header) =>
            html`<label><input type="checkbox" .checked=${has(header)} @change=${() => toggle(header)} /> ${header}</label>`,
        )}
      </fieldset>
      <div class="field">
        <label for="new-headers">Column headers, one a line; the unit stands in square brackets</label>
        <textarea id="new-headers" rows="8" .value=${headers} @input=${(event: Event) => {
          headers = (event.target as HTMLTextAreaElement).value;
          redraw();
        }}></textarea>
      </div>
      ${problem ? html`<p class="shell-problem" role="alert">${problem}</p>` : nothing}
      <div class="shell-actions"><button type="button" class="main" @click=${make}>Make the table</button></div>`;
  });
}
