import type { Area } from "../../../../sheet/book/book.js";
import { createArrowPicking } from "./arrowPicking.js";
import { attempt } from "./attempt.js";
import type { Desk } from "./desk.js";
import { pickedText } from "./text/pickedText.js";
import { isFormula } from "./text/tokens.js";
import { sheetNames } from "./typing.js";
import { isPickable, picked, putPicked } from "./view/picked.js";

/** References put into the formula from the grid, by mouse and by arrows. */
export interface Picks {
  isPicking(): boolean;
  pick(area: Area, done: boolean): void;
  /** False where an arrow picks nothing and is the caret's. */
  byArrow(down: number, right: number, extend: boolean, toEdge: boolean): boolean;
}

export function createPicks(desk: Desk): Picks {
  const { page, grid, formula } = desk;
  const arrows = createArrowPicking(page, grid, () => desk.edit?.place ?? page.selection().active);

  function put(area: Area): void {
    if (!desk.edit) return;
    const reference = pickedText(area, desk.edit.place, sheetNames(page));
    formula.view.dispatch(putPicked(formula.view.state, reference));
  }

  async function move(down: number, right: number, extend: boolean, toEdge: boolean): Promise<void> {
    const { state } = formula.view;
    if (!state.field(picked)) arrows.reset();
    const area = await arrows.move(down, right, extend, toEdge);
    if (formula.view.state.doc.eq(state.doc)) put(area);
  }

  const isPicking = () => desk.edit !== undefined && isFormula(formula.text()) && isPickable(formula.view.state);
  return {
    isPicking,
    pick(area, done) {
      put(area);
      arrows.startAt(area);
      if (done) formula.view.focus();
    },
    byArrow(down, right, extend, toEdge) {
      if (!isPicking()) return false;
      attempt(page, () => move(down, right, extend, toEdge));
      return true;
    },
  };
}
