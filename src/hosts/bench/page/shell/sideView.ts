import { html, nothing, type TemplateResult } from "lit-html";
import type { Page } from "../page.js";
import type { Panel } from "../panel.js";

export interface SideActions {
  show(id: string): void;
  hide(): void;
}

/** The parts beside the table, one at a time. */
export function sideView(page: Page, panels: readonly Panel[], actions: SideActions): TemplateResult {
  const shown = panels.find(({ id }) => id === page.preferences().panel);
  if (!shown) return html``;
  const onKey = (event: KeyboardEvent) => {
    const step = { ArrowRight: 1, ArrowLeft: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const next = panels[(panels.indexOf(shown) + step + panels.length) % panels.length] as Panel;
    actions.show(next.id);
    document.getElementById(`side-${next.id}`)?.focus();
  };
  return html`<div class="shell-side-head">
      <div class="shell-tabs" role="tablist" aria-label="Beside the table" @keydown=${onKey}>
        ${panels.map(
          ({ id, title, keys }) => html`<button
            type="button"
            role="tab"
            id="side-${id}"
            aria-selected=${id === shown.id ? "true" : "false"}
            aria-controls=${id === shown.id ? "side-panel" : nothing}
            title=${keys}
            tabindex=${id === shown.id ? "0" : "-1"}
            @click=${() => actions.show(id)}
          >${title}</button>`,
        )}
      </div>
      <button type="button" class="quiet" aria-label="Close what is beside the table" @click=${actions.hide}>Close</button>
    </div>
    <section class="shell-panel" id="side-panel" role="tabpanel" aria-labelledby="side-${shown.id}" tabindex="0"><h2 class="unseen">${shown.title}</h2>${shown.view()}</section>`;
}
