import { html, nothing, type TemplateResult } from "lit-html";
import type { Part } from "./part.js";

export interface PaneState {
  readonly active: Part;
  /** What was done last. */
  readonly said: string;
  /** What the worksheet could not do. */
  readonly trouble: string;
}

export interface PaneActions {
  show(part: Part): void;
  dismiss(): void;
}

export function paneView(parts: readonly Part[], state: PaneState, actions: PaneActions): TemplateResult {
  const { active, said, trouble } = state;
  return html`
    <div class="tabs" role="tablist" aria-label="Parts of the pane" @keydown=${(event: KeyboardEvent) => move(event, parts, active, actions)}>
      ${parts.map(
        (part) => html`<button
          type="button"
          role="tab"
          id="tab-${part.id}"
          aria-controls="panel-${part.id}"
          aria-selected=${part === active ? "true" : "false"}
          tabindex=${part === active ? "0" : "-1"}
          @click=${() => actions.show(part)}
        >${part.title}</button>`,
      )}
    </div>
    <p class="said" role="status">${said}</p>
    ${trouble ? html`<p class="caution" role="alert"><span class="mark" aria-hidden="true"></span><span>${trouble}</span> <button type="button" class="quiet" @click=${actions.dismiss}>Close</button></p>` : nothing}
    ${parts.map(
      (
        part,
      ) => html`<section role="tabpanel" id="panel-${part.id}" aria-labelledby="tab-${part.id}" ?hidden=${part !== active}>
        ${part === active ? part.view() : nothing}
      </section>`,
    )}
  `;
}

/** The arrow keys go around the tabs, Home and End to the first and the last. */
function move(event: KeyboardEvent, parts: readonly Part[], active: Part, actions: PaneActions): void {
  const at = parts.indexOf(active);
  const places: Readonly<Record<string, number>> = {
    ArrowRight: at + 1,
    ArrowLeft: at - 1,
    Home: 0,
    End: parts.length - 1,
  };
  const place = places[event.key];
  if (place === undefined) return;
  event.preventDefault();
  const part = parts[(place + parts.length) % parts.length]!;
  actions.show(part);
  document.getElementById(`tab-${part.id}`)?.focus();
}
