import { addressText } from "../../../../sheet/book/address.js";
import type { Place } from "../../../../sheet/book/book.js";
import { between } from "./arrowPicking.js";
import type { Desk } from "./desk.js";
import { entering, isSamePlace } from "./edit.js";
import type { IdleLine } from "./idleLine.js";
import { closedAtEnd, syntaxProblem } from "./text/syntaxProblem.js";
import { setChecked } from "./view/check.js";

export interface Step {
  readonly down: number;
  readonly right: number;
}

/** Begins, enters and gives up what is typed. */
export interface Typist {
  /** `typed` replaces what the cell holds. */
  begin(typed: string | undefined, inCell: boolean): void;
  /** Typing began in the line by itself. */
  beganInLine(): void;
  resume(place: Place, text: string): void;
  commit(step?: Step, over?: boolean): Promise<boolean>;
  cancel(): void;
}

interface Kept {
  readonly place: Place;
  readonly text: string;
}

export function createTypist(desk: Desk, idle: IdleLine): Typist {
  const { page, grid, formula, surface, drafts } = desk;
  /** Texts that were refused when another one was begun already; each comes back when there is room. */
  const waiting: Kept[] = [];

  function open(place: Place, inCell: boolean): void {
    desk.address.show(addressText(place.row, place.column));
    if (inCell) surface.toCell(place);
    formula.view.focus();
  }

  function begin(typed: string | undefined, inCell: boolean): void {
    const place = page.selection().active;
    const entry = idle.entryOf(place);
    const awaitsEntry = typed === undefined && entry === undefined;
    desk.edit = { place, original: entry, awaitsEntry, arrowsPick: typed !== undefined || entry === "" };
    const text = formula.begin(typed === undefined ? (entry ?? "") : "");
    if (typed === undefined && !awaitsEntry) desk.edit.original = text;
    open(place, inCell);
    if (typed) formula.type(typed);
  }

  function resume(place: Place, text: string): void {
    if (desk.edit) return void waiting.push({ place, text });
    page.select(between(place, place), place);
    desk.edit = { place, original: undefined, awaitsEntry: false, arrowsPick: false };
    formula.begin(text);
    open(place, false);
  }

  function end(): void {
    const hadFocus = formula.view.hasFocus;
    desk.edit = undefined;
    surface.toLine();
    desk.marks.clear();
    desk.told.clear();
    formula.show("");
    if (hadFocus) grid.focus();
  }

  /** After typing: the next cell, or a text that has to be mended first. */
  function goOn(place: Place, step: Step | undefined): void {
    if (step && page.sheet() !== place.sheet) page.showSheet(place.sheet);
    if (step) grid.step(between(place, place), step.down, step.right, false);
    idle.refresh();
    const next = waiting.shift();
    if (next) resume(next.place, next.text);
  }

  /** Says why the text cannot be entered; it stays and is gone on with. */
  function refuse({ position: from, message }: { readonly position: number; readonly message: string }): void {
    formula.view.dispatch({
      effects: setChecked.of({ diagnostics: [{ from, to: from + 1, severity: "error", message }], preview: undefined }),
    });
    const place = desk.edit?.place;
    if (!place) return;
    if (page.sheet() === place.sheet && !isSamePlace(page.selection().active, place)) {
      page.select(between(place, place), place);
    }
    formula.view.focus();
  }

  async function commit(step?: Step, over = false): Promise<boolean> {
    const { edit } = desk;
    if (!edit) return true;
    const text = closedAtEnd(formula.text());
    const problem = syntaxProblem(text);
    if (problem) {
      refuse(problem);
      return false;
    }
    const isChanged = over || text !== edit.original;
    // Keys pressed from now on are for the next cell, so nothing waits for the worker.
    const acting = isChanged ? page.act(entering(text, edit.place, over, page)) : undefined;
    end();
    goOn(edit.place, step);
    const isDone = acting === undefined || (await acting.catch(() => false));
    if (isDone) drafts.settled(edit.place);
    else resume(edit.place, text);
    return isDone;
  }

  return {
    begin,
    beganInLine() {
      const { active: place } = page.selection();
      const text = idle.entryOf(place);
      desk.edit = { place, original: text, awaitsEntry: text === undefined, arrowsPick: text === "" };
    },
    resume,
    commit,
    cancel() {
      const { edit } = desk;
      if (!edit) return;
      end();
      drafts.settled(edit.place);
      if (page.sheet() !== edit.place.sheet) page.showSheet(edit.place.sheet);
      goOn(edit.place, undefined);
      grid.focus();
    },
  };
}
