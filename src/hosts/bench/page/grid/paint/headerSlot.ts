import type { ColumnState } from "../../../protocol/bookState.js";
import type { ShownCell } from "../../../protocol/shown.js";
import { element } from "../layout/frame.js";
import { type Placed, placed } from "./placed.js";

export interface HeaderFacts {
  readonly column: number;
  readonly state: ColumnState | undefined;
  /** The header as a cell, where nothing is known of its column. */
  readonly shown: ShownCell | undefined;
  readonly isSelected: boolean;
  readonly isActiveColumn: boolean;
  /** The name of the column whose uncertainty this is. */
  readonly sigmaOf: string | undefined;
  readonly isLastSigma: boolean;
}

export interface HeaderSlot extends Placed {
  readonly unit: HTMLButtonElement;
  show(facts: HeaderFacts): void;
}

/** A header: name above, unit below as a button of its own. */
export function headerSlot(parent: HTMLElement, frozen: boolean): HeaderSlot {
  const cell = element("grid-cell", parent, "columnheader");
  cell.setAttribute("aria-selected", "false");
  const line = element("grid-name-line", cell);
  const sign = span("grid-sign", line);
  const name = span("grid-name", line);
  const unit = document.createElement("button");
  unit.type = "button";
  unit.tabIndex = -1;
  cell.append(unit);
  let [key, column, className] = ["", -1, ""];
  let isSelected = false;

  function write({ state, shown, sigmaOf }: HeaderFacts): void {
    const words = state?.name || (state?.unit ? "" : (shown?.text ?? ""));
    // An uncertainty that a formula filled beside its value needs no header of its own.
    name.textContent = words || (sigmaOf === undefined ? "" : "±");
    sign.textContent = state?.derived ? "=" : "";
    sign.setAttribute("aria-hidden", "true");
    const heard = `${words}${state?.unit ? ` [${state.unit}]` : ""}${asideOf(state, sigmaOf)}`;
    if (heard) cell.setAttribute("aria-label", heard);
    else cell.removeAttribute("aria-label");
    unit.textContent = state?.unit || "unit";
    unit.className = state?.unit ? "grid-unit" : "grid-unit grid-unit-none";
    unit.hidden = !state?.unit && !words;
    unit.setAttribute("aria-label", state?.unit ? `Unit ${state.unit} of ${words}` : `No unit of ${words}`);
  }

  return {
    ...placed(cell),
    unit,
    show(facts) {
      const { state, shown } = facts;
      if (column !== facts.column) {
        column = facts.column;
        cell.setAttribute("aria-colindex", String(column + 2));
        unit.dataset.column = String(column);
      }
      const nextKey = `${state?.name}\n${state?.unit}\n${state?.derived}\n${readingOf(state)}\n${shown?.text}\n${facts.sigmaOf}`;
      if (key !== nextKey) {
        key = nextKey;
        write(facts);
      }
      const nextClass = classOf(facts, frozen);
      if (className !== nextClass) cell.className = className = nextClass;
      if (isSelected !== facts.isSelected) {
        isSelected = facts.isSelected;
        cell.setAttribute("aria-selected", String(isSelected));
      }
    },
  };
}

function asideOf(state: ColumnState | undefined, sigmaOf: string | undefined): string {
  return [
    state?.derived ? ", calculated" : "",
    sigmaOf === undefined ? "" : `, uncertainty of ${sigmaOf}`,
    state?.reading.is === "problem" ? ", needs attention" : "",
  ].join("");
}

function classOf({ state, isActiveColumn, sigmaOf, isLastSigma }: HeaderFacts, frozen: boolean): string {
  return [
    "grid-cell grid-head",
    frozen ? "grid-frozen" : "",
    isActiveColumn ? "grid-active-column" : "",
    state?.reading.is === "problem" ? "grid-misread" : "",
    state?.sigmasTo === undefined ? "" : "grid-tie-start",
    sigmaOf === undefined ? "" : isLastSigma ? "grid-sigma grid-tie-end" : "grid-sigma grid-tie",
  ]
    .filter(Boolean)
    .join(" ");
}

const readingOf = (state: ColumnState | undefined) => (state?.reading.is === "problem" ? state.reading.message : "");

function span(className: string, parent: HTMLElement): HTMLElement {
  const made = document.createElement("span");
  made.className = className;
  parent.append(made);
  return made;
}
