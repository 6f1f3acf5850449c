import type { Cell } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import { addressText } from "../../../src/sheet/book/address.js";
import type { Book } from "../../../src/sheet/book/book.js";
import { columnAt } from "../../../src/sheet/book/book.js";
import { cellOf } from "../../../src/sheet/book/cellOf.js";
import { formulaOf } from "../../../src/sheet/book/formulaOf.js";
import { spanAt } from "../../../src/sheet/book/spans.js";
import { spillSize } from "../../../src/sheet/book/spillSize.js";
import { usedColumns, usedRows } from "../../../src/sheet/book/usedRows.js";
import { formulaText } from "../../../src/sheet/formula/formula.js";

/** Where two books differ: cells bit by bit, formulas, what they fill, names, sheets. */
export function differences(a: Book, b: Book): string[] {
  const found: string[] = [];
  const compare = (what: string, first: unknown, second: unknown) => {
    if (!Object.is(first, second)) {
      found.push(`${what}: ${String(first)} | ${String(second)}`);
    }
  };
  compare("sheets", a.sheets.map(({ name }) => name).join("/"), b.sheets.map(({ name }) => name).join("/"));
  compare("names", namesOf(a), namesOf(b));
  for (const [sheet, { name }] of a.sheets.entries()) {
    const rows = Math.max(usedRows(a, sheet), usedRows(b, sheet));
    const columns = Math.max(usedColumns(a, sheet), usedColumns(b, sheet));
    for (let column = 0; column < columns; column++) {
      for (let row = 0; row < rows; row++) {
        const place = { sheet, row, column };
        const at = addressText(row, column, name);
        compare(at, plain(cellOf(a, place)), plain(cellOf(b, place)));
        compare(`${at} formula`, formulaOf(a, place), formulaOf(b, place));
        compare(`${at} fills`, size(a, sheet, row, column), size(b, sheet, row, column));
        compare(`${at} filled by`, owner(a, sheet, row, column), owner(b, sheet, row, column));
        const message = messageOf(a, place);
        if (!toldByCalculation.test(message)) {
          compare(`${at} message`, message, messageOf(b, place));
        }
      }
    }
  }
  return found;
}

function plain(cell: Cell): unknown {
  return cell instanceof CellError ? `error ${cell.code}` : cell;
}

/** Why a formula gave an error. Circles and blocked ways are told by a calculation only, no file says them. */
function messageOf(book: Book, place: { sheet: number; row: number; column: number }): string {
  const cell = cellOf(book, place);
  const { runs, claims } = columnAt(book, place.sheet, place.column);
  const isCalculated = spanAt(runs, place.row) !== undefined || spanAt(claims, place.row) !== undefined;
  return cell instanceof CellError && isCalculated ? cell.message : "";
}

const toldByCalculation = /depends on itself|in the way|comes to rest/;

function size(book: Book, sheet: number, row: number, column: number): string {
  const spill = spillSize(columnAt(book, sheet, column), row);
  return spill === undefined ? "" : `${spill.rows} x ${spill.width}`;
}

function owner(book: Book, sheet: number, row: number, column: number): string {
  const claim = spanAt(columnAt(book, sheet, column).claims, row);
  return claim === undefined ? "" : addressText(claim.row ?? row, claim.column);
}

function namesOf({ names }: Book): string {
  return names.map(({ name, formula }) => `${name}${formulaText(formula, 0, 0)}`).join(" ");
}
