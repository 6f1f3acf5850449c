import type { Page } from "../page.js";

const least = 240;

/** The edge between the table and what stands beside it, moved by mouse or by the arrow keys. */
export function dragSide(side: HTMLElement, page: Page): void {
  const edge = document.createElement("div");
  edge.className = "shell-edge";
  edge.tabIndex = 0;
  edge.setAttribute("role", "separator");
  edge.setAttribute("aria-orientation", "vertical");
  edge.setAttribute("aria-label", "Width of what is beside the table");
  edge.setAttribute("aria-valuemin", String(least));
  side.before(edge);

  const most = () => Math.max(least, innerWidth - 320);
  const width = () => Math.min(most(), page.preferences().panelWidth);
  const show = (pixels: number) => {
    side.style.setProperty("--side-width", `${pixels}px`);
    edge.setAttribute("aria-valuenow", String(Math.round(pixels)));
    edge.setAttribute("aria-valuemax", String(most()));
    edge.hidden = page.preferences().panel === "";
  };
  const keep = (pixels: number) => page.prefer({ panelWidth: Math.round(Math.min(most(), Math.max(least, pixels))) });

  edge.addEventListener("pointerdown", (event) => {
    edge.setPointerCapture(event.pointerId);
    const [from, before] = [event.clientX, width()];
    const move = (moved: PointerEvent) => show(Math.min(most(), Math.max(least, before + from - moved.clientX)));
    edge.addEventListener("pointermove", move);
    edge.addEventListener(
      "pointerup",
      (last) => {
        edge.removeEventListener("pointermove", move);
        keep(before + from - last.clientX);
      },
      { once: true },
    );
  });
  edge.addEventListener("keydown", (event) => {
    const step = { ArrowLeft: 24, ArrowRight: -24 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    keep(width() + step);
  });
  page.onChange((change) => {
    if (change === "preferences") show(width());
  });
  show(width());
}
