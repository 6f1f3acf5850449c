import {
  acceptCompletion,
  closeCompletion,
  completionStatus,
  moveCompletionSelection,
  startCompletion,
} from "@codemirror/autocomplete";
import { redo, standardKeymap, undo } from "@codemirror/commands";
import type { Extension } from "@codemirror/state";
import { Prec } from "@codemirror/state";
import type { Command, KeyBinding } from "@codemirror/view";
import { EditorView, keymap } from "@codemirror/view";
import { stepReferences } from "../text/stepReference.js";
import { editing } from "./editing.js";

/** What the keys of the editor do beyond its text. */
export interface EditorActions {
  /** Enters what is typed and goes on so many cells. */
  enter(down: number, right: number): void;
  enterOver(): void;
  cancel(): void;
  begin(): void;
  /** An arrow that is not needed for a list; false leaves it to the caret. */
  arrow(down: number, right: number, extend: boolean, toEdge: boolean): boolean;
  toggleArrows(): void;
  completeHeaders(): void;
  leave(): void;
}

const directions = [
  ["ArrowDown", 1, 0],
  ["ArrowUp", -1, 0],
  ["ArrowRight", 0, 1],
  ["ArrowLeft", 0, -1],
] as const;

export function editorKeys(actions: EditorActions): Extension {
  const whileEditing =
    (run: (view: EditorView) => void): Command =>
    (view) => {
      if (!view.state.field(editing)) return false;
      run(view);
      return true;
    };
  const orChoose = (otherwise: Command): Command => {
    return (view) => acceptCompletion(view) || otherwise(view);
  };
  const bindings: KeyBinding[] = [
    { key: "Enter", run: orChoose((view) => enterOrBegin(view, actions)) },
    { key: "Shift-Enter", run: whileEditing(() => actions.enter(-1, 0)) },
    { key: "Tab", run: orChoose(whileEditing(() => actions.enter(0, 1))) },
    { key: "Shift-Tab", run: whileEditing(() => actions.enter(0, -1)) },
    { key: "Mod-Enter", run: whileEditing(() => actions.enterOver()) },
    { key: "Alt-Enter", run: () => true },
    { key: "Escape", run: (view) => giveUp(view, actions) },
    { key: "F2", run: whileEditing(() => actions.toggleArrows()) },
    { key: "F8", run: whileEditing(() => actions.completeHeaders()) },
    ...["F4", "Ctrl-$", "Ctrl-Shift-4"].map((key) => ({ key, run: whileEditing(stepDollars) })),
    { key: "Ctrl-Space", run: startCompletion },
    { key: "PageDown", run: moveCompletionSelection(true, "page") },
    { key: "PageUp", run: moveCompletionSelection(false, "page") },
    { key: "Mod-z", run: whileEditing(undo) },
    { key: "Mod-y", run: whileEditing(redo) },
    { key: "Mod-Shift-z", run: whileEditing(redo) },
    ...directions.flatMap(([key, down, right]) => arrowBindings(key, down, right, actions)),
  ];
  return [Prec.highest(keymap.of(bindings)), keymap.of(standardKeymap), completeHeadersKey(actions)];
}

function enterOrBegin(view: EditorView, actions: EditorActions): boolean {
  if (view.state.field(editing)) actions.enter(1, 0);
  else actions.begin();
  return true;
}

/** A list that is seen closes first; one that is still on its way is given up with the rest. */
function giveUp(view: EditorView, actions: EditorActions): boolean {
  const isListSeen = completionStatus(view.state) === "active";
  closeCompletion(view);
  if (isListSeen) return true;
  if (view.state.field(editing)) actions.cancel();
  else actions.leave();
  return true;
}

function arrowBindings(key: string, down: number, right: number, actions: EditorActions): KeyBinding[] {
  const move = (extend: boolean, toEdge: boolean): Command => {
    return (view) => {
      if (!extend && !toEdge && down !== 0 && completionStatus(view.state) === "active") {
        return moveCompletionSelection(down > 0)(view);
      }
      return view.state.field(editing) && actions.arrow(down, right, extend, toEdge);
    };
  };
  return [
    { key, run: move(false, false), shift: move(true, false) },
    { key: `Mod-${key}`, run: move(false, true), shift: move(true, true) },
  ];
}

/** Told by the key's place, because Alt makes another letter of it on some keyboards. */
function completeHeadersKey(actions: EditorActions): Extension {
  return EditorView.domEventHandlers({
    keydown(event, view) {
      const { altKey, ctrlKey, metaKey, shiftKey, code } = event;
      if (!altKey || ctrlKey || metaKey || shiftKey || code !== "KeyC" || !view.state.field(editing)) return false;
      event.preventDefault();
      actions.completeHeaders();
      return true;
    },
  });
}

function stepDollars(view: EditorView): void {
  const { from, to, empty } = view.state.selection.main;
  const changes = stepReferences(view.state.doc.toString(), from, to);
  const last = changes.at(-1);
  if (!last) return;
  const set = view.state.changes([...changes]);
  const end = set.mapPos(last.to, 1);
  const anchor = empty ? end : set.mapPos(changes[0]!.from, -1);
  view.dispatch({ changes: set, selection: { anchor, head: end }, userEvent: "input.step", scrollIntoView: true });
}
