import type { ColumnState } from "../../../../../src/hosts/bench/protocol/bookState.js";
import type { ShownCell } from "../../../../../src/hosts/bench/protocol/shown.js";

const column = (name: string, unit: string, more: Partial<ColumnState> = {}): ColumnState => ({
  name,
  unit,
  reading: unit ? { is: "unit", unit, kind: "", quantity: undefined } : { is: "none", quantity: undefined },
  sigmaOf: undefined,
  sigmasTo: undefined,
  width: undefined,
  hidden: false,
  format: { kind: "general" },
  derived: false,
  ...more,
});

/** A: names; B, C: a value and its uncertainty; D to F: a mass and two; G: hidden; H, I: calculated; J: misread. */
export const columnStates: readonly ColumnState[] = [
  column("Target", ""),
  column("Period", "d", { sigmasTo: 2 }),
  column("σ Period", "d", { sigmaOf: 1 }),
  column("Star mass", "solMass", { sigmasTo: 5 }),
  column("σ up", "solMass", { sigmaOf: 3 }),
  column("σ low", "solMass", { sigmaOf: 3 }),
  column("Remark of the observer", ""),
  column("K", "m/s", { derived: true, sigmasTo: 8 }),
  column("σ K", "m/s", { derived: true, sigmaOf: 7 }),
  column("Speed", "m/ss", { reading: { is: "problem", message: '"m/ss" is not a known unit; did you mean "m/s"?' } }),
  ...Array.from({ length: 20 }, (_, index) => column(`Note ${index + 1}`, "")),
];

export const errorMessage = "REFLEX: planet mass is blank; it is needed.";

/** The cell of a table of any length, made when it is asked for. Row 4 (sheet row 3) holds an error in column H. */
export function tableCell(row: number, column: number): ShownCell {
  const state = columnStates[column];
  if (!state) return { text: "", is: "blank" };
  if (row === 0) return { text: state.unit ? `${state.name} [${state.unit}]` : state.name, is: "text" };
  if (column === 0) return { text: `HD ${10_000 + row}`, is: "text" };
  if (column === 6) return { text: `seen ${row % 9} times, with a remark that is longer than its column`, is: "text" };
  if (column === 7 && row % 10 === 3) return { text: "#N/A", is: "error", message: errorMessage, hasFormula: true };
  if (column === 10 && row > 20) return { text: "", is: "blank" };
  const number = ((row * 7919 + column * 104_729) % 100_000) / 1000;
  return { text: number.toFixed(column % 3 === 0 ? 2 : 3), is: "number", ...(state.derived && { hasFormula: true }) };
}
