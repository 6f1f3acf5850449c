import { addressText } from "../../../../sheet/book/address.js";
import type { Area, Book, Place } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { displayCell } from "../../../../sheet/display/displayCell.js";
import { general } from "../../../../sheet/display/numberFormat.js";
import type { Formula } from "../../../../sheet/formula/formula.js";
import { areaAt } from "../../../../sheet/tell/sceneAt.js";
import type { WhyCell } from "../../protocol/answers.js";
import { counted } from "../actions/words.js";

/** What a formula refers to, each once, with what stands there. */
export function readsOf(book: Book, formula: Formula, home: Place): WhyCell["reads"] {
  const reads = new Map<string, WhyCell["reads"][number]>();
  for (const reference of formula.references) {
    const area = areaAt(book, reference, home);
    if (area === undefined) continue;
    const place = { sheet: area.sheet, row: area.top, column: area.left };
    const address = areaText(book, area, home.sheet);
    const cells = (area.bottom + 1 - area.top) * (area.right + 1 - area.left);
    const text = cells === 1 ? displayCell(cellOf(book, place), general) : counted(cells, "cell");
    reads.set(address, { address, place, text });
  }
  return [...reads.values()];
}

function areaText(book: Book, { sheet, top, left, bottom, right }: Area, home: number): string {
  const first = addressText(top, left, sheet === home ? undefined : book.sheets[sheet]?.name);
  return top === bottom && left === right ? first : `${first}:${addressText(bottom, right)}`;
}
