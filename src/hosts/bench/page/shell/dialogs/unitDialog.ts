import { html, nothing } from "lit-html";
import type { ColumnReport } from "../../../protocol/answers.js";
import type { ColumnState } from "../../../protocol/bookState.js";
import { headerOf } from "../selected.js";
import type { Shell } from "../shell.js";

/** How a column's header was read; another unit, with the values converted or kept as they stand. */
export function unitDialog({ page, dialogs, attempt }: Shell, column: number): void {
  const sheet = page.sheet();
  const state = page.sheetState().columnStates[column];
  if (!state || (state.name === "" && state.unit === "")) {
    page.announce("This column has no header yet; type one in its first row, such as Period [d].");
    return;
  }
  const place = { sheet, row: 0, column };
  let unit = state.unit;
  let report: ColumnReport | undefined;
  let asked = 0;
  dialogs.open(`Unit of ${headerOf(page, column)}`, ({ close, redraw }) => {
    const look = () => {
      asked += 1;
      const mine = asked;
      attempt(async () => {
        const answer = await page.bench.checkUnit(unit, place);
        if (mine !== asked) return;
        report = answer;
        redraw();
      });
    };
    if (asked === 0) look();
    const set = async (convert: boolean) => {
      if (await page.act({ do: "set unit", place, unit: unit.trim(), convert })) close();
      else redraw();
    };
    const isSame = unit.trim() === state.unit;
    return html`<p>${readingText(state)}</p>
      <div class="field">
        <label for="unit-text">Unit</label>
        <input id="unit-text" type="text" autofocus .value=${unit} aria-describedby="unit-reading" @input=${(
          event: Event,
        ) => {
          unit = (event.target as HTMLInputElement).value;
          look();
          redraw();
        }} />
        <p id="unit-reading" class="soft" role="status">${report ? report.understood : ""}</p>
      </div>
      ${report?.findings.map(({ message }) => html`<p class="shell-problem">${message}</p>`) ?? nothing}
      <div class="shell-actions">
        <button type="button" class="main" ?disabled=${isSame || state.derived || state.unit === ""} @click=${() => set(true)}>Convert the values</button>
        <button type="button" ?disabled=${isSame} @click=${() => set(false)}>${state.derived ? "Show it in this unit" : "Keep the values, correct the unit"}</button>
      </div>
      <p class="soft">${
        state.derived
          ? "The values of this column are worked out by formulas that take the unit from this header."
          : "Convert where the same masses are to be told in another unit; keep where the header was wrong. Either is one step to undo."
      }</p>`;
  });
}

function readingText({ reading }: ColumnState): string {
  switch (reading.is) {
    case "unit":
      return `Read as ${reading.unit}, ${reading.kind}${reading.quantity ? `; the column as ${reading.quantity}` : ""}.`;
    case "none":
      return `No unit is stated${reading.quantity ? `; the column is read as ${reading.quantity}` : ""}.`;
    case "problem":
      return reading.message;
  }
}
