import { element } from "../layout/frame.js";
import type { Sight } from "../layout/sight.js";
import type { Placed } from "./placed.js";

/** The slots of one row: frozen ones stand still, the others lie on a track that moves across. */
export interface SlotTrack<Slot> {
  /** Puts slots over the columns in view. */
  arrange(sight: Sight, first: number, last: number): void;
  moveAcross(left: number): void;
  slotOf(column: number): Slot | undefined;
}

export function slotTrack<Slot extends Placed>(
  row: HTMLElement,
  make: (parent: HTMLElement, isFrozen: boolean) => Slot,
): SlotTrack<Slot> {
  const track = element("grid-track", row);
  const frozen: Slot[] = [];
  const free: Slot[] = [];
  let across = Number.NaN;
  return {
    arrange({ columns, numbersWidth }, first, last) {
      while (frozen.length < columns.frozen) frozen.push(make(row, true));
      for (const slot of frozen.splice(columns.frozen)) slot.element.remove();
      // Slots are kept, so that a column keeps its slot while others come into view.
      while (free.length < last - first + 1) free.push(make(track, false));
      frozen.forEach((slot, column) => {
        slot.place(numbersWidth + columns.startOf(column), columns.widthOf(column));
      });
      for (let column = first; column < first + free.length; column++) {
        const slot = free[column % free.length] as Slot;
        if (column <= last) slot.place(numbersWidth + columns.startOf(column), columns.widthOf(column));
        else slot.hide();
      }
    },
    moveAcross(left) {
      if (across === left) return;
      across = left;
      track.style.transform = `translateX(${-left}px)`;
    },
    slotOf: (column) => (column < frozen.length ? frozen[column] : free[column % free.length]),
  };
}
