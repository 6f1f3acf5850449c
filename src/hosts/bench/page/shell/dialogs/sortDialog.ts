import { html, nothing } from "lit-html";
import type { Area } from "../../../../../sheet/book/book.js";
import { headerOf } from "../selected.js";
import type { Shell } from "../shell.js";

/** Sorts all rows of the table under its header, or the rows selected, by up to three columns. */
export function sortDialog({ page, dialogs }: Shell): void {
  const { area, active } = page.selection();
  const { rows, columns } = page.sheetState();
  const isPart = area.bottom - area.top > 0 && area.top > 0 && area.bottom < rows - 1;
  let onlyPart = false;
  let keys: { column: number; descending: boolean }[] = [{ column: active.column, descending: false }];
  dialogs.open("Sort rows", ({ close, redraw }) => {
    const all = Array.from({ length: columns }, (_, column) => column);
    const sort = async () => {
      const whole: Area = { sheet: page.sheet(), top: 1, left: 0, bottom: Math.max(1, rows - 1), right: columns - 1 };
      const sorted = onlyPart ? { ...whole, top: area.top, bottom: area.bottom } : whole;
      close();
      await page.act({ do: "sort", area: sorted, keys });
    };
    return html`${keys.map(
      (key, index) => html`<div class="shell-pair">
        <div class="field">
          <label for="sort-${index}">${index === 0 ? "By" : "then by"}</label>
          <select id="sort-${index}" @change=${(event: Event) => {
            key.column = Number((event.target as HTMLSelectElement).value);
          }}>
            ${all.map((column) => html`<option value=${column} ?selected=${column === key.column}>${headerOf(page, column)}</option>`)}
          </select>
        </div>
        <div class="field">
          <label for="order-${index}">Order</label>
          <select id="order-${index}" @change=${(event: Event) => {
            key.descending = (event.target as HTMLSelectElement).value === "down";
          }}>
            <option value="up" ?selected=${!key.descending}>smallest first</option>
            <option value="down" ?selected=${key.descending}>largest first</option>
          </select>
        </div>
      </div>`,
    )}
      ${
        keys.length < 3
          ? html`<button type="button" class="quiet" @click=${() => {
              keys = [...keys, { column: 0, descending: false }];
              redraw();
            }}>Add another column</button>`
          : nothing
      }
      ${
        isPart
          ? html`<label class="shell-check"><input type="checkbox" .checked=${onlyPart} @change=${(event: Event) => {
              onlyPart = (event.target as HTMLInputElement).checked;
            }} /> Only rows ${area.top + 1} to ${area.bottom + 1}</label>`
          : nothing
      }
      <div class="shell-actions"><button type="button" class="main" @click=${sort}>Sort</button></div>`;
  });
}
