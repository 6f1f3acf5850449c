import type { ColumnPresentation, Presentation, SheetPresentation } from "./presentation.js";
import { plainSheet } from "./presentation.js";

/** The presentation with some columns of one sheet seen in another way. */
export function presentColumns(
  presentation: Presentation,
  sheet: number,
  columns: readonly number[],
  change: (column: ColumnPresentation) => ColumnPresentation,
): Presentation {
  return presentSheet(presentation, sheet, (before) => {
    const length = Math.max(before.columns.length, ...columns.map((column) => column + 1));
    const chosen = new Set(columns);
    const after = Array.from({ length }, (_, column) => {
      const known = before.columns[column];
      return chosen.has(column) ? change(known ?? {}) : known;
    });
    return { ...before, columns: after };
  });
}

export function freezeColumns(presentation: Presentation, sheet: number, frozenColumns: number): Presentation {
  return presentSheet(presentation, sheet, (before) => ({ ...before, frozenColumns }));
}

export function presentSheet(
  presentation: Presentation,
  sheet: number,
  change: (before: SheetPresentation) => SheetPresentation,
): Presentation {
  const length = Math.max(presentation.length, sheet + 1);
  return Array.from({ length }, (_, index) => {
    const before = presentation[index] ?? plainSheet;
    return index === sheet ? change(before) : before;
  });
}
