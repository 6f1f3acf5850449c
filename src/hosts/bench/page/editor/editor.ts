import type { Area, Place } from "../../../../sheet/book/book.js";
import type { Grid } from "../grid/grid.js";
import type { Page } from "../page.js";

/** The formula line above the grid and the editor inside a cell: two views of one text. */
export interface Editor {
  /** The place being edited, undefined while nothing is typed. */
  editing(): Place | undefined;
  /** Starts in the cell; `typed` replaces what it holds. */
  beginInCell(typed: string | undefined): void;
  beginInLine(): void;
  /** Takes up a text that was typed and not entered before the page was closed. */
  resume(place: Place, text: string): void;
  /** Enters what is typed; resolves with false where it was refused and stays in the editor. */
  commit(): Promise<boolean>;
  cancel(): void;
  isPicking(): boolean;
  pick(area: Area, done: boolean): void;
  /** Puts a text at the caret, from a list of functions beside the grid. */
  insert(text: string): void;
}

export type CreateEditor = (line: HTMLElement, page: Page, grid: Grid) => Editor;
