import type { EditorState } from "@codemirror/state";
import type { Typing } from "./typing.js";
import { hintOf, keysFor } from "./view/card.js";
import { checked } from "./view/check.js";

/** What is spoken of the text: a description to ask for, and a status that is read out by itself. */
export interface Told {
  readonly describedBy: string;
  update(state: EditorState): void;
  say(text: string): void;
  clear(): void;
}

export function createTold(line: HTMLElement, typing: Typing): Told {
  const description = hiddenPart("editor-description");
  const status = hiddenPart("editor-status");
  status.setAttribute("role", "status");
  line.append(description, status);
  const set = (part: HTMLElement, text: string) => {
    if (part.textContent !== text) part.textContent = text;
  };
  return {
    describedBy: `${description.id} ${status.id}`,
    update(state) {
      const hint = hintOf(typing, state);
      const keys = keysFor(typing, state, hint).map(([key, does]) => `${key} ${does}`);
      set(description, ["Enter enters, Escape gives up", ...keys].join("; "));
      const parameter = hint?.present === undefined ? undefined : hint.entry.parameters[hint.present];
      const known = state.field(checked);
      const value = known?.preview === undefined ? [] : [`gives ${known.preview}`];
      const messages = known?.diagnostics[0] ? [known.diagnostics[0].message] : value;
      const at = parameter ? [`${parameter.name}: ${parameter.meaning} ${parameter.unit}`.trim()] : [];
      set(status, [...at, ...messages].join(". "));
    },
    say: (text) => set(status, text),
    clear() {
      set(description, "");
      set(status, "");
    },
  };
}

function hiddenPart(id: string): HTMLElement {
  const part = document.createElement("div");
  part.id = id;
  part.className = "editor-unseen";
  return part;
}
