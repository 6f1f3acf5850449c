import { readAddress } from "../../src/sheet/book/address.js";
import { columnAt } from "../../src/sheet/book/book.js";
import { bookOf } from "../../src/sheet/book/bookOf.js";
import { cellOf } from "../../src/sheet/book/cellOf.js";
import { spillSize } from "../../src/sheet/book/spillSize.js";
import { change } from "../../src/sheet/change.js";
import { setCells } from "../../src/sheet/edit/setCells.js";
import { noFunctions } from "../../src/sheet/formula/functions.js";
import { matrixOfRows } from "../../src/sheet/values/operand.js";
import type { FormulaCase } from "./openFormula/readCases.js";
import { runCorpus } from "./openFormula/runCorpus.js";

/** Far from the cells of any case. */
const home = { sheet: 0, row: 60, column: 40 };

/** The formula in a cell of a book that holds the cells of the case, calculated as a whole. */
function inBook(cells: FormulaCase["cells"], formula: string) {
  const sheets = new Set(["Sheet1"]);
  const entries = [...cells].map(([address, content]) => {
    const [sheet, cell] = address.includes("!") ? (address.split("!") as [string, string]) : ["Sheet1", address];
    sheets.add(sheet);
    const place = readAddress(cell as string);
    return { sheet: [...sheets].indexOf(sheet as string), place: place ?? { row: 0, column: 0 }, content };
  });
  const start = bookOf([...sheets].map((name) => ({ name, columns: [] })));
  const book = change(
    start,
    [
      ...entries.map(({ sheet, place, content }) => setCells({ sheet, ...place }, [[content]])),
      setCells(home, [[{ formula }]]),
    ],
    noFunctions,
  );
  const size = spillSize(columnAt(book, 0, home.column), home.row);
  if (size === undefined) {
    return cellOf(book, home);
  }
  return matrixOfRows(
    Array.from({ length: size.rows }, (_, row) =>
      Array.from({ length: size.width }, (_, column) =>
        cellOf(book, { sheet: 0, row: home.row + row, column: home.column + column }),
      ),
    ),
  );
}

runCorpus("in a calculated book", inBook);
