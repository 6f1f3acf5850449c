import type { Page } from "../../page.js";
import { narrowest, widest } from "../layout/columnWidth.js";
import type { Frame } from "../layout/frame.js";
import type { Sight } from "../layout/sight.js";

const padding = 22;

/** The width that the header and the cells in view of a column need [px at a root size of 16 px]. */
export function columnFit(page: Page, frame: Frame, sight: Sight, column: number): number {
  const context = document.createElement("canvas").getContext("2d");
  const cell = frame.table.querySelector(".grid-row .grid-cell");
  const state = page.sheetState().columnStates[column];
  const texts = [(state?.name ?? page.cells.cellAt(0, column)?.text ?? "") + (state?.derived ? " =" : "")];
  if (state?.unit) texts.push(`${state.unit}  `);
  for (let row = sight.firstRow(); row <= sight.lastRow(); row++)
    texts.push(page.cells.cellAt(row, column)?.text ?? "");
  if (!context || !cell) return narrowest;
  const style = getComputedStyle(cell);
  context.font = `${style.fontWeight} ${style.fontSize} ${style.fontFamily}`;
  const longest = Math.max(...texts.map((text) => context.measureText(text).width));
  return Math.min(Math.max(Math.ceil(longest / sight.zoom) + padding, narrowest + padding), widest);
}
