import { completionStatus } from "@codemirror/autocomplete";
import type { EditorState, Extension } from "@codemirror/state";
import type { EditorView, Tooltip, ViewUpdate } from "@codemirror/view";
import { repositionTooltips, showTooltip } from "@codemirror/view";
import type { TemplateResult } from "lit-html";
import { html, nothing, render } from "lit-html";
import type { Hint } from "../text/hintAt.js";
import { hintAt } from "../text/hintAt.js";
import { readTokens } from "../text/tokens.js";
import type { Typing } from "../typing.js";
import { checked } from "./check.js";
import { editing } from "./editing.js";
import type { EditorActions } from "./editorKeys.js";
import { isPickable } from "./picked.js";

/** Under the text: the call that the caret stands in, what the formula gives or lacks, and the keys that help. */
export function card(typing: Typing, actions: EditorActions): Extension {
  const tooltip: Tooltip = {
    pos: 0,
    create(view) {
      const dom = document.createElement("div");
      dom.className = "editor-card";
      // What it tells is spoken by the status and the description of the text.
      dom.setAttribute("aria-hidden", "true");
      // A press on the card leaves the caret where it is.
      dom.addEventListener("mousedown", (event) => event.preventDefault());
      const draw = (state: EditorState) => render(cardOf(typing, state, actions), dom);
      draw(view.state);
      const update = ({ state }: ViewUpdate) => {
        draw(state);
        // It may have become narrower.
        repositionTooltips(view);
      };
      return { dom, update, getCoords: () => boxOf(view), resize: false };
    },
  };
  return showTooltip.compute(["doc", editing], (state) =>
    state.field(editing) && state.sliceDoc(0, 1) === "=" ? tooltip : null,
  );
}

function boxOf(view: EditorView) {
  return view.dom.getBoundingClientRect();
}

export function hintOf(typing: Typing, state: EditorState): Hint | undefined {
  return hintAt(state.doc.toString(), state.selection.main.head, typing.functions());
}

function cardOf(typing: Typing, state: EditorState, actions: EditorActions): TemplateResult {
  const hint = hintOf(typing, state);
  const isChoosing = completionStatus(state) === "active";
  return html`
    ${hint ? signatureOf(hint) : nothing}
    ${isChoosing ? nothing : messageOf(state)}
    ${isChoosing ? nothing : keysOf(typing, state, hint, actions)}
  `;
}

function signatureOf({ entry, present }: Hint): TemplateResult {
  const parameters = entry.parameters.map(({ name, optional, repeating }, index) => {
    const shown = `${optional ? `[${name}]` : name}${repeating ? " …" : ""}`;
    const comma = index === 0 ? "" : ", ";
    return html`${comma}<span class=${index === present ? "editor-present" : ""}>${shown}</span>`;
  });
  return html`
    <p class="editor-signature"><span class="editor-function">${entry.name}</span>(${parameters})</p>
    ${meaningOf({ entry, present })}
    ${entry.result === "" ? nothing : html`<p class="editor-result">gives ${entry.result}</p>`}
  `;
}

function meaningOf({ entry, present }: Hint): TemplateResult | typeof nothing {
  const parameter = present === undefined ? undefined : entry.parameters[present];
  if (!parameter || (parameter.meaning === "" && parameter.unit === "")) return nothing;
  const unit = parameter.unit === "" ? nothing : html` <span class="editor-unit">${parameter.unit}</span>`;
  return html`<p class="editor-meaning"><b>${parameter.name}</b>${unit} ${parameter.meaning}</p>`;
}

function messageOf(state: EditorState): TemplateResult | typeof nothing {
  const known = state.field(checked);
  const [first] = known?.diagnostics ?? [];
  if (first) return html`<p class="editor-message" data-severity=${first.severity}>${first.message}</p>`;
  return known?.preview === undefined ? nothing : html`<p class="editor-preview">= ${known.preview}</p>`;
}

function keysOf(
  typing: Typing,
  state: EditorState,
  hint: Hint | undefined,
  actions: EditorActions,
): TemplateResult | typeof nothing {
  const keys = keysFor(typing, state, hint);
  return keys.length === 0
    ? nothing
    : html`<p class="editor-keys">${keys.map(([key, does]) => html`<span><kbd>${key}</kbd> ${key === completesHeaders ? html`<button type="button" class="quiet" tabindex="-1" @click=${actions.completeHeaders}>${does}</button>` : does}</span>`)}</p>`;
}

const completesHeaders = "Alt+C";

/** The keys of use where the caret stands. */
export function keysFor(
  typing: Typing,
  state: EditorState,
  hint: Hint | undefined,
): readonly (readonly [key: string, does: string])[] {
  const { from, to } = state.selection.main;
  const onReference = readTokens(state.doc.toString()).some(
    (token) => token.kind === "reference" && token.from <= to && token.to >= from,
  );
  const arrows = typing.arrowsPick() ? "arrows move the caret" : "arrows pick cells";
  return [
    ...(onReference ? [["F4 or Ctrl+$", "steps through $"] as const] : []),
    ...(hint?.entry.own ? [[completesHeaders, "completes the headers"] as const] : []),
    ...(isPickable(state) ? [["F2", arrows] as const] : []),
  ];
}
