import { html } from "lit-html";
import type { Command } from "../command.js";
import { keysText } from "../keysOf.js";
import type { Shell } from "../shell.js";

const inGrid: readonly (readonly [string, string])[] = [
  ["Arrow keys, PageUp, PageDown, Home, End", "move; with Shift select; with Ctrl jump to the edge of the data"],
  ["Enter, Tab", "move down, move right; with Shift back"],
  ["F2 or any character", "edit the cell"],
  ["Alt+U", "the unit of the column"],
  ["Ctrl+Space, Shift+Space", "select the column, the row"],
  ["Ctrl+C, Ctrl+X, Ctrl+V", "copy, cut, paste; Ctrl+Shift+V pastes values only"],
  ["Ctrl+D, Ctrl+R", "fill the first row down, the first column to the right"],
  ["F6, Shift+F6", "go on to the next part of the page, or back to the one before"],
];

const inFormulas: readonly (readonly [string, string])[] = [
  ["F4", "step the reference at the caret through its $ forms"],
  ["F8 or Alt+C", "complete the headers"],
  ["Arrow keys after ( , or an operator", "pick a cell; with Shift an area"],
  ["Ctrl+Enter", "enter into every selected cell"],
  ["Escape", "close the list, then leave the cell as it was"],
];

/** All keys. */
export function keysDialog({ dialogs }: Shell, commands: readonly Command[]): void {
  const rows = (pairs: readonly (readonly [string, string])[]) =>
    pairs.map(([keys, words]) => html`<tr><th scope="row"><kbd>${keysText(keys)}</kbd></th><td>${words}</td></tr>`);
  const own = commands.flatMap(({ keys, words }): [string, string][] => (keys ? [[keys, words]] : []));
  dialogs.open(
    "Keys",
    () => html`<h3>In the table</h3>
      <table class="shell-keys"><tbody>${rows(inGrid)}</tbody></table>
      <h3>In a formula</h3>
      <table class="shell-keys"><tbody>${rows(inFormulas)}</tbody></table>
      <h3>Everywhere</h3>
      <table class="shell-keys"><tbody>${rows(own)}</tbody></table>`,
  );
}
