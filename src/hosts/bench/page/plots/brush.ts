import { type Frame, placeX, placeY } from "./draw/drawFigure.js";
import type { Figure } from "./draw/figure.js";

export interface BrushEvents {
  figure(): Figure | undefined;
  frame(): Frame | undefined;
  /** Rows of the points inside; an empty rectangle is a press on a point, or on none. */
  brushed(rows: readonly number[]): void;
  /** The nearest point under the pointer. */
  hovered(row: number | undefined, at: { readonly x: number; readonly y: number }): void;
}

const reach = 9;

/** Drags a rectangle over the points of a plot. */
export function brush(canvas: HTMLElement, box: HTMLElement, events: BrushEvents): void {
  let from: { readonly x: number; readonly y: number } | undefined;

  const at = (event: PointerEvent) => {
    const { left, top } = canvas.getBoundingClientRect();
    return { x: event.clientX - left, y: event.clientY - top };
  };

  const show = (a: { readonly x: number; readonly y: number }, b: { readonly x: number; readonly y: number }) => {
    box.hidden = false;
    box.style.left = `${Math.min(a.x, b.x)}px`;
    box.style.top = `${Math.min(a.y, b.y)}px`;
    box.style.width = `${Math.abs(a.x - b.x)}px`;
    box.style.height = `${Math.abs(a.y - b.y)}px`;
  };

  canvas.addEventListener("pointerdown", (event) => {
    if (event.button !== 0 || !events.figure()?.brush) return;
    from = at(event);
    canvas.setPointerCapture(event.pointerId);
    event.preventDefault();
  });
  canvas.addEventListener("pointermove", (event) => {
    const here = at(event);
    if (from) show(from, here);
    else events.hovered(nearest(events, here), here);
  });
  canvas.addEventListener("pointerleave", () => events.hovered(undefined, { x: 0, y: 0 }));
  canvas.addEventListener("pointerup", (event) => {
    if (!from) return;
    const [a, b] = [from, at(event)];
    from = undefined;
    box.hidden = true;
    const isPress = Math.hypot(a.x - b.x, a.y - b.y) < 4;
    const row = isPress ? nearest(events, b) : undefined;
    events.brushed(isPress ? (row === undefined ? [] : [row]) : inside(events, a, b));
  });
}

type Point = { readonly x: number; readonly y: number };

function inside(events: BrushEvents, a: Point, b: Point): number[] {
  const [left, right] = [Math.min(a.x, b.x), Math.max(a.x, b.x)];
  const [top, bottom] = [Math.min(a.y, b.y), Math.max(a.y, b.y)];
  const rows: number[] = [];
  eachPoint(events, (row, x, y) => {
    if (x >= left && x <= right && y >= top && y <= bottom) rows.push(row);
  });
  return rows;
}

function nearest(events: BrushEvents, here: Point): number | undefined {
  let found: number | undefined;
  let best = reach;
  eachPoint(events, (row, x, y) => {
    const away = Math.hypot(x - here.x, y - here.y);
    if (away < best) {
      best = away;
      found = row;
    }
  });
  return found;
}

function eachPoint(events: BrushEvents, visit: (row: number, x: number, y: number) => void): void {
  const [figure, frame] = [events.figure(), events.frame()];
  const points = figure?.brush;
  if (!figure || !frame || !points) return;
  for (let index = 0; index < points.x.length; index++) {
    const x = placeX(frame, figure, points.x[index] as number);
    const y = placeY(frame, figure, points.y[index] as number);
    if (Number.isFinite(x) && Number.isFinite(y)) visit(points.rows[index] as number, x, y);
  }
}
