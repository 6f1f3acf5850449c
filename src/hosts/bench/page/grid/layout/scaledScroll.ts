/** Browsers lay out no taller content than this at every zoom [px]; beyond it the scroll bar is scaled. */
const tallest = 6_000_000;
const idleAfter = 160;

/** How far the rows are scrolled. Small steps move them as far as any page; only jumps of the scroll bar are scaled. */
export interface ScaledScroll {
  top(): number;
  left(): number;
  setTop(top: number): void;
  setLeft(left: number): void;
  /** The height of what scrolls and of the part in view; the height that the scrolled element shall have is returned. */
  resize(content: number, inView: number): number;
  stop(): void;
}

export function scaledScroll(scroller: HTMLElement, onScroll: () => void): ScaledScroll {
  let top = 0;
  // Kept, as reading it makes the browser lay out what was just written.
  let left = 0;
  let seen = 0;
  let content = 0;
  let inView = 0;
  let idle: ReturnType<typeof setTimeout> | undefined;

  const reach = () => Math.max(content - inView, 0);
  const bar = () => Math.max(Math.min(content, tallest) - inView, 0);
  const scale = () => (bar() > 0 ? reach() / bar() : 1);

  function settle(): void {
    const wanted = top / scale();
    if (Math.abs(scroller.scrollTop - wanted) >= 0.5) scroller.scrollTop = wanted;
    seen = scroller.scrollTop;
  }

  function follow(): void {
    const step = scroller.scrollTop - seen;
    seen = scroller.scrollTop;
    left = scroller.scrollLeft;
    if (step !== 0) {
      const isSmall = Math.abs(step) <= inView;
      top = clamp(isSmall && scale() > 1 ? top + step : seen * scale(), 0, reach());
      const isAtStop = seen <= 0 || seen >= bar() - 1;
      if (scale() > 1 && isAtStop && isSmall) settle();
      clearTimeout(idle);
      if (scale() > 1) idle = setTimeout(settle, idleAfter);
    }
    onScroll();
  }

  scroller.addEventListener("scroll", follow, { passive: true });
  return {
    top: () => top,
    left: () => left,
    setTop(wanted) {
      top = clamp(wanted, 0, reach());
      settle();
      onScroll();
    },
    setLeft(wanted) {
      scroller.scrollLeft = wanted;
      left = scroller.scrollLeft;
      onScroll();
    },
    resize(nextContent, nextInView) {
      content = nextContent;
      inView = nextInView;
      top = clamp(top, 0, reach());
      return Math.min(content, tallest);
    },
    stop() {
      clearTimeout(idle);
      scroller.removeEventListener("scroll", follow);
    },
  };
}

const clamp = (value: number, least: number, most: number) => Math.min(Math.max(value, least), most);
