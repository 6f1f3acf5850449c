import type { Place } from "../../../../sheet/book/book.js";
import type { Page } from "../page.js";

/** Selects a cell and brings it into view; the focus stays where it is. */
export function goTo(page: Page, place: Place | undefined): void {
  if (!place) return;
  const { sheet, row, column } = place;
  page.select({ sheet, top: row, left: column, bottom: row, right: column }, place);
}
