import type { Place } from "../../../../sheet/book/book.js";
import type { Grid } from "../grid/grid.js";
import type { Painted } from "./text/paintOf.js";

/** The two places where the text can be: the line above the grid, and the cell. */
export interface Surface {
  readonly host: HTMLElement;
  isInLine(): boolean;
  toLine(): void;
  toCell(place: Place): void;
  /** Shows in the line what is typed in the cell. */
  mirror(text: string, painted: readonly Painted[]): void;
}

/** Longer texts go on in the cell; the line has no room for more. */
const mostMirrored = 400;

/** What happens in the cell while it is edited is no business of the grid around it. */
const kept = [
  ...["keydown", "keypress", "keyup", "beforeinput", "input", "compositionstart", "compositionend"],
  ...["copy", "cut", "paste", "pointerdown", "mousedown", "click", "dblclick", "contextmenu", "wheel", "focusin"],
] as const;

export function createSurface(host: HTMLElement, grid: Grid, onMirrorPressed: (event: PointerEvent) => void): Surface {
  const mirror = document.createElement("div");
  mirror.className = "editor-mirror";
  mirror.hidden = true;
  // The same text is read where it is typed.
  mirror.setAttribute("aria-hidden", "true");
  mirror.addEventListener("pointerdown", (event) => {
    event.preventDefault();
    onMirrorPressed(event);
  });
  host.append(mirror);
  const cell = document.createElement("div");
  cell.className = "editor-cell";
  for (const type of kept) cell.addEventListener(type, (event) => event.stopPropagation());
  let isInLine = true;

  const move = (to: HTMLElement, inLine: boolean) => {
    const text = host.querySelector(".cm-editor") ?? cell.querySelector(".cm-editor");
    if (text) to.append(text);
    mirror.hidden = inLine;
    isInLine = inLine;
  };
  return {
    host,
    isInLine: () => isInLine,
    toLine() {
      if (isInLine) return;
      move(host, true);
      cell.remove();
      grid.closeCell();
    },
    toCell(place) {
      grid.openCell(place).append(cell);
      move(cell, false);
    },
    mirror(text, painted) {
      if (!isInLine) mirror.replaceChildren(...piecesOf(text.slice(0, mostMirrored), painted));
    },
  };
}

function piecesOf(text: string, painted: readonly Painted[]): (Node | string)[] {
  const pieces: (Node | string)[] = [];
  let last = 0;
  for (const { from, to, paint } of painted) {
    if (from >= text.length) break;
    const piece = document.createElement("span");
    piece.className = paint;
    piece.textContent = text.slice(from, to);
    pieces.push(text.slice(last, from), piece);
    last = to;
  }
  return [...pieces, text.slice(last)];
}
