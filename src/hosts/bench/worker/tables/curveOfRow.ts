import type { Book } from "../../../../sheet/book/book.js";
import { cellOf } from "../../../../sheet/book/cellOf.js";
import { orbitCurve } from "../../../../table/orbitCurve.js";
import type { CurveAnswer } from "../../protocol/answers.js";
import { headerText } from "../actions/words.js";
import { sheetSize } from "../state/sheetSize.js";

/** Radial velocity over one orbit, from what stands in a row of the table. */
export function curveOfRow(book: Book, sheet: number, row: number): CurveAnswer {
  const { columns, rows } = sheetSize(book.sheets[sheet]!);
  if (row < 1 || row >= rows) {
    return { is: "missing", message: "Select a cell in the row of a planet to see its star's velocity." };
  }
  const cells = Array.from({ length: columns }, (_, column) => ({
    header: headerText(book, sheet, column),
    cell: cellOf(book, { sheet, row, column }),
  }));
  const name = cells.find(({ cell }) => typeof cell === "string" && cell.trim() !== "")?.cell;
  const curve = orbitCurve(cells);
  return curve.is === "missing" ? curve : { ...curve, title: name === undefined ? `row ${row + 1}` : String(name) };
}
