import type { Extension } from "@codemirror/state";
import { StateEffect, StateField } from "@codemirror/state";
import { Decoration, EditorView, ViewPlugin } from "@codemirror/view";
import type { Diagnostic, FormulaCheck } from "../../../protocol/answers.js";
import { closedAtEnd, isUnfinished } from "../text/syntaxProblem.js";
import { isFormula } from "../text/tokens.js";
import type { Typing } from "../typing.js";
import { editing } from "./editing.js";

const pauseBeforeCheck = 150;

export const setChecked = StateEffect.define<FormulaCheck | undefined>();

/** What is known of the formula as it stands; a value belongs to one text, faults move along until they are looked at again. */
export const checked = StateField.define<FormulaCheck | undefined>({
  create: () => undefined,
  update(known, { effects, docChanged, changes, newDoc }) {
    const effect = effects.find((each) => each.is(setChecked));
    if (effect) return effect.value;
    if (!docChanged || !known) return known;
    if (!isFormula(newDoc.sliceString(0, 1))) return undefined;
    const diagnostics = known.diagnostics.map((each) => ({
      ...each,
      from: changes.mapPos(each.from, 1),
      to: changes.mapPos(each.to, -1),
    }));
    return { diagnostics, preview: undefined };
  },
  provide: (field) =>
    EditorView.decorations.from(field, (known) => (view) => {
      const { length } = view.state.doc;
      return Decoration.set(
        (known?.diagnostics ?? []).flatMap((each) => underlined(each, length)),
        true,
      );
    }),
});

const underlines = {
  error: Decoration.mark({ class: "editor-wrong" }),
  hint: Decoration.mark({ class: "editor-hinted" }),
};

function underlined({ from, to, severity }: Diagnostic, length: number) {
  // What is missing at the end is marked at the last letter.
  const start = Math.max(0, Math.min(from, length - 1));
  const end = Math.min(Math.max(to, start + 1), length);
  return start < end ? [underlines[severity].range(start, end)] : [];
}

/** What is only unfinished is no fault yet. */
function softened({ diagnostics, preview }: FormulaCheck): FormulaCheck {
  return { diagnostics: diagnostics.map((each) => ({ ...each, severity: "hint" })), preview };
}

/** Asks the worker about a formula when the typing pauses; answers to texts that have changed meanwhile are dropped. */
export function checking(typing: Typing): Extension {
  return [
    checked,
    ViewPlugin.define((view) => {
      let timer: ReturnType<typeof setTimeout> | undefined;
      async function ask(): Promise<void> {
        const text = view.state.doc.toString();
        const place = typing.place();
        if (!place || !isFormula(text) || text.length === 1) return;
        const answer = await typing.page.bench.checkFormula(closedAtEnd(text), place).catch(() => undefined);
        const isStale = text !== view.state.doc.toString() || typing.place() !== place;
        if (isStale || !answer) return;
        const isOnItsWay = isUnfinished(text, view.state.selection.main.head);
        view.dispatch({ effects: setChecked.of(isOnItsWay ? softened(answer) : answer) });
      }
      return {
        update({ docChanged, state, startState }) {
          if (!docChanged && state.field(editing) === startState.field(editing)) return;
          clearTimeout(timer);
          if (state.field(editing)) timer = setTimeout(ask, pauseBeforeCheck);
        },
        destroy: () => clearTimeout(timer),
      };
    }),
  ];
}
