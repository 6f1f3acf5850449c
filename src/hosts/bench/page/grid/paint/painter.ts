import type { Page } from "../../page.js";
import type { Frame } from "../layout/frame.js";
import type { Sight, Spot } from "../layout/sight.js";
import { holds, isWholeColumns, isWholeRows } from "../select/areas.js";
import { type CellSlot, cellSlot } from "./cellSlot.js";
import { headerSlot } from "./headerSlot.js";
import { type LetterSlot, letterSlot } from "./letterSlot.js";
import { type RowSlot, rowSlot } from "./rowSlot.js";
import { slotTrack } from "./slotTrack.js";

/** Rows keep their places within so many rows, so that scrolling moves one element; beyond, floats would be too coarse. */
const baseRows = 512;

export interface Painter {
  paint(): void;
  elementOf(spot: Spot): HTMLElement | undefined;
  unitOf(column: number): HTMLButtonElement | undefined;
}

/** Shows the cells in view with as few writes as there are differences. */
export function createPainter(page: Page, frame: Frame, sight: Sight): Painter {
  const letters = slotTrack<LetterSlot>(frame.letters, letterSlot);
  const headerRow = rowSlot(frame.header, headerSlot);
  const headers = headerRow.cells;
  const pool: RowSlot<CellSlot>[] = [];
  let [layout, first, last, version, lettersKey] = [-1, 0, -1, -1, ""];

  function columnsInView(): [number, number] {
    const { columns } = sight;
    const from = columns.frozenWidth + sight.scroll.left();
    const first = Math.max(columns.at(from), columns.frozen);
    return [first, Math.max(columns.at(from + Math.max(sight.width - sight.freeLeft(), 0) - 1), first - 1)];
  }

  function arrange(): void {
    const [nextFirst, nextLast] = columnsInView();
    const rows = Math.max(Math.ceil((sight.height - sight.bodyTop()) / sight.rowHeight) + 1, 1);
    const isSame = layout === sight.layout && first === nextFirst && last === nextLast && pool.length === rows;
    if (isSame) return;
    [layout, first, last] = [sight.layout, nextFirst, nextLast];
    while (pool.length < rows) pool.push(rowSlot(frame.shift, cellSlot));
    for (const row of pool.splice(rows)) row.element.remove();
    for (const track of [letters, headers, ...pool.map(({ cells }) => cells)]) track.arrange(sight, first, last);
    lettersKey = "";
  }

  function eachColumn(visit: (column: number) => void): void {
    for (let column = 0; column < sight.columns.frozen; column++) visit(column);
    for (let column = first; column <= last; column++) if (sight.columns.widthOf(column) > 0) visit(column);
  }

  function paintLetters(): void {
    const { area } = page.selection();
    const isWhole = isWholeColumns(area);
    const states = page.sheetState().columnStates;
    eachColumn((column) => {
      let hiddenFrom = column;
      while (hiddenFrom > 0 && states[hiddenFrom - 1]?.hidden) hiddenFrom -= 1;
      const isInSelection = column >= area.left && column <= area.right;
      letters.slotOf(column)?.show({
        column,
        isInSelection,
        isWholeSelected: isWhole && isInSelection,
        hiddenFrom: hiddenFrom < column ? hiddenFrom : undefined,
      });
    });
  }

  function paintHeaders(): void {
    const { area, active } = page.selection();
    const states = page.sheetState().columnStates;
    headerRow.show({
      row: 0,
      sheetRow: 0,
      top: 0,
      isInSelection: area.top === 0,
      isWholeSelected: area.top === 0 && isWholeRows(area),
      isAfterGap: false,
      isMarked: false,
    });
    eachColumn((column) => {
      const state = states[column];
      const value = state?.sigmaOf === undefined ? undefined : states[state.sigmaOf];
      headers.slotOf(column)?.show({
        column,
        state,
        shown: page.cells.cellAt(0, column),
        isSelected: holds(area, 0, column),
        isActiveColumn: active.column === column,
        sigmaOf: value?.name,
        isLastSigma: value?.sigmasTo === column,
      });
    });
  }

  function paintRow(slot: RowSlot<CellSlot>, row: number, top: number): void {
    const { area } = page.selection();
    const { columnStates, visibleRows, columns } = page.sheetState();
    const sheetRow = sight.rows.toSheet(row);
    const isInSelection = sheetRow >= area.top && sheetRow <= area.bottom;
    slot.show({
      row,
      sheetRow,
      top,
      isInSelection,
      isWholeSelected: isInSelection && isWholeRows(area),
      isAfterGap: sight.rows.toSheet(row - 1) !== sheetRow - 1,
      isMarked: page.marked().has(sheetRow),
    });
    const isSpareRow = row >= visibleRows;
    eachColumn((column) => {
      const state = columnStates[column];
      slot.cells.slotOf(column)?.show({
        row,
        column,
        shown: page.cells.cellAt(row, column),
        isSpare: isSpareRow || column >= columns,
        isSelected: isInSelection && column >= area.left && column <= area.right,
        isSigma: state?.sigmaOf !== undefined,
        isDerived: state?.derived === true,
        version,
      });
    });
  }

  function paintRows(): void {
    const [from, to] = [sight.firstRow(), sight.lastRow()];
    const base = Math.floor((from - 1) / baseRows) * baseRows;
    const shift = base * sight.rowHeight - sight.scroll.top();
    const ratio = globalThis.devicePixelRatio || 1;
    frame.shift.style.transform = `translateY(${Math.round(shift * ratio) / ratio}px)`;
    for (let row = from; row < from + pool.length; row++) {
      const slot = pool[row % pool.length] as RowSlot<CellSlot>;
      if (row <= to) paintRow(slot, row, (row - 1 - base) * sight.rowHeight);
      else slot.hide();
    }
  }

  return {
    paint() {
      arrange();
      version = page.state().version;
      const left = sight.scroll.left();
      for (const track of [letters, headers]) track.moveAcross(left);
      for (const { cells } of pool) cells.moveAcross(left);
      const { area, active } = page.selection();
      const key = JSON.stringify([area, active, version]);
      if (lettersKey !== key) paintLetters();
      lettersKey = key;
      paintHeaders();
      paintRows();
    },
    elementOf({ row, column }) {
      const isInView = column < sight.columns.frozen || (column >= first && column <= last);
      if (!isInView || sight.columns.widthOf(column) === 0) return undefined;
      if (row === 0) return headers.slotOf(column)?.element;
      if (row < sight.firstRow() || row > sight.lastRow()) return undefined;
      return pool[row % pool.length]?.cells.slotOf(column)?.element;
    },
    unitOf: (column) => headers.slotOf(column)?.unit,
  };
}
