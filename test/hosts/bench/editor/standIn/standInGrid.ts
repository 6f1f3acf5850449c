import type { Grid, GridEvents, ReferenceMark } from "../../../../../src/hosts/bench/page/grid/grid.js";
import type { Page } from "../../../../../src/hosts/bench/page/page.js";
import { addressText, columnLetters } from "../../../../../src/sheet/book/address.js";
import type { Area, Place } from "../../../../../src/sheet/book/book.js";
import { mostRows } from "../../../../../src/sheet/limits.js";

const cell = (sheet: number, row: number, column: number): Area => ({
  sheet,
  top: row,
  left: column,
  bottom: row,
  right: column,
});

/** A table that can be pressed, dragged over and typed in: what a grid does for the editor, and no more. */
export function standInGrid(host: HTMLElement, page: Page, events: GridEvents) {
  const marks: ReferenceMark[] = [];
  const table = document.createElement("table");
  table.tabIndex = 0;
  table.setAttribute("aria-label", "Cells");
  let room: HTMLElement | undefined;
  let from: Area | undefined;
  for (let row = -1; row < 8; row++) {
    const line = table.insertRow();
    for (let column = 0; column < 8; column++) {
      const box = line.insertCell();
      box.id = row < 0 ? `column-${columnLetters(column)}` : addressText(row, column);
      box.textContent = row < 0 ? columnLetters(column) : box.id;
      const area = () =>
        row < 0 ? { ...cell(page.sheet(), 0, column), bottom: mostRows - 1 } : cell(page.sheet(), row, column);
      box.addEventListener("mousedown", (event) => {
        if (!events.isPicking()) return page.select(area());
        event.preventDefault();
        from = area();
        events.pick(from, false);
      });
      box.addEventListener("mouseenter", () => from && events.pick(joined(from, area()), false));
      box.addEventListener("mouseup", () => {
        if (from) events.pick(joined(from, area()), true);
        from = undefined;
      });
      box.addEventListener("dblclick", () => events.edit(undefined));
    }
  }
  table.addEventListener("keydown", (event) => {
    if (event.key === "F2") events.edit(undefined);
    else if (event.key.length === 1 && !event.ctrlKey && !event.altKey) events.edit(event.key);
    else return;
    event.preventDefault();
  });
  host.append(table);

  const grid: Grid = {
    element: host,
    showReferences(shown) {
      marks.splice(0, marks.length, ...shown);
    },
    openCell({ row, column }: Place) {
      const box = document.getElementById(addressText(row, column))!.getBoundingClientRect();
      room = document.createElement("div");
      room.className = "room";
      room.style.left = `${box.left}px`;
      room.style.top = `${box.top}px`;
      room.style.minWidth = `${box.width}px`;
      host.append(room);
      return room;
    },
    closeCell: () => room?.remove(),
    boxOf: ({ row, column }) => document.getElementById(addressText(row, column))?.getBoundingClientRect(),
    reveal: () => {},
    focus: () => table.focus(),
    step(area, down, right, extend) {
      const to = cell(area.sheet, Math.max(0, area.bottom + down), Math.max(0, area.right + right));
      if (!events.isPicking()) page.select(to);
      return extend ? joined(area, to) : to;
    },
  };
  return { grid, marks };
}

function joined(one: Area, other: Area): Area {
  return {
    sheet: one.sheet,
    top: Math.min(one.top, other.top),
    left: Math.min(one.left, other.left),
    bottom: Math.max(one.bottom, other.bottom),
    right: Math.max(one.right, other.right),
  };
}
