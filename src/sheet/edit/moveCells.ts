import type { Area, ColumnSpan, Place } from "../book/book.js";
import { blankColumn } from "../book/cells.js";
import { spansIn } from "../book/spans.js";
import { releaseSpills } from "../calculate/placeSpill.js";
import type { Rectangle } from "../formula/reference.js";
import type { Draft, Edit } from "./draft.js";
import { writeContent } from "./draft.js";
import { refuseOffSheet } from "./pasteCells.js";
import { EditRefused } from "./refused.js";
import { restructure } from "./structure/restructure.js";
import type { Rewriting } from "./structure/rewriteRun.js";
import { sheetIndexIn } from "./structure/sheetIndex.js";

/** Cuts an area out and puts it elsewhere: references to its cells follow them, and its own references stay on their cells. */
export function moveCells(area: Area, place: Place): Edit {
  return (draft) => {
    const down = place.row - area.top;
    const across = place.column - area.left;
    if (down === 0 && across === 0 && place.sheet === area.sheet) {
      return;
    }
    refuseOffSheet("move", place, area);
    const target: Area = { sheet: place.sheet, ...shifted(area, down, across) };
    releaseOwn(draft, area);
    refuseTorn(draft, area);
    clearOutside(draft, target, area);

    const values = columnsOf(area).map((column) =>
      draft.session.world.slice(area.sheet, column, area.top, area.bottom + 1),
    );
    restructure(draft, {
      rule: ruleOf(draft, area, place, down, across),
      moveCells: (sheets) => sheets,
      moveSpan: (span) => followSpan(span, area, target),
    });
    for (const column of columnsOf(area)) {
      writeValues(draft, area.sheet, column, area.top, blankColumn(area.bottom - area.top + 1));
    }
    for (const [index, column] of values.entries()) {
      writeValues(draft, target.sheet, target.left + index, target.top, column);
    }
  };
}

function writeValues(
  draft: Draft,
  sheet: number,
  column: number,
  from: number,
  values: ReturnType<typeof blankColumn>,
): void {
  const { cells } = draft.session.column(sheet, column);
  cells.writeColumn(from, values);
  draft.changed.push({ sheet, column, from, to: from + values.length });
}

function shifted(area: Rectangle, down: number, across: number): Rectangle {
  return { top: area.top + down, bottom: area.bottom + down, left: area.left + across, right: area.right + across };
}

function columnsOf(area: Rectangle): number[] {
  return Array.from({ length: area.right - area.left + 1 }, (_, index) => area.left + index);
}

/** The formulas of the area take back what they filled and fill again at the new place. */
function releaseOwn(draft: Draft, { sheet, top, bottom, left, right }: Area): void {
  for (let column = left; column <= right; column++) {
    for (const { from, to } of spansIn(draft.session.peek(sheet, column).spills, top, bottom + 1)) {
      const owners = { from: Math.max(from, top), to: Math.min(to, bottom + 1) };
      releaseSpills(draft.session, { sheet, column }, owners.from, owners.to);
      draft.stale.push({ sheet, column, ...owners });
    }
  }
}

function refuseTorn(draft: Draft, area: Area): void {
  for (const column of columnsOf(area)) {
    if (spansIn(draft.session.peek(area.sheet, column).claims, area.top, area.bottom + 1).length > 0) {
      throw new EditRefused(
        "move: some of the cells are filled by a formula outside the selection; select that formula's cell too",
      );
    }
  }
}

/** Empties the cells that will be written over, those of the moved area itself excepted. */
function clearOutside(draft: Draft, target: Area, area: Area): void {
  const rows = target.bottom - target.top + 1;
  for (const column of columnsOf(target)) {
    const inside = target.sheet === area.sheet && column >= area.left && column <= area.right;
    const parts = inside
      ? [
          { from: target.top, to: Math.min(target.bottom + 1, area.top) },
          { from: Math.max(target.top, area.bottom + 1), to: target.bottom + 1 },
        ]
      : [{ from: target.top, to: target.top + rows }];
    for (const { from, to } of parts) {
      if (from < to) {
        writeContent(draft, { sheet: target.sheet, column, from }, blankColumn(to - from), []);
      }
    }
  }
}

function ruleOf(draft: Draft, area: Area, place: Place, down: number, across: number): Rewriting {
  const { session } = draft;
  const otherSheet = place.sheet !== area.sheet;
  const within = (rectangle: Rectangle): boolean =>
    rectangle.top >= area.top &&
    rectangle.bottom <= area.bottom &&
    rectangle.left >= area.left &&
    rectangle.right <= area.right;
  const isHome = (home: Place): boolean =>
    home.sheet === area.sheet && within({ top: home.row, bottom: home.row, left: home.column, right: home.column });
  return {
    sheet: area.sheet,
    sheetIndex: sheetIndexIn(draft),
    rowCuts: [area.top, area.bottom + 1],
    move(rectangle, reference, home) {
      const follows = within(rectangle);
      const moved = follows ? shifted(rectangle, down, across) : rectangle;
      const unnamed = reference.sheet === undefined;
      if (!otherSheet || (unnamed && follows === isHome(home))) {
        return moved;
      }
      return { ...moved, sheet: session.sheetName(follows ? place.sheet : area.sheet) };
    },
    moveHome: (home) =>
      isHome(home) ? { sheet: place.sheet, row: home.row + down, column: home.column + across } : home,
  };
}

/** Cells that wait to be calculated wait at the old and at the new place. */
function followSpan(span: ColumnSpan, area: Area, target: Area): ColumnSpan[] {
  const from = Math.max(span.from, area.top);
  const to = Math.min(span.to, area.bottom + 1);
  const inside = span.sheet === area.sheet && span.column >= area.left && span.column <= area.right && from < to;
  if (!inside) {
    return [span];
  }
  const down = target.top - area.top;
  const column = span.column + target.left - area.left;
  return [span, { sheet: target.sheet, column, from: from + down, to: to + down }];
}
