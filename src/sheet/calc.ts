import type { Block } from "../call/column.js";
import type { Book } from "./book/book.js";
import { bookOf } from "./book/bookOf.js";
import { openSession } from "./calculate/session.js";
import { blockOfOperand, evaluateCell } from "./evaluate/evaluateCell.js";
import type { Functions } from "./formula/functions.js";
import { readFormula } from "./formula/readFormula.js";

/**
 * What one formula is worth, without a cell of its own; references are to the first sheet of the book. What cannot be
 * read or computed comes as an error in the block.
 */
export function calc(
  text: string,
  functions: Functions,
  book: Book = bookOf([{ name: "Sheet1", columns: [] }]),
): Block {
  const formula = readFormula(text, 0, 0, functions);
  const { world } = openSession(book);
  const scene = { world, formula, sheet: 0, column: 0, known: new Map() };
  return blockOfOperand(evaluateCell(formula.tree, scene, 0));
}
