import type { Cell } from "../../call/cell.js";
import { CellError } from "../../call/cell.js";
import type { Block } from "../../call/column.js";
import { cellAt } from "../../call/column.js";
import { addressText } from "../book/address.js";
import type { Claim, Spill } from "../book/book.js";
import { blankColumn } from "../book/cells.js";
import { cutSpans, putSpan, spanAt, spansIn } from "../book/spans.js";
import { mostColumns, mostRows } from "../limits.js";
import type { Session } from "./session.js";

export interface Owner {
  readonly sheet: number;
  readonly column: number;
}

export const sameSpill = (a: Spill, b: Spill): boolean =>
  a.rows === 1 && b.rows === 1 && a.width === b.width && a.blocked === b.blocked;

export const sameClaim = (a: Claim, b: Claim): boolean => a.column === b.column && a.row === b.row;

/** Clears what the formulas of rows `from` up to `to` filled besides their own cells. */
export function releaseSpills(session: Session, owner: Owner, from: number, to: number): void {
  const { sheet, column } = owner;
  const spills = spansIn(session.peek(sheet, column).spills, from, to);
  if (spills.length === 0) {
    return;
  }
  for (const spill of spills) {
    const first = Math.max(from, spill.from);
    const last = Math.min(to, spill.to);
    for (let across = 0; across < spill.width && !spill.blocked; across++) {
      const top = across === 0 ? first + 1 : first;
      releaseClaims(session, owner, column + across, top, last + spill.rows - 1);
    }
  }
  const own = session.column(sheet, column);
  own.spills = cutSpans(own.spills, from, to);
}

function releaseClaims(session: Session, owner: Owner, column: number, from: number, to: number): void {
  const held = spansIn(session.peek(owner.sheet, column).claims, from, to).filter(
    (each) => each.column === owner.column,
  );
  for (const claim of held) {
    const target = session.column(owner.sheet, column);
    const first = Math.max(from, claim.from);
    const last = Math.min(to, claim.to);
    target.claims = cutSpans(target.claims, first, last);
    target.cells.writeColumn(first, blankColumn(last - first));
    session.touch({ sheet: owner.sheet, column, from: first, to: last });
  }
}

/** Whether rows of a column hold nothing that a formula may not fill. */
export function isFree(session: Session, sheet: number, column: number, from: number, to: number): boolean {
  const { runs, claims } = session.peek(sheet, column);
  if (spansIn(runs, from, to).length > 0 || spansIn(claims, from, to).length > 0) {
    return false;
  }
  const { others, length } = session.world.slice(sheet, column, from, to);
  for (let row = 0; row < length; row++) {
    if (others?.[row] !== null) {
      return false;
    }
  }
  return true;
}

/** Puts the rectangle that one formula gave where it belongs, or an error where the way is not free. */
export function placeBlock(session: Session, owner: Owner, row: number, block: Block): void {
  const { sheet, column } = owner;
  const { rows } = block;
  const width = block.columns.length;
  const held = spanAt(session.peek(sheet, column).spills, row);
  if (held !== undefined && !held.blocked && held.rows === rows && held.width === width) {
    fillBlock(session, owner, row, block);
    return;
  }
  releaseSpills(session, owner, row, row + 1);
  const inTheWay = session.refusesSpills ? undefined : firstInTheWay(session, owner, row, rows, width);
  const blocked = inTheWay !== undefined || session.refusesSpills;
  const own = session.column(sheet, column);
  own.spills = putSpan(own.spills, { from: row, to: row + 1, rows, width, blocked }, sameSpill);
  if (blocked) {
    own.cells.write(row, inTheWay === undefined ? restlessError : blockedError(inTheWay, rows, width));
    return;
  }
  fillBlock(session, owner, row, block);
  for (let across = 0; across < width; across++) {
    const target = session.column(sheet, column + across);
    const from = across === 0 ? row + 1 : row;
    const to = row + rows;
    if (from < to) {
      const claim = { from, to, column, row: rows === 1 ? undefined : row };
      target.claims = putSpan(target.claims, claim, sameClaim);
      session.touch({ sheet, column: column + across, from, to });
    }
  }
}

function fillBlock(session: Session, { sheet, column }: Owner, row: number, block: Block): void {
  for (const [across, cells] of block.columns.entries()) {
    session.column(sheet, column + across).cells.writeColumn(row, cells);
  }
}

/** The first cell, row by row, that is not free for a rectangle, by its address. */
function firstInTheWay(session: Session, owner: Owner, row: number, rows: number, width: number): string | undefined {
  const { sheet, column } = owner;
  if (row + rows > mostRows || column + width > mostColumns) {
    return "the edge of the sheet";
  }
  let first: { row: number; column: number } | undefined;
  for (let across = 0; across < width; across++) {
    const from = across === 0 ? row + 1 : row;
    const to = Math.min(row + rows, first?.row ?? mostRows);
    if (from < to && !isFree(session, sheet, column + across, from, to)) {
      first = { row: firstTaken(session, sheet, column + across, from, to), column: column + across };
    }
  }
  return first && addressText(first.row, first.column);
}

function firstTaken(session: Session, sheet: number, column: number, from: number, to: number): number {
  const { runs, claims } = session.peek(sheet, column);
  const cells = session.world.slice(sheet, column, from, to);
  let row = from;
  while (
    row < to - 1 &&
    cellAt(cells, row - from) === null &&
    spanAt(runs, row) === undefined &&
    spanAt(claims, row) === undefined
  ) {
    row++;
  }
  return row;
}

const restlessError = new CellError(
  "#VALUE!",
  "a result that fills cells it depends on",
  "the result fills cells that it depends on, so it never comes to rest; move the formula or what it reads",
);

function blockedError(inTheWay: string, rows: number, width: number): Cell {
  return new CellError(
    "#VALUE!",
    "cells in the way of a result",
    `the result has ${rows} x ${width} cells and ${inTheWay} is in the way; clear ${inTheWay === "the edge of the sheet" ? "some rows or move the formula" : "it or move the formula"}`,
  );
}
