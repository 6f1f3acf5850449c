import { html } from "lit-html";
import { faultText } from "../../createPage.js";
import type { Page } from "../../page.js";
import type { Panel } from "../../panel.js";
import { goTo } from "../goTo.js";

/** Finds cells by their text or their formula, and replaces texts. */
export function findPanel(page: Page, redraw: () => void, enterTyped: () => Promise<boolean>): Panel {
  let options = { text: "", matchCase: false, wholeCell: false, inFormulas: false };
  let replacement = "";
  let said = "";

  function find(backwards: boolean): void {
    if (options.text === "") {
      said = "Type what to look for.";
      redraw();
      return;
    }
    page.bench.find(options, page.selection().active, backwards).then(
      (place) => {
        said = place ? "" : `"${options.text}" is in no cell of this sheet${options.inFormulas ? "'s formulas" : ""}.`;
        goTo(page, place);
        redraw();
      },
      (fault: unknown) => page.trouble(faultText(fault)),
    );
  }

  async function replace(everywhere: boolean): Promise<void> {
    if (!(await enterTyped())) return;
    const { area } = page.selection();
    const { rows, columns } = page.sheetState();
    const whole = {
      sheet: page.sheet(),
      top: 0,
      left: 0,
      bottom: Math.max(0, rows - 1),
      right: Math.max(0, columns - 1),
    };
    await page.act({ do: "replace", area: everywhere ? whole : area, search: options.text, replacement });
  }

  const box = (name: "matchCase" | "wholeCell" | "inFormulas", words: string) => html`<label class="shell-check">
    <input type="checkbox" .checked=${options[name]} @change=${(event: Event) => {
      options = { ...options, [name]: (event.target as HTMLInputElement).checked };
    }} /> ${words}</label>`;

  return {
    id: "find",
    title: "Find",
    keys: "Ctrl+F",
    view: () => html`<div class="field">
        <label for="find-text">Look for</label>
        <input id="find-text" type="text" .value=${options.text} @input=${(event: Event) => {
          options = { ...options, text: (event.target as HTMLInputElement).value };
        }} @keydown=${(event: KeyboardEvent) => {
          if (event.key === "Enter") find(event.shiftKey);
        }} />
      </div>
      ${box("matchCase", "Capitals as typed")} ${box("wholeCell", "The whole cell")} ${box("inFormulas", "In formulas instead of values")}
      <div class="panel-actions">
        <button type="button" class="main" @click=${() => find(false)}>Next</button>
        <button type="button" @click=${() => find(true)}>Previous</button>
      </div>
      <p role="status" class="soft">${said}</p>
      <div class="field">
        <label for="find-replacement">Replace by</label>
        <input id="find-replacement" type="text" .value=${replacement} @input=${(event: Event) => {
          replacement = (event.target as HTMLInputElement).value;
        }} />
      </div>
      <div class="panel-actions">
        <button type="button" @click=${() => replace(false)}>In the selection</button>
        <button type="button" @click=${() => replace(true)}>In the whole sheet</button>
      </div>`,
    shown() {
      redraw();
      const input = document.getElementById("find-text");
      if (input instanceof HTMLInputElement) {
        input.focus();
        input.select();
      }
    },
    hidden: () => {},
    changed: () => {},
  };
}
