import type { EditorState, Extension } from "@codemirror/state";
import type { DecorationSet, PluginValue, ViewUpdate } from "@codemirror/view";
import { Decoration, ViewPlugin } from "@codemirror/view";
import { paintOf, paints } from "../text/paintOf.js";
import { referencesOf } from "../text/references.js";
import type { Typing } from "../typing.js";
import { sheetNames } from "../typing.js";
import { editing } from "./editing.js";

interface Painting extends PluginValue {
  decorations: DecorationSet;
}

const marks = new Map(paints.map((name) => [name, Decoration.mark({ class: name })]));

/** Functions, texts and references told apart in the view; only what is in view is painted. */
export function paintFormula({ page, place }: Typing): Extension {
  const paint = (state: EditorState, { from, to }: { readonly from: number; readonly to: number }) => {
    const text = state.doc.toString();
    const edited = place();
    // A formula that is only shown has no outlines in the grid, so its references need no colours either.
    const references = edited && state.field(editing) ? referencesOf(text, edited, sheetNames(page)) : [];
    const inView = paintOf(text, references).filter((each) => each.to >= from && each.from <= to);
    return Decoration.set(inView.map((each) => marks.get(each.paint)!.range(each.from, each.to)));
  };
  return ViewPlugin.define<Painting>(
    (view) => ({
      decorations: paint(view.state, view.viewport),
      update({ state, startState, docChanged, viewportChanged }: ViewUpdate) {
        const began = state.field(editing) !== startState.field(editing);
        if (docChanged || viewportChanged || began) this.decorations = paint(state, view.viewport);
      },
    }),
    { decorations: (painting) => painting.decorations },
  );
}
