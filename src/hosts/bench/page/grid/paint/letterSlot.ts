import { columnLetters } from "../../../../../sheet/book/address.js";
import { element } from "../layout/frame.js";
import { type Placed, placed } from "./placed.js";

export interface LetterFacts {
  readonly column: number;
  readonly isInSelection: boolean;
  readonly isWholeSelected: boolean;
  /** The first of the hidden columns that end before this one. */
  readonly hiddenFrom: number | undefined;
}

export interface LetterSlot extends Placed {
  show(facts: LetterFacts): void;
}

/** A column's letter, its menu, the edge that sets its width, and the mark of hidden columns before it. */
export function letterSlot(parent: HTMLElement, frozen: boolean): LetterSlot {
  const cell = element("grid-letter", parent, "columnheader");
  const letters = document.createElement("span");
  const unhide = button("grid-unhide");
  const menu = button("grid-menu");
  menu.textContent = "menu";
  const edge = document.createElement("span");
  edge.className = "grid-edge";
  cell.append(unhide, letters, menu, edge);
  let [column, className, hiddenFrom, isWhole] = [-1, "", -1, ""];

  return {
    ...placed(cell),
    show(facts) {
      if (column !== facts.column || hiddenFrom !== (facts.hiddenFrom ?? -1)) {
        column = facts.column;
        hiddenFrom = facts.hiddenFrom ?? -1;
        letters.textContent = columnLetters(column);
        cell.setAttribute("aria-label", columnLetters(column));
        cell.setAttribute("aria-colindex", String(column + 2));
        for (const part of [menu, edge, unhide]) part.dataset.column = String(column);
        menu.setAttribute("aria-label", `Menu of column ${columnLetters(column)}`);
        unhide.hidden = facts.hiddenFrom === undefined;
        if (facts.hiddenFrom !== undefined) {
          const [from, to] = [columnLetters(facts.hiddenFrom), columnLetters(column - 1)];
          unhide.dataset.from = String(facts.hiddenFrom);
          unhide.setAttribute(
            "aria-label",
            from === to ? `Show hidden column ${from}` : `Show hidden columns ${from} to ${to}`,
          );
        }
      }
      const nextClass = [
        "grid-letter",
        frozen ? "grid-frozen" : "",
        facts.isInSelection ? "grid-beside" : "",
        facts.isWholeSelected ? "grid-whole" : "",
      ]
        .filter(Boolean)
        .join(" ");
      if (className !== nextClass) cell.className = className = nextClass;
      const whole = String(facts.isWholeSelected);
      if (isWhole !== whole) {
        isWhole = whole;
        cell.setAttribute("aria-selected", isWhole);
      }
    },
  };
}

function button(className: string): HTMLButtonElement {
  const made = document.createElement("button");
  made.type = "button";
  made.tabIndex = -1;
  made.className = className;
  return made;
}
