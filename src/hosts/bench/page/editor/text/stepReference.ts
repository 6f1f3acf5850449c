import { readTokens } from "./tokens.js";

export interface TextChange {
  readonly from: number;
  readonly to: number;
  readonly insert: string;
}

/** Which of column and row a `$` holds. */
interface Held {
  readonly column: boolean;
  readonly row: boolean;
}

const corner = /^(\$?)(\p{L}{0,3})(\$?)(\d*)$/u;

/**
 * The next of the forms B2, $B$2, B$2, $B2 for the references that a selection touches; all take the form that
 * follows that of the first. `A:C` and `2:5` have two forms.
 */
export function stepReferences(text: string, from: number, to: number): TextChange[] {
  const touched = readTokens(text).filter(
    (token) => token.kind === "reference" && token.from <= to && token.to >= from,
  );
  const first = touched[0];
  if (!first) return [];
  const next = following(heldIn(first.text));
  return touched.map((token) => ({ from: token.from, to: token.to, insert: withHeld(token.text, next) }));
}

function split(reference: string): readonly [string, string] {
  const end = reference.lastIndexOf("!") + 1;
  return [reference.slice(0, end), reference.slice(end)];
}

function heldIn(reference: string): Held {
  const [first = ""] = split(reference)[1].split(/\.?:/);
  const [, before = "", letters = "", between = "", digits = ""] = corner.exec(first) ?? [];
  // Whole columns and rows have two forms: a held one counts as the last of the four, so that none follows.
  if (letters === "" || digits === "") return { column: before !== "", row: false };
  return { column: before !== "", row: between !== "" };
}

function following({ column, row }: Held): Held {
  if (column && row) return { column: false, row: true };
  if (row) return { column: true, row: false };
  if (column) return { column: false, row: false };
  return { column: true, row: true };
}

function withHeld(reference: string, held: Held): string {
  const [sheet, cells] = split(reference);
  const isWhole = !/\p{L}\$?\d/u.test(cells);
  const column = isWhole ? held.column && held.row : held.column;
  const row = isWhole ? column : held.row;
  const stepped = cells.replace(/\$?(\p{L}{0,3})\$?(\d*)/gu, (_, letters: string, digits: string) => {
    const before = letters !== "" && column ? "$" : "";
    const between = digits !== "" && row ? "$" : "";
    return `${before}${letters}${between}${digits}`;
  });
  return sheet + stepped;
}
