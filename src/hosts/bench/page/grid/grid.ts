import type { Area, Place } from "../../../../sheet/book/book.js";
import type { Page } from "../page.js";

/** What the grid tells the page; everything else it does through the page itself. */
export interface GridEvents {
  /** Whether a reference may be put at the caret of the formula being typed, so that a press picks cells. */
  isPicking(): boolean;
  /** Cells pressed or dragged over while picking; `done` with the release. */
  pick(area: Area, done: boolean): void;
  /** The active cell is to be edited; `typed` replaces what it holds, undefined keeps it. */
  edit(typed: string | undefined): void;
  /** The unit of a header was chosen by mouse or keyboard. */
  openUnit(column: number, anchor: HTMLElement): void;
  /** The menu of cells, rows or columns at a point of the window. */
  openMenu(about: "cells" | "rows" | "columns", at: { readonly x: number; readonly y: number }): void;
  copy(cut: boolean): void;
  paste(data: DataTransfer): void;
}

/** A reference of the formula being typed, outlined in the grid in the colour it has in the text. */
export interface ReferenceMark {
  readonly area: Area;
  /** 0 to 5. */
  readonly colour: number;
}

export interface Grid {
  readonly element: HTMLElement;
  showReferences(marks: readonly ReferenceMark[]): void;
  /** An empty element over a cell, for the editor inside it; it grows to the right and moves with the cell. */
  openCell(place: Place): HTMLElement;
  closeCell(): void;
  /** Where a cell is on the screen; undefined where it is out of view. */
  boxOf(place: Place): DOMRect | undefined;
  reveal(place: Place): void;
  focus(): void;
  /**
   * Goes on from these cells as a key would: after Enter or Tab the selection moves. While a formula picks cells it
   * stays; the answer is what the key picks.
   */
  step(from: Area, down: number, right: number, extend: boolean): Area;
}

export type CreateGrid = (host: HTMLElement, page: Page, events: GridEvents) => Grid;
