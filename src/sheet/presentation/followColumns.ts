import type { Presentation } from "./presentation.js";
import { plainSheet } from "./presentation.js";
import { presentSheet } from "./presentColumns.js";

/** Columns put in before column `at` come as they are; what was there keeps how it was seen. */
export function insertPresentedColumns(
  presentation: Presentation,
  sheet: number,
  at: number,
  count: number,
): Presentation {
  return presentSheet(presentation, sheet, ({ columns, frozenColumns }) => ({
    columns: at >= columns.length ? columns : columns.toSpliced(at, 0, ...new Array(count).fill(undefined)),
    frozenColumns: at < frozenColumns ? frozenColumns + count : frozenColumns,
  }));
}

export function deletePresentedColumns(
  presentation: Presentation,
  sheet: number,
  at: number,
  count: number,
): Presentation {
  return presentSheet(presentation, sheet, ({ columns, frozenColumns }) => ({
    columns: columns.toSpliced(at, count),
    frozenColumns: frozenColumns - Math.max(0, Math.min(at + count, frozenColumns) - at),
  }));
}

/** Columns put before another one; the number of frozen columns stays. */
export function reorderPresentedColumns(
  presentation: Presentation,
  sheet: number,
  from: number,
  count: number,
  before: number,
): Presentation {
  return presentSheet(presentation, sheet, ({ columns, frozenColumns }) => {
    const length = Math.max(columns.length, from + count, before);
    const padded = Array.from({ length }, (_, column) => columns[column]);
    const moved = padded.splice(from, count);
    padded.splice(before > from ? before - count : before, 0, ...moved);
    return { columns: padded, frozenColumns };
  });
}

export function insertPresentedSheet(presentation: Presentation, at: number): Presentation {
  return at >= presentation.length ? presentation : presentation.toSpliced(at, 0, plainSheet);
}

export function removePresentedSheet(presentation: Presentation, sheet: number): Presentation {
  return presentation.toSpliced(sheet, 1);
}
