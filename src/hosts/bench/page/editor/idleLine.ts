import { addressText } from "../../../../sheet/book/address.js";
import type { Place } from "../../../../sheet/book/book.js";
import type { Desk } from "./desk.js";
import { isSamePlace } from "./edit.js";
import { createEntryReader } from "./entryReader.js";

/** The line while nothing is typed: it shows what the active cell holds. */
export interface IdleLine {
  refresh(): void;
  /** What a cell holds, where the line knows it already. */
  entryOf(place: Place): string | undefined;
}

export function createIdleLine(desk: Desk): IdleLine {
  const { page, address, formula } = desk;
  let place: Place | undefined;
  let text: string | undefined;
  let displayed = "";
  const readEntry = createEntryReader(page, arrived);

  function arrived(cell: Place, entry: string): void {
    const { edit } = desk;
    if (edit?.awaitsEntry && isSamePlace(edit.place, cell)) {
      edit.awaitsEntry = false;
      edit.original = formula.prepend(entry);
    } else if (!edit && place && isSamePlace(place, cell) && text !== entry) {
      text = entry;
      displayed = formula.show(entry);
    }
  }

  return {
    refresh() {
      const { active } = page.selection();
      address.show(addressText(active.row, active.column));
      // Until its entry is there the line is empty rather than another cell's.
      if (!place || !isSamePlace(place, active) || formula.text() !== displayed) {
        place = active;
        text = undefined;
        displayed = formula.show("");
      }
      readEntry(active);
    },
    entryOf: (cell) => (place && isSamePlace(place, cell) ? text : undefined),
  };
}
