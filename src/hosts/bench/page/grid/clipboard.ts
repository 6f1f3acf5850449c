import type { Page } from "../page.js";
import type { GridEvents } from "./grid.js";
import type { Frame } from "./layout/frame.js";
import type { Marks } from "./paint/marks.js";

/** Copy, cut and paste while the cells have the focus; what was copied stays outlined until it changes or Escape. */
export function listenToClipboard(
  page: Page,
  events: GridEvents,
  frame: Frame,
  marks: Marks,
  request: () => void,
): void {
  let isCut = false;
  let isPasting = false;
  let version = page.state().version;

  function copy(event: ClipboardEvent, cut: boolean): void {
    if (event.target !== frame.table) return;
    event.preventDefault();
    isCut = cut;
    marks.copied = page.selection().area;
    events.copy(cut);
    request();
  }

  frame.table.addEventListener("copy", (event) => copy(event, false));
  frame.table.addEventListener("cut", (event) => copy(event, true));
  frame.table.addEventListener("paste", (event) => {
    if (event.target !== frame.table || !event.clipboardData) return;
    event.preventDefault();
    isPasting = true;
    events.paste(event.clipboardData);
  });
  page.onChange((change) => {
    if (change !== "state" || page.state().version === version) return;
    version = page.state().version;
    // Pasted once, a copy can be pasted again; anything else may have moved what was copied.
    if (!isPasting || isCut) marks.copied = undefined;
    isPasting = false;
  });
}
