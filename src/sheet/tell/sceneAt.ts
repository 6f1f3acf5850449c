import type { Area, Book, Place } from "../book/book.js";
import { columnsInUse, usedLength } from "../book/usedRows.js";
import { openSession } from "../calculate/session.js";
import type { Scene } from "../evaluate/scene.js";
import type { Formula } from "../formula/formula.js";
import type { Reference } from "../formula/reference.js";
import { isOnSheet, resolve } from "../formula/reference.js";

/** A formula as if it stood in a cell of the book, which stays as it is. */
export function sceneAt(book: Book, formula: Formula, { sheet, column }: Omit<Place, "row">): Scene {
  return { world: openSession(book).world, formula, sheet, column, known: new Map() };
}

/** The cells that a reference means in the formula of a cell; undefined where they are gone. */
export function areaAt(book: Book, reference: Reference | undefined, place: Place): Area | undefined {
  if (reference === undefined) return undefined;
  const wanted = reference.sheet?.toUpperCase();
  const sheet = wanted === undefined ? place.sheet : book.sheets.findIndex(({ name }) => name.toUpperCase() === wanted);
  const rectangle = resolve(reference, place.row, place.column);
  return sheet < 0 || !isOnSheet(rectangle) ? undefined : { sheet, ...rectangle };
}

/** How many cells in use the references of a formula take in. */
export function cellsRead(book: Book, formula: Formula, place: Place): number {
  let cells = 0;
  for (const reference of formula.references) {
    const area = areaAt(book, reference, place);
    if (area === undefined) continue;
    const sheet = book.sheets[area.sheet];
    for (let column = area.left; column <= Math.min(area.right, columnsInUse(sheet) - 1); column++) {
      const used = usedLength(sheet!.columns[column]!.cells);
      cells += Math.max(0, Math.min(area.bottom + 1, used) - area.top);
    }
  }
  return cells;
}
