import { html } from "lit-html";
import { formats } from "../files.js";
import type { Shell } from "../shell.js";

/** Which file to write. The book itself is kept in the browser all the time; this makes a copy for elsewhere. */
export function saveDialog({ page, dialogs, files, attempt }: Shell): void {
  dialogs.open("Save a copy", ({ close }) => {
    const save = (format: (typeof formats)[number]["format"]) => {
      close();
      attempt(() => files.save(format));
    };
    return html`<p class="soft">${page.state().title} is kept in this browser as you work. A file takes it elsewhere.</p>
      <ul class="shell-choices">
        ${formats.map(
          ({ format, words }) => html`<li><button type="button" @click=${() => save(format)}>${words}</button></li>`,
        )}
      </ul>`;
  });
}
