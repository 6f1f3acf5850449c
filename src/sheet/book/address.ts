import { parseA1Range, stringifyA1Ref, toCol } from "@borgar/fx";

/** "C" for column 2. */
export function columnLetters(column: number): string {
  return toCol(column);
}

/** "C4" for row 3, column 2; "'My sheet'!C4" with a sheet. */
export function addressText(row: number, column: number, sheet?: string): string {
  return stringifyA1Ref({
    context: sheet === undefined ? [] : [sheet],
    range: { top: row, left: column, bottom: row, right: column },
  });
}

export function readAddress(text: string): { readonly row: number; readonly column: number } | undefined {
  const range = parseA1Range(text.trim().toUpperCase());
  if (!range || range.top === null || range.left === null) {
    return undefined;
  }
  const single = (range.bottom ?? range.top) === range.top && (range.right ?? range.left) === range.left;
  return single ? { row: range.top, column: range.left } : undefined;
}
