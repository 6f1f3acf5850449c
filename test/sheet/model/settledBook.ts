import { expect } from "vitest";
import type { Cell } from "../../../src/call/cell.js";
import { CellError } from "../../../src/call/cell.js";
import { cellAt } from "../../../src/call/column.js";
import { addressText } from "../../../src/sheet/book/address.js";
import type { Book } from "../../../src/sheet/book/book.js";
import { cellOf } from "../../../src/sheet/book/cellOf.js";
import { formulaOf } from "../../../src/sheet/book/formulaOf.js";
import { spanAt } from "../../../src/sheet/book/spans.js";
import { openSession } from "../../../src/sheet/calculate/session.js";
import { blockOfOperand, evaluateCell } from "../../../src/sheet/evaluate/evaluateCell.js";
import type { Functions } from "../../../src/sheet/formula/functions.js";
import { readFormula } from "../../../src/sheet/formula/readFormula.js";
import { sameCell } from "../../../src/sheet/history/changes.js";

/** Errors that only the calculation of a whole book can find. */
const ofTheBook = new Set(["a circle of formulas", "a result that fills cells it depends on"]);

/**
 * A calculated book is at rest: every formula, read from its text and evaluated anew over the cells as they stand,
 * gives what its cell and the cells it fills hold, or is told of a cell that really is in the way.
 */
export function expectSettled(book: Book, functions: Functions): void {
  const { world } = openSession(book);
  const filled = new Map<string, string>();
  for (const [sheet, { columns }] of book.sheets.entries()) {
    for (const [column, { runs, spills }] of columns.entries()) {
      for (const { from, to } of runs) {
        for (let row = from; row < to; row++) {
          const place = { sheet, row, column };
          const text = formulaOf(book, place) as string;
          const held = cellOf(book, place);
          const formula = readFormula(text, row, column, functions);
          const scene = { world, formula, sheet, column, known: undefined };
          const block = blockOfOperand(evaluateCell(formula.tree, scene, row));
          const spill = spanAt(spills, row);
          if (held instanceof CellError && ofTheBook.has(held.topic) && (spill === undefined || spill.blocked)) {
            continue;
          }
          if (spill?.blocked && held instanceof CellError) {
            expect(spill).toMatchObject({ blocked: true, rows: block.rows, width: block.columns.length });
            expectInTheWay(book, sheet, row, column, block.rows, block.columns.length, held.message);
            continue;
          }
          const single = block.rows === 1 && block.columns.length === 1;
          expect(spill, text).toEqual(
            single
              ? undefined
              : expect.objectContaining({ rows: block.rows, width: block.columns.length, blocked: false }),
          );
          for (let across = 0; across < block.columns.length; across++) {
            for (let down = 0; down < block.rows; down++) {
              const fresh = cellAt(block.columns[across] as never, down) ?? 0;
              const at = { sheet, row: row + down, column: column + across };
              expectSame(cellOf(book, at), fresh, `${text} in ${addressText(row, column)}`);
              if (across + down > 0) {
                filled.set(`${sheet}:${at.column}:${at.row}`, `${column}:${row}`);
              }
            }
          }
        }
      }
    }
  }
  expectClaims(book, filled);
}

function expectSame(held: Cell, fresh: Cell, what: string): void {
  if (!sameCell(held, fresh)) {
    expect(show(held), what).toEqual(show(fresh));
  }
}

function show(cell: Cell): string {
  return cell instanceof CellError ? `${cell.code} ${cell.message}` : String(cell);
}

/** Cells are claimed by exactly the formulas that fill them. */
function expectClaims(book: Book, filled: ReadonlyMap<string, string>): void {
  const claimed = new Map<string, string>();
  for (const [sheet, { columns }] of book.sheets.entries()) {
    for (const [column, { claims, runs }] of columns.entries()) {
      for (const claim of claims) {
        for (let row = claim.from; row < claim.to; row++) {
          claimed.set(`${sheet}:${column}:${row}`, `${claim.column}:${claim.row ?? row}`);
          expect(spanAt(runs, row)).toBeUndefined();
        }
      }
    }
  }
  expect(Object.fromEntries([...claimed].sort())).toEqual(Object.fromEntries([...filled].sort()));
}

function expectInTheWay(
  book: Book,
  sheet: number,
  row: number,
  column: number,
  rows: number,
  width: number,
  message: string,
): void {
  const inTheWay: string[] = ["the edge of the sheet"];
  for (let down = 0; down < rows; down++) {
    for (let across = 0; across < width; across++) {
      const at = { sheet, row: row + down, column: column + across };
      if (down + across > 0 && (cellOf(book, at) !== null || formulaOf(book, at) !== undefined)) {
        inTheWay.push(addressText(at.row, at.column));
      }
    }
  }
  expect(
    inTheWay.some((each) => message.includes(` ${each} is in the way`)),
    `${message} / ${inTheWay.join(" ")}`,
  ).toBe(true);
}
