import type { EditorState, TransactionSpec } from "@codemirror/state";
import { StateEffect, StateField } from "@codemirror/state";
import { mayPick } from "../text/pickedText.js";

interface Stretch {
  readonly from: number;
  readonly to: number;
}

const setPicked = StateEffect.define<Stretch>();

/** The reference picked last, which another pick replaces; typing or moving the caret settles it. */
export const picked = StateField.define<Stretch | undefined>({
  create: () => undefined,
  update(stretch, { effects, docChanged, selection }) {
    const effect = effects.find((each) => each.is(setPicked));
    return effect ? effect.value : docChanged || selection ? undefined : stretch;
  },
});

export function isPickable(state: EditorState): boolean {
  const { from, to } = state.selection.main;
  return state.field(picked) !== undefined || mayPick(state.doc.toString(), from, to);
}

/** Puts a reference where the last one was picked, or at the caret. */
export function putPicked(state: EditorState, reference: string): TransactionSpec {
  const { from, to } = state.field(picked) ?? state.selection.main;
  const end = from + reference.length;
  return {
    changes: { from, to, insert: reference },
    selection: { anchor: end },
    effects: setPicked.of({ from, to: end }),
    userEvent: "input.pick",
    scrollIntoView: true,
  };
}
