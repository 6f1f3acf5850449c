import { CellError } from "../../../call/cell.js";
import type { Book, Place } from "../../../sheet/book/book.js";
import { columnAt } from "../../../sheet/book/book.js";
import { spanAt } from "../../../sheet/book/spans.js";
import { openSession } from "../../../sheet/calculate/session.js";
import { evaluateCell } from "../../../sheet/evaluate/evaluateCell.js";
import { isMatrix } from "../../../sheet/values/operand.js";

/** Errors are passed on from cell to cell; so far they are followed. */
const longestChain = 64;

/** Finds out why cells hold errors: files hold their codes alone, so a formula is calculated once more when somebody asks. */
export function explainer(book: () => Book): (place: Place) => string | undefined {
  const asked: Place[] = [];
  return (place) => {
    const isCircle = asked.some(
      ({ sheet, row, column }) => sheet === place.sheet && row === place.row && column === place.column,
    );
    if (isCircle || asked.length >= longestChain) {
      return undefined;
    }
    asked.push(place);
    const sentence = explainCell(book(), place);
    asked.pop();
    return sentence;
  };
}

/**
 * The sentence of the error in a cell that a formula filled; undefined where there is no formula or it gives no error.
 */
function explainCell(book: Book, { sheet, row, column }: Place): string | undefined {
  const { runs, claims } = columnAt(book, sheet, column);
  const claim = spanAt(claims, row);
  const owner = { row: claim?.row ?? row, column: claim?.column ?? column };
  const run = spanAt(claim === undefined ? runs : columnAt(book, sheet, owner.column).runs, owner.row);
  if (run === undefined) {
    return undefined;
  }
  const { formula } = run;
  const scene = { world: openSession(book).world, formula, sheet, column: owner.column, known: new Map() };
  const result = evaluateCell(formula.tree, scene, owner.row);
  const [down, across] = [row - owner.row, column - owner.column];
  const inside = isMatrix(result) && down < result.rows && across < result.columns;
  const cell = inside ? result.at(down, across) : result;
  return cell instanceof CellError ? cell.message : undefined;
}
