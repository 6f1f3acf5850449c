import type { ViewUpdate } from "@codemirror/view";
import { addressText } from "../../../../sheet/book/address.js";
import type { FunctionEntry } from "../../protocol/answers.js";
import { createAddressField } from "./addressField.js";
import { attempt } from "./attempt.js";
import { completeHeaders } from "./completeHeaders.js";
import type { Desk } from "./desk.js";
import { createDraftKeeper } from "./draftKeeper.js";
import type { Edit } from "./edit.js";
import type { CreateEditor } from "./editor.js";
import { createIdleLine } from "./idleLine.js";
import { followPage } from "./pageFollower.js";
import { createPicks } from "./picks.js";
import { createReferenceMarks } from "./referenceMarks.js";
import { createSurface } from "./surface.js";
import { paintOf } from "./text/paintOf.js";
import { isFormula } from "./text/tokens.js";
import { createTold } from "./told.js";
import type { Typing } from "./typing.js";
import { createTypist } from "./typist.js";
import { editing, setEditing } from "./view/editing.js";
import type { EditorActions } from "./view/editorKeys.js";
import { createFormulaView } from "./view/formulaView.js";

/** The address field, the line and the editor in the cell; what they do stands in the parts of this folder. */
export const createEditor: CreateEditor = (line, page, grid) => {
  let edit: Edit | undefined;
  let functions: readonly FunctionEntry[] = [];
  page.bench.functions().then(
    (told) => {
      functions = told;
    },
    (fault: Error) => page.trouble(`The functions could not be listed, so none are offered: ${fault.message}`),
  );
  const typing: Typing = {
    page,
    place: () => edit?.place,
    isInLine: () => surface.isInLine(),
    functions: () => functions,
    arrowsPick: () => edit?.arrowsPick ?? false,
  };
  const actions: EditorActions = {
    enter: (down, right) => void typist.commit({ down, right }),
    enterOver: () => void typist.commit(undefined, true),
    cancel: () => typist.cancel(),
    begin: touch,
    arrow,
    toggleArrows() {
      if (edit) edit.arrowsPick = !edit.arrowsPick;
      touch();
    },
    completeHeaders: () => attempt(page, () => completeHeaders(desk)),
    leave: () => grid.focus(),
  };

  line.classList.add("editor-line");
  const address = createAddressField(line, page, grid);
  const host = part("editor-host");
  const tips = part("editor-tips");
  line.append(host, tips);
  const told = createTold(line, typing);
  const surface = createSurface(host, grid, takeToLine);
  const formula = createFormulaView(host, { typing, actions, tips, updated, label, describedBy: told.describedBy });
  const drafts = createDraftKeeper(page);
  const marks = createReferenceMarks(page, grid);
  const desk: Desk = {
    ...{ page, grid, formula, surface, address, drafts, told, marks },
    get edit() {
      return edit;
    },
    set edit(next) {
      edit = next;
    },
  };
  const idle = createIdleLine(desk);
  const picks = createPicks(desk);
  const typist = createTypist(desk, idle);
  page.onChange(followPage(desk, idle, typist));
  idle.refresh();

  function label(): string {
    const { row, column } = typing.place() ?? page.selection().active;
    return `${surface.isInLine() ? "Formula line, " : "Cell "}${addressText(row, column)}`;
  }

  /** Lets the parts of the view look again; begins typing where nothing was typed. */
  function touch(): void {
    formula.view.dispatch({ effects: setEditing.of(true) });
  }

  function updated({ state, docChanged, transactions }: ViewUpdate): void {
    if (!state.field(editing)) return;
    if (!edit) typist.beganInLine();
    const { place, original } = edit!;
    const text = formula.text();
    // An empty text holds nothing to lose, and taken up again it would clear the cell.
    if (docChanged && (text === original || text === "")) drafts.settled(place);
    else if (docChanged) drafts.typed(place, text);
    const isTyped = transactions.some((each) => each.isUserEvent("input.type") || each.isUserEvent("delete"));
    if (isTyped && !surface.isInLine()) grid.reveal(place);
    surface.mirror(text, paintOf(text, marks.show(text, state.selection.main.head, place)));
    told.update(state);
  }

  function arrow(down: number, right: number, extend: boolean, toEdge: boolean): boolean {
    if (!typing.arrowsPick()) return false;
    if (isFormula(formula.text())) return picks.byArrow(down, right, extend, toEdge);
    if (surface.isInLine() || extend || toEdge) return false;
    void typist.commit({ down, right });
    return true;
  }

  function takeToLine(at: { readonly x: number; readonly y: number }): void {
    surface.toLine();
    formula.view.focus();
    const position = formula.view.posAtCoords(at);
    if (position !== null) formula.view.dispatch({ selection: { anchor: position } });
  }

  /** Goes on in the cell or in the line with what is typed already. */
  function continueIn(inCell: boolean): boolean {
    if (!edit) return false;
    if (inCell && edit.place.sheet === page.sheet()) surface.toCell(edit.place);
    else surface.toLine();
    formula.view.focus();
    touch();
    return true;
  }

  return {
    editing: () => edit?.place,
    beginInCell(typed) {
      if (!continueIn(true)) typist.begin(typed, true);
      else if (typed) formula.type(typed);
    },
    beginInLine() {
      if (!continueIn(false)) typist.begin(undefined, false);
    },
    resume: typist.resume,
    commit: () => typist.commit(),
    cancel: typist.cancel,
    isPicking: picks.isPicking,
    pick: picks.pick,
    insert(text) {
      if (!edit) typist.begin(undefined, false);
      if (text.endsWith("(") && !isFormula(formula.text())) formula.begin("=");
      formula.type(text);
      formula.view.focus();
    },
  };
};

function part(name: string): HTMLElement {
  const element = document.createElement("div");
  element.className = name;
  return element;
}
