import { history } from "@codemirror/commands";
import type { Extension } from "@codemirror/state";
import { EditorSelection, EditorState, Transaction } from "@codemirror/state";
import type { ViewUpdate } from "@codemirror/view";
import { EditorView, tooltips } from "@codemirror/view";
import type { Typing } from "../typing.js";
import { adoptStyles } from "./adoptStyles.js";
import { card } from "./card.js";
import { checking } from "./check.js";
import { completion } from "./completion.js";
import { editing, setEditing } from "./editing.js";
import type { EditorActions } from "./editorKeys.js";
import { editorKeys } from "./editorKeys.js";
import { oneLine } from "./oneLine.js";
import { paintFormula } from "./paintFormula.js";
import { picked } from "./picked.js";

export interface FormulaView {
  readonly view: EditorView;
  text(): string;
  /**
   * Shows a text that nobody types; what was undone and redone before is forgotten. Answers, like the next two, with
   * the text as the view has it, on one line.
   */
  show(text: string): string;
  /** Begins typing with a text, the caret at its end. */
  begin(text: string): string;
  /** Puts in front what the cell holds, where typing began before it was known. */
  prepend(text: string): string;
  /** As if it were typed at the caret. */
  type(text: string): void;
}

export interface ViewParts {
  readonly typing: Typing;
  readonly actions: EditorActions;
  readonly tips: HTMLElement;
  updated(update: ViewUpdate): void;
  /** What the text is called, and the ids of what describes it. */
  label(): string;
  readonly describedBy: string;
}

/** The one view of what is typed; it is moved between the line and the cell, so caret and undo stay. */
export function createFormulaView(parent: HTMLElement, parts: ViewParts): FormulaView {
  const extensions = extensionsOf(parts);
  const stateOf = (doc: string) => EditorState.create({ doc, extensions });
  const view = adoptStyles(() => new EditorView({ parent, state: stateOf("") }));
  return {
    view,
    text: () => view.state.doc.toString(),
    show(text) {
      const doc = singleLine(text);
      view.setState(stateOf(doc));
      return doc;
    },
    begin(text) {
      const doc = singleLine(text);
      view.dispatch({
        changes: { from: 0, to: view.state.doc.length, insert: doc },
        selection: EditorSelection.cursor(doc.length),
        effects: setEditing.of(true),
        annotations: Transaction.addToHistory.of(false),
        scrollIntoView: true,
      });
      return doc;
    },
    prepend(text) {
      const doc = singleLine(text);
      view.dispatch({ changes: { from: 0, insert: doc }, annotations: Transaction.addToHistory.of(false) });
      return doc;
    },
    type: (text) => view.dispatch(view.state.replaceSelection(text), { userEvent: "input.type", scrollIntoView: true }),
  };
}

function singleLine(text: string): string {
  return text.replace(/[\r\n]+/g, " ");
}

/** A press or a letter in the line begins typing; to come to it by Tab does not yet. */
const beginsByItself: Extension = [
  EditorView.domEventHandlers({
    mousedown(_, view) {
      if (!view.state.field(editing)) view.dispatch({ effects: setEditing.of(true) });
      return false;
    },
  }),
  EditorState.transactionExtender.of((transaction) => {
    const isTyped = transaction.docChanged && transaction.annotation(Transaction.userEvent) !== undefined;
    return isTyped && !transaction.startState.field(editing) ? { effects: setEditing.of(true) } : null;
  }),
];

function extensionsOf({ typing, actions, tips, updated, label, describedBy }: ViewParts): Extension {
  return [
    editing,
    picked,
    checking(typing),
    paintFormula(typing),
    card(typing, actions),
    completion(typing),
    history(),
    oneLine,
    editorKeys(actions),
    beginsByItself,
    EditorView.lineWrapping,
    tooltips({ position: "fixed", parent: tips }),
    EditorView.updateListener.of(updated),
    EditorView.contentAttributes.of(() => ({
      "aria-label": label(),
      "aria-multiline": "false",
      "aria-describedby": describedBy,
      spellcheck: "false",
      autocapitalize: "off",
      autocorrect: "off",
      translate: "no",
    })),
  ];
}
