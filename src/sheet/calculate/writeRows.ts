import type { Block, Column } from "../../call/column.js";
import { cellAt } from "../../call/column.js";
import { blockOfOperand } from "../evaluate/evaluateCell.js";
import { cellByCell } from "../evaluate/operateColumns.js";
import type { Rows } from "../evaluate/rows.js";
import { gatherRows, rowAt, scalarOf } from "../evaluate/rows.js";
import type { Operand } from "../values/operand.js";
import { isMatrix } from "../values/operand.js";
import type { Owner } from "./placeSpill.js";
import { placeBlock, releaseSpills } from "./placeSpill.js";
import type { Session } from "./session.js";
import { writeBeside } from "./writeBeside.js";

/** Writes what the formulas of rows `from` up to `to` gave into their cells and the cells they fill. */
export function writeRows(session: Session, owner: Owner, from: number, to: number, result: Rows): void {
  const count = to - from;
  const rows = result.kind === "each" ? gatherRows(count, result.at) : result;
  if (rows.kind === "column") {
    releaseSpills(session, owner, from, to);
    const column = rows.reference ? copyWithoutBlanks(rows.column) : withoutBlanks(rows.column);
    session.column(owner.sheet, owner.column).cells.writeColumn(from, column);
    return;
  }
  const same = rows.kind === "same" ? scalarOf(rows.operand) : undefined;
  if (same !== undefined) {
    releaseSpills(session, owner, from, to);
    const cell = same ?? 0;
    session.column(owner.sheet, owner.column).cells.writeColumn(
      from,
      cellByCell(count, () => cell),
    );
    return;
  }
  if (rows.kind === "columns") {
    const columns = rows.ragged ? rows.columns : rows.columns.map(copyWithoutBlanks);
    if (writeBeside(session, owner, from, columns, rows.ragged)) {
      return;
    }
  }
  for (let row = 0; row < count; row++) {
    writeOne(session, owner, from + row, rowAt(rows, row));
  }
}

/** Writes what the formula of one cell gave into its cell and the cells it fills. */
export function writeOne(session: Session, owner: Owner, row: number, operand: Operand): void {
  const cell = scalarOf(operand);
  if (cell !== undefined) {
    releaseSpills(session, owner, row, row + 1);
    session.column(owner.sheet, owner.column).cells.write(row, cell ?? 0);
    return;
  }
  const block = blockOfOperand(operand);
  placeBlock(session, owner, row, isMatrix(operand) && operand.reference ? filled(block) : block);
}

/** Blank cells that a formula refers to count as 0 in its result. */
function filled(block: Block): Block {
  return { rows: block.rows, columns: block.columns.map(copyWithoutBlanks) };
}

function withoutBlanks(column: Column): Column {
  return column.others?.includes(null) ? copyWithoutBlanks(column) : column;
}

function copyWithoutBlanks(column: Column): Column {
  return column.others === undefined
    ? { ...column, numbers: column.numbers.slice() }
    : cellByCell(column.length, (row) => cellAt(column, row) ?? 0);
}
