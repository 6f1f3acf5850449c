import type { Frame } from "../layout/frame.js";
import type { Hit, Sight } from "../layout/sight.js";

export interface At extends Hit {
  /** From the corner of what is seen [px]. */
  readonly x: number;
  readonly y: number;
  /** Of the window [px]. */
  readonly clientX: number;
  readonly clientY: number;
  readonly isOther: boolean;
}

/** What a press that goes on does. */
export interface Gesture {
  move(at: At): void;
  end(at: At): void;
  cancel?(): void;
  /** Which way the cells scroll while the pointer is outside of them. */
  readonly scrolls: "both" | "across" | "down" | "no";
}

export interface Gestures {
  atOf(event: PointerEvent | MouseEvent): At;
  begin(event: PointerEvent, gesture: Gesture): void;
  isOn(): boolean;
}

/** Follows one press at a time: until the release, Escape, or the browser takes it. */
export function createGestures(frame: Frame, sight: Sight): Gestures {
  const { view } = frame;
  let on: { readonly gesture: Gesture; readonly pointer: number; readonly start: At } | undefined;
  let last: PointerEvent | undefined;
  let frameRequest = 0;
  let frameTime = 0;

  function atOf(event: PointerEvent | MouseEvent): At {
    const corner = view.getBoundingClientRect();
    const [x, y] = [event.clientX - corner.left, event.clientY - corner.top];
    const isOther = event.ctrlKey || event.metaKey;
    return { ...sight.hit(x, y), x, y, clientX: event.clientX, clientY: event.clientY, isOther };
  }

  /** The point pulled into the pane where the press began, as long as that pane can scroll towards it. */
  function heldAt(event: PointerEvent): At {
    const at = atOf(event);
    if (!on) return at;
    const { start } = on;
    const x = start.x >= sight.freeLeft() && sight.scroll.left() > 0 ? Math.max(at.x, sight.freeLeft()) : at.x;
    const y = start.y >= sight.bodyTop() && sight.scroll.top() > 0 ? Math.max(at.y, sight.bodyTop()) : at.y;
    const held = sight.hit(Math.min(x, sight.width - 1), Math.min(y, sight.height - 1));
    return { ...at, row: held.row, column: held.column };
  }

  function scrollOn(time: number): void {
    const frames = Math.min(Math.max(time - frameTime, 0), 100) / 16.7;
    frameTime = time;
    frameRequest = requestAnimationFrame(scrollOn);
    if (!on || !last || on.gesture.scrolls === "no") return;
    const { scrolls } = on.gesture;
    const at = atOf(last);
    const right = scrolls === "down" ? 0 : speed(at.x - sight.width) - fromPane(on.start.x, at.x, sight.freeLeft());
    const down = scrolls === "across" ? 0 : speed(at.y - sight.height) - fromPane(on.start.y, at.y, sight.bodyTop());
    if (right !== 0) sight.scroll.setLeft(sight.scroll.left() + right * frames);
    if (down !== 0) sight.scroll.setTop(sight.scroll.top() + down * frames);
    if (right !== 0 || down !== 0) on.gesture.move(heldAt(last));
  }

  function follow(event: PointerEvent): void {
    if (!on || event.pointerId !== on.pointer) return;
    last = event;
    on.gesture.move(heldAt(event));
  }

  function stop(): Gesture | undefined {
    const gesture = on?.gesture;
    cancelAnimationFrame(frameRequest);
    on = undefined;
    last = undefined;
    return gesture;
  }

  view.addEventListener("pointermove", follow);
  view.addEventListener("pointerup", (event) => {
    if (event.pointerId !== on?.pointer) return;
    const at = heldAt(event);
    stop()?.end(at);
  });
  view.addEventListener("pointercancel", (event) => {
    if (event.pointerId === on?.pointer) stop()?.cancel?.();
  });
  // Touches that select must not scroll as well; browsers ask before they begin to.
  view.addEventListener("touchmove", (event) => on && event.cancelable && event.preventDefault(), { passive: false });
  view.ownerDocument.addEventListener(
    "keydown",
    (event) => {
      if (!on || event.key !== "Escape") return;
      event.preventDefault();
      event.stopPropagation();
      stop()?.cancel?.();
    },
    true,
  );

  return {
    atOf,
    isOn: () => on !== undefined,
    begin(event, gesture) {
      on = { gesture, pointer: event.pointerId, start: atOf(event) };
      last = event;
      try {
        view.setPointerCapture(event.pointerId);
      } catch {
        // The pointer is gone already; its release ends the gesture all the same.
      }
      frameTime = performance.now();
      frameRequest = requestAnimationFrame(scrollOn);
    },
  };
}

/** Pixels in a sixtieth of a second: the farther outside, the faster. */
const speed = (outside: number) => (outside <= 0 ? 0 : Math.min(outside, 240) ** 1.6 / 20 + 2);
const fromPane = (start: number, now: number, edge: number) => (start < edge ? 0 : speed(edge - now));
