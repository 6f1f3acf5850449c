import { html, type TemplateResult } from "lit-html";
import { faultText } from "../../createPage.js";
import type { Page } from "../../page.js";
import type { Panel } from "../../panel.js";

const mostShown = 300;

/** Every version of the book by what was done; any of them can be gone back to. */
export function historyPanel(page: Page, redraw: () => void, enterTyped: () => Promise<boolean>): Panel {
  const go = async (version: number) => {
    if (!(await enterTyped())) return;
    await page.bench.goTo(version);
    redraw();
  };
  const goTo = (version: number) => {
    go(version).catch((fault: unknown) => page.trouble(faultText(fault)));
  };
  return {
    id: "history",
    title: "History",
    keys: "Alt+Y",
    view: () => historyView(page, goTo),
    shown: redraw,
    hidden: () => {},
    changed(change) {
      if (change === "state") redraw();
    },
  };
}

function historyView(page: Page, goTo: (version: number) => void): TemplateResult {
  const { labels, present } = page.state().history;
  const steps = labels.map((label, version) => ({ label, version })).reverse();
  return html`<p class="soft">Go back to any step, and forward again; a new change after going back starts from there.</p>
    <ol class="panel-history" reversed>
      ${steps.slice(0, mostShown).map(
        ({ label, version }) => html`<li class=${version > present ? "isUndone" : ""}>
          <button type="button" class="panel-finding" aria-current=${version === present ? "step" : "false"} @click=${() => goTo(version)}>
            ${label}${version === present ? html` <span class="soft">as it is now</span>` : ""}
          </button>
        </li>`,
      )}
    </ol>`;
}
