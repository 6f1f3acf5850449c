import type { PageChange } from "../page.js";
import type { Desk } from "./desk.js";
import { isSamePlace } from "./edit.js";
import type { IdleLine } from "./idleLine.js";
import { isFormula } from "./text/tokens.js";
import type { Typist } from "./typist.js";

/** What the editor does when the page changes around it: another selection enters what is typed, another sheet is picked on. */
export function followPage(desk: Desk, idle: IdleLine, typist: Typist): (change: PageChange) => void {
  const { page, formula, surface, marks } = desk;
  let sheet = page.sheet();
  let { active } = page.selection();

  return (change) => {
    if (change === "preferences") return;
    const isOtherSheet = page.sheet() !== sheet;
    const isOtherCell = !isSamePlace(page.selection().active, active);
    sheet = page.sheet();
    active = page.selection().active;
    const { edit } = desk;
    if (!edit) return idle.refresh();
    if (isOtherSheet && isFormula(formula.text())) {
      surface.toLine();
      marks.show(formula.text(), formula.view.state.selection.main.head, edit.place);
      formula.view.focus();
    } else if ((isOtherSheet || isOtherCell) && !isSamePlace(active, edit.place)) {
      void typist.commit();
    }
  };
}
