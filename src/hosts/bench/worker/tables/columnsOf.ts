import * as quantities from "../../../../functions/quantities.js";
import type { Book } from "../../../../sheet/book/book.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
import { headerText } from "../actions/words.js";
import { sheetSize } from "../state/sheetSize.js";

/** The first column of each quantity that a sheet has, by the quantity's name in code: `period`, `semiAmplitude`. */
export function columnsOf(book: Book, sheet: number): Readonly<Record<string, number>> {
  const found: Record<string, number> = {};
  const names = Object.entries(quantities);
  for (let column = 0; column < sheetSize(book.sheets[sheet]!).columns; column++) {
    const { quantity, isUncertainty } = recogniseColumn(headerText(book, sheet, column));
    const name = quantity && !isUncertainty ? names.find(([, each]) => each === quantity)?.[0] : undefined;
    if (name !== undefined) found[name] ??= column;
  }
  return found;
}
