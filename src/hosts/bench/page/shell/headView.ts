import { html, nothing, type TemplateResult } from "lit-html";
import type { BookState, SavedState } from "../../protocol/bookState.js";
import type { Page } from "../page.js";

/** The book's title, its sheets, the menus, and whether it is kept. */
export function headView(page: Page, menus: TemplateResult, rename: () => void): TemplateResult {
  const state = page.state();
  return html`<h1 class="shell-title"><button type="button" title="Rename this book" @click=${rename}>${state.title}</button></h1>
    ${sheetTabs(page, state)} ${menus}
    <p class="shell-saved ${state.saved.is === "not saved" ? "isFault" : ""}" role="status">${
      state.saved.is === "not saved" ? html`<span class="mark" aria-hidden="true"></span>` : nothing
    }${savedText(state.saved)}</p>`;
}

function sheetTabs(page: Page, state: BookState): TemplateResult {
  const shown = page.sheet();
  const onKey = (event: KeyboardEvent) => {
    const step = { ArrowRight: 1, ArrowLeft: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const next = (shown + step + state.sheets.length) % state.sheets.length;
    page.showSheet(next);
    document.getElementById(`sheet-${next}`)?.focus();
  };
  return html`<div class="shell-sheets" role="tablist" aria-label="Sheets" @keydown=${onKey}>
    ${state.sheets.map(
      ({ name }, index) => html`<button
        type="button"
        role="tab"
        id="sheet-${index}"
        aria-selected=${index === shown ? "true" : "false"}
        tabindex=${index === shown ? "0" : "-1"}
        @click=${() => page.showSheet(index)}
      >${name}</button>`,
    )}
  </div>`;
}

function savedText(saved: SavedState): string {
  switch (saved.is) {
    case "saved":
      return "Kept in this browser";
    case "saving":
      return "Keeping…";
    case "not saved":
      return saved.message;
  }
}
