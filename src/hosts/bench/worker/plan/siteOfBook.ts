import { height, latitude, longitude } from "../../../../functions/quantities.js";
import type { Quantity } from "../../../../functions/quantity.js";
import type { Book, Place } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { areaAt } from "../../../../sheet/tell/sceneAt.js";
import { recogniseColumn } from "../../../../table/recogniseColumn.js";
import type { PlanSite } from "../../protocol/plan.js";
import { headerText } from "../actions/words.js";
import { sheetSize } from "../state/sheetSize.js";

const parts = { longitude, latitude, height } as const;
type Part = keyof typeof parts;
type Found = Partial<Record<Part, string>>;

/** Labels stand in sheets of few cells; tables of targets are not searched. */
const mostCells = 4_000;

/** The site that a book states: columns of the sheet itself, names for cells, or labels with a value to their right. */
export function siteOfBook(book: Book, sheet: number): PlanSite | undefined {
  return (
    whole(inColumns(book, sheet), "columns of this sheet") ??
    whole(inNames(book), "names of this book") ??
    book.sheets
      .map(({ name }, index) => whole(inLabels(book, index), `the sheet ${name}`))
      .find((site) => site !== undefined)
  );
}

function whole(found: Found, foundIn: string): PlanSite | undefined {
  const { longitude, latitude, height = "" } = found;
  return longitude === undefined || latitude === undefined ? undefined : { longitude, latitude, height, foundIn };
}

function inColumns(book: Book, sheet: number): Found {
  const found: Found = {};
  for (let column = 0; column < sheetSize(book.sheets[sheet]!).columns; column++) {
    const header = headerText(book, sheet, column);
    const part = partOf(recogniseColumn(header).quantity);
    if (part && sheetSize(book.sheets[sheet]!).rows > 1) found[part] ??= header;
  }
  return found;
}

function inNames(book: Book): Found {
  const found: Found = {};
  for (const { name, formula } of book.names) {
    const part = partOf(recogniseColumn(name.replaceAll("_", " ")).quantity);
    const area = part && formula.references.length === 1 && areaAt(book, formula.references[0], origin);
    if (!part || !area) continue;
    const text = quantityText(book, { sheet: area.sheet, row: area.top, column: area.left });
    if (text !== undefined) found[part] ??= text;
  }
  return found;
}

const origin: Place = { sheet: 0, row: 0, column: 0 };

function inLabels(book: Book, sheet: number): Found {
  const found: Found = {};
  const { rows, columns } = sheetSize(book.sheets[sheet]!);
  if (rows * columns > mostCells) return found;
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns - 1; column++) {
      const label = cellOf(book, { sheet, row, column });
      const part = typeof label === "string" ? partOf(recogniseColumn(label).quantity) : undefined;
      const text = part && quantityText(book, { sheet, row, column: column + 1 });
      if (part && text !== undefined) found[part] ??= text;
    }
  }
  return found;
}

function partOf(quantity: Quantity | undefined): Part | undefined {
  return (Object.keys(parts) as Part[]).find((part) => parts[part] === quantity);
}

/** A text with its own unit, or a number with that of the label to its left. */
function quantityText(book: Book, place: Place): string | undefined {
  const cell = cellOf(book, place);
  if (typeof cell === "string" && /\d/.test(cell)) return cell;
  if (typeof cell !== "number" || place.column === 0) return undefined;
  const label = cellOf(book, { ...place, column: place.column - 1 });
  const unit = typeof label === "string" ? recogniseColumn(label).unit : undefined;
  return unit && `${cell} ${unit.text}`;
}
