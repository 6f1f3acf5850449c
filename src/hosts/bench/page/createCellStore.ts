import type { Bench } from "../protocol/bench.js";
import type { BookState } from "../protocol/bookState.js";
import type { ShownCell, ShownWindow } from "../protocol/shown.js";
import type { CellStore } from "./cellStore.js";
import type { Remote } from "./page.js";

const blockRows = 64;
const blockColumns = 24;
const mostBlocks = 240;
const mostOnTheWay = 6;

interface Block extends ShownWindow {
  /** The view it was made for: a filter may have changed since. */
  readonly view: number;
}

export interface FilledCellStore extends CellStore {
  /** The state or the sheet in view changed: blocks are fetched anew when they are asked for. */
  refresh(state: BookState, sheet: number): void;
}

export function createCellStore(bench: Remote<Bench>): FilledCellStore {
  const blocks = new Map<string, Block>();
  const onTheWay = new Set<string>();
  /** Blocks that were looked at since the last state: most probably those in view. */
  const looked = new Map<string, { readonly down: number; readonly right: number }>();
  const listeners = new Set<() => void>();
  let latest = "";
  let state: BookState | undefined;
  let sheet = 0;
  let view = 0;
  let filterKey = "";
  let visible: Int32Array | undefined;

  const sheetState = () => state?.sheets[sheet];
  /** Below them come the blank ones, which are always in view. */
  const rowsInUse = () => sheetState()?.rows ?? 0;
  /** Rows may be kept from view by conditions, or because others were chosen by hand. */
  const isFiltered = ({ rows, visibleRows } = sheetState() ?? { rows: 0, visibleRows: 0 }) => visibleRows < rows;

  function blockAt(viewRow: number, column: number): Block | undefined {
    const [down, right] = [Math.floor(viewRow / blockRows), Math.floor(column / blockColumns)];
    const key = `${sheet}:${down}:${right}`;
    const block = blocks.get(key);
    if (key !== latest) {
      latest = key;
      looked.delete(key);
      looked.set(key, { down, right });
    }
    if (block?.version !== state?.version || block?.view !== view) fetchBlock(key, down, right);
    return block;
  }

  function fetchBlock(key: string, down: number, right: number): void {
    if (state === undefined || onTheWay.has(key) || onTheWay.size >= mostOnTheWay) return;
    onTheWay.add(key);
    const asked = view;
    const [from, left] = [down * blockRows, right * blockColumns];
    bench.windowOf(sheet, from, from + blockRows, left, left + blockColumns).then(
      (window) => {
        onTheWay.delete(key);
        if (asked === view) keepBlock(key, { ...window, view });
        for (const listener of listeners) listener();
      },
      // The worker was started anew; what is in view is asked for again with the next state.
      () => onTheWay.delete(key),
    );
  }

  function fetchVisible(asked: number): void {
    bench.visibleRows(sheet).then(
      (rows) => {
        if (asked !== view) return;
        visible = rows;
        for (const listener of listeners) listener();
      },
      () => {},
    );
  }

  function keepBlock(key: string, block: Block): void {
    blocks.delete(key);
    blocks.set(key, block);
    const oldest = blocks.size > mostBlocks ? blocks.keys().next().value : undefined;
    if (oldest !== undefined) blocks.delete(oldest);
  }

  return {
    cellAt(viewRow, column): ShownCell | undefined {
      const block = blockAt(viewRow, column);
      return block?.cells[viewRow - block.from]?.[column - block.left];
    },
    sheetRow(viewRow) {
      if (!isFiltered() || !visible) return viewRow;
      return visible[viewRow] ?? rowsInUse() + viewRow - visible.length;
    },
    viewRow(sheetRow) {
      if (!isFiltered() || !visible) return sheetRow;
      return sheetRow < rowsInUse() ? firstAtLeast(visible, sheetRow) : visible.length + sheetRow - rowsInUse();
    },
    viewRows: () => sheetState()?.visibleRows ?? 0,
    onArrival(listener) {
      listeners.add(listener);
      return () => listeners.delete(listener);
    },
    refresh(next, shown) {
      const found = next.sheets[shown];
      const seen = found && isFiltered(found) ? found.visibleRows : "all";
      const key = `${next.id}:${shown}:${seen}:${JSON.stringify(found?.filter)}`;
      // Cells of another sheet, book or filter are not shown while the right ones are on their way.
      if (key !== filterKey) {
        blocks.clear();
        view += 1;
        filterKey = key;
      }
      state = next;
      sheet = shown;
      // Asked for before others ask the worker for anything, and before the next frame.
      for (const [block, { down, right }] of [...looked].reverse().slice(0, mostOnTheWay)) {
        if (block.startsWith(`${sheet}:`)) fetchBlock(block, down, right);
      }
      looked.clear();
      latest = "";
      if (!isFiltered()) visible = undefined;
      else fetchVisible(view);
    },
  };
}

/** The first index whose number is not below the one wanted. */
function firstAtLeast(ascending: Int32Array, wanted: number): number {
  let [from, to] = [0, ascending.length];
  while (from < to) {
    const middle = (from + to) >> 1;
    if ((ascending[middle] as number) < wanted) from = middle + 1;
    else to = middle;
  }
  return from;
}
