import { html, nothing, type TemplateResult } from "lit-html";
import { type Command, type MenuName, menuNames } from "./command.js";
import { keysText } from "./keysOf.js";

export interface MenuBar {
  view(): TemplateResult;
  close(): void;
  openAt(about: "cells" | "rows" | "columns", at: { readonly x: number; readonly y: number }): void;
}

/** Menus of words. Arrow keys walk in and between them, a first letter jumps, Escape closes. */
export function createMenuBar(
  commands: () => readonly Command[],
  redraw: () => void,
  refocus: () => void,
  start: (command: Command) => void,
): MenuBar {
  let open: MenuName | undefined;
  let around: { readonly about: "cells" | "rows" | "columns"; readonly x: number; readonly y: number } | undefined;

  function close(): void {
    if (open === undefined && around === undefined) return;
    open = undefined;
    around = undefined;
    redraw();
  }

  function show(name: MenuName, place: "first" | "last" | "button"): void {
    open = name;
    around = undefined;
    redraw();
    keepInView(document.getElementById(`menu-${name}-list`));
    if (place === "button") document.getElementById(`menu-${name}`)?.focus();
    else
      items(`menu-${name}-list`)
        .at(place === "first" ? 0 : -1)
        ?.focus();
  }

  function run(command: Command): void {
    close();
    refocus();
    start(command);
  }

  function onKey(event: KeyboardEvent): void {
    const list = (event.target as HTMLElement).closest<HTMLElement>("[role=menu]");
    const step = { ArrowRight: 1, ArrowLeft: -1 }[event.key];
    if (step !== undefined && !around) {
      const name = open ?? ((event.target as HTMLElement).dataset.menu as MenuName);
      const next = menuNames[(menuNames.indexOf(name) + step + menuNames.length) % menuNames.length] as MenuName;
      if (open) show(next, list ? "first" : "button");
      else document.getElementById(`menu-${next}`)?.focus();
    } else if (event.key === "Escape" && (open || around)) {
      const button = open && document.getElementById(`menu-${open}`);
      close();
      if (button) button.focus();
      else refocus();
    } else if (!list && (event.key === "ArrowDown" || event.key === "ArrowUp")) {
      show((event.target as HTMLElement).dataset.menu as MenuName, event.key === "ArrowDown" ? "first" : "last");
    } else if (list) {
      if (!walk(event, items(list.id))) return;
    } else return;
    event.preventDefault();
    event.stopPropagation();
  }

  function list(id: string, name: string, shown: readonly Command[]): TemplateResult {
    return html`<ul role="menu" id=${id} aria-label=${name} @keydown=${onKey}>
      ${shown.map((command, index) => {
        const off = command.isPossible?.() === false;
        const marked = command.isOn !== undefined;
        return html`${command.apart && index > 0 ? html`<li role="separator"></li>` : nothing}<li role="none">
            <button
              type="button"
              role=${marked ? "menuitemcheckbox" : "menuitem"}
              aria-checked=${marked ? String(command.isOn?.()) : nothing}
              aria-disabled=${off ? "true" : nothing}
              aria-keyshortcuts=${command.keys ? command.keys.replace("Ctrl", "Control") : nothing}
              tabindex="-1"
              @click=${() => (off ? undefined : run(command))}
            ><span>${command.words}</span>${command.keys ? html`<kbd>${keysText(command.keys)}</kbd>` : nothing}</button>
          </li>`;
      })}
    </ul>`;
  }

  // A press anywhere else closes what is open.
  document.addEventListener("pointerdown", (event) => {
    if (!(event.target as Element).closest?.(".shell-menus, .shell-around")) close();
  });

  return {
    close,
    openAt(about, at) {
      open = undefined;
      around = { about, ...at };
      redraw();
      const box = document.querySelector<HTMLElement>(".shell-around");
      if (!box) return;
      box.style.left = `${Math.max(0, Math.min(at.x, innerWidth - box.offsetWidth - 4))}px`;
      box.style.top = `${Math.max(0, Math.min(at.y, innerHeight - box.offsetHeight - 4))}px`;
      items("menu-around")[0]?.focus();
    },
    view() {
      const all = commands();
      return html`<div class="shell-menus" role="menubar" aria-label="Commands">
          ${menuNames.map(
            (name, index) => html`<div class="shell-menu" role="none">
              <button
                type="button"
                role="menuitem"
                id="menu-${name}"
                data-menu=${name}
                aria-haspopup="menu"
                aria-expanded=${open === name ? "true" : "false"}
                tabindex=${(open ?? menuNames[0]) === name || (open === undefined && index === 0) ? "0" : "-1"}
                @click=${() => (open === name ? close() : show(name, "button"))}
                @pointerenter=${() => (open && open !== name ? show(name, "button") : undefined)}
                @keydown=${onKey}
              >${name}</button>
              ${
                open === name
                  ? list(
                      `menu-${name}-list`,
                      name,
                      all.filter(({ menu }) => menu === name),
                    )
                  : nothing
              }
            </div>`,
          )}
        </div>
        ${
          around
            ? html`<div class="shell-around">${list(
                "menu-around",
                `About these ${around.about}`,
                all.filter(({ about }) => about?.includes((around as NonNullable<typeof around>).about)),
              )}</div>`
            : nothing
        }`;
    },
  };
}

/** Moves a list that would reach beyond the window to the left. */
function keepInView(list: HTMLElement | null): void {
  const beyond = list ? list.getBoundingClientRect().right + 4 - innerWidth : 0;
  if (list && beyond > 0) list.style.insetInlineStart = `${-beyond}px`;
}

function items(id: string): HTMLElement[] {
  return [...document.querySelectorAll<HTMLElement>(`#${id} [role^=menuitem]`)];
}

/** Moves within a menu; false where the key is not for it. */
function walk(event: KeyboardEvent, all: readonly HTMLElement[]): boolean {
  const at = all.indexOf(document.activeElement as HTMLElement);
  const places: Readonly<Record<string, number>> = { ArrowDown: at + 1, ArrowUp: at - 1, Home: 0, End: all.length - 1 };
  const place = places[event.key];
  if (place !== undefined) {
    all[(place + all.length) % all.length]?.focus();
    return true;
  }
  if (event.key.length !== 1 || event.ctrlKey || event.key === " ") return false;
  const letter = event.key.toLowerCase();
  const after = [...all.slice(at + 1), ...all.slice(0, at + 1)];
  after.find((item) => item.textContent?.trim().toLowerCase().startsWith(letter))?.focus();
  return true;
}
