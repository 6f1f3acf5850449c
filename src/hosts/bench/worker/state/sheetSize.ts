import type { Sheet } from "../../../../sheet/book/book.js";
import type { Cells } from "../../../../sheet/book/cells.js";
import { usedLength } from "../../../../sheet/book/usedRows.js";

export interface SheetSize {
  readonly rows: number;
  readonly columns: number;
}

const lengths = new WeakMap<Cells, number>();
const sizes = new WeakMap<Sheet, SheetSize>();

/** Rows down to the last cell in use; looked for once in cells that versions share. */
export function lengthInUse(cells: Cells): number {
  let length = lengths.get(cells);
  if (length === undefined) {
    length = usedLength(cells);
    lengths.set(cells, length);
  }
  return length;
}

export function sheetSize(sheet: Sheet): SheetSize {
  let size = sizes.get(sheet);
  if (size === undefined) {
    const used = sheet.columns.map(({ cells }) => lengthInUse(cells));
    const columns = used.findLastIndex((length) => length > 0) + 1;
    size = { rows: Math.max(0, ...used), columns };
    sizes.set(sheet, size);
  }
  return size;
}
