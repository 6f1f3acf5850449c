import type { Place } from "../../../../../sheet/book/book.js";
import { element, type Frame } from "../layout/frame.js";
import type { Sight } from "../layout/sight.js";

/** The room for the editor inside a cell; it moves with the cell and goes under what is frozen. */
export interface CellInset {
  open(place: Place): HTMLElement;
  close(): void;
  paint(): void;
}

/** A formula takes more room than most cells have [px at a root size of 16 px]. */
const roomy = 260;

export function createCellInset(frame: Frame, sight: Sight, reveal: (place: Place) => void): CellInset {
  const { inset } = frame;
  let open: { readonly place: Place; readonly room: HTMLElement } | undefined;
  inset.hidden = true;

  function paint(): void {
    if (!open) return;
    const { place, room } = open;
    const box = sight.boxOf({ row: sight.rows.toView(place.row), column: place.column });
    const isFrozen = place.column < sight.columns.frozen;
    const top = place.row === 0 ? sight.lettersHeight : sight.bodyTop();
    inset.style.clipPath = `inset(${top}px 0 0 ${isFrozen ? sight.numbersWidth : sight.freeLeft()}px)`;
    room.style.transform = `translate(${box.left}px, ${box.top}px)`;
    room.style.minWidth = `${box.width}px`;
    room.style.maxWidth = `${Math.max(sight.width - box.left, box.width)}px`;
    room.style.minHeight = `${box.height}px`;
  }

  /** Scrolls a cell at the far edge further in, so that what is typed in it can be read. */
  function makeRoom(place: Place): void {
    if (place.column < sight.columns.frozen) return;
    const { left } = sight.boxOf({ row: sight.rows.toView(place.row), column: place.column });
    const lacking = Math.min(roomy * sight.zoom - (sight.width - left), left - sight.freeLeft());
    if (lacking > 0) sight.scroll.setLeft(sight.scroll.left() + lacking);
  }

  function close(): void {
    open?.room.remove();
    open = undefined;
    inset.hidden = true;
  }

  // Whoever types on in a cell that was scrolled away wants to see it.
  inset.addEventListener("keydown", () => open && reveal(open.place));

  return {
    open(place) {
      close();
      open = { place, room: element("grid-cell-editor", inset) };
      inset.hidden = false;
      reveal(place);
      makeRoom(place);
      paint();
      return open.room;
    },
    close,
    paint,
  };
}
