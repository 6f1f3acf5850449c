import { html, nothing } from "lit-html";
import type { Shell } from "../shell.js";

/** Names for cells and constants that formulas can use. */
export function namesDialog({ page, dialogs }: Shell): void {
  let name = "";
  let text = "";
  dialogs.open("Names", ({ redraw }) => {
    const define = async () => {
      const formula = text.startsWith("=") ? text : `=${text}`;
      if (await page.act({ do: "define name", name: name.trim(), text: formula, sheet: page.sheet() })) {
        name = "";
        text = "";
      }
      redraw();
    };
    const remove = async (gone: string) => {
      await page.act({ do: "remove name", name: gone });
      redraw();
    };
    const { names } = page.state();
    return html`${
      names.length === 0
        ? html`<p class="soft">No name is defined. A name such as resolving_power can stand in formulas instead of Assumptions!$B$2.</p>`
        : html`<table class="shell-table-of">
          <thead><tr><th>Name</th><th>Refers to</th><th><span class="unseen">Remove</span></th></tr></thead>
          <tbody>${names.map(
            (each) => html`<tr>
              <td>${each.name}</td>
              <td class="code">${each.refersTo}</td>
              <td><button type="button" class="quiet" aria-label=${`Remove ${each.name}`} @click=${() => remove(each.name)}>Remove</button></td>
            </tr>`,
          )}</tbody>
        </table>`
    }
      <div class="shell-pair">
        <div class="field"><label for="name-new">Name</label>
          <input id="name-new" type="text" .value=${name} @input=${(event: Event) => {
            name = (event.target as HTMLInputElement).value;
          }} /></div>
        <div class="field"><label for="name-text">Cell, area or value</label>
          <input id="name-text" type="text" placeholder="Assumptions!$B$2" .value=${text} @input=${(event: Event) => {
            text = (event.target as HTMLInputElement).value;
          }} /></div>
      </div>
      <div class="shell-actions"><button type="button" class="main" @click=${define}>Define the name</button></div>
      ${nothing}`;
  });
}
