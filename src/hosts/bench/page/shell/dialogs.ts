import { html, render, type TemplateResult } from "lit-html";

export interface Dialogs {
  /** Shows a dialog until it is closed; `view` is drawn again by `redraw`. */
  open(title: string, view: (dialog: OpenDialog) => TemplateResult): void;
  isOpen(): boolean;
}

export interface OpenDialog {
  close(): void;
  redraw(): void;
}

/** One dialog at a time, in the browser's own: Escape closes it and the focus goes back to where it was. */
export function createDialogs(root: HTMLElement): Dialogs {
  const element = document.createElement("dialog");
  element.className = "shell-dialog";
  root.append(element);
  let current: (() => TemplateResult) | undefined;
  let focused: Element | null = null;

  const redraw = () => {
    if (current) render(current(), element);
  };

  const close = () => element.close();

  function cleanUp(): void {
    current = undefined;
    render(html``, element);
    if (focused instanceof HTMLElement) focused.focus();
  }

  // The browser tells of it a little later, when another dialog may be open already.
  element.addEventListener("close", () => {
    if (!element.open && current) cleanUp();
  });
  // A press on the ground beside the dialog closes it, as Escape does.
  element.addEventListener("pointerdown", (event) => {
    if (event.target === element) close();
  });

  return {
    isOpen: () => element.open,
    open(title, view) {
      if (!element.open && current) cleanUp();
      if (!element.open) focused = document.activeElement;
      current = () => html`<form class="shell-form" method="dialog" aria-labelledby="dialog-title" @submit=${stop}>
        <div class="shell-dialog-head">
          <h2 id="dialog-title">${title}</h2>
          <button type="button" class="quiet" @click=${close}>Close</button>
        </div>
        ${view({ close, redraw })}
      </form>`;
      redraw();
      if (!element.open) element.showModal();
      const first = element.querySelector<HTMLElement>("[autofocus], input, select, textarea");
      first?.focus();
      if (first instanceof HTMLInputElement && first.type === "text") first.select();
    },
  };
}

function stop(event: Event): void {
  event.preventDefault();
}
