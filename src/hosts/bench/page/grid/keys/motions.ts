import type { Page } from "../../page.js";
import type { Sight, Spot } from "../layout/sight.js";

/** Where a key leads from a cell; jumps ask the worker. */
export type Motion = (from: Spot, page: Page, sight: Sight) => Spot | Promise<Spot>;

const by =
  (down: number, right: number): Motion =>
  (from, _page, sight) =>
    stepped(from, down, right, sight);

const jump =
  (toward: "down" | "up" | "left" | "right"): Motion =>
  async ({ row, column }, page, sight) => {
    const place = await page.bench.edge({ sheet: page.sheet(), row: sight.rows.toSheet(row), column }, toward);
    return { row: sight.rows.toView(place.row), column: place.column };
  };

const lastColumn = (page: Page) => Math.max(page.sheetState().columns - 1, 0);
const lastRow = (page: Page) => Math.max(page.sheetState().visibleRows - 1, 0);

/** Keys without Shift, which extends the selection instead of moving it. */
export const motions: Readonly<Record<string, Motion>> = {
  ArrowDown: by(1, 0),
  ArrowUp: by(-1, 0),
  ArrowLeft: by(0, -1),
  ArrowRight: by(0, 1),
  "Ctrl+ArrowDown": jump("down"),
  "Ctrl+ArrowUp": jump("up"),
  "Ctrl+ArrowLeft": jump("left"),
  "Ctrl+ArrowRight": jump("right"),
  Home: ({ row }) => ({ row, column: 0 }),
  End: ({ row }, page) => ({ row, column: lastColumn(page) }),
  "Ctrl+Home": () => ({ row: 0, column: 0 }),
  "Ctrl+End": (_from, page) => ({ row: lastRow(page), column: lastColumn(page) }),
  PageDown: (from, _page, sight) => stepped(from, sight.pageRows(), 0, sight),
  PageUp: (from, _page, sight) => stepped(from, -sight.pageRows(), 0, sight),
  "Alt+PageDown": (from, _page, sight) => across(from, 1, sight),
  "Alt+PageUp": (from, _page, sight) => across(from, -1, sight),
};

export function stepped({ row, column }: Spot, down: number, right: number, sight: Sight): Spot {
  return {
    row: Math.min(Math.max(row + down, 0), sight.rows.count - 1),
    column: right === 0 ? column : sight.columns.step(column, right),
  };
}

/** A view's width to one side. */
function across({ row, column }: Spot, direction: number, { columns, width, freeLeft }: Sight): Spot {
  const room = Math.max(width - freeLeft(), 1);
  return { row, column: columns.at(Math.max(columns.startOf(column) + direction * room, 0)) };
}
