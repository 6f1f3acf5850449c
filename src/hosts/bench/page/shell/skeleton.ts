/** The parts of the page that stay in place; each is drawn by its owner. */
export interface Skeleton {
  readonly root: HTMLElement;
  readonly head: HTMLElement;
  readonly trouble: HTMLElement;
  readonly line: HTMLElement;
  readonly grid: HTMLElement;
  readonly plots: HTMLElement;
  readonly side: HTMLElement;
  readonly foot: HTMLElement;
  readonly said: HTMLElement;
}

export function buildSkeleton(root: HTMLElement): Skeleton {
  const add = (parent: HTMLElement, name: string, className: string): HTMLElement => {
    const element = document.createElement(name);
    element.className = className;
    parent.append(element);
    return element;
  };
  root.className = "shell";
  const head = add(root, "header", "shell-head");
  const trouble = add(root, "div", "shell-trouble");
  trouble.setAttribute("role", "alert");
  const line = add(root, "section", "shell-line");
  line.setAttribute("aria-label", "Formula line");
  const work = add(root, "main", "shell-work");
  const table = add(work, "div", "shell-table");
  const grid = add(table, "div", "shell-grid");
  const plots = add(table, "section", "shell-plots");
  plots.setAttribute("aria-label", "Plots");
  plots.hidden = true;
  const side = add(work, "aside", "shell-side");
  side.setAttribute("aria-label", "Beside the table");
  const foot = add(root, "footer", "shell-foot");
  const said = add(root, "div", "shell-said");
  said.setAttribute("role", "status");
  return { root, head, trouble, line, grid, plots, side, foot, said };
}
