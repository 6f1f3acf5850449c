import type { ShownCell } from "../../../protocol/shown.js";
import { element } from "../layout/frame.js";
import { type Placed, placed } from "./placed.js";

/** What a slot is told of the cell that it shows now. */
export interface CellFacts {
  readonly row: number;
  readonly column: number;
  readonly shown: ShownCell | undefined;
  /** Beyond the used cells nothing is on its way. */
  readonly isSpare: boolean;
  readonly isSelected: boolean;
  readonly isSigma: boolean;
  readonly isDerived: boolean;
  readonly version: number;
}

/** One element that shows one cell after the other; only what differs is written. */
export interface CellSlot extends Placed {
  show(facts: CellFacts): void;
}

export function cellSlot(parent: HTMLElement, frozen: boolean): CellSlot {
  const cell = element("grid-cell", parent, "gridcell");
  cell.setAttribute("aria-selected", "false");
  const text = document.createTextNode("");
  cell.append(text);
  const base = frozen ? "grid-cell grid-frozen" : "grid-cell";
  let [row, column, className] = [-1, -1, ""];
  let [isSelected, flashedAt, flashes] = [false, -1, 0];
  let shown: ShownCell | undefined;

  const classOf = (facts: CellFacts, known: ShownCell | undefined) => {
    const kind = known === undefined ? (facts.isSpare ? "" : " grid-waiting") : (classes[known.is] ?? "");
    return `${base}${kind}${facts.isSigma ? " grid-sigma" : ""}${facts.isDerived ? " grid-derived" : ""}${known?.spilled ? " grid-spilled" : ""}${flashed()}`;
  };
  // Two names for one animation: to change the name is to start it again.
  const flashed = () => (shown?.flash && flashes > 0 ? ` grid-${shown.flash}-${flashes % 2}` : "");

  return {
    ...placed(cell),
    show(facts) {
      const isSame = row === facts.row && column === facts.column;
      if (!isSame) {
        if (column !== facts.column) cell.setAttribute("aria-colindex", String(facts.column + 2));
        [row, column, flashes, flashedAt] = [facts.row, facts.column, 0, facts.version];
      }
      // What was last seen here stays until the cell has come.
      const known = facts.shown ?? (isSame ? shown : undefined);
      if (known !== shown) {
        if (isSame && known?.flash && flashedAt !== facts.version) {
          flashes += 1;
          flashedAt = facts.version;
        }
        shown = known;
        const next = known?.text ?? "";
        if (text.data !== next) text.data = next;
      }
      const nextClass = classOf(facts, known);
      if (className !== nextClass) cell.className = className = nextClass;
      if (isSelected !== facts.isSelected) {
        isSelected = facts.isSelected;
        cell.setAttribute("aria-selected", String(isSelected));
      }
    },
  };
}

const classes: { readonly [Kind in ShownCell["is"]]: string } = {
  number: " grid-number",
  text: "",
  logical: " grid-logical",
  error: " grid-error",
  blank: "",
};
