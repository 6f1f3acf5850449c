import { html, nothing } from "lit-html";
import type { FilterCondition } from "../../../protocol/request.js";
import { isFiltered } from "../isFiltered.js";
import { headerOf } from "../selected.js";
import type { Shell } from "../shell.js";

const tests: readonly {
  readonly test: FilterCondition["test"];
  readonly words: string;
  readonly takesText: boolean;
}[] = [
  { test: ">=", words: "is at least", takesText: true },
  { test: "<=", words: "is at most", takesText: true },
  { test: ">", words: "is above", takesText: true },
  { test: "<", words: "is below", takesText: true },
  { test: "=", words: "is", takesText: true },
  { test: "<>", words: "is not", takesText: true },
  { test: "contains", words: "contains", takesText: true },
  { test: "holds error", words: "holds an error", takesText: false },
  { test: "blank", words: "is blank", takesText: false },
  { test: "not blank", words: "is not blank", takesText: false },
];

/** Which rows are seen: all conditions have to hold. Nothing is removed. */
export function filterDialog({ page, dialogs, attempt }: Shell): void {
  const sheet = page.sheet();
  const present = page.sheetState().filter;
  const fresh = (): FilterCondition => ({ column: page.selection().active.column, test: ">=", text: "" });
  let conditions: FilterCondition[] = present.length > 0 ? [...present] : [fresh()];
  let problem: string | undefined;
  dialogs.open("Filter rows", ({ close, redraw }) => {
    const set = (index: number, change: Partial<FilterCondition>) => {
      conditions = conditions.map((condition, at) => (at === index ? { ...condition, ...change } : condition));
      redraw();
    };
    const apply = (wanted: readonly FilterCondition[]) =>
      attempt(async () => {
        const outcome = await page.bench.filter(sheet, wanted);
        if (outcome.is === "refused") {
          problem = outcome.message;
          return redraw();
        }
        close();
        page.settle(outcome);
      });
    const all = Array.from({ length: page.sheetState().columns }, (_, column) => column);
    return html`${conditions.map((condition, index) => {
      const takesText = tests.find(({ test }) => test === condition.test)?.takesText;
      return html`<div class="shell-pair">
        <div class="field"><label for="filter-column-${index}">${index === 0 ? "Rows where" : "and"}</label>
          <select id="filter-column-${index}" @change=${(event: Event) => set(index, { column: Number((event.target as HTMLSelectElement).value) })}>
            ${all.map((column) => html`<option value=${column} ?selected=${column === condition.column}>${headerOf(page, column)}</option>`)}
          </select></div>
        <div class="field"><label for="filter-test-${index}">Test</label>
          <select id="filter-test-${index}" @change=${(event: Event) => set(index, { test: (event.target as HTMLSelectElement).value as FilterCondition["test"] })}>
            ${tests.map(({ test, words }) => html`<option value=${test} ?selected=${test === condition.test}>${words}</option>`)}
          </select></div>
        ${
          takesText
            ? html`<div class="field"><label for="filter-text-${index}">Value</label>
              <input id="filter-text-${index}" type="text" placeholder="1 m/s" .value=${condition.text} @input=${(event: Event) => set(index, { text: (event.target as HTMLInputElement).value })} @keydown=${(
                event: KeyboardEvent,
              ) => {
                if (event.key === "Enter") apply(conditions);
              }} /></div>`
            : nothing
        }
        <button type="button" class="quiet" aria-label=${`Remove condition ${index + 1}`} @click=${() => {
          conditions = conditions.filter((_, at) => at !== index);
          redraw();
        }}>Remove</button>
      </div>`;
    })}
      <button type="button" class="quiet" @click=${() => {
        conditions = [...conditions, fresh()];
        redraw();
      }}>Add a condition</button>
      ${problem ? html`<p class="shell-problem" role="alert">${problem}</p>` : nothing}
      <div class="shell-actions">
        <button type="button" class="main" @click=${() => apply(conditions)}>Filter</button>
        ${isFiltered(page) ? html`<button type="button" @click=${() => apply([])}>Show all rows</button>` : nothing}
      </div>
      <p class="soft">A value with a unit, such as 1 m/s, is converted to the unit of the column.</p>`;
  });
}
