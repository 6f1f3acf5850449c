import { element } from "../layout/frame.js";
import type { Placed } from "./placed.js";
import { type SlotTrack, slotTrack } from "./slotTrack.js";

/** What the cells of a row have in common. */
export interface RowFacts {
  /** The row in view. */
  readonly row: number;
  readonly sheetRow: number;
  readonly top: number;
  readonly isInSelection: boolean;
  readonly isWholeSelected: boolean;
  /** A filter leaves rows out above this one. */
  readonly isAfterGap: boolean;
  /** A plot set it apart. */
  readonly isMarked: boolean;
}

export interface RowSlot<Slot> {
  readonly element: HTMLElement;
  show(facts: RowFacts): void;
  hide(): void;
  readonly cells: SlotTrack<Slot>;
}

export function rowSlot<Slot extends Placed>(
  parent: HTMLElement,
  make: (parent: HTMLElement, isFrozen: boolean) => Slot,
): RowSlot<Slot> {
  const row = element("grid-row", parent, "row");
  const number = element("grid-number-cell", row, "rowheader");
  number.setAttribute("aria-colindex", "1");
  const cells = slotTrack(row, make);
  let [shownRow, sheetRow, top] = [-1, -1, -1];
  let isHidden = false;
  let [numberClass, isWhole] = ["", ""];

  return {
    element: row,
    show(facts) {
      if (isHidden) row.hidden = isHidden = false;
      if (shownRow !== facts.row) {
        shownRow = facts.row;
        row.setAttribute("aria-rowindex", String(facts.row + 2));
      }
      if (sheetRow !== facts.sheetRow) {
        sheetRow = facts.sheetRow;
        number.textContent = String(sheetRow + 1);
      }
      if (top !== facts.top) {
        top = facts.top;
        row.style.transform = `translateY(${top}px)`;
      }
      const nextClass = `grid-number-cell${facts.isInSelection ? " grid-beside" : ""}${facts.isAfterGap ? " grid-gap" : ""}${facts.isMarked ? " grid-marked" : ""}`;
      if (numberClass !== nextClass) number.className = numberClass = nextClass;
      const whole = String(facts.isWholeSelected);
      if (isWhole !== whole) {
        isWhole = whole;
        number.setAttribute("aria-selected", whole);
      }
    },
    hide() {
      if (!isHidden) row.hidden = isHidden = true;
    },
    cells,
  };
}
