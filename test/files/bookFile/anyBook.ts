import fc from "fast-check";
import { type Cell, CellError } from "../../../src/call/cell.js";
import { findCellFunction } from "../../../src/call/cellFunctions.js";
import type { Book } from "../../../src/sheet/book/book.js";
import { bookOf } from "../../../src/sheet/book/bookOf.js";
import { change } from "../../../src/sheet/change.js";
import type { Edit } from "../../../src/sheet/edit/draft.js";
import { fillFormula } from "../../../src/sheet/edit/fillFormula.js";
import { insertRows } from "../../../src/sheet/edit/insertRows.js";
import { defineName } from "../../../src/sheet/edit/names.js";
import { setCells } from "../../../src/sheet/edit/setCells.js";
import { addSheet } from "../../../src/sheet/edit/sheets.js";
import type { Functions } from "../../../src/sheet/formula/functions.js";

export const functions: Functions = { cellFunction: findCellFunction, cellFunctionNames: () => ["BARY.AXIS"] };

const cell: fc.Arbitrary<Cell> = fc.oneof(
  fc.double({ noNaN: true, noDefaultInfinity: true }),
  fc.constantFrom(-0, 0, 5e-324, Number.MAX_VALUE, 0.1 + 0.2),
  fc.string({ unit: "grapheme", maxLength: 12 }),
  fc.constantFrom("", "'", '"', "=1", "\u2028", "d", "4.23 d", "\ud800"),
  fc.boolean(),
  fc.constant(null),
  fc.constant(new CellError("#N/A", "planted", "planted on purpose")),
);

const formula = fc.constantFrom(
  "=A1*2",
  "=B$1+ROW()",
  "=IF(A1>0,1,NA())",
  "=1/0",
  "=rate*2",
  "=Other!A1",
  '=BARY.AXIS(A1,"1 solMass",,"d")',
  "=SUM(A$1:A1)",
  "=1+",
  "=C9#",
  "=NOSUCH(1)",
  '="text"&A1',
);

const place = fc.record({ sheet: fc.constantFrom(0, 1), row: fc.nat(40), column: fc.nat(5) });

const edit: fc.Arbitrary<Edit> = fc.oneof(
  fc.tuple(place, fc.array(cell, { minLength: 1, maxLength: 5 })).map(([at, cells]) =>
    setCells(
      at,
      cells.map((each) => [each]),
    ),
  ),
  fc
    .tuple(place, fc.integer({ min: 1, max: 12 }), formula)
    .map(([{ sheet, row, column }, rows, text]) => fillFormula({ sheet, column, from: row, to: row + rows }, text)),
  fc.tuple(fc.nat(30), fc.integer({ min: 1, max: 3 })).map(([at, count]) => insertRows(0, at, count)),
  // Far to the right, where nothing can come into its way.
  fc.nat(20).map((row) => fillFormula({ sheet: 0, column: 30, from: row, to: row + 1 }, "=SEQUENCE(3,2)")),
);

/** Books of two sheets with every kind of cell, formulas of every fate, names and spills. */
export const anyBook: fc.Arbitrary<Book> = fc.array(edit, { maxLength: 12 }).map((edits) => {
  const empty = bookOf([{ name: "Targets", columns: [] }]);
  return change(empty, [addSheet("Other"), defineName("rate", "=Other!B2", 0), ...edits], functions);
});
