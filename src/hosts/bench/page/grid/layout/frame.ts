/** The elements that are always there. Every pane lies in one scrolled element, so that wheel and touch move all. */
export interface Frame {
  readonly root: HTMLElement;
  readonly scroller: HTMLElement;
  /** As large as all cells, within what browsers can lay out. */
  readonly extent: HTMLElement;
  /** What is seen; it stays while the extent scrolls. */
  readonly view: HTMLElement;
  /** Takes the focus and the keys. */
  readonly table: HTMLElement;
  readonly letters: HTMLElement;
  readonly corner: HTMLElement;
  readonly header: HTMLElement;
  readonly body: HTMLElement;
  /** Moves the rows by less than a row. */
  readonly shift: HTMLElement;
  readonly marks: { readonly [Name in PaneName]: HTMLElement };
  readonly inset: HTMLElement;
  readonly tip: HTMLElement;
  readonly live: HTMLElement;
  /** As high as a row and as wide as the root's letters, to learn both in pixels. */
  readonly probe: HTMLElement;
}

export type PaneName = "frozenHeader" | "header" | "frozenBody" | "body";
export const paneNames: readonly PaneName[] = ["body", "frozenBody", "header", "frozenHeader"];

let grids = 0;

export function buildFrame(host: HTMLElement): Frame {
  const root = element("grid", host);
  const scroller = element("grid-scroll", root);
  scroller.tabIndex = -1;
  const extent = element("grid-extent", scroller);
  const view = element("grid-view", extent);
  const table = element("grid-table", view, "grid");
  table.tabIndex = 0;
  table.setAttribute("aria-multiselectable", "true");
  const letters = element("grid-letters", table, "row");
  letters.setAttribute("aria-rowindex", "1");
  const corner = element("grid-corner", letters, "columnheader");
  element("grid-unseen", corner).textContent = "All cells";
  corner.setAttribute("aria-colindex", "1");
  const header = element("grid-header", table);
  const body = element("grid-body", table, "rowgroup");
  const shift = element("grid-shift", body);
  const marks = {
    body: element("grid-pane", view),
    frozenBody: element("grid-pane grid-frozen-pane", view),
    header: element("grid-pane grid-header-pane", view),
    frozenHeader: element("grid-pane grid-frozen-pane grid-header-pane", view),
  };
  const inset = element("grid-inset", view);
  const tip = element("grid-tip", root, "tooltip");
  tip.id = `grid-tip-${++grids}`;
  tip.hidden = true;
  const live = element("grid-live", root);
  live.setAttribute("aria-live", "polite");
  return {
    root,
    scroller,
    extent,
    view,
    table,
    letters,
    corner,
    header,
    body,
    shift,
    marks,
    inset,
    tip,
    live,
    probe: element("grid-probe", root),
  };
}

export function element(className: string, parent?: Element, role?: string): HTMLElement {
  const made = document.createElement("div");
  made.className = className;
  if (role) made.setAttribute("role", role);
  parent?.append(made);
  return made;
}
