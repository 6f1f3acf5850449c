import type { ColumnState } from "../../../protocol/bookState.js";

export const narrowest = 24;
export const widest = 2000;

/** The width of a column whose header sets none [px at a root size of 16 px], from the length of its name and unit. */
export function usualWidth(column: number, state: ColumnState | undefined): number {
  // All digits of what was worked out, where nothing says how many are wanted.
  const isWhole = state?.derived === true && state.format.kind === "general";
  const words = Math.max((state?.name.length ?? 0) + (state?.derived ? 2 : 0), (state?.unit.length ?? 0) + 2);
  const least = column === 0 ? 136 : isWhole ? 164 : 92;
  return Math.min(Math.max(words * 8.5 + 26, least), 200);
}
