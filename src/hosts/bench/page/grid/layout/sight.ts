import { mostColumns, mostRows } from "../../../../../sheet/limits.js";
import type { Page } from "../../page.js";
import { type ColumnAxis, columnAxis } from "./columnAxis.js";
import { usualWidth } from "./columnWidth.js";
import type { Frame } from "./frame.js";
import { type RowAxis, rowAxis } from "./rowAxis.js";
import { scaledScroll } from "./scaledScroll.js";

const spareRows = 200;
const spareColumns = 12;
const fewestColumns = 26;
/** Frozen columns leave at least this part of the view to the others. */
const mostFrozen = 0.6;

/** A rectangle in pixels from the corner of what is seen. */
export interface Box {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
}

/** A cell as it is seen: the row in view, the header being 0. */
export interface Spot {
  readonly row: number;
  readonly column: number;
}

export interface Hit extends Spot {
  /** The band in which the point lies. */
  readonly on: "corner" | "letters" | "numbers" | "cells";
}

/** What is seen of the sheet and where. */
export interface Sight {
  readonly columns: ColumnAxis;
  readonly rows: RowAxis;
  /** All in pixels. */
  readonly rowHeight: number;
  readonly lettersHeight: number;
  readonly headerHeight: number;
  readonly numbersWidth: number;
  readonly width: number;
  readonly height: number;
  /** Pixels of a width that was set at a root size of 16 px. */
  readonly zoom: number;
  /** Grows with every new layout. */
  readonly layout: number;
  readonly scroll: { top(): number; left(): number; setTop(top: number): void; setLeft(left: number): void };
  bodyTop(): number;
  freeLeft(): number;
  boxOf(spot: Spot): Box;
  hit(x: number, y: number): Hit;
  reveal(spot: Spot): void;
  firstRow(): number;
  lastRow(): number;
  /** Rows that are seen whole. */
  pageRows(): number;
  /** Widths that are not set yet, while an edge is dragged. */
  readonly draftWidths: Map<number, number>;
  /** Makes room for a cell beyond the rows and columns that there are now. */
  include(spot: Spot): void;
  /** Sizes, widths or counts may have changed. */
  arrange(): void;
  stop(): void;
}

const nothing: Spot = { row: 0, column: 0 };

export function createSight(page: Page, frame: Frame, onScroll: () => void): Sight {
  const scroll = scaledScroll(frame.scroller, onScroll);
  let asked = nothing;
  let extent = "";
  const draftWidths = new Map<number, number>();
  let columns = columnAxis([], 0);
  let rows = rowAxis(page.cells, page.sheetState(), 1);
  let [rowHeight, zoom, width, height, numbersWidth, layout] = [28, 1, 0, 0, 48, 0];

  const lettersHeight = () => Math.round(24 * zoom);
  const headerHeight = () => Math.round(48 * zoom);
  const bodyTop = () => lettersHeight() + headerHeight();
  const freeLeft = () => numbersWidth + columns.frozenWidth;

  /** Spare cells reach beyond the active one, and beyond what was asked for last. */
  function farthest(): Spot {
    const { active } = page.selection();
    return {
      row: Math.max(asked.row, rows.toView(active.row)),
      column: Math.max(asked.column, active.column),
    };
  }

  function include(spot: Spot): void {
    const isNear = spot.row > rows.count - spareRows / 2 || spot.column > columns.count - spareColumns / 2;
    if (!isNear) return;
    asked = spot;
    arrange();
    asked = nothing;
  }

  function arrangeColumns(): void {
    const { columns: used, columnStates, frozenColumns } = page.sheetState();
    const wanted = Math.max(used, columnStates.length, farthest().column + 1) + spareColumns;
    const count = Math.min(Math.max(wanted, fewestColumns), mostColumns);
    const widths = Array.from({ length: count }, (_, column) => {
      const state = columnStates[column];
      if (state?.hidden) return 0;
      return Math.round((draftWidths.get(column) ?? state?.width ?? usualWidth(column, state)) * zoom);
    });
    let [frozen, taken] = [0, 0];
    while (frozen < Math.min(frozenColumns, count)) {
      taken += widths[frozen] as number;
      if (taken > mostFrozen * (width - numbersWidth)) break;
      frozen += 1;
    }
    columns = columnAxis(widths, frozen);
  }

  function arrangeRows(): void {
    const used = page.sheetState();
    const hidden = used.rows - used.visibleRows;
    const wanted = Math.max(used.visibleRows, farthest().row + 1) + spareRows;
    rows = rowAxis(page.cells, used, Math.min(wanted, mostRows - hidden));
    const digits = String(rows.toSheet(rows.count - 1) + 1).length;
    numbersWidth = Math.round((Math.max(digits, 4) * 8 + 16) * zoom);
  }

  function arrange(): void {
    rowHeight = frame.probe.offsetHeight || rowHeight;
    zoom = (frame.probe.offsetWidth || 160) / 160;
    // Measured where nothing of ours takes room, so that scroll bars count and contents do not.
    width = frame.scroller.clientWidth;
    height = frame.scroller.clientHeight;
    arrangeRows();
    arrangeColumns();
    layout += 1;
    const body = (rows.count - 1) * rowHeight;
    const free = columns.width - columns.frozenWidth;
    const set = (name: string, value: number) => frame.root.style.setProperty(name, `${value}px`);
    set("--grid-row", rowHeight);
    set("--grid-letters", lettersHeight());
    set("--grid-header", headerHeight());
    set("--grid-numbers", numbersWidth);
    set("--grid-frozen", columns.frozenWidth);
    set("--grid-width", width);
    set("--grid-height", height);
    const inView = Math.max(height - bodyTop(), 0);
    frame.extent.style.width = `${freeLeft() + free}px`;
    frame.extent.style.height = `${scroll.resize(body, inView) + bodyTop()}px`;
    // Only then, as it ends a scroll under way.
    if (extent !== `${frame.extent.style.width} ${frame.extent.style.height}`) {
      scroll.setLeft(scroll.left());
      scroll.setTop(scroll.top());
    }
    extent = `${frame.extent.style.width} ${frame.extent.style.height}`;
    frame.table.setAttribute("aria-rowcount", String(rows.count + 1));
    frame.table.setAttribute("aria-colcount", String(columns.count + 1));
  }

  function boxOf({ row, column }: Spot): Box {
    const start = columns.startOf(column) + numbersWidth;
    return {
      left: column < columns.frozen ? start : start - scroll.left(),
      top: row <= 0 ? lettersHeight() : bodyTop() + (row - 1) * rowHeight - scroll.top(),
      width: columns.widthOf(column),
      height: row <= 0 ? headerHeight() : rowHeight,
    };
  }

  function hit(x: number, y: number): Hit {
    const inLetters = y < lettersHeight();
    const inNumbers = x < numbersWidth;
    const along = x < freeLeft() ? Math.max(x - numbersWidth, 0) : x - numbersWidth + scroll.left();
    const down = Math.floor((y - bodyTop() + scroll.top()) / rowHeight) + 1;
    return {
      column: columns.at(along),
      row: y < bodyTop() ? 0 : Math.min(Math.max(down, 1), rows.count - 1),
      on: inLetters ? (inNumbers ? "corner" : "letters") : inNumbers ? "numbers" : "cells",
    };
  }

  function reveal({ row, column }: Spot): void {
    const box = boxOf({ row, column });
    if (row > 0) {
      if (box.top < bodyTop()) scroll.setTop((row - 1) * rowHeight);
      else if (box.top + rowHeight > height) scroll.setTop(row * rowHeight - (height - bodyTop()));
    }
    if (column >= columns.frozen) {
      const room = width - freeLeft();
      const start = columns.startOf(column) - columns.frozenWidth;
      if (box.left < freeLeft() || box.width > room) scroll.setLeft(start);
      else if (box.left + box.width > width) scroll.setLeft(start + box.width - room);
    }
  }

  return {
    get columns() {
      return columns;
    },
    get rows() {
      return rows;
    },
    get rowHeight() {
      return rowHeight;
    },
    get lettersHeight() {
      return lettersHeight();
    },
    get headerHeight() {
      return headerHeight();
    },
    get numbersWidth() {
      return numbersWidth;
    },
    get width() {
      return width;
    },
    get height() {
      return height;
    },
    get zoom() {
      return zoom;
    },
    get layout() {
      return layout;
    },
    scroll,
    include,
    draftWidths,
    bodyTop,
    freeLeft,
    boxOf,
    hit,
    reveal,
    firstRow: () => Math.floor(scroll.top() / rowHeight) + 1,
    lastRow: () => Math.min(Math.ceil((scroll.top() + height - bodyTop()) / rowHeight), rows.count - 1),
    pageRows: () => Math.max(Math.floor((height - bodyTop()) / rowHeight) - 1, 1),
    arrange,
    stop: scroll.stop,
  };
}
