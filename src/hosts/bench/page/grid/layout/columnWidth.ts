import type { ColumnState } from "../../../protocol/bookState.js";

export const narrowest = 24;
export const widest = 2000;

/** The width of a column whose header sets none [px at a root size of 16 px], from the length of its name and unit. */
export function usualWidth(column: number, state: ColumnState | undefined): number {
  const words = Math.max((state?.name.length ?? 0) + (state?.derived ? 2 : 0), (state?.unit.length ?? 0) + 2);
  const least = column === 0 ? 136 : 92;
  return Math.min(Math.max(words * 8.5 + 20, least), 200);
}
