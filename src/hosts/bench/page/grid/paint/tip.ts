import type { Page } from "../../page.js";
import type { Frame } from "../layout/frame.js";
import type { Sight, Spot } from "../layout/sight.js";

const wait = 350;
const grace = 250;

/** The sentence of an error, beside its cell: under the pointer and for the active cell. */
export interface Tip {
  /** The pointer rests over a cell; undefined where it rests over none. */
  point(spot: Spot | undefined): void;
  /** The active cell came here. */
  focus(spot: Spot | undefined): void;
  /** Whether there was something to dismiss. */
  dismiss(): boolean;
  paint(): void;
  /** What is to be told of a cell. */
  messageOf(spot: Spot): string | undefined;
}

export function createTip(page: Page, frame: Frame, sight: Sight): Tip {
  const { tip } = frame;
  let shown: Spot | undefined;
  let focused: Spot | undefined;
  let pointed: Spot | undefined;
  let dismissed: Spot | undefined;
  let timer: ReturnType<typeof setTimeout> | undefined;

  function messageOf({ row, column }: Spot): string | undefined {
    const reading = row === 0 ? page.sheetState().columnStates[column]?.reading : undefined;
    if (reading?.is === "problem") return reading.message;
    return page.cells.cellAt(row, column)?.message;
  }

  function show(spot: Spot | undefined): void {
    shown = spot && messageOf(spot) !== undefined && !isSame(spot, dismissed) ? spot : undefined;
    paint();
  }

  function paint(): void {
    const message = shown && messageOf(shown);
    tip.hidden = message === undefined;
    if (!shown || message === undefined) return;
    if (tip.textContent !== message) tip.textContent = message;
    const box = sight.boxOf(shown);
    const isInView = box.top >= 0 && box.top + box.height <= sight.height + box.height && box.left < sight.width;
    tip.hidden = !isInView;
    const below = box.top + box.height;
    const isRoomBelow = below + tip.offsetHeight < sight.height;
    const left = Math.max(Math.min(box.left, sight.width - tip.offsetWidth - 4), 0);
    tip.style.transform = `translate(${left}px, ${isRoomBelow ? below : Math.max(box.top - tip.offsetHeight, 0)}px)`;
  }

  function later(spot: Spot | undefined, delay: number): void {
    clearTimeout(timer);
    timer = setTimeout(() => show(spot), delay);
  }

  // It stays while the pointer is over it, so that it can be read and selected.
  tip.addEventListener("pointerenter", () => clearTimeout(timer));
  tip.addEventListener("pointerleave", () => later(focused, grace));

  return {
    point(spot) {
      if (isSame(spot, pointed)) return;
      pointed = spot;
      if (!isSame(spot, dismissed)) dismissed = undefined;
      const next = spot && messageOf(spot) !== undefined ? spot : focused;
      later(next, next === focused ? grace : wait);
    },
    focus(spot) {
      if (isSame(spot, focused)) return;
      focused = spot;
      dismissed = undefined;
      // The active cell refers to this text before it is seen.
      if (!shown) tip.textContent = (spot && messageOf(spot)) ?? "";
      later(spot, wait);
    },
    dismiss() {
      clearTimeout(timer);
      if (!shown) return false;
      dismissed = shown;
      show(undefined);
      return true;
    },
    paint,
    messageOf,
  };
}

const isSame = (one: Spot | undefined, other: Spot | undefined) =>
  one?.row === other?.row && one?.column === other?.column;
