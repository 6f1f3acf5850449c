import type { KeyParts } from "../keys/keys.js";
import { holds, isWholeColumns, isWholeRows } from "../select/areas.js";
import { fillPress } from "./fillPress.js";
import { type At, createGestures, type Gesture } from "./gesture.js";
import { pickPress } from "./pickPress.js";
import { reorderPress } from "./reorderPress.js";
import { selectPress } from "./selectPress.js";
import { widthPress } from "./widthPress.js";

const longPress = 450;
const still = 10;

/** Mouse, pen and touch. A finger scrolls, taps to select, and selects an area after resting a moment. */
export function listenToPresses(parts: KeyParts): void {
  const { page, events, frame, sight, selecting, picking, marks, tip, widths, walking } = parts;
  const { view } = frame;
  const gestures = createGestures(frame, sight);
  let resting: { readonly timer: ReturnType<typeof setTimeout>; readonly at: At } | undefined;
  let isTouch = false;

  function gestureOf(event: PointerEvent, at: At): Gesture {
    const target = event.target as HTMLElement;
    const { area } = page.selection();
    if (target.closest(".grid-handle")) return fillPress(page, marks, selecting, parts.request);
    const edge = target.closest<HTMLElement>(".grid-edge");
    if (edge) return widthPress(at, Number(edge.dataset.column), sight, widths);
    if (events.isPicking()) return pickPress(at, event.shiftKey, page, picking, selecting);
    walking.forget();
    const isChosen = isWholeColumns(area) && !isWholeRows(area) && at.column >= area.left && at.column <= area.right;
    if (at.on === "letters" && !event.shiftKey && (event.altKey || isChosen)) {
      return reorderPress(at, page, sight, marks, selecting, parts.request);
    }
    return selectPress(at, event.shiftKey, selecting, sight);
  }

  function takeFocus(): void {
    if (!events.isPicking()) frame.table.focus({ preventScroll: true });
  }

  const isElsewhere = ({ target }: Event) =>
    (target as HTMLElement).closest(events.isPicking() ? ".grid-inset" : "button, .grid-inset") !== null;

  function stopResting(): void {
    clearTimeout(resting?.timer);
    resting = undefined;
  }

  function touch(event: PointerEvent): void {
    const at = gestures.atOf(event);
    stopResting();
    if ((event.target as HTMLElement).closest(".grid-handle, .grid-edge")) {
      gestures.begin(event, gestureOf(event, at));
      return;
    }
    const timer = setTimeout(() => {
      resting = undefined;
      takeFocus();
      const gesture = gestureOf(event, at);
      const isMenu = !events.isPicking();
      gestures.begin(event, {
        ...gesture,
        end(to) {
          gesture.end(to);
          if (isMenu && isNear(at, to)) events.openMenu(aboutOf(at), { x: to.clientX, y: to.clientY });
        },
      });
    }, longPress);
    resting = { timer, at };
  }

  view.addEventListener("pointerdown", (event) => {
    isTouch = event.pointerType === "touch";
    if (isElsewhere(event) || gestures.isOn()) return;
    if (isTouch) return touch(event);
    if (event.button !== 0) return;
    takeFocus();
    gestures.begin(event, gestureOf(event, gestures.atOf(event)));
  });
  view.addEventListener("pointermove", (event) => {
    if (resting && !isNear(resting.at, gestures.atOf(event))) stopResting();
    const at = gestures.atOf(event);
    tip.point(event.pointerType === "touch" || gestures.isOn() || at.on !== "cells" ? undefined : at);
  });
  view.addEventListener("pointerleave", () => tip.point(undefined));
  view.addEventListener("pointerup", (event) => {
    if (!resting) return;
    stopResting();
    takeFocus();
    const at = gestures.atOf(event);
    gestureOf(event, at).end(at);
  });
  view.addEventListener("pointercancel", stopResting);
  // The cells are no text to mark, and the editor keeps the focus while cells are picked.
  view.addEventListener("mousedown", (event) => {
    if (!(event.target as HTMLElement).closest(".grid-inset")) event.preventDefault();
  });

  view.addEventListener("dblclick", (event) => {
    if (isElsewhere(event) || events.isPicking()) return;
    // The view held the pointer, so the event names it and not what lies under the pointer.
    const target = document.elementFromPoint(event.clientX, event.clientY) ?? frame.view;
    const edge = target.closest<HTMLElement>(".grid-edge");
    if (edge) return widths.fit(widths.together(Number(edge.dataset.column)));
    if (target.closest(".grid-handle")) return void page.act({ do: "fill to end", area: page.selection().area });
    if (gestures.atOf(event).on === "cells") events.edit(undefined);
  });

  view.addEventListener("click", (event) => {
    const button = (event.target as HTMLElement).closest<HTMLElement>("button");
    if (!button || !frame.table.contains(button) || events.isPicking()) return;
    takeFocus();
    const column = Number(button.dataset.column);
    if (button.classList.contains("grid-unit")) return events.openUnit(column, button);
    if (button.classList.contains("grid-unhide")) {
      const from = Number(button.dataset.from);
      const columns = Array.from({ length: column - from }, (_, index) => from + index);
      return void page.act({ do: "hide columns", sheet: page.sheet(), columns, hidden: false });
    }
    const { area } = page.selection();
    if (!isWholeColumns(area) || column < area.left || column > area.right) selecting.columns(column, column);
    const { left, bottom } = button.getBoundingClientRect();
    events.openMenu("columns", { x: left, y: bottom });
  });

  view.addEventListener("contextmenu", (event) => {
    if (isElsewhere(event)) return;
    event.preventDefault();
    // A finger's menu comes with its release, from a keyboard's key it was opened already.
    if (isTouch || gestures.isOn() || event.button !== 2) return;
    const at = gestures.atOf(event);
    const { area } = page.selection();
    const isInside =
      at.on === "letters"
        ? isWholeColumns(area) && at.column >= area.left && at.column <= area.right
        : at.on === "numbers"
          ? isWholeRows(area) && holds(area, sight.rows.toSheet(at.row), 0)
          : holds(area, sight.rows.toSheet(at.row), at.column);
    if (!isInside) selectPress(at, false, selecting, sight);
    takeFocus();
    events.openMenu(aboutOf(at), { x: event.clientX, y: event.clientY });
  });
}

const isNear = (one: At, other: At) => Math.hypot(one.x - other.x, one.y - other.y) < still;
const aboutOf = ({ on }: At) => (on === "letters" ? "columns" : on === "numbers" ? "rows" : "cells");
