import type { Skeleton } from "./skeleton.js";

/** What takes the focus in each part of the page, in the order in which F6 goes through them. */
export function createParts(skeleton: Skeleton, focusGrid: () => void): (backwards: boolean) => void {
  const first = (part: HTMLElement, selector: string) => part.querySelector<HTMLElement>(selector);
  const parts: readonly { readonly element: HTMLElement; readonly target: () => HTMLElement | null }[] = [
    { element: skeleton.head, target: () => first(skeleton.head, "[role=menubar] [tabindex='0']") },
    { element: skeleton.trouble, target: () => first(skeleton.trouble, "button") },
    { element: skeleton.line, target: () => first(skeleton.line, "input") },
    { element: skeleton.grid, target: () => first(skeleton.grid, "[role=grid]") },
    { element: skeleton.plots, target: () => first(skeleton.plots, "select, input, button") },
    { element: skeleton.side, target: () => first(skeleton.side, "[role=tab][tabindex='0']") },
    { element: skeleton.foot, target: () => first(skeleton.foot, "button") },
  ];

  return (backwards) => {
    const at = parts.findIndex(({ element }) => element.contains(document.activeElement));
    const step = backwards ? -1 : 1;
    for (let count = 1; count <= parts.length; count++) {
      const next = parts[(at + count * step + count * parts.length) % parts.length];
      const target = next && !next.element.hidden ? next.target() : null;
      if (!target) continue;
      if (next?.element === skeleton.grid) focusGrid();
      else target.focus();
      return;
    }
  };
}
