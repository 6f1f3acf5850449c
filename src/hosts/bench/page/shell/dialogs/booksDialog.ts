import { html, nothing } from "lit-html";
import type { BookEntry } from "../../../protocol/answers.js";
import type { Shell } from "../shell.js";

/** The books kept in this browser: open one, remove one, take the removal back. */
export function booksDialog({ page, dialogs, attempt }: Shell): void {
  let books: readonly BookEntry[] | undefined;
  let removed: BookEntry | undefined;
  dialogs.open("Books in this browser", ({ close, redraw }) => {
    const load = async () => {
      books = await page.bench.books();
      redraw();
    };
    if (books === undefined) {
      books = [];
      attempt(load);
    }
    const open = (id: string) => {
      close();
      attempt(async () => {
        const opened = await page.bench.openBook(id);
        if (opened.is === "refused") page.trouble(opened.message);
      });
    };
    const remove = (book: BookEntry) =>
      attempt(async () => {
        await page.bench.removeBook(book.id);
        removed = book;
        await load();
      });
    const takeBack = (book: BookEntry) =>
      attempt(async () => {
        await page.bench.takeBack(book.id);
        removed = undefined;
        await load();
      });
    return html`${
      removed
        ? html`<p role="status">${removed.title} was removed. <button type="button" class="quiet" @click=${() => takeBack(removed as BookEntry)}>Take it back</button></p>`
        : nothing
    }
      <ul class="shell-books">
        ${(books ?? []).map(
          (book) => html`<li>
            <button type="button" class="shell-book" aria-current=${book.id === page.state().id ? "true" : nothing} @click=${() => open(book.id)}>
              <b>${book.title}</b>
              <span class="soft">${book.rows.toLocaleString("en")} rows, changed ${new Date(book.changed).toLocaleString("sv")}</span>
            </button>
            ${
              book.id === page.state().id
                ? html`<span class="soft">open now</span>`
                : html`<button type="button" class="quiet" aria-label=${`Remove ${book.title}`} @click=${() => remove(book)}>Remove</button>`
            }
          </li>`,
        )}
      </ul>`;
  });
}
