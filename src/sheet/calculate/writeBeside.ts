import type { Column } from "../../call/column.js";
import { cellAt, sliceColumn } from "../../call/column.js";
import type { Span } from "../book/spans.js";
import { clipSpans, replaceSpans } from "../book/spans.js";
import type { Owner } from "./placeSpill.js";
import { isFree, releaseSpills, sameClaim, sameSpill } from "./placeSpill.js";
import type { Session } from "./session.js";

interface Segment extends Span {
  readonly width: number;
}

/**
 * Writes results that lie beside each other, one a row from row `from` on, in one go: true where the cells to the
 * right are free or held by the same formulas, else nothing is written.
 */
export function writeBeside(
  session: Session,
  owner: Owner,
  from: number,
  columns: readonly Column[],
  ragged: boolean,
): boolean {
  const { sheet, column } = owner;
  const to = from + (columns[0] as Column).length;
  const segments = segmentsOf(columns, from, to, ragged);
  const spills = segments.filter(({ width }) => width > 1).map((segment) => ({ ...segment, rows: 1, blocked: false }));
  const before = clipSpans(session.peek(sheet, column).spills, from, to);
  const kept =
    before.length === spills.length &&
    before.every(
      (each, index) =>
        each.from === spills[index]?.from && each.to === spills[index]?.to && sameSpill(each, spills[index]),
    );

  if (!kept && session.refusesSpills) {
    return false;
  }
  if (!kept) {
    releaseSpills(session, owner, from, to);
    if (!spills.every((each) => isRowFree(session, owner, each))) {
      return false;
    }
    const own = session.column(sheet, column);
    own.spills = replaceSpans(own.spills, from, to, spills, sameSpill);
  }
  session.column(sheet, column).cells.writeColumn(from, columns[0] as Column);
  for (let across = 1; across < columns.length; across++) {
    const claims = segments
      .filter(({ width }) => width > across)
      .map((span) => ({ from: span.from, to: span.to, column, row: undefined }));
    const target = session.column(sheet, column + across);
    for (const claim of claims) {
      const cells = columns[across] as Column;
      const whole = claim.from === from && claim.to === to;
      target.cells.writeColumn(claim.from, whole ? cells : sliceColumn(cells, claim.from - from, claim.to - from));
      if (!kept) {
        session.touch({ sheet, column: column + across, from: claim.from, to: claim.to });
      }
    }
    if (!kept) {
      const foreign = clipSpans(target.claims, from, to);
      const all = foreign.length === 0 ? claims : [...foreign, ...claims].sort((a, b) => a.from - b.from);
      target.claims = replaceSpans(target.claims, from, to, all, sameClaim);
    }
  }
  return true;
}

function isRowFree(session: Session, owner: Owner, segment: Segment): boolean {
  for (let across = 1; across < segment.width; across++) {
    if (!isFree(session, owner.sheet, owner.column + across, segment.from, segment.to)) {
      return false;
    }
  }
  return true;
}

/** Rows of one width in a row; where ragged, blanks at the end of a row are no part of it. */
function segmentsOf(columns: readonly Column[], from: number, to: number, ragged: boolean): Segment[] {
  if (!ragged || columns.slice(1).every((column) => !column.others?.includes(null))) {
    return [{ from, to, width: columns.length }];
  }
  const segments: Segment[] = [];
  for (let row = from; row < to; row++) {
    let width = columns.length;
    while (width > 1 && cellAt(columns[width - 1] as Column, row - from) === null) {
      width--;
    }
    const last = segments.at(-1);
    if (last?.width === width) {
      segments[segments.length - 1] = { ...last, to: row + 1 };
    } else {
      segments.push({ from: row, to: row + 1, width });
    }
  }
  return segments;
}
